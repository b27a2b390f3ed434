import { useDeferredValue, useEffect, useMemo, useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { ingredientQueries } from './queries.ts';

export interface NameSaid {
  readonly kind: 'unknown' | 'other-name';
  /** Names to take instead, best first. */
  readonly take: readonly string[];
}

/** What the dictionary says of names as written; nothing for a name it prints as it stands. */
export function useKnownNames(names: readonly string[]): ReadonlyMap<string, NameSaid> {
  const asked = useSettled(useDeferredValue(names.join('\n')));
  const list = useMemo(() => [...new Set(asked.split('\n').map((name) => name.trim()).filter((name) => name.length > 1))], [asked]);
  const { data } = useQuery(ingredientQueries.resolve(list.map((name) => ({ name }))));
  return useMemo(() => {
    const said = new Map<string, NameSaid>();
    for (const item of data?.items ?? []) {
      if (item.match === 'unknown' || item.match === 'respelt') {
        const guesses = [item.entry, ...item.suggestions].flatMap((entry) => (entry ? [entry.inci] : []));
        said.set(item.name, { kind: 'unknown', take: [...new Set(guesses)].slice(0, 5) });
      } else if (item.entry && item.entry.inci !== item.name && item.match === 'synonym') {
        said.set(item.name, { kind: 'other-name', take: [item.entry.inci] });
      }
    }
    return said;
  }, [data]);
}

/** The value once it has stood still: names are judged when they are written, not while. */
function useSettled(value: string, ms = 350): string {
  const [settled, setSettled] = useState(value);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(value), ms);
    return () => clearTimeout(timer);
  }, [value, ms]);
  return settled;
}
