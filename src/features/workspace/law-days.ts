import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Assessment } from '#shared/engine/assessment.ts';
import type { Finding } from '#shared/engine/types.ts';
import type { LawBook, LawChange } from '#shared/law/law-book.ts';
import type { Market } from '#shared/law/types.ts';
import type { AssessInput } from './engine.ts';

/** A day on which something changes for this very product in one market. */
export interface ProductLawDay {
  readonly date: string;
  readonly words: string;
}

type Judge = (document: FormulaDocument, input: AssessInput) => Assessment;

function dayBefore(day: string): string {
  return new Date(Date.parse(`${day}T00:00:00Z`) - 86_400_000).toISOString().slice(0, 10);
}

/** The days on which a product is judged to see what a change does to it. */
export interface DaysAround {
  readonly before: { readonly placed: string; readonly available: string };
  readonly on: { readonly placed: string; readonly available: string };
  /** The first day of the same change, where this is its second. */
  readonly begun?: string;
}

/** The day before a change and the day of it. What is still on the shelf is judged as first sold before the change began. */
export function daysAround(change: LawChange, changes: readonly LawChange[]): DaysAround {
  const begun = change.kind === 'available' ? changes.find((other) => other.id === change.id && other.market === change.market && other.kind === 'placed' && other.date < change.date) : undefined;
  const at = (day: string) => ({ placed: begun ? dayBefore(begun.date) : day, available: day });
  return { before: at(dayBefore(change.date)), on: at(change.date), ...(begun && { begun: begun.date }) };
}

/** What tells a point from others on another day. */
export function pointOf({ kind, subject, rule, limit }: Finding): string {
  return [kind, subject, rule, limit ?? ''].join('|');
}

/** What a person would notice: the printed list, the verdicts and the wording. */
function impression(assessment: Assessment): string {
  const result = assessment.results[0]!;
  const findings = result.findings.filter((finding) => finding.kind !== 'upcoming').map(pointOf);
  return JSON.stringify([result.declaration.text, findings.toSorted(), result.requiredWording.map((wording) => wording.text).toSorted()]);
}

/**
 * The changes of the law that touch this product, found by judging it on the day before and on
 * the day: nothing is guessed from titles. Changes for what is still on the shelf are judged
 * for a batch first sold before the change began. Yields to the page between changes.
 */
export async function findLawDays(judge: Judge, document: FormulaDocument, market: Market, law: LawBook, options: { since: string; today: string; signal: AbortSignal }): Promise<ProductLawDay[]> {
  const changes = law.changes.filter((change) => change.market === market && change.date >= options.since);
  const found: ProductLawDay[] = [];
  for (const change of changes) {
    await new Promise((resolve) => setTimeout(resolve, 0));
    if (options.signal.aborted) return [];
    const { before, on, begun } = daysAround(change, law.changes);
    const seen = (days: DaysAround['on']) => impression(judge(document, { markets: [market], ...days, today: options.today }));
    if (seen(before) === seen(on)) continue;
    const isSecond = begun !== undefined;
    const follows = isSecond && found.some((day) => day.date === begun && day.words === change.title);
    found.push({ date: change.date, words: follows ? 'and on all that is still sold' : isSecond ? `${change.title}, on all that is still sold` : change.title });
  }
  const byDate = new Map<string, string>();
  for (const { date, words } of found) byDate.set(date, byDate.has(date) ? `${byDate.get(date)}; ${words}` : words);
  return [...byDate].map(([date, words]) => ({ date, words })).toSorted((a, b) => (a.date < b.date ? -1 : 1));
}
