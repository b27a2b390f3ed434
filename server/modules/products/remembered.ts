/**
 * Remembers what was worked out for a state that its key tells in full; the oldest goes first.
 * The memory is per server and may be lost.
 */
export function createMemory<T extends object>(most: number): (key: string, work: () => T) => T {
  const kept = new Map<string, T>();
  return (key, work) => {
    let found = kept.get(key);
    if (!found) {
      found = work();
      if (kept.size >= most) kept.delete(kept.keys().next().value ?? '');
      kept.set(key, found);
    }
    return found;
  };
}
