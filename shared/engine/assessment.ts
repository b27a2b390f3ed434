import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { PlainDate } from '#shared/kernel/plain-date.ts';
import type { Rational } from '#shared/kernel/rational.ts';
import type { Exposure, Market } from '#shared/law/types.ts';
import type { AllergenVerdict } from './allergens.ts';
import type { Blend } from './blend.ts';
import type { CompositionState, Way } from './prepare-material.ts';
import type { Finding, Interval, RequiredWording } from './types.ts';

/** One material's part in an entry: enough to show the sum. All shares in percent. */
export interface EntrySource {
  readonly materialId: string;
  readonly tradeName: string;
  /** Indices into `/formula/lines`. */
  readonly lines: readonly number[];
  /** Of the material in the batch, in grams. */
  readonly mass: Rational;
  /** The material's share of the product. */
  readonly materialShare: Rational;
  /** The substance's share of the material. */
  readonly ofMaterial: Interval;
  /** The substance's share of the product through this material. */
  readonly share: Interval;
  readonly names: readonly string[];
  readonly ways: readonly Way[];
}

export type Zone = 'ordered' | 'free' | 'allergen' | 'colourant' | 'may-contain';

/** One printed name of the list, with what it rests on. */
export interface DeclarationEntry {
  /** As printed in this market. */
  readonly name: string;
  readonly inci: string;
  readonly zone: Zone;
  readonly share: Interval;
  readonly sources: readonly EntrySource[];
  readonly certainty?: 'certain' | 'possible' | undefined;
  /** INCI names printed together under this one. */
  readonly members?: readonly string[] | undefined;
  /** Why this name and this place, a sentence each. */
  readonly why: readonly string[];
  readonly citation: string;
  /** The range lies on both sides of the line between the ordered and the free part. */
  readonly straddles: boolean;
  /** Substance keys in the blend; empty for shades that the formula itself does not hold. */
  readonly keys: readonly string[];
  /** Each material's usual share as text, largest first: `sources` without the sums behind them. */
  readonly shares: readonly SourceShare[];
}

/** What one material brings to an entry, in percent as an exact decimal text. */
export interface SourceShare {
  readonly material: string;
  readonly share: string;
}

/** Two neighbours whose order some allowed composition turns round. */
export interface UncertainPair {
  readonly first: DeclarationEntry;
  readonly second: DeclarationEntry;
  /** Where both ranges lie. */
  readonly overlap: { readonly min: Rational; readonly max: Rational };
  /** How far the second can lead the first, in percent. */
  readonly byAtMost: Rational;
}

export interface Declaration {
  readonly heading: string;
  readonly text: string;
  readonly entries: readonly DeclarationEntry[];
  readonly uncertainPairs: readonly UncertainPair[];
  /** `below 1 %` or `1 % or less`. */
  readonly freeLine: string;
  readonly citation: string;
}

/** The largest share a line could take without a finding that is not there today. */
export interface HeadroomLine {
  readonly line: number;
  /** In percent; `null` where nothing bounds it. */
  readonly max: string | null;
  readonly limitedBy: string | null;
}

/** The product judged in one market on two days. */
export interface MarketAssessment {
  readonly market: Market;
  readonly placedOnMarket: PlainDate;
  readonly availableOn: PlainDate;
  readonly exposure: Exposure;
  readonly declaration: Declaration;
  readonly allergens: readonly AllergenVerdict[];
  readonly findings: readonly Finding[];
  readonly requiredWording: readonly RequiredWording[];
  /** Conditions of the law that nothing entered can decide, a sentence each with its subject and citation. */
  readonly notChecked: readonly string[];
  /** Worked out on the first call. */
  headroom(): readonly HeadroomLine[];
}

/** One line of the formula, weighed. */
export interface LineShare {
  readonly line: number;
  readonly materialId: string;
  /** In grams. */
  readonly mass: Rational;
  /** In percent of the sum of all lines. */
  readonly share: Rational;
  readonly isMadeUp: boolean;
}

/** How a material's composition adds up. */
export interface CompositionVerdict {
  readonly materialId: string;
  readonly state: CompositionState;
  readonly typicalSum: Rational;
}

/** A formula document judged in all its markets: exact figures for screens, reports and the result document. */
export interface Assessment {
  readonly document: FormulaDocument;
  readonly dataRelease: string;
  /** In grams. */
  readonly totalMass: Rational;
  readonly lines: readonly LineShare[];
  readonly compositions: readonly CompositionVerdict[];
  readonly blend: Blend;
  readonly results: readonly MarketAssessment[];
}
