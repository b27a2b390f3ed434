import { compare, decimal, parseDecimal } from '#shared/kernel/rational.ts';

/** A figure as typed: its plain decimal (empty while nothing stands there), or why it is none. */
export type ReadNumber =
  | { readonly ok: true; readonly text: string; readonly note?: string }
  | { readonly ok: false; readonly why: string };

/** A thousand tonnes: more than any batch, so a slip of the hand. */
const ABSURD_GRAMS = decimal('1000000000');
const HUNDRED = decimal('100');
const MOST_DIGITS = 30;

/** Removes what separates thousands and turns a decimal comma into a point. */
function withPoint(text: string): string {
  const comma = text.lastIndexOf(',');
  const point = text.lastIndexOf('.');
  if (comma >= 0 && point >= 0) {
    return comma > point ? text.replaceAll('.', '').replace(',', '.') : text.replaceAll(',', '');
  }
  if (/^[+-]?\d{1,3}(,\d{3}){2,}$/.test(text)) return text.replaceAll(',', '');
  if (/^[+-]?\d{1,3}(\.\d{3}){2,}$/.test(text)) return text.replaceAll('.', '');
  return text.replace(',', '.');
}

/**
 * Reads a figure as people type it: `12.5`, `12,5`, `.5`, `5.`, `1 250`, `3 %`, `12 g`.
 * Refuses, in plain words, what is negative, no number, or out of all proportion.
 */
export function readNumber(written: string, unit: 'g' | '%'): ReadNumber {
  const bare = written.replace(/[\s\u00a0\u2009\u202f'’]/g, '').replace(/(g|%)$/i, '');
  if (bare === '') return { ok: true, text: '' };
  if (/^[-−–]/.test(bare)) return { ok: false, why: 'An amount cannot be negative.' };
  if (bare.length > MOST_DIGITS) return { ok: false, why: 'That is more digits than a scale can show.' };
  const pointed = withPoint(bare.replace(/^\+/, '')).replace(/^\./, '0.').replace(/\.$/, '');
  const value = parseDecimal(pointed);
  if (!value) return { ok: false, why: `“${written.trim()}” is not a number. Write one such as 12.5.` };
  const text = pointed.replace(/^0+(?=\d)/, '');
  if (unit === '%' && compare(value, HUNDRED) > 0) return { ok: false, why: 'A share cannot be over 100 %.' };
  if (compare(value, ABSURD_GRAMS) > 0) return { ok: false, why: 'That is more than a thousand tonnes. Check the figure.' };
  return bare.includes(',') ? { ok: true, text, note: `Read as ${text}.` } : { ok: true, text };
}
