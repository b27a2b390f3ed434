import { parseDecimal, compare, HUNDRED, type Rational } from '#shared/kernel/rational.ts';
import type { Fault } from './formula-document.ts';

/** Longest decimal taken: far more digits than any scale or sheet shows. */
const LONGEST_DECIMAL = 60;
const LARGEST = parseDecimal('1000000000000')!;
const PLAIN = /^-?\d+(\.\d+)?$/;
const EXPONENT = /^(-?)(\d+)(?:\.(\d+))?e([+-]\d+)$/;

export interface DecimalRule {
  /** Refuse anything over 100. */
  readonly isShare?: boolean;
  /** Refuse zero. */
  readonly isPositive?: boolean;
}

/**
 * Walks an unknown JSON value and notes every fault with its JSON Pointer. Each reader returns
 * `undefined` where there is nothing usable, so that the walk always reaches the end.
 */
export class DocumentWalk {
  readonly faults: Fault[] = [];

  fault(pointer: string, message: string): undefined {
    // A document with more faults than this is another kind of file.
    if (this.faults.length < 500) this.faults.push({ pointer, message });
    return undefined;
  }

  object(value: unknown, pointer: string, isNeeded = false): Record<string, unknown> | undefined {
    if (isAbsent(value)) return isNeeded ? this.fault(pointer, 'This part is missing.') : undefined;
    if (typeof value !== 'object' || Array.isArray(value)) return this.fault(pointer, 'This has to be a group of named fields.');
    return value as Record<string, unknown>;
  }

  list(value: unknown, pointer: string, most: number, isNeeded = false): readonly unknown[] {
    if (isAbsent(value)) {
      if (isNeeded) this.fault(pointer, 'This list is missing.');
      return [];
    }
    if (!Array.isArray(value)) {
      this.fault(pointer, 'This has to be a list.');
      return [];
    }
    if (value.length > most) {
      this.fault(pointer, `This list is too long: at most ${most} are read.`);
      return [];
    }
    return value as readonly unknown[];
  }

  text(value: unknown, pointer: string, options: { most?: number; isNeeded?: boolean } = {}): string | undefined {
    if (isAbsent(value)) return options.isNeeded ? this.fault(pointer, 'This text is missing.') : undefined;
    if (typeof value !== 'string') return this.fault(pointer, 'This has to be a text.');
    const most = options.most ?? 10_000;
    if (value.length > most) return this.fault(pointer, `This text is too long: at most ${most} characters are read.`);
    if (options.isNeeded && value.trim() === '') return this.fault(pointer, 'This text is empty.');
    return value;
  }

  flag(value: unknown, pointer: string): boolean | undefined {
    if (isAbsent(value)) return undefined;
    return typeof value === 'boolean' ? value : this.fault(pointer, 'This has to be true or false.');
  }

  choice<T extends string>(value: unknown, pointer: string, choices: readonly T[], isNeeded = false): T | undefined {
    if (isAbsent(value)) return isNeeded ? this.fault(pointer, `Choose one of ${choices.join(', ')}.`) : undefined;
    const found = choices.find((choice) => choice === value);
    return found ?? this.fault(pointer, `Not known: ${show(value)}. Choose one of ${choices.join(', ')}.`);
  }

  /** A non-negative decimal as plain text without an exponent. */
  decimal(value: unknown, pointer: string, rule: DecimalRule = {}, isNeeded = false): string | undefined {
    if (isAbsent(value)) return isNeeded ? this.fault(pointer, 'A figure is missing here.') : undefined;
    const text = decimalText(value);
    if (text === null) return this.fault(pointer, `Not a decimal number: ${show(value)}. Write it like 12.5.`);
    if (text.length > LONGEST_DECIMAL) return this.fault(pointer, 'That is more digits than can be read.');
    const read = parseDecimal(text)!;
    if (read.n < 0n) return this.fault(pointer, `A figure cannot be negative: ${text}.`);
    if (rule.isShare && compare(read, HUNDRED) > 0) return this.fault(pointer, `A share cannot be over 100 %: ${text}.`);
    if (compare(read, LARGEST) > 0) return this.fault(pointer, `That is larger than any batch: ${text}.`);
    if (rule.isPositive && read.n === 0n) return this.fault(pointer, 'This has to be more than 0.');
    return text;
  }
}

/** A field left out and a field given as null are the same. */
export function isAbsent(value: unknown): value is undefined | null {
  return value === undefined || value === null;
}

/** The plain decimal text of a JSON text or number (by its shortest decimal form), or `null`. */
export function decimalText(value: unknown): string | null {
  if (typeof value === 'string') return value.length <= 400 && PLAIN.test(value) ? value : null;
  if (typeof value !== 'number') return null;
  const text = `${value}`;
  if (PLAIN.test(text)) return text;
  const match = EXPONENT.exec(text);
  if (!match) return null;
  const [, sign, whole, fraction = '', exponent] = match;
  const digits = whole! + fraction;
  const point = BigInt(whole!.length) + BigInt(exponent!);
  return sign! + placePoint(digits, point);
}

function placePoint(digits: string, point: bigint): string {
  const length = BigInt(digits.length);
  if (point <= 0n) return `0.${'0'.repeat(countOf(-point))}${digits}`;
  if (point >= length) return digits + '0'.repeat(countOf(point - length));
  const whole = digits.slice(0, countOf(point));
  return `${whole}.${digits.slice(countOf(point))}`;
}

/** A small whole number for text functions; JSON numbers have exponents under 400. */
function countOf(value: bigint): number {
  let count = 0;
  for (let left = value; left > 0n; left -= 1n) count += 1;
  return count;
}

/** A value as quoted in a message: short, and never a whole document. */
export function show(value: unknown): string {
  const text = typeof value === 'string' ? `"${value}"` : Array.isArray(value) ? 'a list' : typeof value === 'object' ? 'a group of fields' : `${String(value)}`;
  return text.length > 60 ? `${text.slice(0, 57)}…` : text;
}

/** Decimal order of two texts already read by {@link DocumentWalk.decimal}. */
export function isOver(left: string, right: string): boolean {
  const a: Rational = parseDecimal(left)!;
  return compare(a, parseDecimal(right)!) > 0;
}
