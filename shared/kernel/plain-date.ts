/** A calendar day as `YYYY-MM-DD`. Days compare as text: no clock and no time zone takes part. */
export type PlainDate = string & { readonly __plainDate: unique symbol };

const DAY = /^(\d{4})-(\d{2})-(\d{2})$/;
const LENGTHS: Readonly<Record<string, bigint>> = {
  '01': 31n, '02': 28n, '03': 31n, '04': 30n, '05': 31n, '06': 30n,
  '07': 31n, '08': 31n, '09': 30n, '10': 31n, '11': 30n, '12': 31n,
};

/** Reads a day that exists in the Gregorian calendar; `null` for anything else. */
export function parsePlainDate(text: string): PlainDate | null {
  const match = DAY.exec(text);
  if (!match) return null;
  const year = BigInt(match[1]!);
  const day = BigInt(match[3]!);
  const isLeap = (year % 4n === 0n && year % 100n !== 0n) || year % 400n === 0n;
  const length = match[2] === '02' && isLeap ? 29n : LENGTHS[match[2]!];
  return length !== undefined && day >= 1n && day <= length ? (text as PlainDate) : null;
}

/** As {@link parsePlainDate}, for text known to be a day. @throws RangeError naming the text. */
export function plainDate(text: string): PlainDate {
  const day = parsePlainDate(text);
  if (!day) throw new RangeError(`"${text}" is not a day written YYYY-MM-DD`);
  return day;
}
