import { expect, test } from 'vitest';
import { judge, said, type Asked } from '../judging.ts';

const rules = (asked: Asked): string[] => said(judge([], asked), 'wording-required').map((line) => line.split(' ').at(-1)!);

test.each<[string, Asked, string[]]>([
  ['a US bubble bath', { market: 'US', category: 'bubble-bath' }, ['us/740.17']],
  ['a US bubble bath for adults only', { market: 'US', category: 'bubble-bath', facts: { adultsOnly: true } }, []],
  ['a US aerosol', { market: 'US', category: 'hair-spray' }, ['us/740.11-a']],
  ['a US shaving foam', { market: 'US', category: 'shaving-foam' }, ['us/740.11-a-foam']],
  ['a US self-tanner', { market: 'US', category: 'self-tan' }, ['us/740.19']],
  ['a US body wash', { market: 'US', category: 'body-wash' }, []],
  ['a Canadian oxidative hair dye', { market: 'CA', category: 'hair-dye-oxidative' }, ['ca/cr-22']],
  ['a Canadian aerosol whose flame was not measured', { market: 'CA', category: 'hair-spray' }, ['ca/cr-25', 'ca/cr-25-other', 'ca/cr-26']],
  ['a Canadian aerosol without a flame', { market: 'CA', category: 'hair-spray', facts: { flameProjectionCm: '0', flashback: false } }, ['ca/cr-25', 'ca/cr-25-other']],
  ['an EU bubble bath', { market: 'EU', category: 'bubble-bath' }, []],
])('%s', (_, asked, expected) => {
  expect(rules(asked)).toEqual(expected);
});

test('Canada wants both languages', () => {
  expect(judge([], { market: 'CA', category: 'hair-dye-oxidative' }).requiredWording.map((one) => one.lang)).toEqual(['en', 'fr']);
});

test('a US professional product says so from 29 December 2023', () => {
  const asked: Asked = { market: 'US', flags: { professionalUseOnly: true } };
  expect(rules({ ...asked, available: '2023-12-28' })).toEqual([]);
  expect(rules({ ...asked, available: '2023-12-29' })).toEqual(['us/609-c']);
});
