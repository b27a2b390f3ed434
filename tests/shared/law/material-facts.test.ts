import { describe, expect, test } from 'vitest';
import { plainDate } from '#shared/kernel/plain-date.ts';
import type { ProductFacts, Substance } from '#shared/engine/types.ts';
import { isMaterialFact, MATERIAL_FACTS } from '#shared/law/material-facts.ts';
import { ONE, ZERO } from '#shared/kernel/rational.ts';
import { answer } from '#shared/rules/answer.ts';
import { law } from '../rules/judging.ts';

const share = { min: ZERO, typical: ONE, max: ONE };
const substance = (...materials: string[]): Substance => ({ key: 'paraffin', name: 'Paraffin', cas: [], purposes: [], nano: false, as: { ingredient: share }, total: share, sources: materials.map((materialId) => ({ materialId, line: 0, share })) });
const facts = (given: Record<string, Record<string, string | boolean>>, own: ProductFacts['facts'] = {}): ProductFacts => ({
  market: 'EU', placedOnMarket: plainDate('2026-12-01'), availableOn: plainDate('2026-12-01'), category: law.categories.get('body-oil')!,
  flags: { under3: false, professionalUseOnly: false, aerosol: false, spray: false, intimateHygiene: false }, facts: own, readyForUse: ONE, materialFacts: new Map(Object.entries(given)),
});
const ask = (given: Record<string, Record<string, string | boolean>>, of: Substance, own: ProductFacts['facts'] = {}, condition: Parameters<typeof answer>[0] = { fact: 'butadieneInMaterial', above: '0.1' }) => {
  const needs = new Set<string>();
  return [answer(condition, { facts: facts(given, own), substance: of, needs }), [...needs]] as const;
};

describe('what a certificate says', () => {
  test.each([['0.09', false], ['0.1', false], ['0.1001', true]])('butadiene of %s %% above 0.1 %%: %s', (value, expected) => {
    expect(ask({ a: { butadieneInMaterial: value } }, substance('a'))[0]).toBe(expected);
  });
  test('one bad material among several is enough for a warning; one without an answer leaves it open', () => {
    expect(ask({ a: { butadieneInMaterial: '0' }, b: { butadieneInMaterial: '1' } }, substance('a', 'b', 'c'))[0]).toBe(true);
    expect(ask({ a: { butadieneInMaterial: '0' } }, substance('a', 'b'))).toEqual([undefined, ['butadieneInMaterial']]);
  });
  test('what must hold has to hold in each', () => {
    const most = { fact: 'peanutProteinPpm', most: '0.5' };
    expect(ask({ a: { peanutProteinPpm: '0.5' }, b: { peanutProteinPpm: '0.51' } }, substance('a', 'b'), {}, most)[0]).toBe(false);
    expect(ask({ a: { peanutProteinPpm: '0.5' }, b: { peanutProteinPpm: '0' } }, substance('a', 'b'), {}, most)[0]).toBe(true);
  });
  test('a history that is not known is a warning too', () => {
    const unknown = { fact: 'fullRefiningHistory', is: [false] };
    expect(ask({ a: { fullRefiningHistory: true }, b: { fullRefiningHistory: false } }, substance('a', 'b'), {}, unknown)[0]).toBe(true);
    expect(ask({ a: { fullRefiningHistory: true } }, substance('a'), {}, unknown)[0]).toBe(false);
  });
  test('a material without an answer takes the product’s, and one that answers does not', () => {
    expect(ask({ z: {} }, substance('a'), { butadieneInMaterial: '1' })[0]).toBe(true);
    expect(ask({ a: { butadieneInMaterial: '0' } }, substance('a'), { butadieneInMaterial: '1' })[0]).toBe(false);
  });
  test('other facts stay the product’s', () => {
    expect([isMaterialFact('pH'), isMaterialFact('toString'), Object.keys(MATERIAL_FACTS).every(isMaterialFact)]).toEqual([false, false, true]);
    expect(ask({ a: { pH: '3' } }, substance('a'), { pH: '5' }, { fact: 'pH', least: '4' })[0]).toBe(true);
  });
});
