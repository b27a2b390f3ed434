import { describe, expect, test } from 'vitest';
import { readFormulaDocument } from '#shared/contracts/read-formula-document.ts';
import type { Fault, FormulaDocument } from '#shared/contracts/formula-document.ts';

const knows = { categories: new Set(['body-wash']) };

type Json = Record<string, unknown>;

function good(): Json {
  return {
    document: 'formula/1',
    product: { name: 'Wash', brand: 'Brackenmere Bathhouse', category: 'body-wash', markets: ['EU'] },
    materials: [
      { id: 'water', tradeName: 'Water', composition: [{ inci: 'Aqua', percent: '100' }] },
      { id: 'salt', tradeName: 'Salt', composition: [{ inci: 'Sodium Chloride', min: '98', typical: '99', max: '100' }] },
    ],
    formula: { batchSize: { value: '500', unit: 'g' }, lines: [{ material: 'water', phase: 'A', unit: 'qs' }, { material: 'salt', phase: 'A', amount: '5', unit: 'g' }] },
    label: { barcode: { symbology: 'EAN-13', digits: '9521234567899' }, container: { shape: 'flat', widthMm: '60', heightMm: '90' } },
  };
}

/** Puts a value at a JSON Pointer; `undefined` takes the field away. */
function having(pointer: string, value: unknown): Json {
  const document = good();
  const steps = pointer.split('/').slice(1);
  const last = steps.pop()!;
  let at: Json = document;
  for (const step of steps) at = (at[step] ??= {}) as Json;
  if (value === undefined) Reflect.deleteProperty(at, last);
  else at[last] = value;
  return document;
}

function faultsOf(value: unknown): readonly Fault[] {
  const read = readFormulaDocument(value, knows);
  return 'faults' in read ? read.faults : [];
}

function documentOf(value: unknown): FormulaDocument {
  const read = readFormulaDocument(value, knows);
  if ('faults' in read) throw new Error(JSON.stringify(read.faults));
  return read.document;
}

describe('each fault is told at its place', () => {
  test.each<[string, unknown, string?]>([
    ['/document', 'formula/2'],
    ['/document', undefined],
    ['/product', undefined],
    ['/product/category', 'space-suit'],
    ['/product/category', 7],
    ['/product/markets', undefined],
    ['/product/markets', []],
    ['/product/markets/0', 'FR'],
    ['/product/name', 3],
    ['/product/placedOnMarket', '2026-02-30'],
    ['/product/availableOn', '1 May 2026'],
    ['/product/under3', 'yes'],
    ['/product/facts/pH', {}],
    ['/product/netContent', { value: '-1', unit: 'ml' }, '/product/netContent/value'],
    ['/product/netContent', { value: '1', unit: 'l' }, '/product/netContent/unit'],
    ['/product/durability', { kind: 'pao', months: '1.5' }, '/product/durability/months'],
    ['/product/durability', { kind: 'best-before', date: '2028-13' }, '/product/durability/date'],
    ['/product/claims', [{ lang: 'en' }], '/product/claims/0/text'],
    ['/product/readyForUse', { productParts: '0', otherParts: '1' }, '/product/readyForUse/productParts'],
    ['/materials', undefined],
    ['/materials/1/id', 'water'],
    ['/materials/0/declareAs', 'perfume'],
    ['/materials/0/composition', 'Aqua'],
    ['/materials/0/composition/0/inci', ''],
    ['/materials/0/composition/0/percent', '100.0000001'],
    ['/materials/0/composition/0/percent', '-1'],
    ['/materials/0/composition/0/percent', '1e2'],
    ['/materials/0/composition/0/percent', 'NaN'],
    ['/materials/0/composition/0/percent', ' 5'],
    ['/materials/0/composition/0/percent', '5,5'],
    ['/materials/0/composition/0/percent', true],
    ['/materials/0/composition/0/percent', undefined],
    ['/materials/0/composition/0/percent', '1'.repeat(61)],
    ['/materials/0/composition/0/nano', 'no'],
    ['/materials/0/composition/0/purpose', 'smell'],
    ['/materials/0/composition/0/role', 'extra'],
    ['/materials/1/composition/0/min', '99.5', '/materials/1/composition/0/typical'],
    ['/materials/1/composition/0/min', '100.5'],
    ['/materials/1/composition/0/max', '97', '/materials/1/composition/0/min'],
    ['/materials/1/composition/0/max', undefined],
    ['/materials/1/composition/0/percent', '99'],
    ['/materials/0/constituents', [{ name: 'Linalool' }], '/materials/0/constituents/0/percent'],
    ['/formula', undefined],
    ['/formula/lines', []],
    ['/formula/lines', undefined],
    ['/formula/lines/1/material', 'pepper'],
    ['/formula/lines/1/material', '__proto__'],
    ['/formula/lines/1/unit', 'kg'],
    ['/formula/lines/1/unit', undefined],
    ['/formula/lines/1/unit', 'qs'],
    ['/formula/lines/1/amount', undefined],
    ['/formula/lines/1/amount', '-5'],
    ['/formula/lines/1/amount', 'five'],
    ['/formula/lines/1/amount', 'Infinity'],
    ['/formula/lines/1/amount', Number.POSITIVE_INFINITY],
    ['/formula/lines/1/amount', 1e300],
    ['/formula/lines/1/amount', '9999999999999'],
    ['/formula/batchSize', { value: '0', unit: 'g' }, '/formula/batchSize/value'],
    ['/formula/batchSize', { value: '5', unit: 'ml' }, '/formula/batchSize/unit'],
    ['/label/barcode/digits', '9521234567890'],
    ['/label/barcode/digits', '952123456789'],
    ['/label/barcode/symbology', 'EAN-14'],
    ['/label/container/shape', 'cube'],
    ['/label/container/widthMm', '0'],
    ['/label/market', 'XX'],
  ])('%s', (pointer, value, place) => {
    expect(faultsOf(having(pointer, value)).map((fault) => fault.pointer)).toContain(place ?? pointer);
  });

  test('all of them at once, not only the first', () => {
    const document = { ...having('/formula/lines/1/amount', '-5'), product: { category: 'x', markets: ['FR'], placedOnMarket: 'soon' } };
    expect(faultsOf(document).map(({ pointer }) => pointer).sort()).toEqual(['/formula/lines/1/amount', '/product/category', '/product/markets/0', '/product/placedOnMarket']);
  });

  test.each([[null], ['formula/1'], [7], [[]], [true]])('%j is no document', (value) => {
    expect(faultsOf(value).map(({ pointer }) => pointer)).toEqual(['']);
  });
});

describe('what is tolerated', () => {
  test('unknown extra fields and fields given as null', () => {
    const document = having('/product/colour', 'blue');
    (document['materials'] as Json[])[0]!['supplier'] = null;
    expect(faultsOf({ ...document, extra: [1] })).toEqual([]);
  });

  test.each([
    [5, '5'],
    [0.1, '0.1'],
    [1e-7, '0.0000001'],
    [1.25e-9, '0.00000000125'],
    [1e21 / 1e12, '1000000000'],
    [0, '0'],
    ['0.0100000001', '0.0100000001'],
    ['007.50', '007.50'],
  ])('an amount of %j reads as %s', (amount, text) => {
    expect(documentOf(having('/formula/lines/1/amount', amount)).formula.lines[1]!.amount).toBe(text);
  });

  test('a key named like a prototype does no harm', () => {
    const document = JSON.parse(JSON.stringify(good()).replace('"name":"Wash"', '"name":"Wash","facts":{"__proto__":"x","constructor":"y"}')) as unknown;
    const { facts } = documentOf(document).product;
    expect(Object.keys(facts)).toEqual(['constructor']);
    expect(({} as Json)['x']).toBeUndefined();
  });

  test('markets may be missing where they are given from outside', () => {
    expect(readFormulaDocument(having('/product/markets', undefined), { ...knows, markets: ['US'] })).toHaveProperty('document');
  });
});

describe('absurd sizes', () => {
  test('are refused, never a crash', () => {
    const lines = Array.from({ length: 6000 }, () => ({ material: 'salt', amount: '1', unit: 'g' }));
    expect(faultsOf(having('/formula/lines', lines)).map(({ pointer }) => pointer)).toEqual(['/formula/lines']);
    expect(faultsOf(having('/product/name', 'x'.repeat(1_000_000))).map(({ pointer }) => pointer)).toEqual(['/product/name']);
  });
});
