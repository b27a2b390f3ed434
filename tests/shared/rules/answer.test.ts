import { describe, expect, test } from 'vitest';
import type { Condition, ProductFlag } from '#shared/law/types.ts';
import { answer, type Answer } from '#shared/rules/answer.ts';
import { law } from './judging.ts';

const flags: Record<ProductFlag, boolean> = { under3: false, professionalUseOnly: false, aerosol: false, spray: false, intimateHygiene: false };

function ask(condition: Condition, facts: Record<string, string | boolean> = {}, category = 'body-wash', given: Partial<typeof flags> = {}): { value: Answer; needs: string[] } {
  const needs = new Set<string>();
  const product = { category: law.categories.get(category)!, flags: { ...flags, ...given }, facts } as never;
  return { value: answer(condition, { facts: product, needs }), needs: [...needs] };
}

const open: Condition = { fact: 'x', is: [true] };
const yes: Condition = { all: [] };
const no: Condition = { not: yes };

describe('three values', () => {
  test.each<[string, Condition, Answer]>([
    ['an empty all', yes, true],
    ['all of true and open', { all: [yes, open] }, undefined],
    ['all of false and open', { all: [open, no] }, false],
    ['any of true and open', { any: [open, yes] }, true],
    ['any of false and open', { any: [no, open] }, undefined],
    ['not open', { not: open }, undefined],
    ['exposure', { exposure: 'rinse-off' }, true],
    ['tag', { tag: ['hair', 'shower'] }, true],
    ['category', { category: ['shampoo'] }, false],
    ['nano', { nano: true }, false],
  ])('%s', (_, condition, expected) => {
    expect(ask(condition).value).toBe(expected);
  });

  test('an open answer names what is missing', () => {
    expect(ask(open).needs).toEqual(['x']);
  });
});

describe('decimal facts', () => {
  test.each<[string, Answer]>([
    ['6.99', false],
    ['7', true],
    ['9.5', true],
    ['9.51', false],
    ['acid', undefined],
  ])('pH %s within 7 to 9.5: %s', (pH, expected) => {
    expect(ask({ fact: 'pH', least: '7', most: '9.5' }, { pH }).value).toBe(expected);
  });

  test.each<[string, Answer]>([
    ['6', false],
    ['6.01', true],
  ])('pH %s strictly above 6: %s', (pH, expected) => {
    expect(ask({ fact: 'pH', above: '6' }, { pH }).value).toBe(expected);
  });
});

describe('facts worked out from the product', () => {
  const inhalable: Condition = { fact: 'inhalable', is: [true] };
  test.each<[string, string, Partial<typeof flags>, Record<string, string | boolean>, Answer]>([
    ['a spray can be breathed in', 'deodorant-spray', { spray: true }, {}, true],
    ['a powder may be', 'face-powder', {}, {}, undefined],
    ['a cream is not', 'face-cream', {}, {}, false],
    ['an answer given beats all', 'deodorant-spray', { spray: true }, { inhalable: false }, false],
  ])('%s', (_, category, given, facts, expected) => {
    expect(ask(inhalable, facts, category, given).value).toBe(expected);
  });
});
