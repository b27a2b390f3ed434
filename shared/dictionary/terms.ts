import { otherNames } from '#shared/dictionary/create-dictionary.ts';
import type { DictionaryEntry } from '#shared/dictionary/types.ts';
import { foldName } from '#shared/law/fold.ts';

export type TermKind = 'inci' | 'synonym' | 'common-name' | 'cas' | 'respelt';

/** One way to write an entry, as it is looked for. */
export interface Term {
  readonly term: string;
  /** Small letters, one space for every run of other marks: what letter groups are cut from. */
  readonly words: string;
  /** {@link foldName}; of a CAS number its digits. */
  readonly folded: string;
  readonly kind: TermKind;
}

/** Words of a name or a query: accents off, marks to single spaces. */
export function toWords(text: string): string {
  return text
    .toLowerCase()
    .normalize('NFKD')
    .replace(/\p{M}+/gu, '')
    .replace(/[^\p{L}\p{N}]+/gu, ' ')
    .trim();
}

/** Every term that leads to an entry, each folded form once, the INCI name first. */
export function termsOf(entry: DictionaryEntry): Term[] {
  const common = new Set(entry.commonNames);
  const terms: Term[] = [];
  const seen = new Set<string>();
  const add = (term: string, kind: TermKind) => {
    const folded = foldName(term);
    if (folded === '' || seen.has(folded)) return;
    seen.add(folded);
    terms.push({ term, words: toWords(term), folded, kind });
  };
  add(entry.inci, 'inci');
  for (const name of otherNames(entry)) add(name, common.has(name) ? 'common-name' : 'synonym');
  for (const name of entry.misspellings ?? []) add(name, 'respelt');
  for (const cas of entry.cas) add(cas, 'cas');
  return terms;
}
