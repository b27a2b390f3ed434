import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import { readFormulaDocument } from '#shared/contracts/read-formula-document.ts';
import { resultDocumentSchema } from '#shared/contracts/result-document.ts';
import { formula, law, line, material, part, present } from '#tests/support/engine.ts';

const FIXTURES = join(import.meta.dirname, '../../reference/fixtures');

test.each(['body-wash.json', 'hand-cream-slip.json'])('the result of %s is what the schema of results describes, in every market', (name) => {
  const read = readFormulaDocument(JSON.parse(readFileSync(join(FIXTURES, name), 'utf8')), law);
  if (!('document' in read)) throw new Error(JSON.stringify(read.faults));
  const result = present(read.document, { markets: ['EU', 'UK', 'US', 'CA'] });
  // Strict: a field that the schema does not know would be dropped by the reader and show here.
  expect(resultDocumentSchema.parse(JSON.parse(JSON.stringify(result)))).toEqual(JSON.parse(JSON.stringify(result)));
});

test('conditions of the law that nothing entered decides are told with subject and citation', () => {
  const document = formula([material('t', [part('Triethanolamine', '1'), part('Aqua', '99')])], [line('t', '100 g')]);
  const { notChecked } = present(document).results[0]!;
  expect(notChecked).toHaveLength(1);
  expect(notChecked![0]).toMatch(/^Triethanolamine: .+ \(Regulation \(EC\) No 1223\/2009, Annex III, entry 62\)$/);
});
