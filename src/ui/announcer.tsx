import { useSyncExternalStore } from 'react';

let said = '';
const listeners = new Set<() => void>();

/** Says a sentence to those who listen to the page; the same sentence twice is said twice. */
export function announce(sentence: string): void {
  said = said === sentence ? `${sentence}\u00a0` : sentence;
  listeners.forEach((listener) => listener());
}

/** The one live region of the page. */
export function Announcer() {
  const words = useSyncExternalStore(
    (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    () => said,
    () => '',
  );
  return <div className="sr-only" role="status" aria-live="polite">{words}</div>;
}
