import { sayError } from '#src/lib/api/error.ts';
import { Button } from './button.tsx';
import { Dialog } from './dialog.tsx';

export interface TakeAwayDialogProps {
  readonly title: string;
  /** What goes, in words. */
  readonly what: string;
  readonly isBusy: boolean;
  readonly error: unknown;
  readonly onTakeAway: () => void;
  readonly onClose: () => void;
}

/** Asks before a paper goes for good. */
export function TakeAwayDialog({ title, what, isBusy, error, onTakeAway, onClose }: TakeAwayDialogProps) {
  return (
    <Dialog
      title={title}
      role="alertdialog"
      isOpen
      onClose={onClose}
      foot={
        <>
          <Button onClick={onClose}>Keep it</Button>
          <Button weight="stop" busy={isBusy} onClick={onTakeAway}>Take away</Button>
        </>
      }
    >
      <p className="quiet">{what}. It cannot be brought back; keep your own copy.</p>
      {error ? <p className="error mt-2" role="alert">{sayError(error)}</p> : null}
    </Dialog>
  );
}
