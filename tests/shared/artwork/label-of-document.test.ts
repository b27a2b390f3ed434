import { expect, it } from 'vitest';
import { labelOfDocument } from '#shared/artwork/label-of-document.ts';
import type { FormulaDocument } from '#shared/contracts/formula-document.ts';

const REQUIRED = { text: 'Avoid contact with eyes.', lang: 'en', citation: 'Regulation (EC) No 1223/2009, Annex III', subject: 'X' };

function printed(warnings: readonly { text: string; lang?: string }[]): readonly string[] {
  const document = {
    product: { name: 'Wash', brand: 'House', category: 'body-wash', markets: ['UK'], claims: [], particulars: { responsiblePerson: {}, warnings } },
    label: { languages: ['en'], market: 'UK' },
  } as unknown as FormulaDocument;
  return labelOfDocument(document, { requiredWording: [REQUIRED] } as unknown as Parameters<typeof labelOfDocument>[1], 'UK').warnings;
}

it('prints a warning the law wants though the maker typed none', () => {
  expect(printed([])).toEqual(['Avoid contact with eyes.']);
});

it('does not double a warning typed with other spaces, case or punctuation', () => {
  expect(printed([{ text: 'AVOID  contact with eyes!', lang: 'en' }])).toEqual(['Avoid contact with eyes.']);
});

it('keeps a warning of the maker that says something else', () => {
  expect(printed([{ text: 'Keep away from pets.', lang: 'en' }])).toEqual(['Avoid contact with eyes.', 'Keep away from pets.']);
});

it('does not print a wording beside a text of the maker that already holds it', () => {
  expect(printed([{ text: 'Shake well. Avoid contact with eyes. Keep cool.', lang: 'en' }])).toEqual(['Shake well. Avoid contact with eyes. Keep cool.']);
});

it('prints a wording that the text of the maker holds only up to the middle of a word', () => {
  expect(printed([{ text: 'Avoid contact with eyesight tests.', lang: 'en' }])).toEqual(['Avoid contact with eyes.', 'Avoid contact with eyesight tests.']);
});
