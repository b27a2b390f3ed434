import type { FreedElement, FreeElement } from '#shared/contracts/by-hand.ts';
import { plainWords, type Word } from '../breaking.ts';
import { barsFoot, markFoot, netFoot, type Foot } from '../feet.ts';
import { inMillimetres } from '../lengths.ts';
import { ELEMENT_NAMES, type Misfit } from '../misfits.ts';
import type { Ink, Item, Micrometres, Weight } from '../scene.ts';
import { leastText, strongWeight, type Job, type Setting } from '../setting.ts';
import { setText, type HandText } from './set-text.ts';

export interface HandPlaced {
  readonly items: readonly Item[];
  readonly misfits: readonly Misfit[];
  /** Inks beside the label's own. */
  readonly inks?: Readonly<Record<string, Ink>>;
}

const NOTHING: HandPlaced = { items: [], misfits: [] };
/** Display type is chosen no larger than this where no size is asked for. */
const MOST_TITLE: Micrometres = 40_000;
const MOST_SMALL: Micrometres = 3900;
const TITLE_LEADING = 1080;
const SMALL_LEADING = 1266;

type TextElement = Exclude<FreeElement, 'net content' | 'durability' | 'barcode'>;

function paragraphsOf(job: Job, element: TextElement): readonly (readonly Word[])[] {
  const { content } = job;
  const plain = (text: string, weight: Weight): Word[][] => (text === '' ? [] : [plainWords(text, weight)]);
  if (element === 'brand') return plain(content.brand, 400);
  if (element === 'name') return plain(content.name, 400);
  if (element === 'function') return plain(content.functionName, 400);
  if (element === 'claim') return plain(content.claim, 400);
  const block = content.blocks[element];
  if (!block) return [];
  const [first, ...rest] = block.paragraphs.map(({ words }) => words);
  if (!block.keepsHeading || !first) return block.paragraphs.map(({ words }) => words);
  const heading = block.heading.split(' ').map((text, i): Word => ({ text, weight: 600, before: i === 0 ? 'free' : 'never' }));
  return [[...heading, { ...first[0]!, before: 'name' }, ...first.slice(1)], ...rest];
}

/** The weight of an element that the law wants bold, else what was asked. */
function lawfulStyle(job: Job, freed: FreedElement): FreedElement['style'] {
  const { style } = freed;
  const isIdentity = freed.element === 'function' || (freed.element === 'name' && job.content.functionName === '');
  const least = isIdentity && job.isNorthAmerican ? strongWeight(job) : 300;
  return style.weight !== undefined && style.weight < least ? { ...style, weight: least } : isIdentity && job.isNorthAmerican && style.weight === undefined ? { ...style, weight: least } : style;
}

/** What a frame lacks, in words. */
export function lacking(element: Misfit['element'], missing: { readonly height: Micrometres; readonly width: Micrometres; readonly word?: string }): Misfit[] {
  const name = element === 'container' ? 'The label' : ELEMENT_NAMES[element];
  const say = (direction: 'height' | 'width', by: Micrometres, where: string): Misfit => ({ element, direction, missing: by, message: `${name} lacks ${inMillimetres(by)} mm of ${direction}${where} in the frame set by hand. Make the frame larger or the type smaller.` });
  if (missing.width > 0) return [say('width', missing.width, missing.word === undefined ? '' : ` for “${missing.word}”`)];
  return missing.height > 0 ? [say('height', missing.height, '')] : [];
}

function setFreedText(job: Job, freed: FreedElement, element: TextElement): HandPlaced {
  const paragraphs = paragraphsOf(job, element);
  if (paragraphs.length === 0) return NOTHING;
  const isTitle = element === 'brand' || element === 'name' || element === 'function';
  const text: HandText = {
    element, paragraphs, frame: freed.frame, style: lawfulStyle(job, freed),
    least: (weight) => leastText(job, weight),
    most: isTitle ? MOST_TITLE : MOST_SMALL, leading: isTitle ? TITLE_LEADING : SMALL_LEADING,
    ink: isTitle ? 'ink' : 'black', ...(element === 'ingredients' && { headInk: 'ink' }),
  };
  const { items, missing } = setText(text, job.metrics);
  return { items, misfits: lacking(element, missing) };
}

function standFoot(freed: FreedElement, foot: Foot | null): HandPlaced {
  if (!foot) return NOTHING;
  const { x, y, width, height } = freed.frame;
  const align = freed.style.align ?? 'left';
  const shift = align === 'left' ? 0 : align === 'centre' ? Math.round((width - foot.width) / 2) : width - foot.width;
  const items = foot.draw(x + Math.max(0, shift), y + height);
  return { items, misfits: lacking(foot.element, { width: Math.max(0, foot.width - width), height: Math.max(0, foot.height - height) }) };
}

/**
 * Sets one element into the frame a person gave it, with every letter at its market's least
 * height or above. What the frame lacks is told and never cut.
 */
export function setFreed(job: Job, setting: Setting, freed: FreedElement): HandPlaced {
  const { element, frame, style } = freed;
  if (element === 'net content') {
    if (!job.content.net) return NOTHING;
    const sized = style.size === undefined ? job : { ...job, netSize: Math.max(job.netSize, style.size) };
    return standFoot(freed, netFoot(sized, frame.width, style.ink ?? 'black'));
  }
  if (element === 'durability') return standFoot(freed, markFoot(job, { ...setting, size: Math.max(job.floor, style.size ?? setting.size) }, frame.width));
  // A frame taller than wide stands the bars on end.
  if (element === 'barcode') return standFoot(freed, barsFoot(job, { ...setting, ladder: frame.height > frame.width }));
  return setFreedText(job, freed, element);
}
