import type { Finding } from '#shared/engine/types.ts';
import type { Market } from '#shared/law/types.ts';
import type { MergedFinding } from './report-model.ts';

/** A finding as the engine gives it or as a result document carries it. */
export type ToldFinding = Omit<Finding, 'kind'> & { readonly kind: string };

/** The findings of one market. */
export interface MarketFindings {
  readonly market: Market;
  readonly findings: readonly ToldFinding[];
}

/** One point told once: findings of several markets that say the same are joined, citations kept in order. */
export function mergeFindings(results: readonly MarketFindings[]): MergedFinding[] {
  const merged = new Map<string, { -readonly [Key in keyof MergedFinding]: MergedFinding[Key] }>();
  for (const { market, findings } of results) {
    for (const finding of findings) {
      const key = [finding.severity, finding.kind, finding.subject, ...(finding.members ?? []), finding.remedy ?? '', finding.message].join('|');
      const known = merged.get(key);
      if (known) {
        if (!known.markets.includes(market)) known.markets = [...known.markets, market];
        if (!known.citations.includes(finding.citation)) known.citations = [...known.citations, finding.citation];
        continue;
      }
      merged.set(key, {
        severity: finding.severity,
        kind: finding.kind,
        rule: finding.rule,
        subject: finding.subject,
        markets: [market],
        act: shorten(finding.remedy ?? finding.message),
        why: finding.remedy ? shorten(finding.message) : '',
        arithmetic: [...(finding.arithmetic ?? []).map((step) => shorten(step.step ? `${step.step}: ${step.figure}` : step.figure)), ...(finding.suspects ?? []).map(slipInWords)],
        citations: [finding.citation],
        ...(finding.sourcing && { sourcing: finding.sourcing }),
        ...(finding.reading && { reading: finding.reading }),
      });
    }
  }
  return [...merged.values()];
}

/** Figures of more than six decimals are cut, and say so: the exact ones stand in the result document. */
function shorten(text: string): string {
  return text.replace(/(\d\.\d{6})\d+/g, '$1…');
}

function slipInWords({ line, written, perhaps, slip }: NonNullable<ToldFinding['suspects']>[number]): string {
  return `Line ${line + 1}: perhaps ${perhaps} for ${written}, ${slip === 'digits-exchanged' ? 'two figures exchanged' : 'the point shifted by one place'}`;
}

/** What a finding is about, without figures: for readers who are not to know the formula. */
const WITHOUT_FIGURES: Readonly<Record<string, string>> = {
  'sum-mismatch': 'The formula’s amounts do not add up.',
  'composition-incomplete': 'A material’s composition is not complete.',
  'unknown-ingredient': 'A name is not in the dictionary.',
  'order-uncertain': 'A supplier’s range leaves the order of two ingredients open.',
  'zone-uncertain': 'A supplier’s range leaves the side of the 1 % line open.',
  'limit-exceeded': 'A limit is exceeded.',
  'limit-uncertain': 'Whether a limit is kept rests on a range or on an answer still missing.',
};

/** The same findings with amounts, arithmetic and measured figures taken out. */
export function withholdFigures(findings: readonly MergedFinding[]): MergedFinding[] {
  return findings.map((finding) => {
    const plain = WITHOUT_FIGURES[finding.kind];
    return plain ? { ...finding, act: `${finding.subject}: ${plain}`, why: '', arithmetic: [] } : { ...finding, arithmetic: [] };
  });
}
