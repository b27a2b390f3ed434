import { expect, test } from 'vitest';
import { compare, decimal, multiply, add, ZERO, type Rational } from '#shared/kernel/rational.ts';
import { foldName } from '#shared/law/fold.ts';
import { lawTables } from '#shared/law/tables.ts';
import type { Member } from '#shared/law/types.ts';
import { law } from '../shared/rules/judging.ts';
import { FORMULAS } from './formulas.ts';

/** IUPAC, abridged standard atomic weights 2021. */
const WEIGHTS: Readonly<Record<string, string>> = {
  Ag: '107.87', Al: '26.982', B: '10.81', Ba: '137.33', Br: '79.904', C: '12.011', Ca: '40.078', Cl: '35.45', F: '18.998', H: '1.0080', Hg: '200.59', K: '39.098',
  Li: '6.94', Mg: '24.305', N: '14.007', Na: '22.990', O: '15.999', P: '30.974', S: '32.06', Se: '78.971', Si: '28.085', Sn: '118.71', Sr: '87.62', Zn: '65.38',
};

function massOf(formula: string): Rational {
  const parts = [...formula.matchAll(/([A-Z][a-z]?)(\d*)/g)];
  expect(parts.map(([text]) => text).join('')).toBe(formula);
  return parts.reduce((sum, [, element, count]) => add(sum, multiply(decimal(WEIGHTS[element!]!), decimal(count || '1'))), ZERO);
}

const members: Member[] = [...law.rows.flatMap((row) => row.members), ...lawTables.formaldehyde.members].filter((member) => member.factor);
const cases = Object.entries(FORMULAS).flatMap(([basis, list]) => list.map(([name, formula, times]) => ({ name, formula, basis, times })));

test('a mass is the sum of its atoms: sodium benzoate 144.105, water 18.015', () => {
  expect(compare(massOf('C7H5NaO2'), decimal('144.105'))).toBe(0);
  expect(compare(massOf('H2O'), decimal('18.015'))).toBe(0);
});

/** Two ratios of masses are the same where their cross products are: no rounding is involved. */
function isRight({ factor }: Member, { formula, basis, times }: (typeof cases)[number]): boolean {
  const equivalent = multiply(massOf(basis), decimal(String(times)));
  return compare(multiply(decimal(factor!.times), massOf(formula)), multiply(decimal(factor!.over), equivalent)) === 0;
}

test('every substance listed here stands in the tables with a factor', () => {
  const named = new Set(members.map(({ name }) => foldName(name)));
  expect(cases.filter(({ name }) => !named.has(foldName(name))).map(({ name }) => name)).toEqual([]);
});

test('no factor of a substance listed here says anything else', () => {
  const wrong = members.filter((member) => {
    const formulas = cases.filter(({ name }) => foldName(name) === foldName(member.name));
    return formulas.length > 0 && !formulas.some((one) => isRight(member, one));
  });
  expect(isRight({ name: 'Sodium Benzoate', factor: { times: '122.123', over: '144.106' } }, cases.find(({ name }) => name === 'Sodium Benzoate')!)).toBe(false);
  expect(wrong.map(({ name, factor }) => `${name} ${factor!.times}/${factor!.over}`)).toEqual([]);
});

test('hardly a factor of the tables is without a formula here', () => {
  const known = new Set(cases.map(({ name }) => foldName(name)));
  const open = [...new Set(members.filter((member) => !known.has(foldName(member.name))).map((member) => member.name))];
  console.info(`Factors: ${String(members.length)}, without a formula here: ${open.join(', ')}`);
  expect(members.length - members.filter((member) => open.includes(member.name)).length).toBeGreaterThan(200);
  // Equal parts of dye and lignosulfate are a share by weight, not a ratio of molar masses.
  expect(open).toContain('Disperse Black 9');
});
