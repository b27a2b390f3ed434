import type { Category, Condition, Market, Member, Provision, RowList, Sourcing } from './types.ts';

/** The law tables as they stand in data/: compact, with what rows have in common at the head of each file. */

export interface InstrumentJson {
  readonly id: string;
  readonly title: string;
  /** As cited: `Regulation (EC) No 1223/2009`. */
  readonly short: string;
  readonly markets: readonly Market[];
  readonly link: string;
  /** The text read, and when. */
  readonly state: string;
  readonly sourcing: Sourcing;
  /** How the same text is cited, and how firmly it is sourced, where another market took it over. */
  readonly elsewhere?: Partial<Record<Market, { readonly short: string; readonly sourcing: Sourcing; readonly note: string }>>;
}

export interface DatesJson {
  readonly placed?: string;
  readonly available: string;
}

export type ProvisionJson = Omit<Provision, 'from' | 'until' | 'letter'> & {
  readonly letter?: string;
  readonly from?: DatesJson;
  readonly until?: DatesJson;
};

/** A row; `names` and `cas` are short for one member that they all name. */
export interface RowJson {
  readonly id?: string;
  readonly entry: string;
  readonly title: string;
  readonly members?: readonly Member[];
  readonly names?: readonly string[];
  readonly cas?: readonly string[];
  readonly sharedCas?: readonly string[];
  readonly together?: 'each' | 'sum' | 'ratios';
  readonly provisions?: readonly ProvisionJson[];
  readonly onlyListedUses?: boolean;
  readonly markets?: readonly Market[];
  readonly from?: DatesJson;
  readonly until?: DatesJson;
  readonly sourcing?: Sourcing;
  readonly citation?: string;
  readonly otherUses?: boolean;
  readonly covers?: 'nano' | 'both';
}

/** One file of rows of one list. `{entry}` in the citation and id stands for the entry's number. */
export interface RowFileJson {
  readonly list: RowList;
  readonly instrument: string;
  readonly citation: string;
  readonly id: string;
  readonly markets: readonly Market[];
  readonly sourcing: Sourcing;
  readonly onlyListedUses?: boolean;
  readonly rows: readonly RowJson[];
}

export interface AllergenFileJson {
  readonly citation: string;
  readonly leaveOn: string;
  readonly rinseOff: string;
  readonly markets: readonly {
    readonly market: Market;
    readonly olderFrom: DatesJson;
    readonly newerFrom?: DatesJson;
    readonly sourcing: Sourcing;
    readonly citation: string;
  }[];
  readonly groups: readonly {
    readonly id: string;
    readonly entry: string;
    readonly label: string;
    readonly prescribesName: boolean;
    /** On the list before Regulation (EU) 2023/1545. */
    readonly older: boolean;
    readonly members: readonly Member[];
    readonly reading?: string;
  }[];
}

/** A text that a rule wants on the label. */
export interface WordingJson {
  readonly id: string;
  /** Language to text. */
  readonly text: Readonly<Record<string, string>>;
  /** Languages whose text is not read from the act in force and needs checking. */
  readonly unchecked?: readonly string[];
  /** True where no text is held in any language: what stands here says where to take it. */
  readonly pointer?: true;
  readonly citation: string;
  readonly place?: 'principal-panel' | 'label';
}

/** A warning that a kind of product carries, whatever its substances. */
export interface ProductWarningJson {
  readonly id: string;
  readonly instrument: string;
  readonly market: Market;
  readonly citation: string;
  readonly subject: string;
  readonly where: Condition;
  readonly wording: string;
  readonly sourcing: Sourcing;
  readonly from?: DatesJson;
  readonly until?: DatesJson;
  readonly reading?: string;
  /** Silent, instead of asking, where its condition cannot be answered: another warning asks for the same fact. */
  readonly onlyWhenKnown?: boolean;
}

/** A condition on the product as a whole, whatever its substances. */
export interface ProductConditionJson {
  readonly id: string;
  readonly instrument: string;
  readonly market: Market;
  readonly citation: string;
  readonly sourcing: Sourcing;
  readonly subject: string;
  readonly where: Condition;
  /** What must hold. */
  readonly requires: Condition;
  readonly words: string;
  readonly remedy: string;
}

/** A duty of a market that nothing entered decides, and why. */
export interface DutyJson {
  readonly id: string;
  readonly market: Market;
  readonly instrument: string;
  readonly citation: string;
  readonly sourcing: Sourcing;
  readonly subject: string;
  /** The duty in our own words. */
  readonly says: string;
  /** Why it is not computed here. */
  readonly because: string;
  /** For which products; absent: all. */
  readonly where?: Condition;
  readonly from?: DatesJson;
  /** Told in the report's list of what was not checked; the others are kept for the record. */
  readonly onReport?: boolean;
}

/** A row of Canada's schedule of names: the EU technical name, or the INCI name with its French equivalent, or all three. */
export interface ScheduleNameJson {
  readonly item: string;
  readonly eu: string;
  readonly inci: string;
  readonly fr: string;
}

/** A change of law with its dates, as a calendar shows it. */
export interface ChangeJson {
  readonly id: string;
  readonly title: string;
  readonly market: Market;
  readonly citation: string;
  readonly placed?: string;
  readonly available: string;
  readonly what: string;
}

/** A US colour additive as listed for cosmetics. */
export interface UsColourJson {
  readonly name: string;
  readonly fullName: string;
  readonly ci: readonly string[];
  readonly otherNames?: readonly string[];
  readonly cfr: string;
  /** Must come from an FDA-certified batch. */
  readonly certified: boolean;
  readonly eye: 'yes' | 'no' | 'listed' | 'lashes';
  readonly lips: 'yes' | 'no' | 'listed';
  readonly external: 'yes' | 'no' | 'listed';
  /** Category tags where the listing names products. */
  readonly only?: readonly string[];
  readonly lipMax?: string;
  readonly max?: string;
  readonly lake: boolean;
  readonly lakeEye?: boolean;
  readonly words?: string;
  readonly permitted?: false;
  readonly sourcing: Sourcing;
  readonly from?: DatesJson;
}

/** Preservatives that release formaldehyde, with the greatest release that their molar mass allows. */
export interface FormaldehydeJson {
  readonly citation: string;
  readonly sourcing: Sourcing;
  readonly note: string;
  readonly rules: readonly {
    readonly id: string;
    readonly market: Market;
    /** Strictly above this share of released formaldehyde, in percent. */
    readonly threshold: string;
    readonly wording: string;
    readonly citation: string;
    readonly from?: DatesJson;
    readonly until?: DatesJson;
  }[];
  readonly members: readonly (Member & { readonly entry: string })[];
}

export interface LawTables {
  readonly release: { readonly release: string; readonly readOn: string; readonly coveredFrom: string };
  readonly instruments: readonly InstrumentJson[];
  readonly categories: readonly Category[];
  readonly allergens: AllergenFileJson;
  readonly rows: readonly RowFileJson[];
  readonly wording: readonly WordingJson[];
  readonly warnings: readonly ProductWarningJson[];
  readonly changes: readonly ChangeJson[];
  readonly usColours: readonly UsColourJson[];
  readonly formaldehyde: FormaldehydeJson;
  readonly duties: readonly DutyJson[];
  readonly productConditions: readonly ProductConditionJson[];
  readonly canadianNames: { readonly names: readonly ScheduleNameJson[] };
}
