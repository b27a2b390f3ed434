import type { KeyboardEvent } from 'react';

/** Where a key leads from one figure of the grid: to a neighbour, past the last line, or nowhere. */
export type Step = { readonly to: HTMLInputElement } | 'past-end' | null;

const atStart = (input: HTMLInputElement) => input.selectionStart === 0 && (input.selectionEnd === 0 || input.selectionEnd === input.value.length);
const atEnd = (input: HTMLInputElement) => input.selectionEnd === input.value.length && (input.selectionStart === input.value.length || input.selectionStart === 0);

/** Enter and the arrows walk the columns; left and right change column where the caret can go no further. */
export function stepFrom(event: KeyboardEvent<HTMLInputElement>): Step {
  if (event.altKey || event.ctrlKey || event.metaKey) return null;
  const input = event.currentTarget;
  const grid = input.closest('table');
  if (!grid) return null;
  const column = input.dataset.column === '%' ? '%' : 'g';
  const fields = [...grid.querySelectorAll<HTMLInputElement>(`input[data-column="${column}"]:not([readonly])`)];
  const at = fields.indexOf(input);
  if (event.key === 'Enter' || event.key === 'ArrowDown') {
    const next = fields[at + (event.key === 'Enter' && event.shiftKey ? -1 : 1)];
    if (next) return { to: next };
    return event.key === 'Enter' && !event.shiftKey ? 'past-end' : null;
  }
  if (event.key === 'ArrowUp') return fields[at - 1] ? { to: fields[at - 1]! } : null;
  const aside = (event.key === 'ArrowRight' && column === 'g' && atEnd(input)) || (event.key === 'ArrowLeft' && column === '%' && atStart(input));
  if (!aside) return null;
  const other = input.closest('tr')?.querySelector<HTMLInputElement>(`input[data-column="${column === 'g' ? '%' : 'g'}"]`);
  return other ? { to: other } : null;
}

/** The row of a line. */
export function findRow(grid: HTMLElement | null, lineId: string): HTMLElement | undefined {
  return [...(grid?.querySelectorAll<HTMLElement>('tr[data-row]') ?? [])].find((row) => row.dataset.row === lineId);
}

/** Puts the caret into a line's grams. */
export function focusGrams(grid: HTMLElement | null, lineId: string): void {
  findRow(grid, lineId)?.querySelector<HTMLInputElement>('input[data-column="g"]')?.focus();
}
