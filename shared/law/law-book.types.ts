import type { PlainDate } from '#shared/kernel/plain-date.ts';
import type { AllergenGroup, Category } from './types.ts';

/** The law tables as the engine and the rules read them: parsed once, immutable. */
export interface LawBook {
  /** Release of the law data, as shown in results. */
  readonly release: string;
  readonly categories: ReadonlyMap<string, Category>;
  readonly allergenGroups: readonly AllergenGroup[];
  readonly coveredFrom: PlainDate;
  readonly coveredUntil: PlainDate;
}
