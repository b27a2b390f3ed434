import type { Item, Micrometres } from './scene.ts';
import type { Job, Setting } from './setting.ts';

/** What runs around a banded label, and the room it leaves to the rest. */
export interface Bands {
  readonly items: readonly Item[];
  /** Cap line of the first row under it. */
  readonly top: Micrometres;
  /** Last base line over it. */
  readonly foot: Micrometres;
}

const REACH: Micrometres = 20_000;

/** Fillet: a thick and a thin rule above, the same below in mirror, on a ground of the light ink. */
export function filletBands(job: Job, setting: Setting): Bands {
  const { width, height } = job.sheet;
  const k = Math.max(0.62, Math.min(1.5, height / 46_000)) * [1, 0.85, 0.62][setting.tight]!;
  const [from, thick, gap, thin] = [4200 * k, Math.max(450, 900 * k), 400 * k, Math.max(150, 200 * k)].map(Math.round) as [number, number, number, number];
  const under = from + thick + gap + thin;
  const rule = (y: Micrometres, weight: Micrometres) => ({ x: -REACH, y, width: width + 2 * REACH, height: weight });
  const rows = Math.max(1500, Math.round(2600 * k));
  return {
    items: [
      { kind: 'boxes', element: 'ground', ink: 'light', boxes: [{ x: -REACH, y: -REACH, width: width + 2 * REACH, height: height + 2 * REACH }] },
      { kind: 'boxes', element: 'rule', ink: 'ink', boxes: [rule(from, thick), rule(from + thick + gap, thin), rule(height - under, thin), rule(height - from - thick, thick)] },
    ],
    top: under + rows,
    foot: height - under - Math.max(Math.round(2200 * k), Math.round(Math.max(setting.size, job.content.net ? job.netSize : 0) * 0.215) + 500),
  };
}

/**
 * Headband: slanted threads over the upper edge, three of the ink to one of the light ink, that meet
 * in register where the wrap closes; a hairline under them.
 */
export function headbandBands(job: Job, setting: Setting): Bands {
  const { width, height, round } = job.sheet;
  const k = Math.max(0.8, Math.min(1.6, height / 40_000)) * (setting.tight === 2 ? 0.8 : 1);
  const deep = Math.round(2900 * k);
  const count = Math.max(4, 4 * Math.round(round / (4 * 900 * k)));
  const pitch = round / count;
  const thread = pitch * 0.69;
  // Threads lean by the same slope above the trim, so that the cut may wander.
  const lean = Math.round((900 * k * (deep + REACH)) / deep);
  const first = -Math.ceil(REACH / pitch / 4) * 4;
  const last = Math.ceil((width + REACH) / pitch);
  const steps = (isLight: boolean) => Array.from({ length: last - first }, (_, i) => first + i).filter((i) => (((i % 4) + 4) % 4 === 3) === isLight).flatMap((i) => {
    const x = Math.round(i * pitch);
    const w = Math.round(thread);
    return [['M', x + lean, -REACH], ['L', x + lean + w, -REACH], ['L', x + w, deep], ['L', x, deep], ['Z']] as const;
  });
  const line = deep + Math.round(1000 * k);
  const weight = Math.max(150, Math.round(180 * k));
  const clip = { x: -REACH, y: -REACH, width: width + 2 * REACH, height: REACH + deep };
  return {
    items: [
      { kind: 'path', element: 'rule', ink: 'ink', steps: steps(false), clip },
      { kind: 'path', element: 'rule', ink: 'light', steps: steps(true), clip },
      { kind: 'boxes', element: 'rule', ink: 'ink', boxes: [{ x: -REACH, y: line, width: width + 2 * REACH, height: weight }] },
    ],
    top: line + weight + Math.round([2900, 2400, 1700][setting.tight]! * Math.min(1.2, k)),
    foot: height - Math.max(2000 + Math.round(Math.max(setting.size, job.content.net ? job.netSize : 0, job.content.eMark ? 4500 : 0) * 0.215), Math.round(Math.min(height * 0.062, 7000) * [1, 0.6, 0][setting.tight]!)),
  };
}
