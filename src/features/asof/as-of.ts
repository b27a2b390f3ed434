import { parsePlainDate } from '#shared/kernel/plain-date.ts';
import type { Market } from '#shared/law/types.ts';

const MARKETS: readonly Market[] = ['EU', 'UK', 'US', 'CA'];

/** The market and the two days for which a product is looked at. */
export interface AsOf {
  readonly market: Market;
  /** First sold on. */
  readonly placed: string;
  /** Still on the shelf on. */
  readonly available: string;
}

export interface AsOfDefaults {
  readonly markets: readonly Market[];
  readonly placed: string | null;
  readonly available: string | null;
  readonly today: string;
}

/**
 * Reads the address's `market`, `placed` and `available`; what is missing or no day comes from
 * the product. Left alone, both days are the same.
 */
export function readAsOf(search: URLSearchParams, defaults: AsOfDefaults): AsOf {
  const market = MARKETS.find((each) => each === search.get('market')) ?? defaults.markets[0] ?? 'EU';
  const day = (name: string) => parsePlainDate(search.get(name) ?? '');
  const placed = day('placed') ?? defaults.placed ?? defaults.today;
  // A day in the address moves both, unless the shelf day stands there too.
  const available = day('available') ?? (day('placed') ? placed : (defaults.available ?? placed));
  return { market, placed, available: available < placed ? placed : available };
}

/** The address for another view; what equals the product's own is left out, so that addresses stay short. */
export function writeAsOf(search: URLSearchParams, next: AsOf, defaults: AsOfDefaults): URLSearchParams {
  const result = new URLSearchParams(search);
  const set = (name: string, value: string | null) => (value === null ? result.delete(name) : result.set(name, value));
  set('market', next.market === (defaults.markets[0] ?? 'EU') ? null : next.market);
  const ownPlaced = defaults.placed ?? defaults.today;
  const ownAvailable = defaults.available ?? ownPlaced;
  const isOwn = next.placed === ownPlaced && next.available === ownAvailable;
  set('placed', isOwn || next.placed === ownPlaced ? null : next.placed);
  set('available', isOwn || (next.available === next.placed && next.placed !== ownPlaced) ? null : next.available);
  return result;
}
