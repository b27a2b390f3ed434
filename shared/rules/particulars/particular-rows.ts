import canada from '#data/parameters/particulars-ca.json' with { type: 'json' };
import union from '#data/parameters/particulars-eu.json' with { type: 'json' };
import placesJson from '#data/parameters/particulars-places.json' with { type: 'json' };
import britain from '#data/parameters/particulars-uk.json' with { type: 'json' };
import states from '#data/parameters/particulars-us.json' with { type: 'json' };
import { MARKETS, type Condition, type Dates, type Market, type Sourcing } from '#shared/law/types.ts';

/** A particular that stands in the document as it is. */
export type GivenField = 'netContent' | 'batchCode' | 'function' | 'usContact' | 'canadaContact' | 'countryOfOrigin';

/** How a particular is looked for; `open` is never decided here, with the reason. */
export type ParticularCheck =
  | { readonly given: GivenField }
  /** Name and address stand for one of these markets. */
  | { readonly party: readonly Market[] }
  /** The address ends with no country outside this market. */
  | { readonly established: 'EU' | 'UK' }
  /** The party's name or address holds one of these texts. */
  | { readonly says: readonly string[]; readonly in: 'party' }
  /** Up to this many months a date, above it a period after opening. */
  | { readonly durability: string }
  /** Unit of the content by physical form. */
  | { readonly measure: Readonly<Record<string, 'g' | 'ml'>>; readonly aerosol: 'g' | 'ml' }
  /** Most significant figures of the content. */
  | { readonly figures: number }
  /** Bounds of the content in g or ml. */
  | { readonly content: { readonly least: string; readonly most: string } }
  /** Least height of the content's figures in mm, by the content or by the panel's area; the last row has no bound. */
  | { readonly heights: readonly (readonly [string | null, string])[]; readonly by: 'content' | 'sq-in' | 'sq-cm' }
  /** Least height in mm of what a fact measures. */
  | { readonly height: string; readonly fact: string }
  /** Above this area in square inches the content stands in the bottom 30 %, as a fact says. */
  | { readonly zone: { readonly over: string; readonly asks: string } }
  /** Languages of the label, or those of the countries it goes to. */
  | { readonly languages: readonly string[] | 'destinations' }
  | { readonly any: readonly ParticularCheck[] }
  | { readonly open: string };

/** One duty about what a label bears, in one market. */
export interface ParticularRow {
  readonly id: string;
  readonly market: Market;
  readonly instrument: string;
  readonly citation: string;
  readonly sourcing: Sourcing;
  /** The field's key in a document, or what the duty is about. */
  readonly subject: string;
  /** What the label then lacks; of an open duty the whole sentence. */
  readonly words: string;
  readonly remedy: string;
  readonly check: ParticularCheck;
  /** When it binds; what cannot be answered is asked for. */
  readonly where?: Condition;
  /** What frees from it. */
  readonly unless?: Condition;
  /** Says nothing, instead of asking, where `where` cannot be answered. */
  readonly silent?: boolean;
  /** Kept for the record: what is set here keeps it, and nothing is said. */
  readonly record?: boolean;
  /** What fails it is a question, not a breach. */
  readonly doubt?: boolean;
  readonly from?: Dates;
  readonly until?: Dates;
  readonly reading?: string;
  /** Which piece of the pack bears it. */
  readonly bears?: string;
}

interface Places {
  readonly countries: Readonly<Record<'EU' | 'UK' | 'both' | 'elsewhere', readonly string[]>>;
  /** By country code: all of the languages, or any of them. */
  readonly languages: Readonly<Record<string, { readonly all?: readonly string[]; readonly any?: readonly string[] }>>;
}

/** Every duty about label particulars, in the order of the law; the casts only name the shape that the tests check. */
export const particularRows: readonly ParticularRow[] = [...union, ...britain, ...states, ...canada] as unknown as readonly ParticularRow[];
export const places = placesJson as unknown as Places;

const byMarket: ReadonlyMap<Market, readonly ParticularRow[]> = new Map(MARKETS.map((market) => [market, particularRows.filter((row) => row.market === market)]));

export function rowsOfMarket(market: Market): readonly ParticularRow[] {
  return byMarket.get(market) ?? [];
}
