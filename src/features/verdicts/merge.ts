import type { Finding, Severity } from '#shared/engine/types.ts';
import { foldName } from '#shared/law/fold.ts';
import type { Market } from '#shared/law/types.ts';
import { sayDay } from '#src/lib/say.ts';

/** One point over all markets: the weightiest answer leads, each market keeps its own. */
export interface MergedFinding {
  readonly id: string;
  readonly severity: Severity;
  readonly lead: Finding;
  readonly markets: ReadonlyMap<Market, Finding>;
  /** Every citation once, in the order of the markets. */
  readonly citations: readonly string[];
}

export const SEVERITIES: readonly Severity[] = ['stop', 'decide', 'note'];
const rank = (severity: Severity) => SEVERITIES.indexOf(severity);

/** A rule's id without its market: `eu/annex-v/29` and `uk/annex-v/29` are one topic. */
function topicOf(rule: string): string {
  return rule.replace(/^(eu|uk|gb|us|ca)\//, '');
}

function identify(finding: Finding): string {
  const members = (finding.members ?? []).map(foldName).toSorted().join('+');
  return [finding.kind, foldName(finding.subject) || finding.subject, members, topicOf(finding.rule)].join('|');
}

/** Findings of several markets, the same points merged, what stops sale first. */
export function mergeFindings(results: readonly { readonly market: Market; readonly findings: readonly Finding[] }[]): MergedFinding[] {
  const merged = new Map<string, Map<Market, Finding>>();
  for (const { market, findings } of results) {
    const seen = new Map<string, number>();
    for (const finding of findings) {
      const base = identify(finding);
      // Two rows of one topic in one market stay two points.
      const count = seen.get(base) ?? 0;
      seen.set(base, count + 1);
      const id = count === 0 ? base : `${base}|${count}`;
      const markets = merged.get(id) ?? new Map<Market, Finding>();
      markets.set(market, finding);
      merged.set(id, markets);
    }
  }
  return [...merged]
    .map(([id, markets]): MergedFinding => {
      const lead = [...markets.values()].reduce((first, finding) => (rank(finding.severity) < rank(first.severity) ? finding : first));
      return { id, severity: lead.severity, lead, markets, citations: [...new Set([...markets.values()].map((finding) => finding.citation))] };
    })
    .toSorted((a, b) => rank(a.severity) - rank(b.severity));
}

export interface Counts {
  readonly stop: number;
  readonly decide: number;
  readonly note: number;
}
export function countFindings(findings: readonly Finding[]): Counts {
  const count = (severity: Severity) => findings.filter((finding) => finding.severity === severity).length;
  return { stop: count('stop'), decide: count('decide'), note: count('note') };
}

/** Four figures, more where it takes them to tell it from `other`: the exact ones stand in the arithmetic. */
function short(text: string, other = text): string {
  const value = Number(text);
  if (!Number.isFinite(value)) return text;
  for (let figures = 4; figures <= 15; figures++) {
    const said = String(Number(value.toPrecision(figures)));
    if (text === other || said !== String(Number(Number(other).toPrecision(figures)))) return said;
  }
  return text;
}

/** What stands in a market's column: a figure or a word, and what it is measured against. */
export function cellWords(finding: Finding): { readonly figure: string; readonly against: string } {
  const unit = finding.unit ?? '%';
  const range = finding.measuredRange;
  const say = (text: string) => short(text, finding.limit);
  const measured = range && range.min !== range.max ? `${say(range.min)} to ${say(range.max)} ${unit}` : finding.measured !== undefined ? `${say(finding.measured)} ${unit}` : '';
  const limit = finding.limit !== undefined ? `${short(finding.limit)} ${unit}` : '';
  switch (finding.kind) {
    case 'sum-mismatch':
      return { figure: measured, against: limit ? `expected ${limit}` : '' };
    case 'order-uncertain':
      return { figure: 'either order', against: 'the range allows both' };
    case 'zone-uncertain':
      return { figure: measured, against: 'around 1 %' };
    case 'composition-incomplete':
      return { figure: measured, against: 'of 100 %' };
    case 'wording-required':
      return { figure: 'to print', against: finding.certainty === 'possible' ? 'perhaps' : '' };
    case 'particular-missing':
    case 'wording-missing':
      return { figure: 'missing', against: '' };
    case 'upcoming':
      return { figure: finding.effective ? `from ${sayDay(finding.effective.from)}` : 'later', against: measured };
    case 'date-not-covered':
      return { figure: 'not covered', against: '' };
    case 'particular-uncertain':
      return { figure: measured || 'open', against: limit ? `against ${limit}` : 'cannot tell' };
    case 'prohibited':
      return { figure: measured || 'present', against: 'prohibited' };
    default:
      return { figure: measured || { stop: 'stops sale', decide: 'open', note: 'note' }[finding.severity], against: limit ? `limit ${limit}${finding.basis ? ` ${finding.basis}` : ''}` : '' };
  }
}

const MARKET_WORDS: Readonly<Record<Market, string>> = { EU: 'the EU', UK: 'Great Britain', US: 'the US', CA: 'Canada' };

/** Market names as they stand in a sentence: `the EU, Great Britain or Canada`. */
export function sayMarkets(markets: readonly Market[], joint: 'and' | 'or'): string {
  const words = markets.map((market) => MARKET_WORDS[market]);
  return words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} ${joint} ${words.at(-1)}`;
}

/** The answer in two sentences: where it must not be sold, and where nothing was found broken. */
export function summarise(counts: ReadonlyMap<Market, Counts>, release: string): { readonly first: string; readonly second: string } {
  const markets = [...counts.keys()];
  const stopped = markets.filter((market) => counts.get(market)!.stop > 0);
  const clear = markets.filter((market) => counts.get(market)!.stop === 0);
  const waiting = Math.max(0, ...clear.map((market) => counts.get(market)!.decide));
  const rest = clear.length > 0 ? `No rule in data release ${release} is broken in ${sayMarkets(clear, 'or')}${waiting > 0 ? `; ${waiting === 1 ? 'one point waits' : `up to ${waiting} points wait`} for a decision.` : '.'}` : '';
  return stopped.length > 0
    ? { first: `Not to be sold as it stands in ${sayMarkets(stopped, 'or')}.`, second: rest }
    : { first: rest, second: 'Colophon advises; who places the product on the market answers for it.' };
}
