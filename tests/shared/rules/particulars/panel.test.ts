import { expect, test } from 'vitest';
import { decimal, toDecimal } from '#shared/kernel/rational.ts';
import { heightFor, panelOf, sayBound, squareInches } from '#shared/rules/particulars/panel.ts';
import { particularRows } from '#shared/rules/particulars/particular-rows.ts';

const rowsOf = (id: string) => {
  const check = particularRows.find((row) => row.id === id)!.check;
  if (!('heights' in check)) throw new Error(`${id} has no heights`);
  return check.heights;
};

// Reference of each market: EU Directive 76/211/EEC (secondary), Great Britain (memory), US 21 CFR 701.13(i), Canada CPLR section 14.
test.each([
  ['eu/particulars/netContent-height', [['5', '2'], ['50', '2'], ['50.001', '3'], ['200', '3'], ['200.001', '4'], ['1000', '4'], ['1000.001', '6']]],
  ['uk/particulars/netContent-height', [['50', '2'], ['50.001', '3'], ['200', '3'], ['200.001', '4'], ['1000', '4'], ['1000.001', '6']]],
  ['us/particulars/netContent-height', [['5', '1.5875'], ['5.0001', '3.175'], ['25', '3.175'], ['25.01', '4.7625'], ['100', '4.7625'], ['100.01', '6.35'], ['400', '6.35'], ['400.01', '12.7']]],
  ['ca/particulars/netContent-height', [['32', '1.6'], ['32.001', '3.2'], ['258', '3.2'], ['259', '6.4'], ['645', '6.4'], ['645.1', '9.5'], ['2580', '9.5'], ['2580.1', '12.7']]],
] as const)('%s: each row up to and over its bound', (id, cases) => {
  for (const [figure, height] of cases) expect(heightFor(rowsOf(id), decimal(figure)).height, figure).toBe(height);
});

test('the last row is told by the bound before it', () => {
  const rows = rowsOf('us/particulars/netContent-height');
  expect([sayBound(rows, '25', 'sq in'), sayBound(rows, null, 'sq in')]).toEqual(['up to 25 sq in', 'over 400 sq in']);
});

// Worked examples: a face of 2 x 2.5 in is 5 sq in exactly; a cylinder of 60 mm by 150 mm has 17.53.
test('the panel of a face and of a cylinder', () => {
  const face = panelOf(undefined, { shape: 'flat', widthMm: '50.8', heightMm: '63.5' })!;
  expect(toDecimal(squareInches(face))).toBe('5');
  const round = panelOf(undefined, { shape: 'cylinder', diameterMm: '60', labelHeightMm: '150', overlapMm: '5' })!;
  expect(toDecimal(squareInches(round), 2)).toBe('17.53');
});

test('what was measured beats the label; a cone and a mistake have no area', () => {
  const flat = { shape: 'flat', widthMm: '10', heightMm: '10' } as const;
  expect(toDecimal(panelOf('35', flat)!.squareCm)).toBe('35');
  expect(toDecimal(panelOf('about 35', flat)!.squareCm)).toBe('1');
  expect(panelOf(undefined, { shape: 'taper', topDiameterMm: '40', bottomDiameterMm: '30', labelHeightMm: '50', overlapMm: '3' })).toBeUndefined();
  expect(panelOf(undefined, { ...flat, widthMm: 'wide' })).toBeUndefined();
});
