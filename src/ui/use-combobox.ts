import { useState } from 'react';
import type { KeyboardEvent } from 'react';

export interface ComboboxKeys {
  readonly isOpen: boolean;
  /** The option the arrow keys stand on; -1 for the field itself. */
  readonly at: number;
  readonly open: () => void;
  readonly close: () => void;
  readonly onKeyDown: (event: KeyboardEvent<HTMLInputElement>) => void;
}

/**
 * The keys of an editable field with a list, after the ARIA practices: arrows walk the options
 * and come round, Enter and Tab take the one they stand on, Escape shuts the list and leaves the
 * text, Alt with an arrow opens and shuts it. Enter on the text itself shuts an open list.
 * Source: W3C, ARIA Authoring Practices Guide, combobox pattern.
 */
export function useCombobox(count: number, take: (index: number) => void): ComboboxKeys {
  const [isOpen, setOpen] = useState(false);
  const [stood, setStood] = useState(-1);
  const at = isOpen && stood < count ? stood : -1;
  const close = () => { setOpen(false); setStood(-1); };
  const open = () => { setOpen(true); setStood(-1); };
  const walk = (step: 1 | -1) => {
    if (!isOpen) setOpen(true);
    // From the field the first step down lands on the first, the first step up on the last.
    if (count > 0) setStood(at < 0 ? (step > 0 ? 0 : count - 1) : (at + step + count) % count);
  };
  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>) => {
    if (event.nativeEvent.isComposing || event.ctrlKey || event.metaKey) return;
    const { key, altKey } = event;
    if (key === 'ArrowDown' || key === 'ArrowUp') {
      event.preventDefault();
      if (!altKey) walk(key === 'ArrowDown' ? 1 : -1);
      else if (key === 'ArrowDown') open();
      else close();
    } else if (key === 'Enter' && isOpen) {
      event.preventDefault();
      if (at >= 0) take(at);
      close();
    } else if (key === 'Tab' && isOpen) {
      if (at >= 0) take(at);
      // Where taking a name leads on by itself, the key must not lead one field further.
      if (document.activeElement !== event.currentTarget) event.preventDefault();
      close();
    } else if (key === 'Escape' && isOpen) {
      // The dialog around the field stays.
      event.preventDefault();
      event.stopPropagation();
      close();
    } else if (key === 'Home' || key === 'End' || key === 'ArrowLeft' || key === 'ArrowRight') {
      setStood(-1);
    }
  };
  return { isOpen, at, open, close, onKeyDown };
}
