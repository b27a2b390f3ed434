/** One ingredient of the dictionary, as the engine and the screens use it. */
export interface DictionaryEntry {
  /** Permanent slug. */
  readonly id: string;
  /** INCI name in title case as printed by default: `Aqua`, `CI 77891`, `Lavandula Angustifolia Oil`. */
  readonly inci: string;
  readonly cas: readonly string[];
  readonly ec: readonly string[];
  /** Functions in the inventory's terms, lower case. */
  readonly functions: readonly string[];
  /** Names printed in a market where they differ from `inci`. */
  readonly names: {
    readonly us?: string;
    readonly ca?: string;
    /** The French form for Canada's joined names. */
    readonly fr?: string;
    /** Every US colour name of this CI number; more than one = ambiguous. */
    readonly usColours?: readonly string[];
  };
  readonly synonyms: readonly string[];
  /** Common and trade-neutral forms that lead here. */
  readonly commonNames: readonly string[];
  /** Frequent misspellings of the names above. */
  readonly misspellings?: readonly string[];
  /** INCI name of the successor where this name is a former one. */
  readonly supersededBy?: string;
  /** `botanical`, `colourant`, `essential-oil`, `animal`, `silicone`, `paraben`, `sulfate-surfactant`, `alcohol` … */
  readonly properties: readonly string[];
  readonly source: string;
}

/** An entry as the browser's own look-up needs it: what names are told by, and what it is for. */
export type NameEntry = Omit<DictionaryEntry, 'ec' | 'source'>;

/** How a written name was recognised. */
export interface NameMatch {
  readonly entry: DictionaryEntry;
  readonly match: 'exact' | 'synonym' | 'respelt';
}

/** Name look-up used by the engine: pure, in memory. */
export interface Dictionary {
  readonly release: string;
  /** Exact or synonym match of a name (case, punctuation and slashed forms folded), with CAS as a second key; never a guess. */
  resolve(name: string, cas?: string): NameMatch | undefined;
  /** Up to `count` likely names for an unknown one, best first. */
  suggest(name: string, count?: number): readonly DictionaryEntry[];
}
