import { add, decimal, divide, multiply, parseDecimal, rational, subtract, toDecimal } from '#shared/kernel/rational.ts';
import { readDecimal } from '#src/lib/say.ts';

export type TemperatureUnit = 'C' | 'F';
const NINE_FIFTHS = rational(9n, 5n);
const FREEZING_F = decimal('32');

/** A temperature kept in °C, as text in the unit shown; what is no number stays as typed. */
export function showTemperature(celsius: string, unit: TemperatureUnit): string {
  const value = parseDecimal(readDecimal(celsius));
  return unit === 'C' || !value ? celsius : toDecimal(add(multiply(value, NINE_FIFTHS), FREEZING_F), 2);
}
/** A temperature typed in the unit shown, as text in °C. */
export function keepTemperature(typed: string, unit: TemperatureUnit): string {
  const value = parseDecimal(readDecimal(typed));
  return unit === 'C' || !value ? typed : toDecimal(divide(subtract(value, FREEZING_F), NINE_FIFTHS), 6);
}
