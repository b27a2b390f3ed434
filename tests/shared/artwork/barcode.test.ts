import { expect, test } from 'vitest';
import { barcodeFault, modulesOf, symbolOf, uprightModule } from '#shared/artwork/barcode.ts';

/** L codes of the figures 0 to 9 (GS1 General Specifications, from memory); G is R reversed, R is L inverted. */
const L = ['0001101', '0011001', '0010011', '0111101', '0100011', '0110001', '0101111', '0111011', '0110111', '0001011'];
const PARITY = ['LLLLLL', 'LLGLGG', 'LLGGLG', 'LLGGGL', 'LGLLGG', 'LGGLLG', 'LGGGLL', 'LGLGLG', 'LGLGGL', 'LGGLGL'];
const invert = (code: string): string => code.replace(/./g, (bit) => (bit === '0' ? '1' : '0'));
const reverse = (code: string): string => [...code].reverse().join('');

function expected(digits: string): string {
  const parity = PARITY[Number(digits[0])]!;
  const left = [...digits.slice(1, 7)].map((digit, i) => (parity[i] === 'L' ? L[Number(digit)]! : reverse(invert(L[Number(digit)]!)))).join('');
  return `101${left}01010${[...digits.slice(7)].map((digit) => invert(L[Number(digit)]!)).join('')}101`;
}

test.each(['9521234567899', '5012345678900', '6291041500213', '7300011000017', '4006381333931'])('the modules of %s are those of the code tables', (digits) => {
  expect(modulesOf({ symbology: 'EAN-13', digits })).toBe(expected(digits));
});

test('UPC-A is EAN-13 with a leading nought', () => {
  expect(modulesOf({ symbology: 'UPC-A', digits: '036000291452' })).toBe(expected('0036000291452'));
});

test.each([
  [{ symbology: 'EAN-13', digits: '6291041500214' }, 'The last figure is 4; the check figure of 629104150021 is 3.'],
  [{ symbology: 'EAN-13', digits: '629104150021' }, 'EAN-13 takes 13 figures; 12 are given.'],
  [{ symbology: 'UPC-A', digits: '03600029145X' }, 'UPC-A takes figures only.'],
] as const)('a wrong number is said: %o', (settings, message) => {
  expect(barcodeFault(settings)).toBe(message);
});

test.each([
  // GS1 size guide: width with quiet zones and bar height at 80, 100 %
  [264, 29_832, 18_280], [330, 37_290, 22_850],
])('at X %i µm the symbol has the width and bar height of the size guide', (module, width, height) => {
  const symbol = symbolOf({ symbology: 'EAN-13', digits: '9521234567899' }, module);
  expect(symbol.width + symbol.quiet[0] + symbol.quiet[1]).toBe(width);
  expect(Math.min(...symbol.bars.map((bar) => bar.height))).toBe(height);
  expect(Math.max(...symbol.bars.map((bar) => bar.height))).toBe(height + 5 * module);
});

test('bars tile the modules exactly', () => {
  const digits = '9521234567899';
  const { bars } = symbolOf({ symbology: 'EAN-13', digits }, 300);
  const row = Array.from({ length: 95 }, (_, i) => (bars.some((bar) => bar.x <= i * 300 && bar.x + bar.width >= (i + 1) * 300) ? '1' : '0')).join('');
  expect(row).toBe(expected(digits));
});

test('a curve limits the upright module, and turns the bars under 48 mm', () => {
  // 95 X ≤ π D / 6
  expect(uprightModule(58_000)).toBe(319);
  expect(uprightModule(60_000)).toBe(330);
  expect(uprightModule(47_900)).toBe(264);
  expect(uprightModule(47_800)).toBe(0);
  expect(uprightModule(0)).toBe(330);
});
