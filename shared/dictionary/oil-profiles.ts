import { DomainError } from '#shared/kernel/errors.ts';
import { parseDecimal, compare } from '#shared/kernel/rational.ts';
import { readCsv } from './parse-csv.ts';

/** A published range of one constituent, percent of the oil as decimals. */
export interface OilConstituent {
  readonly name: string;
  readonly cas?: string;
  readonly min: string;
  readonly max: string;
  /** `secondary` where a published copy was read, else `memory`. */
  readonly sourcing: string;
}

/** The constituents that one standard gives for one kind of an essential oil. */
export interface OilProfile {
  readonly id: string;
  /** The oil's trade-neutral name. */
  readonly oil: string;
  readonly inci: string;
  readonly standard: string;
  /** Origin or chemical type; empty where the standard has one. */
  readonly kind: string;
  readonly constituents: readonly OilConstituent[];
}

const COLUMNS = ['profile', 'oil', 'inci', 'standard', 'kind', 'constituent', 'cas', 'min', 'max', 'sourcing', 'source'] as const;

/**
 * Reads data/dictionary/oil-profiles.csv, one constituent a row, into profiles in file order.
 * A standard that gives only an upper limit has 0 as its least, one with only a lower limit
 * 100 as its most.
 * @throws DomainError for a range that is none or a profile whose rows disagree.
 */
export function parseOilProfiles(csv: string): OilProfile[] {
  const profiles = new Map<string, OilProfile & { constituents: OilConstituent[] }>();
  for (const row of readCsv(csv, COLUMNS)) {
    const min = parseDecimal(row.min);
    const max = parseDecimal(row.max);
    if (!min || !max || compare(min, max) > 0) throw new DomainError(`oil profile ${row.profile}: ${row.constituent} has no range`);
    const profile = profiles.get(row.profile) ?? { id: row.profile, oil: row.oil, inci: row.inci, standard: row.standard, kind: row.kind, constituents: [] };
    if (profile.inci !== row.inci || profile.standard !== row.standard || profile.kind !== row.kind) throw new DomainError(`oil profile ${row.profile} has rows that disagree`);
    profiles.set(row.profile, profile);
    profile.constituents.push({ name: row.constituent, ...(row.cas ? { cas: row.cas } : {}), min: row.min, max: row.max, sourcing: row.sourcing });
  }
  return [...profiles.values()];
}
