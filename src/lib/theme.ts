import { useCallback, useSyncExternalStore } from 'react';

export type Theme = 'light' | 'dark';
const KEY = 'colophon.theme';
const listeners = new Set<() => void>();
const system = (): MediaQueryList | null => (typeof matchMedia === 'function' ? matchMedia('(prefers-color-scheme: dark)') : null);

function current(): Theme {
  const chosen = document.documentElement.dataset.theme;
  if (chosen === 'light' || chosen === 'dark') return chosen;
  return system()?.matches ? 'dark' : 'light';
}

/** Puts back the theme chosen on this computer; without one the system decides. */
export function restoreTheme(): void {
  try {
    const kept = localStorage.getItem(KEY);
    if (kept === 'light' || kept === 'dark') document.documentElement.dataset.theme = kept;
  } catch {
    // Storage is shut: the system decides.
  }
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  const query = system();
  query?.addEventListener('change', listener);
  return () => {
    listeners.delete(listener);
    query?.removeEventListener('change', listener);
  };
}

/** The theme in force, and how to turn it. Turning to the system's own forgets the choice. */
export function useTheme(): { theme: Theme; turn: () => void } {
  const theme = useSyncExternalStore(subscribe, current, () => 'light' as const);
  const turn = useCallback(() => {
    const next: Theme = current() === 'dark' ? 'light' : 'dark';
    document.documentElement.dataset.theme = next;
    try {
      localStorage.setItem(KEY, next);
    } catch {
      // Not remembered, still turned.
    }
    listeners.forEach((listener) => listener());
  }, []);
  return { theme, turn };
}
