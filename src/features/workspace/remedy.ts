import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import type { MarketAssessment } from '#shared/engine/assessment.ts';
import type { Finding } from '#shared/engine/types.ts';
import { divide, multiply, parseDecimal, subtract, type Rational } from '#shared/kernel/rational.ts';
import type { EntryView, MarketView } from './view.ts';
import { keysOfFinding } from './view.ts';

/** Grams of one line that keep a limit: tried by the engine before it is offered. */
export interface AmountRemedy {
  readonly lineId: string;
  readonly materialId: string;
  readonly grams: string;
}

/** Rounded down to a hundredth of a gram, which a small house's scale shows. */
function downToHundredths(value: Rational): string {
  const hundredths = (value.n * 100n) / value.d;
  const digits = hundredths.toString().padStart(3, '0');
  return `${digits.slice(0, -2)}.${digits.slice(-2)}`.replace(/\.?0+$/, '');
}

const same = (a: Finding, b: Finding) => a.kind === b.kind && a.subject === b.subject && a.rule === b.rule;

/**
 * For a limit that is exceeded: how many grams of the line that brings most of it would keep
 * the limit, with everything else as it is. `null` where no single amount does.
 */
export function findAmountRemedy(finding: Finding, draft: ProductDraft, view: MarketView, tryWith: (draft: ProductDraft) => MarketAssessment): AmountRemedy | null {
  if (finding.kind !== 'limit-exceeded' || finding.measured === undefined || finding.limit === undefined) return null;
  const measured = parseDecimal(finding.measured);
  const limit = parseDecimal(finding.limit);
  if (!measured || !limit || measured.n <= 0n) return null;
  const keys = new Set(keysOfFinding(finding, view.entries));
  const entry = view.entries.find((each) => keys.has(each.key));
  const part = entry && greatestPart(entry);
  const line = part && draft.formula.phases.flatMap((phase) => phase.lines)[part.line];
  const now = line && line.unit === 'g' ? parseDecimal(line.amount) : null;
  if (!entry || !part || !line || !now) return null;
  // Others bring `rest`; this line may bring what is left of the limit.
  const share = part.share / entry.typical;
  const own = multiply(measured, { n: BigInt(Math.round(share * 1e9)), d: 1_000_000_000n });
  const left = subtract(limit, subtract(measured, own));
  if (left.n <= 0n || own.n <= 0n) return null;
  const grams = downToHundredths(divide(multiply(now, left), own));
  if (grams === '0') return null;
  const changed: ProductDraft = {
    ...draft,
    formula: { ...draft.formula, phases: draft.formula.phases.map((phase) => ({ ...phase, lines: phase.lines.map((each) => (each.id === line.id ? { ...each, amount: grams } : each)) })) },
  };
  const settled = !tryWith(changed).findings.some((each) => same(each, finding));
  return settled ? { lineId: line.id, materialId: line.materialId, grams } : null;
}

function greatestPart(entry: EntryView) {
  return entry.parts.toSorted((a, b) => b.share - a.share)[0];
}
