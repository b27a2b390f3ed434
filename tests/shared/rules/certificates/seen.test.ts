import { expect, test } from 'vitest';
import { assess } from '#shared/engine/assess.ts';
import { dictionary, formula, law, line, material, part, TODAY } from '#tests/support/engine.ts';

type Facts = Readonly<Record<string, string | boolean>>;
/** A foaming amide, from one material or two, with what their certificates say. */
const open = (...facts: (Facts | undefined)[]): string[] => {
  const materials = facts.map((said, at) => ({ ...material(`m${at}`, [part('Cocamide DEA', '100')], { tradeName: `Amide ${at + 1}` }), ...(said ? { facts: said } : {}) }));
  const document = formula([material('water', [part('Aqua', '100')]), ...materials], [line('water', '98 g'), ...facts.map((_, at) => line(`m${at}`, '1 g'))]);
  return assess(document, { law, dictionary, markets: ['EU'], today: TODAY }).results[0]!.notChecked.filter((words) => words.startsWith('Cocamide DEA'));
};

test('a condition of purity names the material whose certificate was seen, and stays open', () => {
  const [words, ...rest] = open({ certificateSeen: true });
  expect(rest).toEqual([]);
  expect(words).toMatch(/nitrosamines at most 50 micrograms per kilogram.* For the purity of Amide 1 the house has seen a certificate\./);
});

test('nothing is said where none was seen, or not for every material that brings it', () => {
  for (const words of [open(undefined), open({ certificateSeen: false }), open({ certificateSeen: true }, undefined)]) {
    expect(words).toHaveLength(1);
    expect(words[0]).not.toContain('seen a certificate');
  }
  expect(open({ certificateSeen: true }, { certificateSeen: true })[0]).toContain('Amide 1, Amide 2');
});
