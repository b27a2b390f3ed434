/** Four figures for the eye; the exact share stands in a title beside it. */
export function roughly(percent: number): string {
  if (percent === 0) return '0';
  return String(Number(percent.toPrecision(4)));
}
