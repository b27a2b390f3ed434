import type { DocumentLabel, FormulaDocument } from '#shared/contracts/formula-document.ts';
import { essence } from '#shared/law/essence.ts';
import type { Market } from '#shared/law/types.ts';
import type { ContainerSettings, LabelInput } from './label-input.ts';

/** What a label reads of a market's result, whether computed here or read from a result document. */
export interface LabelResult {
  readonly declaration: { readonly heading: string; readonly text: string; readonly entries: readonly unknown[] };
  readonly requiredWording: readonly {
    readonly text: string;
    readonly lang: string;
    readonly certainty?: 'certain' | 'possible' | undefined;
    readonly place?: 'principal-panel' | 'label' | undefined;
    readonly isOfficialText?: boolean | undefined;
  }[];
}

/** What a label is set on where the document names no container: the 250 ml bottle of the catalogue. */
const USUAL: ContainerSettings = { shape: 'cylinder', diameterMm: '58', labelHeightMm: '90', overlapMm: '5' };

/** Market of a document's label: its own, else the product's first. */
export function labelMarket(document: FormulaDocument): Market {
  return document.label?.market ?? document.product.markets[0] ?? 'EU';
}

/** Languages of a label: its own, else those a market asks for. */
export function labelLanguages(label: DocumentLabel | undefined, market: Market): readonly string[] {
  if (label?.languages && label.languages.length > 0) return label.languages;
  return market === 'CA' ? ['en', 'fr'] : ['en'];
}

function splitDeclaration(declaration: LabelResult['declaration'] | undefined): LabelInput['ingredients'] {
  if (!declaration || declaration.entries.length === 0) return null;
  const { heading, text } = declaration;
  const body = text.startsWith(`${heading}:`) ? text.slice(heading.length + 1) : text;
  return { heading, body: body.trim() };
}

function unique(texts: readonly string[]): string[] {
  const seen = new Set<string>();
  return texts.filter((text) => {
    // Compared as the verdicts do: a warning that differs in punctuation alone is not printed twice.
    const key = essence(text);
    if (key === '' || seen.has(key)) return false;
    seen.add(key);
    return true;
  });
}

/** Words in a row, so that a text is found within another from word to word, never inside a word. */
function inWords(text: string): string {
  return ` ${text.split(/[^\p{L}\p{N}]+/u).map(essence).filter((word) => word !== '').join(' ')} `;
}

/** True where one of the maker's texts says the words and more: they are then not printed beside it. */
function isWithin(words: string, texts: readonly string[]): boolean {
  return texts.some((text) => essence(text) !== essence(words) && inWords(text).includes(inWords(words)));
}

/** The label of a formula document in one market, from its own particulars and the market's result. */
export function labelOfDocument(document: FormulaDocument, result: LabelResult | undefined, market: Market = labelMarket(document)): LabelInput {
  const { product, label } = document;
  const particulars = product.particulars;
  const languages = labelLanguages(label, market);
  const speaks = (lang: string | undefined): boolean => lang === undefined || languages.includes(lang);
  // Wording that is only a pointer to an official text is not printed; the verdicts say what to do about it.
  const wording = (result?.requiredWording ?? []).filter((words) => speaks(words.lang) && words.isOfficialText !== false && words.certainty !== 'possible');
  const onFront = wording.filter((words) => words.place === 'principal-panel').map((words) => words.text);
  const onLabel = wording.filter((words) => words.place !== 'principal-panel').map((words) => words.text);
  const own = (particulars?.warnings ?? []).filter((warning) => speaks(warning.lang)).map((warning) => warning.text);
  const party = particulars?.responsiblePerson[market] ?? (market === 'UK' ? particulars?.responsiblePerson.EU : undefined);
  return {
    market, languages,
    container: label?.container ?? USUAL,
    bleedMm: label?.bleedMm,
    brand: product.brand,
    name: product.name,
    functionName: particulars?.function ?? '',
    claim: product.claims.find((claim) => speaks(claim.lang))?.text,
    netContent: product.netContent ?? null,
    durability: product.durability?.kind === 'pao' ? { kind: 'pao', months: Number(product.durability.months) } : (product.durability ?? null),
    directions: particulars?.directions ?? '',
    warnings: unique([...onLabel.filter((text) => !isWithin(text, own)), ...own]).filter((text) => !onFront.includes(text)),
    frontWarnings: unique(onFront),
    ingredients: splitDeclaration(result?.declaration),
    responsiblePerson: party ?? null,
    contact: (market === 'US' ? particulars?.usContact : market === 'CA' ? particulars?.canadaContact : undefined) ?? '',
    countryOfOrigin: particulars?.countryOfOrigin ?? '',
    batchCode: particulars?.batchCode ?? '',
    barcode: label?.barcode ?? null,
    template: label?.template, ink: label?.ink, byHand: label?.byHand, press: label?.press,
  };
}
