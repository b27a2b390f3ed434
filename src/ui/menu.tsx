import type { ReactNode } from 'react';
import { Button as AriaButton } from 'react-aria-components/Button';
import { Menu as AriaMenu, MenuItem, MenuTrigger } from 'react-aria-components/Menu';
import { Popover } from 'react-aria-components/Popover';

export interface MenuEntry {
  readonly id: string;
  readonly word: ReactNode;
  readonly onAction: () => void;
  readonly isDisabled?: boolean;
}
/** A button that opens a list of actions. */
export function Menu({ trigger, label, entries, className = 'btn' }: { trigger: ReactNode; label: string; entries: readonly MenuEntry[]; className?: string }) {
  return (
    <MenuTrigger>
      <AriaButton className={className} aria-label={label}>{trigger}</AriaButton>
      <Popover className="popover" placement="bottom end">
        <AriaMenu className="menu" aria-label={label} items={entries}>
          {(entry) => (
            <MenuItem id={entry.id} className="menu-item" onAction={entry.onAction} isDisabled={entry.isDisabled} textValue={entry.id}>
              {entry.word}
            </MenuItem>
          )}
        </AriaMenu>
      </Popover>
    </MenuTrigger>
  );
}
