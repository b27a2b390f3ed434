import { useLayoutEffect } from 'react';
import type { RefObject } from 'react';
import { placeUnder } from './place-under.ts';

/**
 * Keeps a list hanging from the field it is written beside, while it is open: in the browser's top layer, above
 * dialogs and never cut by a scrolling table, and following the field when the page moves.
 */
export function useHungList(list: RefObject<HTMLElement | null>, isOpen: boolean): void {
  useLayoutEffect(() => {
    const floating = list.current;
    const anchor = floating?.parentElement?.querySelector('input');
    if (!isOpen || !floating || !anchor) return undefined;
    const place = () => placeUnder(floating, anchor);
    place();
    raise(floating);
    window.addEventListener('scroll', place, { capture: true, passive: true });
    window.addEventListener('resize', place);
    return () => {
      window.removeEventListener('scroll', place, { capture: true });
      window.removeEventListener('resize', place);
      floating.hidePopover?.();
    };
  }, [list, isOpen]);
}

/** Lifts it into the top layer, where there is one; else it stands where it is written. */
function raise(floating: HTMLElement): void {
  if (!('showPopover' in floating)) return;
  floating.popover = 'manual';
  floating.showPopover();
}
