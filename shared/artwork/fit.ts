import { compose } from './compose.ts';
import { mayStandUpright } from './feet.ts';
import type { Micrometres } from './scene.ts';
import type { Attempt, ColumnPlan, Job, Setting } from './setting.ts';
import type { BlockName } from './content.ts';
import { verifyAttempt } from './verify.ts';

const USE: readonly BlockName[] = ['directions', 'warnings'];

function plan(texts: readonly BlockName[], feet: ColumnPlan['feet'] = [], beside: ColumnPlan['beside'] = []): ColumnPlan {
  return { texts, feet, beside };
}

/** Two columns, in order of liking: use and house with the jar, list with the bars, then what gives the list more room. */
const TWO: readonly (readonly ColumnPlan[])[] = [
  [plan([...USE, 'responsible person'], ['mark']), plan(['ingredients'], ['bars'])],
  [plan([...USE, 'responsible person'], ['mark', 'bars']), plan(['ingredients'])],
  [plan(USE, ['mark', 'bars']), plan(['ingredients', 'responsible person'])],
  [plan(USE, ['mark']), plan(['ingredients', 'responsible person'], ['bars'])],
  [plan(['ingredients'], ['mark']), plan([...USE, 'responsible person'], ['bars'])],
  [plan(['ingredients']), plan([...USE, 'responsible person'], ['mark', 'bars'])],
  [plan([...USE, 'responsible person'], ['mark'], ['bars']), plan(['ingredients'])],
  [plan([...USE, 'responsible person'], ['mark']), plan(['ingredients'], [], ['bars'])],
  [plan(['directions', 'responsible person'], ['mark', 'bars']), plan(['warnings', 'ingredients'])],
  [plan(['responsible person'], ['mark', 'bars']), plan([...USE, 'ingredients'])],
  [plan(USE, ['mark'], ['bars']), plan(['ingredients', 'responsible person'])],
  [plan(['responsible person'], ['mark'], ['bars']), plan([...USE, 'ingredients'])],
  [plan([...USE, 'responsible person'], [], ['mark']), plan(['ingredients'], [], ['bars'])],
  [plan(USE, [], ['mark']), plan(['ingredients', 'responsible person'], [], ['bars'])],
  [plan([], ['mark', 'bars']), plan([...USE, 'ingredients', 'responsible person'])],
  [plan(['warnings']), plan(['directions', 'ingredients', 'responsible person'], ['mark', 'bars'])],
];
const ONE: readonly (readonly ColumnPlan[])[] = [
  [plan([...USE, 'ingredients', 'responsible person'], ['mark', 'bars'])],
  [plan([...USE, 'ingredients', 'responsible person'], ['mark'], ['bars'])],
  [plan([...USE, 'ingredients', 'responsible person'], [], ['mark', 'bars'])],
];

interface Level {
  readonly regime: Setting['regime'];
  readonly columns: readonly (readonly ColumnPlan[])[];
  readonly tight: Setting['tight'];
  readonly front: number;
  readonly ladder: boolean;
  readonly claim: boolean;
}

function wrapLevels(upright: boolean): Level[] {
  const base = { regime: 'wrap', front: 329, ladder: !upright, claim: true } as const;
  return [
    { ...base, columns: TWO.slice(0, 1), tight: 0 },
    { ...base, columns: TWO.slice(0, 6), tight: 0 },
    { ...base, columns: TWO, tight: 1 },
    { ...base, columns: TWO, tight: 2 },
    { ...base, columns: TWO, tight: 2, ladder: true },
    { ...base, columns: TWO, tight: 2, front: 388, claim: false },
    { ...base, columns: TWO, tight: 2, front: 270, ladder: !upright },
    { ...base, columns: TWO, tight: 2, front: 270, ladder: true, claim: false },
    { ...base, columns: TWO, tight: 2, front: 215, ladder: true, claim: false },
    ...(upright ? [{ ...base, columns: TWO, tight: 2 as const, front: 215, ladder: false, claim: false }] : []),
  ];
}

function splitLevels(upright: boolean, fronts: readonly number[]): Level[] {
  const base = { regime: 'split', ladder: !upright, claim: true } as const;
  const turned = { ...base, ladder: true };
  return [
    ...fronts.flatMap((front): Level[] => [
      { ...base, columns: ONE.slice(0, 1), tight: 0, front }, { ...base, columns: TWO.slice(0, 6), tight: 0, front },
    ]),
    ...fronts.flatMap((front): Level[] => [{ ...base, columns: ONE, tight: 1, front }, { ...base, columns: TWO.slice(0, 8), tight: 1, front }]),
    ...fronts.flatMap((front): Level[] => [
      { ...base, columns: [...ONE, ...TWO], tight: 2, front, claim: false }, { ...turned, columns: [...ONE, ...TWO], tight: 2, front, claim: false },
    ]),
  ];
}

function stackLevels(upright: boolean): Level[] {
  const base = { regime: 'stack', front: 1000, ladder: !upright, claim: true } as const;
  const columns = [...ONE.slice(0, 1), [plan(['ingredients'], ['mark', 'bars']), plan([...USE, 'responsible person'])]];
  return [
    { ...base, columns: columns.slice(0, 1), tight: 0 },
    { ...base, columns, tight: 0 },
    { ...base, columns, tight: 1 },
    { ...base, columns, tight: 2, claim: false },
    { ...base, columns, tight: 2, claim: false, ladder: true },
  ];
}

/** The ways to set this label, from the drawn one to the last concession. */
function levelsFor(job: Job): Level[] {
  const upright = mayStandUpright(job);
  const { shape, width, height, round } = job.sheet;
  if (shape === 'flat') {
    const split = splitLevels(upright, [420, 360, 300]);
    const stacked = stackLevels(upright);
    return width * 4 >= height * 5 ? [...split, ...stacked] : [...stacked, ...split];
  }
  const split = splitLevels(upright, [400, 330, 260]);
  const wrap = wrapLevels(upright);
  return round >= 118_000 ? [...wrap, ...split] : [...split, ...wrap];
}

/** Sizes of small text from taste down to the market's floor. */
function sizesFor(job: Job): Micrometres[] {
  const taste = Math.max(job.floor, Math.min(3900, Math.round(3080 * Math.min(1.2, Math.max(0.9, job.scale)))));
  const steps = 4;
  const sizes = Array.from({ length: steps + 1 }, (_, i) => Math.round(taste - ((taste - job.floor) * i) / steps));
  return [...new Set(sizes)];
}

function missingOf(attempt: Attempt): number {
  return attempt.overflows.reduce((total, overflow) => total + overflow.missing, attempt.isHopeless ? 1e9 : 0);
}

/** A setting with its letters; what its parts did not see of each other is added to the gaps. */
function setFully(job: Job, setting: Setting): Attempt {
  const full = compose({ ...job, dry: false }, setting);
  return full.overflows.length > 0 ? full : { ...full, overflows: verifyAttempt(job, setting, full) };
}

/**
 * The first way of setting the label in which everything fits; where there is none, the way
 * that lacks least, with its gaps.
 */
export function fitLabel(job: Job): Attempt & { readonly setting: Setting } {
  let closest: { missing: number; setting: Setting } | null = null;
  const sizes = sizesFor(job);
  for (const { columns, ...level } of levelsFor(job)) {
    // At a concession the size has already gone down: only the smallest sizes are worth a try.
    for (const size of level.tight === 2 ? sizes.slice(-2) : sizes) {
      for (const plans of columns) {
        const setting: Setting = { ...level, columns: plans, size };
        let attempt = compose(job, setting);
        if (attempt.overflows.length === 0) {
          attempt = setFully(job, setting);
          if (attempt.overflows.length === 0) return { ...attempt, setting };
        }
        const missing = missingOf(attempt);
        if (!closest || missing < closest.missing) closest = { missing, setting };
      }
    }
  }
  const { setting } = closest!;
  return { ...setFully(job, setting), setting };
}
