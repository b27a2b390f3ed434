/** A decimal text to four figures for the eye; the exact text belongs in a title beside it. */
export function roughlyText(text: string): string {
  const value = Number(text);
  if (!Number.isFinite(value) || value === 0) return value === 0 ? '0' : text;
  const short = Number(value.toPrecision(4));
  // Very small shares would otherwise be written with an exponent.
  return Math.abs(short) < 1e-6 ? short.toFixed(10).replace(/0+$/, '') : String(short);
}
