import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Assessment, MarketAssessment } from '#shared/engine/assessment.ts';
import type { Finding } from '#shared/engine/types.ts';
import type { LawBook, LawChange } from '#shared/law/law-book.ts';
import type { Market } from '#shared/law/types.ts';
import { daysAround, pointOf } from '#src/features/workspace/law-days.ts';
import type { AssessInput } from '#src/features/workspace/engine.ts';

/** What one dated change of the law does to one product. */
export interface Effect {
  /** Of the change: its id, market and day. */
  readonly step: string;
  readonly market: Market;
  readonly date: string;
  /** Points that are there from that day on, and such as are gone. */
  readonly added: readonly Finding[];
  readonly removed: readonly Finding[];
  /** Names that the printed list then holds, or no longer holds; both empty where it only moves. */
  readonly list: { readonly added: readonly string[]; readonly removed: readonly string[]; readonly isChanged: boolean };
  /** Words that the label must then carry. */
  readonly wording: readonly string[];
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
    const effect = compare(at(before), at(on));
    if (effect) effects.push({ ...effect, step: stepOf(change), market: change.market, date: change.date, asOf: on });
  }
  return effects;
}

/** `upcoming` tells of the same change beforehand; a day that the tables do not cover is none of the law's. */
const isOfTheDay = ({ kind }: Finding): boolean => kind !== 'upcoming' && kind !== 'date-not-covered' && kind !== 'wording-required';

function compare(before: MarketAssessment, on: MarketAssessment): Pick<Effect, 'added' | 'removed' | 'list' | 'wording'> | undefined {
  const then = before.findings.filter(isOfTheDay);
  const now = on.findings.filter(isOfTheDay);
  const added = without(now, then, pointOf);
  const removed = without(then, now, pointOf);
  const [namesThen, namesNow] = [before, on].map((one) => one.declaration.entries.map(({ name }) => name)) as [string[], string[]];
  const same = (text: string) => text;
  const list = { added: without(namesNow, namesThen, same), removed: without(namesThen, namesNow, same), isChanged: before.declaration.text !== on.declaration.text };
  const wording = without(on.requiredWording.map(({ text }) => text), before.requiredWording.map(({ text }) => text), same);
  return added.length + removed.length + wording.length > 0 || list.isChanged ? { added, removed, list, wording } : undefined;
}

function without<T>(items: readonly T[], others: readonly T[], key: (item: T) => string): T[] {
  const known = new Set(others.map(key));
  return items.filter((item) => !known.has(key(item)));
}
