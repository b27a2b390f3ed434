import { expect, test } from 'vitest';
import { blendFormula } from '#shared/engine/blend.ts';
import { spokenOf } from '#shared/rules/substances/spoken-of.ts';
import { dictionary, formula, law, line, material, part } from '#tests/support/engine.ts';

const materials = [material('a', [part('Aqua', '98'), part('DMDM Hydantoin', '1', { purpose: 'preservative' }), part('CI 77491', '1')])];
const blend = (grams: string) => blendFormula(formula(materials, [line('a', `${grams} g`)]), dictionary);

test('rows, releasers of formaldehyde and stated purposes are found by place', () => {
  const mixture = blend('10');
  const { hits, releasers, purposeful } = spokenOf(mixture, law);
  const name = (at: number): string => mixture.substances[at]!.name;
  expect(hits.map(({ at }) => name(at))).toEqual(['DMDM Hydantoin', 'CI 77491']);
  expect(releasers.map(({ at }) => name(at))).toEqual(['DMDM Hydantoin']);
  expect(purposeful.map(name)).toEqual(['DMDM Hydantoin', 'CI 77491']);
});

test('another amount of the same materials asks for nothing again', () => {
  expect(spokenOf(blend('20'), law)).toBe(spokenOf(blend('10'), law));
});
