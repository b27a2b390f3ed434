import { useSyncExternalStore } from 'react';

/** As labels.css: below this the settings stand under the label. */
const NARROW = '(max-width: 1080px)';

function subscribe(listener: () => void): () => void {
  const query = globalThis.matchMedia?.(NARROW);
  query?.addEventListener('change', listener);
  return () => query?.removeEventListener('change', listener);
}

/** Whether the studio's settings stand under the label instead of beside it. */
export function useIsNarrow(): boolean {
  return useSyncExternalStore(subscribe, () => globalThis.matchMedia?.(NARROW).matches ?? false, () => false);
}
