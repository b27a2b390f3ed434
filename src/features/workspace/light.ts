import { roughlyText } from '#src/lib/figures.ts';
import type { EntryView } from './view.ts';

/** What someone points at: substances, a formula line, or nothing. */
export type Light = { readonly keys: readonly string[] } | { readonly line: number } | null;

/** What belongs together with it: entries, formula lines with what each gives, and the words under the ladder. */
export interface Lit {
  readonly keys: ReadonlySet<string>;
  readonly lines: ReadonlyMap<number, string>;
  readonly told: readonly { readonly name: string; readonly figure: string; readonly parts: string }[];
}

export const DARK: Lit = { keys: new Set(), lines: new Map(), told: [] };

/** A share or a range of one, in words. */
export function sayRange(entry: Pick<EntryView, 'exact' | 'min' | 'max'>): string {
  if (entry.min === entry.max) return `${roughlyText(entry.exact.typical)} %`;
  return `${roughlyText(entry.exact.typical)} %, between ${roughlyText(entry.exact.min)} and ${roughlyText(entry.exact.max)} %`;
}

/** Follows one light through formula, ladder, list and verdicts. */
export function follow(light: Light, entries: readonly EntryView[], nameOfLine: (line: number) => string): Lit {
  if (light === null) return DARK;
  if ('line' in light) {
    const fed = entries.filter((entry) => entry.parts.some((part) => part.line === light.line));
    const brings = fed.map((entry) => `${entry.name} ${roughlyText(String(entry.parts.find((part) => part.line === light.line)!.share))} %`);
    return {
      keys: new Set(fed.map((entry) => entry.key)),
      lines: new Map([[light.line, '']]),
      told: [{ name: nameOfLine(light.line), figure: '', parts: brings.length > 0 ? `brings ${brings.join(', ')}.` : 'brings nothing to the list yet.' }],
    };
  }
  const asked = new Set(light.keys);
  const found = entries.filter((entry) => asked.has(entry.key));
  const lines = new Map<number, string>();
  for (const entry of found) {
    for (const part of entry.parts) lines.set(part.line, found.length === 1 ? `gives ${roughlyText(String(part.share))} %` : '');
  }
  return {
    keys: asked,
    lines,
    told: found.map((entry) => ({
      name: entry.name,
      figure: sayRange(entry),
      parts: found.length === 1 ? entry.parts.map((part) => `${nameOfLine(part.line)} ${roughlyText(String(part.share))} %`).join(' + ') : '',
    })),
  };
}
