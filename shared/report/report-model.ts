import type { Severity } from '#shared/engine/types.ts';
import type { Market } from '#shared/law/types.ts';

/** A finding told once for all the markets that make it. */
export interface MergedFinding {
  readonly severity: Severity;
  readonly kind: string;
  readonly rule: string;
  readonly subject: string;
  readonly markets: readonly Market[];
  /** What to do; the headline. */
  readonly act: string;
  readonly why: string;
  readonly arithmetic: readonly string[];
  readonly citations: readonly string[];
  /** Set where the row rests on a secondary source or on memory. */
  readonly sourcing?: 'secondary' | 'memory';
  readonly reading?: string;
}

export interface LadderRow {
  readonly name: string;
  /** Shares in percent as exact decimals. */
  readonly min: string;
  readonly typical: string;
  readonly max: string;
  readonly zone: 'ordered' | 'free' | 'allergen' | 'colourant' | 'unnamed';
  readonly isUncertain: boolean;
}

/** The report as plain data: the PDF and the screen paint the same model. */
export interface ReportModel {
  readonly house: string;
  readonly name: string;
  readonly function: string;
  readonly subtitle: string;
  readonly markets: readonly Market[];
  readonly counts: Readonly<Record<Severity, number>>;
  readonly finding: string;
  readonly declarations: readonly { readonly label: string; readonly heading: string; /** Each is kept whole when lines are broken. */ readonly names: readonly string[]; readonly text: string }[];
  readonly requiredWording: readonly { readonly market: Market; readonly text: string; readonly lang: string; readonly citation: string; readonly isOfficialText: boolean }[];
  readonly verdicts: Readonly<Record<Severity, readonly MergedFinding[]>>;
  /** Absent where exact shares are withheld. */
  readonly ladder?: {
    readonly market: Market;
    readonly note: string;
    readonly rows: readonly LadderRow[];
    readonly freeBelow: string;
    readonly allergenLine: { readonly at: string; readonly label: string } | null;
  };
  readonly formula: {
    readonly basis: string;
    readonly isExact: boolean;
    readonly phases: readonly { readonly name: string; readonly lines: readonly { readonly name: string; readonly note: string; readonly grams: string; readonly percent: string }[] }[];
    readonly total: { readonly grams: string; readonly percent: string };
  };
  readonly particulars: readonly { readonly name: string; readonly value: string; readonly rule: string }[];
  readonly notChecked: readonly string[];
  readonly cautions: readonly string[];
  readonly dataRelease: string;
  readonly lawReadOn: string;
}

/** The weigh-out sheet as plain data; masses in grams as printed. */
export interface WeighOutModel {
  readonly house: string;
  readonly name: string;
  readonly function: string;
  readonly batchCode: string;
  readonly size: string;
  readonly phases: readonly {
    readonly letter: string;
    readonly name: string;
    readonly lines: readonly { readonly name: string; readonly target: string; readonly from: string; readonly to: string; readonly caution: string }[];
    readonly total: string;
    readonly steps: readonly { readonly text: string; readonly temperature: string; readonly unit: 'C' | 'F' | null }[];
  }[];
  readonly sum: string;
  /** How the make-up line was worked out; empty where there is none. */
  readonly makesUp: string;
  readonly cautions: readonly string[];
  readonly dataRelease: string;
}
