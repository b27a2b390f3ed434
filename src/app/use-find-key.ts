import { useEffect } from 'react';

/** Ctrl or ⌘ with K opens the palette from anywhere. */
export function useFindKey(onFind: () => void): void {
  useEffect(() => {
    const listen = (event: KeyboardEvent) => {
      if ((event.ctrlKey || event.metaKey) && !event.altKey && !event.shiftKey && event.key.toLowerCase() === 'k') {
        event.preventDefault();
        onFind();
      }
    };
    addEventListener('keydown', listen);
    return () => removeEventListener('keydown', listen);
  });
}
