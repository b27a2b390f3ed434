import type { KeyboardEvent } from 'react';

/**
 * Enter, and the arrow keys up and down, go to the same column of the next row; Enter in the
 * last row asks for a new one. Names keep their keys: their list needs them.
 */
export function walkRows(event: KeyboardEvent<HTMLElement>, onBeyond: () => void): void {
  const from = event.target instanceof HTMLInputElement ? event.target : null;
  const { row, column } = from?.dataset ?? {};
  if (!from || row === undefined || column === undefined) return;
  const step = event.key === 'Enter' || event.key === 'ArrowDown' ? 1 : event.key === 'ArrowUp' ? -1 : 0;
  if (step === 0 || event.altKey || event.ctrlKey || event.metaKey) return;
  event.preventDefault();
  const next = event.currentTarget.querySelector<HTMLInputElement>(`[data-row="${Number(row) + step}"][data-column="${column}"]`);
  if (next) next.focus();
  else if (event.key === 'Enter') onBeyond();
}
