/** Numbers and days for the eye, in the reader's locale; the exact figure belongs in a title. */

const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];
const LONG_MONTHS = ['January', 'February', 'March', 'April', 'May', 'June', 'July', 'August', 'September', 'October', 'November', 'December'];

/** `2026-12-01` as `1 Dec 2026`: never ambiguous. */
export function sayDay(day: string): string {
  const [year, month, date] = day.slice(0, 10).split('-');
  return `${Number(date)} ${MONTHS[Number(month) - 1] ?? month} ${year}`;
}
/** Today in the reader's zone, as `YYYY-MM-DD`. */
export function today(now = new Date()): string {
  const two = (value: number) => String(value).padStart(2, '0');
  return `${now.getFullYear()}-${two(now.getMonth() + 1)}-${two(now.getDate())}`;
}
/** `Tuesday, 1 December 2026`. */
export function sayLongDay(now = new Date()): string {
  const weekday = new Intl.DateTimeFormat('en-GB', { weekday: 'long' }).format(now);
  return `${weekday}, ${now.getDate()} ${LONG_MONTHS[now.getMonth()]} ${now.getFullYear()}`;
}
/** An instant as `09:14` today, otherwise `30 Nov 2026`. */
export function sayWhen(instant: string, now = new Date()): string {
  const at = new Date(instant);
  if (Number.isNaN(at.getTime())) return instant;
  return today(at) === today(now) ? sayTime(at) : sayDay(today(at));
}
/** `09:14` in the reader's zone. */
export function sayTime(at: Date): string {
  return `${String(at.getHours()).padStart(2, '0')}:${String(at.getMinutes()).padStart(2, '0')}`;
}
/** `1 material`, `9 materials`. */
export function sayCount(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}
/** `1.2 MB`, `340 KB`. */
export function sayBytes(bytes: number): string {
  if (bytes < 1024) return `${bytes} B`;
  if (bytes < 1024 * 1024) return `${Math.round(bytes / 1024)} KB`;
  return `${(bytes / 1024 / 1024).toFixed(1)} MB`;
}
/** `a, b and c`. */
export function sayList(words: readonly string[]): string {
  if (words.length < 2) return words.join('');
  return `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;
}

const reader = typeof navigator === 'undefined' ? 'en-GB' : navigator.language;
const decimalMark = new Intl.NumberFormat(reader).formatToParts(1.5).find((part) => part.type === 'decimal')?.value ?? '.';

/** A decimal's text with the reader's decimal mark; digits are never rounded here. */
export function sayDecimal(text: string): string {
  return text.replace('.', decimalMark);
}
/** What someone typed as a decimal (`1,5`, ` 12 `, `3 %`), in the form contracts use. */
export function readDecimal(typed: string): string {
  const bare = typed.replace(/[\s\u00a0\u202f%]/g, '');
  return /^\d+,\d+$/.test(bare) ? bare.replace(',', '.') : /^[.,]\d+$/.test(bare) ? `0.${bare.slice(1)}` : bare;
}
