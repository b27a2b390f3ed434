import { scaleLinear } from 'd3-scale';
import type { Rung } from './geometry.ts';

/** A pair of rungs on a straight scale of its own, in whole drawing units. */
export interface LoupeGeometry {
  readonly bars: readonly { readonly key: string; readonly name: string; readonly from: number; readonly to: number; readonly at: number; readonly isRange: boolean; readonly labelX: number; readonly labelY: number; readonly y: number; readonly anchor: 'start' | 'end' }[];
  /** The stretch over which the order may be turned round. */
  readonly shared: { readonly from: number; readonly width: number };
  readonly ticks: readonly { readonly x: number; readonly label: string | null }[];
}

const PAD = 4;

/** Lays a doubtful pair out over `width`: both ranges, where they overlap, and a scale with readable steps. */
export function layLoupe(pair: readonly [Rung, Rung], width: number): LoupeGeometry {
  const [a, b] = pair;
  const low = Math.min(a.min, b.min);
  const high = Math.max(a.max, b.max);
  const pad = (high - low) * 0.18 || Math.max(high * 0.01, 1e-6);
  const scale = scaleLinear().domain([low - pad, high + pad]).range([PAD, width - PAD]);
  const bar = (rung: Rung, y: number, labelY: number) => {
    const to = scale(rung.max);
    const isFirst = labelY < 20;
    const fits = to + 10 + rung.name.length * 6.4 < width;
    return {
      key: rung.key,
      name: rung.name,
      from: scale(rung.min),
      to,
      at: scale(rung.typical),
      isRange: rung.max > rung.min,
      y,
      labelY,
      labelX: isFirst ? PAD : fits ? to + 10 : scale(rung.min) - 8,
      anchor: isFirst || fits ? ('start' as const) : ('end' as const),
    };
  };
  // Where the one that is printed first may stand below the other.
  const from = scale(a.min);
  const to = scale(Math.max(b.max, a.min));
  const labels = new Set(scale.ticks(3).map((value) => value.toPrecision(12)));
  const format = scale.tickFormat(3);
  return {
    bars: [bar(a, 26, 12), bar(b, 41, 45.5)],
    shared: { from: Math.min(from, to), width: Math.max(3, Math.abs(to - from)) },
    ticks: scale.ticks(6).map((value) => ({ x: scale(value), label: labels.has(value.toPrecision(12)) ? format(value) : null })),
  };
}
