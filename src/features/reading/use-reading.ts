import { useDeferredValue, useMemo } from 'react';
import type { Dictionary } from '#shared/dictionary/types.ts';
import { plainDate } from '#shared/kernel/plain-date.ts';
import type { LawBook } from '#shared/law/law-book.ts';
import type { Category, Market } from '#shared/law/types.ts';
import { readList, type Reading } from '#shared/reading/read-list.ts';

export interface Asked {
  readonly text: string;
  readonly market: Market;
  readonly category: Category;
  readonly day: string;
}

/** Reads the list as it is typed; typing itself never waits. `null` where nothing stands there yet. */
export function useReading({ text, market, category, day }: Asked, law: LawBook, dictionary: Dictionary): { reading: Reading | null; isBehind: boolean } {
  const settled = useDeferredValue(text);
  const reading = useMemo(
    () => (settled.trim() === '' ? null : readList(settled, { market, category, law, dictionary, placedOnMarket: plainDate(day), availableOn: plainDate(day) })),
    [settled, market, category, day, law, dictionary],
  );
  return { reading, isBehind: settled !== text };
}
