import type { LawBook } from '#shared/law/law-book.ts';
import type { Finding } from './types.ts';

interface Asked {
  readonly placedOnMarket: string;
  readonly availableOn: string;
}

/**
 * `date-not-covered`: a day outside those whose law the tables hold. The verdicts beside it are
 * those of the nearest day that is covered, and say nothing of what was or will be changed beyond.
 */
export function judgeDays(asked: Asked, law: Pick<LawBook, 'coveredFrom' | 'coveredUntil' | 'release'>): Finding[] {
  const days = [...new Set([asked.placedOnMarket, asked.availableOn])];
  return days.flatMap((day): Finding[] => {
    const words = sayBeyond(day, law);
    if (words === undefined) return [];
    return [{
      kind: 'date-not-covered', severity: 'decide', rule: 'day-covered', subject: day, citation: `Data release ${law.release}`, certainty: 'certain',
      message: words, remedy: `Choose a day from ${law.coveredFrom} to ${law.coveredUntil}, or check what the law says on ${day} yourself.`,
      effective: { from: law.coveredFrom, to: law.coveredUntil },
    }];
  });
}

/** Why nothing is said for a day, in a sentence; `undefined` where the tables cover it. */
export function sayBeyond(day: string, law: Pick<LawBook, 'coveredFrom' | 'coveredUntil' | 'release'>): string | undefined {
  if (day < law.coveredFrom) return `The law tables begin on ${law.coveredFrom}; what bound on ${day} is not known to them.`;
  if (day > law.coveredUntil) return `The law tables of release ${law.release} know of no change after ${law.coveredUntil}; what will bind on ${day} is not guessed.`;
  return undefined;
}
