import type { AddedElement, ByHand, FreeElement } from '#shared/contracts/by-hand.ts';
import { plainWords } from '../breaking.ts';
import type { BlockName } from '../content.ts';
import { inMillimetres } from '../lengths.ts';
import { misfitOf, type Misfit } from '../misfits.ts';
import type { LabelPicture } from '../label-input.ts';
import type { ElementName, Ink, Micrometres } from '../scene.ts';
import { leastText, type Attempt, type Job, type Setting } from '../setting.ts';
import { drawCode, drawShape } from './draw-added.ts';
import { drawPicture } from './draw-picture.ts';
import { keyOf, type HandKey } from './elements.ts';
import { lacking, setFreed, type HandPlaced } from './set-freed.ts';
import { setText } from './set-text.ts';
import { verifyHand } from './verify-hand.ts';

/** Least edge of a module that a telephone still reads from a curved label. Common practice, no source. */
const LEAST_MODULE: Micrometres = 300;
const MOST_OWN: Micrometres = 40_000;
const OWN_LEADING = 1200;

function setAdded(job: Job, added: AddedElement, pictures: readonly LabelPicture[] | undefined): HandPlaced {
  if (added.kind === 'picture') {
    const picture = pictures?.find(({ id }) => id === added.picture);
    return picture ? { ...drawPicture(added, picture), misfits: [] } : { items: [], misfits: [{ element: 'drawing', direction: 'measure', missing: 0, message: 'A picture of this label is not in the house. Choose another or take it off.' }] };
  }
  if (added.kind === 'code') {
    const { items, module } = drawCode(added);
    const small = module < LEAST_MODULE;
    return { items, misfits: small ? [{ element: 'code', direction: 'width', missing: LEAST_MODULE - module, message: `The QR code’s modules would be ${inMillimetres(module)} mm; telephones want ${inMillimetres(LEAST_MODULE)} mm or more (common practice). Make its frame larger or the address shorter.` }] : [] };
  }
  if (added.kind !== 'text') return { items: [drawShape(added)], misfits: [] };
  const { items, missing } = setText({
    element: 'own text', paragraphs: added.text.split(/\n+/).map((line) => plainWords(line, 400)).filter((words) => words.length > 0),
    frame: added.frame, style: added.style, least: (weight) => leastText(job, weight), most: MOST_OWN, leading: OWN_LEADING, ink: 'black', own: added.id,
  }, job.metrics);
  return { items, misfits: lacking('own text', missing) };
}

/** Characters of the house's own words that the type lacks. */
function lackingLetters(job: Job, added: readonly AddedElement[]): Misfit[] {
  const face = job.metrics.face(400);
  return added.flatMap((one): Misfit[] => {
    if (one.kind !== 'text') return [];
    const missing = [...new Set(Array.from(one.text))].filter((char) => !/\s/.test(char) && !face.has(char));
    return missing.length === 0 ? [] : [{ element: 'own text', direction: 'character', missing: 0, message: `The label type has no ${missing.map((char) => `“${char}”`).join(', ')} (in your own text). Write it with other letters.` }];
  });
}

/** Whether anything was changed by hand. */
export function isByHand(byHand: ByHand | undefined): byHand is ByHand {
  return byHand !== undefined && byHand.freed.length + byHand.added.length > 0;
}

/** A job without the texts and feet that were set free: the template needs no room for them. */
export function leanFor(job: Job, { freed }: ByHand): Job {
  const isFree = new Set<FreeElement>(freed.map(({ element }) => element));
  const { content } = job;
  return {
    ...job, memo: new Map(),
    barcode: isFree.has('barcode') ? null : job.barcode,
    content: {
      ...content,
      claim: isFree.has('claim') ? '' : content.claim,
      net: isFree.has('net content') ? null : content.net,
      mark: isFree.has('durability') ? null : content.mark,
      blocks: Object.fromEntries(Object.entries(content.blocks).filter(([name]) => !isFree.has(name as BlockName))),
    },
  };
}

/**
 * A template's setting with what a person changed: freed elements leave their place and are set
 * in their frames, the house's own things join. Everything else stays where it was.
 */
export function applyHand(job: Job, setting: Setting, attempt: Attempt, byHand: ByHand, pictures: readonly LabelPicture[] | undefined = undefined): HandPlaced & { readonly inks: Readonly<Record<string, Ink>> } {
  const freed = new Set<HandKey>(byHand.freed.map(({ element }) => element));
  const isFreed = (element: ElementName): boolean => freed.has(element === 'batch' ? 'durability' : (element as HandKey));
  const kept = attempt.items.filter((item) => !freed.has(keyOf(item) ?? 'own:'));
  const placed = [...byHand.freed.map((one) => setFreed(job, setting, one)), ...byHand.added.map((one) => setAdded(job, one, pictures))];
  const items = [...kept, ...placed.flatMap((one) => one.items)];
  const moved = new Set<HandKey>([...freed, ...byHand.added.map(({ id }): HandKey => `own:${id}`)]);
  return {
    items,
    inks: Object.assign({}, ...placed.map((one) => one.inks ?? {})) as Readonly<Record<string, Ink>>,
    misfits: [
      ...lackingLetters(job, byHand.added), ...attempt.overflows.filter(({ element }) => !isFreed(element)).map(misfitOf),
      ...placed.flatMap((one) => one.misfits), ...verifyHand(job, items, moved),
    ],
  };
}
