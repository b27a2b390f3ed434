import type { Rational } from '#shared/kernel/rational.ts';

/** A float for drawing: twelve places are plenty for a pixel. */
export function toNumber({ n, d }: Rational): number {
  return Number((n * 10n ** 12n) / d) / 1e12;
}

/** A decimal text to four figures for the eye; the exact text belongs in a title beside it. */
export function roughlyText(text: string): string {
  const value = Number(text);
  if (!Number.isFinite(value) || value === 0) return value === 0 ? '0' : text;
  const short = Number(value.toPrecision(4));
  // Very small shares would otherwise be written with an exponent.
  return Math.abs(short) < 1e-6 ? short.toFixed(10).replace(/0+$/, '') : String(short);
}
