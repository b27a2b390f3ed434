import { expect, test } from 'vitest';
import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import { labelOfDocument } from '#shared/artwork/label-of-document.ts';
import { openLawBook } from '#shared/law/law-book.ts';
import { lawTables } from '#shared/law/tables.ts';

const law = openLawBook(lawTables);
const rows = lawTables.wording.flatMap((one) => Object.keys(one.text).map((lang) => [one.id, lang] as const));

test('the coverage of wordings by language is printed', () => {
  const lines = [...new Set(rows.map(([, lang]) => lang))].toSorted().map((lang) => {
    const held = rows.filter((row) => row[1] === lang).map(([id]) => law.wording(id, lang));
    const official = held.filter((one) => one.isOfficialText).length;
    const pointers = held.filter((one) => one.isPointer).length;
    return `${lang}: ${held.length} of ${lawTables.wording.length} wordings, ${official} official, ${held.length - official - pointers} to be checked, ${pointers} only say where the words stand`;
  });
  console.log(lines.join('\n'));
  expect(lines.map((line) => line.slice(0, 2))).toEqual(['de', 'en', 'fr']);
});

test.each(rows)('%s in %s prints on a label in that language where it is official, and not where it is to be checked', (id, lang) => {
  const words = law.wording(id, lang);
  const document = { product: { name: 'Wash', brand: 'House', category: 'body-wash', markets: ['EU'], claims: [] }, label: { languages: [lang], market: 'EU' } } as unknown as FormulaDocument;
  const label = labelOfDocument(document, { requiredWording: [words] } as unknown as Parameters<typeof labelOfDocument>[1], 'EU');
  const isOnFront = words.place === 'principal-panel';
  expect(label.frontWarnings).toEqual(words.isOfficialText && isOnFront ? [words.text] : []);
  expect(label.warnings).toEqual(words.isOfficialText && !isOnFront ? [words.text] : []);
});
