import { expect, test } from 'vitest';
import { materialNames } from '#shared/product/material-names.ts';

const perfume = { declareAs: 'parfum' as const, composition: [], constituents: [{ name: 'Linalool', cas: '78-70-6' }] };

test('a perfume without a composition still needs the name it is listed under', () => {
  expect(materialNames(perfume)).toEqual([
    { name: 'Parfum', isListed: true },
    { name: 'Linalool', cas: '78-70-6', isListed: false },
  ]);
});

test('a material declared by its ingredients needs no collective name', () => {
  expect(materialNames({ declareAs: 'ingredients', composition: [{ inci: 'Aqua' }], constituents: [] })).toEqual([{ name: 'Aqua', cas: undefined, isListed: true }]);
});
