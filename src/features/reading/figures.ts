import type { Rational } from '#shared/kernel/rational.ts';

/** A float for drawing: twelve places are plenty for a pixel. */
export function toFigure({ n, d }: Rational): number {
  return Number((n * 10n ** 12n) / d) / 1e12;
}
/** Four figures for the eye; the exact bound stands in a title beside it. */
export function roughly(decimal: string): string {
  return String(Number(Number(decimal).toPrecision(4)));
}
