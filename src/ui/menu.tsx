import { useRef, useState } from 'react';
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
export interface MenuProps {
  readonly trigger: ReactNode;
  readonly label: string;
  readonly entries: readonly MenuEntry[];
  readonly className?: string;
}

/** A button that opens a list of actions. */
export function Menu({ trigger, label, entries, className = 'btn' }: MenuProps) {
  return (
    <MenuTrigger>
      <AriaButton className={className} aria-label={label}>{trigger}</AriaButton>
      <Popover className="popover" placement="bottom end"><Actions label={label} entries={entries} /></Popover>
    </MenuTrigger>
  );
}

/** As {@link Menu}, on something that can also be dragged: it opens when the press is let go over it, not when a drag begins. */
export function GripMenu({ trigger, label, entries, className = 'btn' }: MenuProps) {
  const button = useRef<HTMLButtonElement>(null);
  const [isOpen, setIsOpen] = useState(false);
  return (
    <>
      <AriaButton ref={button} className={className} aria-label={label} aria-haspopup="menu" aria-expanded={isOpen} onPress={() => setIsOpen(true)}>{trigger}</AriaButton>
      <Popover className="popover" placement="bottom end" triggerRef={button} isOpen={isOpen} onOpenChange={setIsOpen}>
        <Actions label={label} entries={entries} onClose={() => setIsOpen(false)} />
      </Popover>
    </>
  );
}

function Actions({ label, entries, onClose }: Pick<MenuProps, 'label' | 'entries'> & { onClose?: () => void }) {
  return (
    // eslint-disable-next-line jsx-a11y/no-autofocus -- a menu that opens takes the focus (WAI-ARIA Authoring Practices, menu button)
    <AriaMenu className="menu" aria-label={label} items={entries} autoFocus="first" onClose={onClose}>
      {(entry) => (
        <MenuItem id={entry.id} className="menu-item" onAction={entry.onAction} isDisabled={entry.isDisabled} textValue={entry.id}>
          {entry.word}
        </MenuItem>
      )}
    </AriaMenu>
  );
}
