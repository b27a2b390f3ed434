import { z } from './zod.ts';
import { parseDecimal } from '#shared/kernel/rational.ts';
import { parsePlainDate } from '#shared/kernel/plain-date.ts';

/** Schema parts that several contracts share. */

export const idField = z.uuid();
export const versionField = z.int().min(1);
export const nameField = z.string().trim().min(1, 'Give it a name.').max(255, 'Use at most 255 characters.');
export const textField = z.string().max(10_000);
export const marketField = z.enum(['EU', 'UK', 'US', 'CA']);
export const langField = z.string().regex(/^[a-z]{2}$/, 'Use a two-letter language code.');

/** A non-negative decimal as text; digits only, a point, at most 30 characters. */
export const amountField = z
  .string()
  .trim()
  .max(30, 'That is more digits than a scale can show.')
  .refine((text) => parseDecimal(text) !== null, 'Write a number such as 12.5.')
  .refine((text) => !text.startsWith('-'), 'An amount cannot be negative.');

export const percentField = amountField.refine((text) => {
  const value = parseDecimal(text);
  return value === null || value.n <= 100n * value.d;
}, 'A share cannot be over 100 %.');

export const dateField = z.string().refine((text) => parsePlainDate(text) !== null, 'Write a day that exists, as YYYY-MM-DD.');
