import type { MaterialFields } from '#shared/contracts/materials.contract.ts';
import { decimal, toDecimal } from '#shared/kernel/rational.ts';

/** A text in which two materials are equal exactly when they say the same; figures count by value, `5.0` as `5`. */
export function fingerprint(fields: Pick<MaterialFields, 'tradeName' | 'supplier' | 'declareAs' | 'composition' | 'constituents' | 'facts'>): string {
  const line = (part: MaterialFields['composition'][number] | MaterialFields['constituents'][number]) => {
    const { percent, min, typical, max, ...rest } = part;
    const shares = [percent, min, typical, max].map((share) => (share === undefined ? null : toDecimal(decimal(share), 60)));
    const { basis: _basis, ...said } = { basis: undefined, ...rest };
    const words = Object.entries(said)
      .filter(([key, value]) => value !== undefined && value !== false && !(key === 'role' && value === 'ingredient'))
      .sort(([a], [b]) => (a < b ? -1 : 1));
    return [shares, words];
  };
  const { tradeName, supplier, declareAs, composition, constituents, facts = {} } = fields;
  const answers = Object.entries(facts).sort(([a], [b]) => (a < b ? -1 : 1));
  return JSON.stringify([tradeName, supplier, declareAs, composition.map(line), constituents.map(line), answers]);
}
