import type { ReactNode } from 'react';
import { Dialog as AriaDialog, Heading } from 'react-aria-components/Dialog';
import { Modal, ModalOverlay } from 'react-aria-components/Modal';

export interface DialogProps {
  readonly title: string;
  readonly isOpen: boolean;
  /** Called on Escape, on a press outside, and by whoever closes it. */
  readonly onClose: () => void;
  readonly children: ReactNode;
  /** Buttons, the one that acts last. */
  readonly foot?: ReactNode;
  readonly size?: 'small' | 'wide' | 'broad';
  /** `alertdialog` where an answer is needed: it does not close by a press outside. */
  readonly role?: 'dialog' | 'alertdialog';
}

/** A question or a small task over the glass; the focus stays inside and returns after. */
export function Dialog({ title, isOpen, onClose, children, foot, size = 'small', role = 'dialog' }: DialogProps) {
  return (
    <ModalOverlay isOpen={isOpen} onOpenChange={(open) => open || onClose()} isDismissable={role === 'dialog'} className="veil">
      <Modal className={`dialog ${size === 'small' ? '' : size}`}>
        <AriaDialog role={role} className="dialog-body">
          <Heading slot="title" level={2}>{title}</Heading>
          {children}
          {foot ? <div className="dialog-foot">{foot}</div> : null}
        </AriaDialog>
      </Modal>
    </ModalOverlay>
  );
}
