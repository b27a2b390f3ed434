import { expect, test } from 'vitest';
import { replaceName } from '#src/features/reading/replace-name.ts';

test.each([
  ['Aqua, Phenoxyetanol, Parfum', 'Phenoxyetanol', 'Phenoxyethanol', 'Aqua, Phenoxyethanol, Parfum'],
  ['AQUA, PHENOXYETANOL', 'PHENOXYETANOL', 'Phenoxyethanol', 'AQUA, Phenoxyethanol'],
  ['Aqua, Sodium Laurth\nSulfate, X', 'Sodium Laurth Sulfate', 'Sodium Laureth Sulfate', 'Aqua, Sodium Laureth Sulfate, X'],
  ['Aqua, Phe\u00ADnoxyetanol', 'Phenoxyetanol', 'Phenoxyethanol', 'Aqua, Phenoxyethanol'],
  ['Aqua, Phenoxy-\netanol', 'Phenoxyetanol', 'Phenoxyethanol', 'Aqua, Phenoxyethanol'],
  ['Aqua, PEG‑40 Castor (Oil)', 'PEG-40 Castor (Oil)', 'PEG-40 Castor Oil', 'Aqua, PEG-40 Castor Oil'],
  ['Oilseed, Oil', 'Oil', 'Olus Oil', 'Oilseed, Olus Oil'],
  ['Aqua', 'Glycerin', 'X', 'Aqua'],
])('in %j %s becomes %s', (text, written, by, expected) => {
  expect(replaceName(text, written, by)).toBe(expected);
});
