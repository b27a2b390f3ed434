import { expect, test } from 'vitest';
import { claimCriteria, claimTables } from '#shared/rules/claims/claim-tables.ts';
import { CLAIM_LANGUAGES } from '#shared/rules/claims/languages.ts';
import { tokenise } from '#shared/rules/claims/match-words.ts';

test('every language has its tables, opened once', () => {
  for (const lang of CLAIM_LANGUAGES) {
    const tables = claimTables(lang);
    expect(tables.lang).toBe(lang);
    expect(claimTables(lang)).toBe(tables);
    expect(tables.frame.not.size).toBeGreaterThan(0);
  }
});

test('a row is found by its words and knows its companions and exceptions', () => {
  const [hit] = claimTables('en').rows.allAt(tokenise('hypoallergenic', 'en'), 0);
  expect(hit!.item.id).toBe('hypoallergenic');
  const disease = claimTables('en').rows.allAt(tokenise('eczema', 'en'), 0).find(({ item }) => item.id === 'disease')!.item;
  expect(disease.near?.longestAt(tokenise('treats', 'en'), 0)).toBeDefined();
  expect(disease.unless.length).toBeGreaterThan(0);
});

test('starts of INCI names are folded as names are', () => {
  expect(claimTables('en').ingredients.longestAt(tokenise('sweet almonds', 'en'), 0)!.item.starts).toContain('prunusamygdalus');
});

test('each criterion is cited in every market', () => {
  for (const cited of Object.values(claimCriteria)) for (const market of ['EU', 'UK', 'US', 'CA'] as const) expect(cited[market].text).not.toBe('');
});
