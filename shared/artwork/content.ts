import { ingredientWords, plainWords, type Word } from './breaking.ts';
import type { LabelInput } from './label-input.ts';
import { netStatement, type NetStatement } from './net-content.ts';
import type { ElementName } from './scene.ts';
import { sayBestBefore, sayIn, sayOrigin } from './words.ts';

export type BlockName = 'directions' | 'warnings' | 'ingredients' | 'responsible person';

export interface Paragraph {
  readonly words: readonly Word[];
  /** Starts after half a row. */
  readonly apart: boolean;
}
/** A text that hangs in a column. */
export interface Block {
  readonly name: BlockName;
  readonly heading: string;
  /** Printed wherever the block stands; other headings are dropped where room is short. */
  readonly keepsHeading: boolean;
  readonly paragraphs: readonly Paragraph[];
}
export interface Mark {
  readonly kind: 'jar' | 'hourglass' | 'none';
  /** Figure in the jar. */
  readonly months: string;
  /** Lines beside the symbol. */
  readonly lines: readonly { readonly element: ElementName; readonly text: string; readonly strong: boolean }[];
}
/** What the label says, in the order in which it is read. */
export interface Content {
  readonly brand: string;
  readonly name: string;
  readonly functionName: string;
  readonly claim: string;
  readonly frontWarnings: readonly string[];
  readonly net: NetStatement | null;
  readonly eMark: boolean;
  readonly blocks: Readonly<Partial<Record<BlockName, Block>>>;
  readonly mark: Mark | null;
}

/** A name that ends in the product's function is set as two: "Juniper & Oat" and "Body Wash". */
export function splitTitle(name: string, functionName: string): { name: string; functionName: string } {
  const whole = name.trim();
  const tail = functionName.trim();
  const end = whole.slice(whole.length - tail.length);
  if (tail === '' || end.toLowerCase() !== tail.toLowerCase()) return { name: whole, functionName: tail };
  const head = whole.slice(0, whole.length - tail.length);
  return head.trim() === '' ? { name: whole, functionName: '' } : head.endsWith(' ') ? { name: head.trim(), functionName: end } : { name: whole, functionName: tail };
}

function paragraphs(texts: readonly string[]): Paragraph[] {
  return texts
    .flatMap((text) => text.split(/\n+/))
    .map((text) => text.trim())
    .filter(Boolean)
    .map((text, i) => ({ words: plainWords(text, 400), apart: i > 0 }));
}

function partyParagraphs(input: LabelInput): Paragraph[] {
  const lines: Paragraph[] = [];
  const party = input.responsiblePerson;
  const push = (text: string, weight: 400 | 600): void => {
    for (const line of text.split(/\n+/)) if (line.trim()) lines.push({ words: plainWords(line.trim(), weight), apart: false });
  };
  if (party) push(party.name, 600);
  if (party) push(party.address, 400);
  if (input.countryOfOrigin.trim()) push(sayOrigin(input.languages, input.countryOfOrigin.trim()), 400);
  if (input.contact.trim()) push(input.contact.trim(), 400);
  return lines;
}

function markOf(input: LabelInput): Mark | null {
  const { durability } = input;
  const batch = input.batchCode.trim();
  const batchLines = batch
    ? [{ element: 'batch' as const, text: sayIn(input.languages, 'batch'), strong: false }, { element: 'batch' as const, text: batch, strong: true }]
    : [];
  if (durability?.kind === 'best-before') {
    const date = durability.date.split('-').reverse().join('/');
    const words = sayBestBefore(input.languages);
    const lines = [...(words ? [{ element: 'durability' as const, text: words, strong: false }] : []), { element: 'durability' as const, text: date, strong: true }];
    return { kind: 'hourglass', months: '', lines: [...lines, ...batchLines] };
  }
  if (durability) return { kind: 'jar', months: `${durability.months}M`, lines: batchLines };
  return batchLines.length > 0 ? { kind: 'none', months: '', lines: batchLines } : null;
}

/** The content of a label, split into what the composer places. */
export function contentOf(input: LabelInput): Content {
  const net = input.netContent && netStatement(input.netContent, input.market);
  const directions = paragraphs([input.directions]);
  const warnings = paragraphs(input.warnings);
  const party = partyParagraphs(input);
  const list = input.ingredients;
  return {
    brand: input.brand.trim(),
    ...splitTitle(input.name, input.functionName),
    claim: input.claim?.trim() ?? '',
    frontWarnings: input.frontWarnings ?? [],
    net,
    eMark: Boolean(net?.mayCarryEMark) && (input.market === 'EU' || input.market === 'UK'),
    blocks: {
      ...(directions.length > 0 ? { directions: { name: 'directions', heading: sayIn(input.languages, 'use'), keepsHeading: false, paragraphs: directions } } : {}),
      ...(warnings.length > 0 ? { warnings: { name: 'warnings', heading: sayIn(input.languages, 'care'), keepsHeading: false, paragraphs: warnings } } : {}),
      ...(list && list.body.trim()
        ? { ingredients: { name: 'ingredients', heading: `${list.heading}:`, keepsHeading: true, paragraphs: [{ words: ingredientWords(list.body, 400), apart: false }] } }
        : {}),
      ...(party.length > 0 ? { 'responsible person': { name: 'responsible person', heading: sayIn(input.languages, 'from'), keepsHeading: false, paragraphs: party } } : {}),
    },
    mark: markOf(input),
  };
}

/** Every text of the content, for the search for characters that the type lacks. */
export function textsOf(input: LabelInput): { readonly element: ElementName; readonly text: string }[] {
  const content = contentOf(input);
  const texts: { element: ElementName; text: string }[] = [
    { element: 'brand', text: content.brand }, { element: 'name', text: content.name }, { element: 'function', text: content.functionName },
    { element: 'claim', text: content.claim }, ...content.frontWarnings.map((text) => ({ element: 'warnings' as const, text })),
    { element: 'net content', text: content.net?.parts.join(' ') ?? '' },
  ];
  for (const block of Object.values(content.blocks)) {
    texts.push({ element: block.name, text: block.heading }, ...block.paragraphs.map((p) => ({ element: block.name as ElementName, text: p.words.map((word) => word.text).join(' ') })));
  }
  return [...texts, ...(content.mark?.lines ?? [])].filter(({ text }) => text !== '');
}
