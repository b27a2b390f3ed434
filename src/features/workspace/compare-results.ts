import type { MarketAssessment } from '#shared/engine/assessment.ts';
import type { Finding } from '#shared/engine/types.ts';
import { pointOf } from './law-days.ts';

/** What one judgement says that another did not. */
export interface ResultChange {
  /** Points that are new, and such as are gone. */
  readonly added: readonly Finding[];
  readonly removed: readonly Finding[];
  /** Names that the printed list then holds, or no longer holds; both empty where it only moves. */
  readonly list: { readonly added: readonly string[]; readonly removed: readonly string[]; readonly isChanged: boolean };
  /** Words that the label must then carry. */
  readonly wording: readonly string[];
}

/** `upcoming` tells of the same change beforehand; a day that the tables do not cover is none of the law's. */
const isOfTheDay = ({ kind }: Finding): boolean => kind !== 'upcoming' && kind !== 'date-not-covered' && kind !== 'wording-required';

/** What changes from one judgement to another; `undefined` where nothing does. */
export function compareResults(before: MarketAssessment, on: MarketAssessment): ResultChange | undefined {
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
