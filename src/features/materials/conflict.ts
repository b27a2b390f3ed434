import { MATERIAL_FACTS } from '#shared/law/material-facts.ts';
import type { Material, MaterialFields } from '#shared/contracts/materials.contract.ts';

/** A part of a material that two people may have changed, as it is chosen in one piece. */
export interface Differing {
  readonly key: PartKey;
  readonly word: string;
  readonly mine: string;
  readonly theirs: string;
  /** The side that alone changed it since the version both began from. */
  readonly onlyChangedBy: 'mine' | 'theirs' | null;
}
const PARTS = {
  tradeName: ['Name', ['tradeName']],
  supplier: ['Supplier', ['supplier']],
  declareAs: ['Declared', ['declareAs']],
  composition: ['Composition', ['composition']],
  constituents: ['Constituents', ['constituents']],
  price: ['Price per kg', ['pricePerKg', 'currency']],
  notes: ['Notes', ['notes']],
  handling: ['Handling limits', ['handling']],
  facts: ['Certificates', ['facts']],
} as const satisfies Record<string, readonly [string, readonly (keyof MaterialFields)[]]>;
export type PartKey = keyof typeof PARTS;
export type Side = 'mine' | 'theirs';

const pick = (fields: MaterialFields, key: PartKey) => Object.fromEntries(PARTS[key][1].map((name) => [name, fields[name]]));
/** Equal whatever the order of keys, and whether an empty one is written. */
function same(a: unknown, b: unknown): boolean {
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return a === b;
  const keys = new Set([...Object.keys(a), ...Object.keys(b)]);
  return [...keys].every((key) => same((a as Record<string, unknown>)[key], (b as Record<string, unknown>)[key]));
}

/** What differs between two versions of a material, with the side that alone changed it. */
export function findDiffering(base: MaterialFields | null, mine: MaterialFields, theirs: MaterialFields): Differing[] {
  return (Object.keys(PARTS) as PartKey[]).flatMap((key) => {
    if (same(pick(mine, key), pick(theirs, key))) return [];
    const [mineKept, theirsKept] = [base !== null && same(pick(base, key), pick(mine, key)), base !== null && same(pick(base, key), pick(theirs, key))];
    return [{ key, word: PARTS[key][0], mine: sayPart(key, mine), theirs: sayPart(key, theirs), onlyChangedBy: mineKept ? 'theirs' as const : theirsKept ? 'mine' as const : null }];
  });
}

/** The fields that follow from one choice for each differing part. */
export function mergeFields(mine: MaterialFields, theirs: Material, choice: Readonly<Partial<Record<PartKey, Side>>>): MaterialFields {
  let merged = mine;
  for (const key of Object.keys(PARTS) as PartKey[]) {
    if (choice[key] === 'theirs') merged = { ...merged, ...pick(theirs, key) };
  }
  return merged;
}

function sayPart(key: PartKey, fields: MaterialFields): string {
  const share = (line: { percent?: string; min?: string; max?: string }) => (line.percent !== undefined ? `${line.percent} %` : `${line.min ?? '?'} to ${line.max ?? '?'} %`);
  switch (key) {
    case 'composition':
      return fields.composition.map((line) => `${line.inci} ${share(line)}`).join('\n') || 'nothing written';
    case 'constituents':
      return fields.constituents.map((line) => `${line.name} ${share(line)}`).join('\n') || 'nothing written';
    case 'price':
      return fields.pricePerKg === null ? 'no price' : `${fields.pricePerKg} ${fields.currency}`;
    case 'handling': {
      const { heatLimitC, phFrom, phTo, hydrateHours, note } = fields.handling;
      return [heatLimitC && `not above ${heatLimitC} °C`, (phFrom || phTo) && `pH ${phFrom ?? ''} to ${phTo ?? ''}`, hydrateHours && `${hydrateHours} h to hydrate`, note].filter(Boolean).join('\n') || 'none';
    }
    case 'facts':
      return Object.entries(fields.facts ?? {}).map(([fact, value]) => `${MATERIAL_FACTS[fact]?.label ?? fact}: ${value === true ? 'yes' : value === false ? 'no' : value}`).join('\n') || 'none';
    case 'declareAs':
      return { ingredients: 'by its ingredients', parfum: 'as perfume', aroma: 'as flavour' }[fields.declareAs];
    default:
      return fields[key] || 'empty';
  }
}
