import type { DocumentMaterial, DocumentShare } from '#shared/contracts/formula-document.ts';
import type { Dictionary } from '#shared/dictionary/types.ts';
import { prepareMaterial } from '#shared/engine/prepare-material.ts';
import type { PreparedMaterial } from '#shared/engine/prepare-material.ts';
import { HUNDRED, add, compare, decimal, parseDecimal, rational, subtract, toDecimal } from '#shared/kernel/rational.ts';
import type { Rational } from '#shared/kernel/rational.ts';
import { readDecimal } from '#src/lib/say.ts';
import type { VerdictWeight } from '#src/ui/verdict-mark.tsx';
import { isBlankPart } from './material-form.ts';
import type { MaterialForm, PartFields, ShareFields } from './material-form.ts';

/** A part's figures in percent of the material, and where its bar begins. */
export interface JudgedPart {
  readonly least: Rational;
  readonly typical: Rational;
  readonly most: Rational;
  readonly from: Rational;
  readonly isRange: boolean;
  /** False while nothing, or no number yet, is written. */
  readonly isFilled: boolean;
}
export interface Judgement {
  readonly parts: readonly JudgedPart[];
  readonly least: Rational;
  readonly typical: Rational;
  readonly most: Rational;
  /** `null` where there is nothing to say against it. */
  readonly weight: VerdictWeight | null;
  readonly title: string;
  readonly words: string;
}

// Only figures are judged here; names are looked up elsewhere.
const NO_NAMES: Dictionary = { release: '', resolve: () => undefined, suggest: () => [] };
const ZERO_SHARE: DocumentShare = { percent: '0' };

/** The sum of a composition as it is typed, by the engine's own arithmetic. Faulty figures count as nothing yet. */
export function judgeComposition(parts: readonly PartFields[], declareAs: MaterialForm['declareAs']): Judgement {
  const shares = parts.map(readShare);
  const material: DocumentMaterial = {
    id: 'typed', tradeName: '', declareAs, constituents: [],
    composition: shares.map((share, index) => ({ inci: parts[index]!.inci || `part ${index}`, role: 'ingredient', ...(share ?? ZERO_SHARE) })),
  };
  const prepared = prepareMaterial(material, NO_NAMES);
  let from = rational(0n);
  let least = from;
  let most = from;
  const judged = prepared.parts.map((part, index): JudgedPart => {
    const written = shares[index];
    const one = { least: rational(part.lo, prepared.den), typical: rational(part.typ, prepared.den), most: rational(part.hi, prepared.den), from, isRange: part.lo !== part.hi, isFilled: written !== null };
    from = add(from, one.typical);
    least = add(least, one.least);
    most = add(most, one.most);
    return one;
  });
  const whole = { parts: judged, least, typical: from, most };
  return { ...whole, ...sayIt(prepared, whole, parts) };
}

/** A share as the engine reads it, or `null` while it cannot be read. */
export function readShare(fields: ShareFields): DocumentShare | null {
  const [least, most, typical] = [fields.least, fields.most, fields.typical].map((text) => readDecimal(text)) as [string, string, string];
  const isFigure = (text: string) => parseDecimal(text) !== null && !text.startsWith('-');
  if (!isFigure(least)) return null;
  if (most === '' && typical === '') return { percent: least };
  if (!isFigure(most) || compare(decimal(least), decimal(most)) > 0) return null;
  const isInside = isFigure(typical) && compare(decimal(least), decimal(typical)) <= 0 && compare(decimal(typical), decimal(most)) <= 0;
  return isInside ? { min: least, typical, max: most } : { min: least, max: most };
}

const say = (value: Rational) => toDecimal(value, 4);
interface Whole {
  readonly parts: readonly JudgedPart[];
  readonly least: Rational;
  readonly most: Rational;
}

function sayIt(prepared: PreparedMaterial, whole: Whole, parts: readonly PartFields[]): Pick<Judgement, 'weight' | 'title' | 'words'> {
  if (parts.every(isBlankPart)) {
    return prepared.material.declareAs === 'ingredients'
      ? { weight: null, title: '', words: 'Write the first ingredient and its share. The bar has to land on 100.' }
      : { weight: null, title: '', words: 'Declared as one entry: its composition may be left out.' };
  }
  const hasRange = whole.parts.some((part) => part.isRange);
  if (prepared.state === 'sums') {
    return hasRange
      ? { weight: null, title: '', words: `The ranges can make 100: their least is ${say(whole.least)}, their most ${say(whole.most)}. ${sayLambda(prepared)}Hatched: the supplier’s range.` }
      : { weight: null, title: '', words: 'The parts make 100 %.' };
  }
  if (prepared.state === 'scaled') return { weight: 'note', title: `The figures make ${say(prepared.typicalSum)} %.`, words: 'That is within half a percent of 100, as suppliers round. They are scaled to 100 and stand as they are.' };
  const unread = whole.parts.filter((part, index) => !part.isFilled && !isBlankPart(parts[index]!)).length;
  const gap = subtract(HUNDRED, prepared.typicalSum);
  if (compare(gap, rational(0n)) > 0) {
    return { weight: 'decide', title: `${say(gap)} % are missing.`, words: `The parts make ${say(whole.most)} % ${hasRange ? 'at most' : 'together'}. ${unread > 0 ? 'A line still wants its figure.' : 'Perhaps water or a carrier is not written down.'}` };
  }
  const over = subtract(whole.least, HUNDRED);
  return { weight: 'stop', title: `${say(over)} % too much.`, words: `The parts make ${say(whole.least)} % ${hasRange ? 'at least' : 'together'}; no material holds more than 100.` };
}

/** `Each typical figure stands 0.6 of the way up its range, so that together they are 100. ` */
function sayLambda(prepared: PreparedMaterial): string {
  const free = prepared.parts.find((part, index) => part.hi > part.lo && prepared.material.composition[index]?.typical === undefined);
  if (!free) return '';
  return `Each typical figure stands ${toDecimal(rational(free.typ - free.lo, free.hi - free.lo), 3)} of the way up its range, so that together they are 100. `;
}
