import { useCallback, useMemo } from 'react';

/** Work not yet saved, kept on this computer so that a reload or a lost connection loses nothing. */
export interface Draft<T> {
  /** The version that was on screen when the work began; 0 for something new. */
  readonly baseVersion: number;
  /** When it was last kept, as an instant. */
  readonly keptAt: string;
  readonly value: T;
}

const PREFIX = 'colophon.draft.';
const keyOf = (houseId: string, kind: string, id: string): string => `${PREFIX}${houseId}.${kind}.${id}`;

export interface DraftStore<T> {
  read(): Draft<T> | null;
  /** False where the browser keeps nothing (storage full or shut). */
  keep(value: T, baseVersion: number): boolean;
  clear(): void;
}

/** The draft of one thing of one house. What is read back is judged by `isValue`. */
export function draftStore<T>(houseId: string, kind: string, id: string, isValue: (value: unknown) => value is T): DraftStore<T> {
  const key = keyOf(houseId, kind, id);
  return {
    read() {
      try {
        const draft = JSON.parse(localStorage.getItem(key) ?? 'null') as Draft<unknown> | null;
        return draft && typeof draft.baseVersion === 'number' && isValue(draft.value) ? (draft as Draft<T>) : null;
      } catch {
        return null;
      }
    },
    keep(value, baseVersion) {
      try {
        localStorage.setItem(key, JSON.stringify({ baseVersion, keptAt: new Date().toISOString(), value } satisfies Draft<T>));
        return true;
      } catch {
        return false;
      }
    },
    clear() {
      try {
        localStorage.removeItem(key);
      } catch {
        // Storage is shut: then nothing was kept either.
      }
    },
  };
}

/** As {@link draftStore}, stable across renders. */
export function useDraftStore<T>(houseId: string, kind: string, id: string, isValue: (value: unknown) => value is T): DraftStore<T> {
  const judge = useCallback((value: unknown): value is T => isValue(value), [isValue]);
  return useMemo(() => draftStore(houseId, kind, id, judge), [houseId, kind, id, judge]);
}
