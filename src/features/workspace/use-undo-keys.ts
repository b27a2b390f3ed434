import { useEffect } from 'react';

interface Steps {
  undo(): void;
  redo(): void;
}

/** Ctrl or ⌘ Z takes back, with Shift (or Ctrl Y) does again; fields of a dialog keep their own undo. */
export function useUndoKeys({ undo, redo }: Steps): void {
  useEffect(() => {
    const handle = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey) return;
      if ((event.target as Element | null)?.closest?.('[role="dialog"], [role="alertdialog"]')) return;
      const key = event.key.toLowerCase();
      if (key !== 'z' && key !== 'y') return;
      event.preventDefault();
      if (key === 'y' || event.shiftKey) redo();
      else undo();
    };
    addEventListener('keydown', handle);
    return () => removeEventListener('keydown', handle);
  });
}
