import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Assessment } from '#shared/engine/assessment.ts';
import type { LawBook, LawChange } from '#shared/law/law-book.ts';
import type { Market } from '#shared/law/types.ts';
import { compareResults, type ResultChange } from '#src/features/workspace/compare-results.ts';
import { daysAround } from '#src/features/workspace/law-days.ts';
import type { AssessInput } from '#src/features/workspace/engine.ts';

/** What one dated change of the law does to one product. */
export interface Effect extends ResultChange {
  /** Of the change: its id, market and day. */
  readonly step: string;
  readonly market: Market;
  readonly date: string;
  /** The days for which the product was judged: where its verdicts can be looked at. */
  readonly asOf: { readonly placed: string; readonly available: string };
}

export const stepOf = (change: Pick<LawChange, 'id' | 'market' | 'date'>): string => `${change.id}|${change.market}|${change.date}`;

type Judge = (document: FormulaDocument, input: AssessInput) => Assessment;
interface Span {
  readonly since: string;
  readonly until: string;
  readonly today: string;
  readonly signal: AbortSignal;
}

/**
 * What the dated changes of the law do to a product, by judging it on the day before and on
 * the day: nothing is guessed from titles. Yields to the page between changes.
 */
export async function findEffects(judge: Judge, document: FormulaDocument, law: LawBook, { since, until, today, signal }: Span): Promise<Effect[]> {
  const { markets } = document.product;
  const effects: Effect[] = [];
  for (const change of law.changes) {
    if (!markets.includes(change.market) || change.date < since || change.date >= until) continue;
    await new Promise((resolve) => setTimeout(resolve, 0));
    signal.throwIfAborted();
    const { before, on } = daysAround(change, law.changes);
    const at = (days: typeof on) => judge(document, { markets: [change.market], ...days, today }).results[0]!;
    const effect = compareResults(at(before), at(on));
    if (effect) effects.push({ ...effect, step: stepOf(change), market: change.market, date: change.date, asOf: on });
  }
  return effects;
}
