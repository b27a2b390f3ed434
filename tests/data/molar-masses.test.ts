import { MF } from 'mf-parser';
import { expect, test } from 'vitest';
import { add, compare, decimal, multiply, subtract, toDecimal, ZERO, type Rational } from '#shared/kernel/rational.ts';
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

/**
 * How far the weight of an element in a natural material may lie from the abridged figure above: the ends of the
 * intervals, or the uncertainties, of IUPAC's standard atomic weights 2021 (from memory), and the last digit cut off. Mercury alone is wider: IUPAC gives 200.592 ± 0.003, and the
 * library adds its isotopes up to 200.599.
 */
const SPREAD: Readonly<Record<string, string>> = {
  Ag: '0.003', Al: '0.0005', B: '0.011', Ba: '0.01', Br: '0.003', C: '0.0014', Ca: '0.004', Cl: '0.007', F: '0.0005', H: '0.0003', Hg: '0.0095', K: '0.0005',
  Li: '0.057', Mg: '0.002', N: '0.0007', Na: '0.0005', O: '0.0008', P: '0.0005', S: '0.016', Se: '0.008', Si: '0.001', Sn: '0.007', Sr: '0.01', Zn: '0.02',
};

function spreadOf(formula: string): Rational {
  return [...formula.matchAll(/([A-Z][a-z]?)(\d*)/g)].reduce((sum, [, element, count]) => add(sum, multiply(decimal(SPREAD[element!]!), decimal(count || '1'))), ZERO);
}

/** The average molecular mass as the chemistry library mf-parser 3.9.3 has it, from isotopes and their abundances. */
function outsideMass(formula: string): Rational {
  return decimal(new MF(formula).getInfo().mass.toFixed(9));
}

function isNear(a: Rational, b: Rational, most: Rational): boolean {
  return compare(subtract(a, b), most) <= 0 && compare(subtract(b, a), most) <= 0;
}

/** The factor of the tables against the library's masses: `times` × mass and `over` × equivalents, apart by no more than the weights' own spread. */
function agreesOutside({ factor }: Member, { formula, basis, times }: (typeof cases)[number]): boolean {
  const [up, down, count] = [decimal(factor!.times), decimal(factor!.over), decimal(String(times))];
  const most = add(multiply(up, spreadOf(formula)), multiply(multiply(down, count), spreadOf(basis)));
  return isNear(multiply(up, outsideMass(formula)), multiply(multiply(down, count), outsideMass(basis)), most);
}

test('every mass agrees with a chemistry library within the spread of natural atomic weights', () => {
  const formulas = [...new Set(cases.flatMap(({ formula, basis }) => [formula, basis]))];
  const apart = formulas.filter((formula) => !isNear(massOf(formula), outsideMass(formula), spreadOf(formula)));
  console.info(`Masses compared with mf-parser: ${String(formulas.length)}`);
  expect(apart.map((formula) => `${formula}: ${toDecimal(massOf(formula), 4)}, mf-parser ${toDecimal(outsideMass(formula), 4)}`)).toEqual([]);
  expect(isNear(massOf('C7H5KO2'), outsideMass('C7H5NaO2'), spreadOf('C7H5NaO2'))).toBe(false);
  expect(isNear(massOf('C7H6NaO2'), outsideMass('C7H5NaO2'), spreadOf('C7H5NaO2'))).toBe(false);
});

test('every factor of the tables agrees with a chemistry library', () => {
  const apart = members.filter((member) => {
    const formulas = cases.filter(({ name }) => foldName(name) === foldName(member.name));
    return formulas.length > 0 && !formulas.some((one) => agreesOutside(member, one));
  });
  expect(apart.map(({ name, factor }) => `${name} ${factor!.times}/${factor!.over}`)).toEqual([]);
  const benzoate = cases.find(({ name }) => name === 'Sodium Benzoate')!;
  // One hydrogen too few in the acid.
  expect(agreesOutside({ name: 'Sodium Benzoate', factor: { times: '121.115', over: '144.105' } }, benzoate)).toBe(false);
});
