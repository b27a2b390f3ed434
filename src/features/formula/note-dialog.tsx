import { useState } from 'react';
import type { FormulaLine } from '#shared/contracts/product-draft.ts';
import { Button } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { TextField } from '#src/ui/field.tsx';
import { focusFirst } from './focus-first.ts';

/** A note on one line of the formula. */
export function NoteDialog({ line, name, onClose, onWrite }: { line: FormulaLine; name: string; onClose: () => void; onWrite: (note: string) => void }) {
  const [note, setNote] = useState(line.note ?? '');
  const finish = () => {
    onWrite(note.trim());
    onClose();
  };
  return (
    <Dialog title={name} isOpen onClose={onClose} foot={<><Button onClick={onClose}>Back</Button><Button weight="act" onClick={finish}>Keep the note</Button></>}>
      <TextField label="Note" ref={focusFirst} maxLength={500} value={note} onChange={(event) => setNote(event.target.value)} onKeyDown={(event) => event.key === 'Enter' && finish()} />
    </Dialog>
  );
}
