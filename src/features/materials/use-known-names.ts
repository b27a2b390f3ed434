import { useDeferredValue, useEffect, useMemo, useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { ingredientQueries } from './queries.ts';

export interface NameSaid {
  readonly kind: 'unknown' | 'other-name';
  /** Names to take instead, best first. */
  readonly take: readonly string[];
}

function useResolved(names: readonly string[]) {
  const asked = useSettled(useDeferredValue(names.join('\n')));
  const list = useMemo(() => [...new Set(asked.split('\n').map((name) => name.trim()).filter((name) => name.length > 1))], [asked]);
  return useQuery(ingredientQueries.resolve(list.map((name) => ({ name })))).data;
}

/** The dictionary's CAS number of each name that it knows, for names whose number is not written. */
export function useKnownNumbers(names: readonly string[]): ReadonlyMap<string, string> {
  const data = useResolved(names);
  return useMemo(() => new Map((data?.items ?? []).flatMap((item) => (item.match !== 'unknown' && item.match !== 'respelt' && item.entry?.cas[0] ? [[item.name, item.entry.cas[0]] as const] : []))), [data]);
}

/** What the dictionary says of names as written; nothing for a name it prints as it stands. */
export function useKnownNames(names: readonly string[]): ReadonlyMap<string, NameSaid> {
  const data = useResolved(names);
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
