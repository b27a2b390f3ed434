import { parseDecimal } from '#shared/kernel/rational.ts';
import { readDecimal } from '#src/lib/say.ts';

/** A plain figure of a field: its decimal text, or what is wrong with it. */
export function readNumber(typed: string): { readonly text: string; readonly fault?: string } {
  const text = readDecimal(typed);
  if (text === '') return { text };
  if (text.startsWith('-')) return { text, fault: 'It cannot be negative.' };
  return parseDecimal(text.replace(/\.$/, '')) ? { text: text.replace(/\.$/, '') } : { text, fault: `“${typed.trim()}” is not a number. Write one such as 12.5.` };
}
