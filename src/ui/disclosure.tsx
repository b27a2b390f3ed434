import { useCallback, useId } from 'react';
import type { ReactNode } from 'react';

/**
 * A button that shows a small list of links over the page: the browser's own popover, which
 * closes on Escape or a press outside and gives the focus back. Light enough for the bar.
 */
export function Disclosure({ trigger, label, className = '', at, children }: { trigger: ReactNode; label: string; className?: string; at: 'left' | 'right'; children: (close: () => void) => ReactNode }) {
  const id = useId();
  const close = useCallback(() => document.getElementById(id)?.hidePopover?.(), [id]);
  return (
    <>
      <button type="button" className={className} popoverTarget={id}>
        {trigger}
      </button>
      <div id={id} popover="auto" className={`hanging ${at}`} role="group" aria-label={label}>
        {children(close)}
      </div>
    </>
  );
}
