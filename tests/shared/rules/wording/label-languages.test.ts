import { describe, expect, test } from 'vitest';
import { languageName } from '#shared/rules/wording/label-languages.ts';
import { judge, law, type Asked } from '../judging.ts';

const retinol = [{ name: 'Retinol', percent: '0.1' }];
const ENGLISH = law.wording('vitamin-a', 'en').text;
const GERMAN = law.wording('vitamin-a', 'de').text;
const lacking = (asked: Asked) => judge(retinol, { category: 'face-cream', ...asked }).findings.filter((one) => one.kind === 'wording-missing');
const says = (languages: readonly string[], ...warnings: { text: string; lang?: string }[]) => lacking({ languages, particulars: { warnings } })[0]?.message;

describe('the languages of a label, one by one', () => {
  test('English words alone lack German on a label in both', () => {
    expect(says(['en', 'de'], { text: ENGLISH })).toBe(`The label's warnings do not say, in German: ${GERMAN}`);
  });

  test('German words alone lack English on a label in both', () => {
    expect(says(['en', 'de'], { text: GERMAN })).toBe(`The label's warnings do not say, in English: ${ENGLISH}`);
  });

  test('both texts lack nothing, and neither lacks both in one finding', () => {
    expect(says(['en', 'de'], { text: ENGLISH }, { text: GERMAN })).toBeUndefined();
    expect(lacking({ languages: ['en', 'de'], particulars: { warnings: [] } }).map((one) => one.message)).toEqual([`The label's warnings do not say, in English: ${ENGLISH}; in German: ${GERMAN}`]);
  });

  test('a German label is not helped by English words', () => {
    expect(says(['de'], { text: ENGLISH })).toContain(`in German: ${GERMAN}`);
  });

  test('a region of a language is that language', () => {
    expect(says(['de-AT'], { text: GERMAN })).toBeUndefined();
  });

  test('words that are not held are to be taken from the journal of that language', () => {
    const finding = lacking({ languages: ['en', 'es'], particulars: { warnings: [{ text: ENGLISH }] } })[0]!;
    expect(finding.message).toContain('the Spanish edition of the Official Journal');
    expect(finding.message).not.toContain('in English: Contains');
    expect(finding.remedy).toContain('Take the official words in Spanish from Regulation (EC) No 1223/2009');
  });

  test('a text marked with a language that is not held cannot be compared, and is not blamed', () => {
    expect(says(['en', 'es'], { text: ENGLISH }, { text: 'Contiene vitamina A', lang: 'es' })).toBeUndefined();
    expect(says(['en', 'es'], { text: 'Contiene vitamina A', lang: 'es' })).toContain(`in English: ${ENGLISH}`);
  });
});

test('the United States want English, whatever languages the label has', () => {
  const asked: Asked = { market: 'US', category: 'bubble-bath', languages: ['de'], particulars: { warnings: [] } };
  const finding = judge([], asked).findings.find((one) => one.kind === 'wording-missing')!;
  expect(finding.message).toBe(`The label's warnings do not say: ${law.wording('us-740-17', 'en').text}`);
});

test('Canada wants French beside English', () => {
  const warn = (...ids: string[]) => judge([], { market: 'CA', category: 'hair-dye-oxidative', particulars: { warnings: ids.map((lang) => ({ text: dye(lang) })) } }).findings.find((one) => one.kind === 'wording-missing')?.message;
  const dye = (lang: string): string => judge([], { market: 'CA', category: 'hair-dye-oxidative' }).requiredWording.find((one) => one.lang === lang)!.text;
  expect(warn('en', 'fr')).toBeUndefined();
  expect(warn('en')).toContain('in French');
  expect(warn('fr')).toContain('in English');
});

test('a language has its English name, and else its code', () => {
  expect([languageName('de'), languageName('fr-CA'), languageName('xx')]).toEqual(['German', 'French', 'xx']);
});
