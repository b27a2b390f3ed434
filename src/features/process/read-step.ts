import type { ProcessStep } from '#shared/contracts/product-draft.ts';

type Temperature = ProcessStep['temperature'];
type Time = ProcessStep['time'];

const NUMBER = String.raw`\d+(?:[.,]\d+)?`;
const plain = (text: string) => text.replace(',', '.');

/** `70`, `70 to 75`, `70–75 °F`: a temperature or a range, in the unit at hand unless it is written. */
export function readTemperature(text: string, unit: 'C' | 'F'): { temperature: Temperature } | { fault: string } {
  const bare = text.trim();
  if (bare === '') return { temperature: null };
  const match = new RegExp(`^(${NUMBER})(?:\\s*(?:to|-|–|bis)\\s*(${NUMBER}))?\\s*(?:°\\s*)?([CF])?$`, 'i').exec(bare);
  if (!match) return { fault: 'Write a temperature such as 70 or 70 to 75.' };
  const own = match[3] ? (match[3].toUpperCase() as 'C' | 'F') : unit;
  const from = plain(match[1]!);
  const to = match[2] === undefined ? undefined : plain(match[2]);
  if (Number(to ?? from) > (own === 'C' ? 300 : 572)) return { fault: 'That is hotter than any kettle here. Check the figure.' };
  if (to !== undefined && Number(to) < Number(from)) return { fault: 'The second temperature is below the first.' };
  return { temperature: { from, ...(to !== undefined && { to }), unit: own } };
}

/** `20 min`, `8 h`, `hold 8 h`; a bare number is minutes. */
export function readTime(text: string): { time: Time } | { fault: string } {
  const bare = text.trim().replace(/^(hold|for)\s+/i, '');
  if (bare === '') return { time: null };
  const match = new RegExp(`^(${NUMBER})\\s*(min(?:utes?)?|h(?:ours?|rs?)?)?$`, 'i').exec(bare);
  if (!match) return { fault: 'Write a time such as 20 min or 8 h.' };
  if (Number(plain(match[1]!)) > 10_000) return { fault: 'That is longer than any hold. Check the figure.' };
  return { time: { value: plain(match[1]!), unit: /^h/i.test(match[2] ?? '') ? 'h' : 'min' } };
}

export function sayTemperature(temperature: Temperature): string {
  if (!temperature) return '';
  const { from, to, unit } = temperature;
  const figures = [from, to].filter((each) => each !== undefined);
  return figures.length === 0 ? '' : `${figures.join(' to ')} °${unit}`;
}
export function sayTime(time: Time): string {
  return time ? `${time.value} ${time.unit}` : '';
}
