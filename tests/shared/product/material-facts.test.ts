import { expect, test } from 'vitest';
import { readFormulaDocument } from '#shared/contracts/read-formula-document.ts';
import { toMaterialFields } from '#shared/product/from-document.ts';
import { toDocumentMaterial } from '#shared/product/to-document.ts';
import { law } from '../rules/judging.ts';

const written = (facts: unknown) => ({
  document: 'formula/1',
  product: { name: 'Balm', category: 'lip-balm', markets: ['EU'] },
  materials: [{ id: 'm', tradeName: 'Soft wax', composition: [{ inci: 'Petrolatum', percent: '100' }], facts }],
  formula: { lines: [{ material: 'm', amount: '1', unit: 'g' }] },
});
const read = (facts: unknown) => readFormulaDocument(written(facts), { categories: law.categories });

test('what a certificate says comes through a document and back', () => {
  const found = read({ fullRefiningHistory: true, benzoPyreneInMaterial: 0.004, dmsoExtractOfMaterial: '2.9' });
  if (!('document' in found)) throw new Error(JSON.stringify(found.faults));
  const facts = { fullRefiningHistory: true, benzoPyreneInMaterial: '0.004', dmsoExtractOfMaterial: '2.9' };
  const [material] = found.document.materials;
  expect(material!.facts).toEqual(facts);
  expect(toDocumentMaterial({ id: 'm', ...toMaterialFields(material!) }).facts).toEqual(facts);
});

test('none are written where none are said', () => {
  const found = read(undefined);
  expect('document' in found && found.document.materials[0]!.facts).toBeUndefined();
});

test('a fault in them is told at its place', () => {
  const found = read({ peanutProteinPpm: { most: 1 } });
  expect('faults' in found && found.faults.map(({ pointer }) => pointer)).toEqual(['/materials/0/facts/peanutProteinPpm']);
});
