import { expect, test } from 'vitest';
import { findAbsences } from '#shared/rules/claims/absences.ts';
import { claimTables } from '#shared/rules/claims/claim-tables.ts';
import type { ClaimLanguage } from '#shared/rules/claims/languages.ts';
import { tokenise } from '#shared/rules/claims/match-words.ts';

/** Classes and names said to be absent; words that only might be a name are left out. */
function absent(text: string, lang: ClaimLanguage = 'en'): string[] {
  return findAbsences(text, tokenise(text, lang), claimTables(lang)).flatMap(({ of }) => ('claimClass' in of ? [of.claimClass.id] : 'starts' in of ? [of.word] : []));
}

test.each([
  ['Free from parabens, silicones and mineral oil', ['paraben', 'silicone', 'mineral-oil']],
  ['Paraben- and silicone-free', ['silicone', 'paraben']],
  ['paraben/silicone free', ['silicone', 'paraben']],
  ['0 % alcohol', ['alcohol']],
  ['Contains no preservatives', ['preservative']],
  ['Not made with sulphates', ['sulfate']],
  ['parabenfree', ['paraben']],
  ['Vegan', ['animal']],
  ['Without almond or wheat', ['almond', 'gluten']],
  ['SLS-free', ['sls']],
])('%s', (text, expected) => expect(absent(text)).toEqual(expected));

test.each(['With parabens', 'Free silicone brush', 'Not vegan', 'It is not free from parabens', 'No soap residue', 'Free from fuss', 'No parabens were added. Silicone brush'])('%s says less', (text) => {
  expect(absent(text)).toEqual(text.startsWith('No parabens') ? ['paraben'] : []);
});

test('a list ends where another denial begins, and each quotes its own words', () => {
  const text = 'No animal testing, no parabens';
  expect(findAbsences(text, tokenise(text, 'en'), claimTables('en')).filter(({ of }) => 'claimClass' in of).map(({ words }) => words)).toEqual(['no parabens']);
});

test('what is 100 % natural may be one ingredient only', () => {
  expect(absent('With 100 % natural shea butter')).not.toContain('not-natural');
  expect(absent('100 % natural')).toContain('not-natural');
});

test('German joins, French lists', () => {
  expect(absent('silikonfrei', 'de')).toEqual(['silicone']);
  expect(absent('Sans parabènes ni silicones', 'fr')).toEqual(['paraben', 'silicone']);
});
