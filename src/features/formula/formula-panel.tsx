import { useCallback, useRef, useState } from 'react';
import type { FormulaLine, ProductDraft } from '#shared/contracts/product-draft.ts';
import type { Material } from '#shared/contracts/materials.contract.ts';
import { sayError } from '#src/lib/api/error.ts';
import { Button, TextButton } from '#src/ui/button.tsx';
import { EmptyState } from '#src/ui/empty-state.tsx';
import { Panel } from '#src/ui/sheet.tsx';
import { useToast } from '#src/ui/toast.tsx';
import { AddMaterial } from './add-material.tsx';
import { BatchSize, ScaleDialog } from './batch-size.tsx';
import { FormulaGrid, type FormulaGridProps } from './formula-grid.tsx';
import { newId } from './new-id.ts';
import { NewMaterialDialog } from './new-material-dialog.tsx';
import { NoteDialog } from './note-dialog.tsx';
import { PasteDialog } from './paste-dialog.tsx';
import { addPasted, addPhase } from './phase-recipes.ts';
import { addLine, setLineNote, type Recipe } from './recipes.ts';
import { focusGrams } from './walk.ts';

export interface FormulaPanelProps extends Omit<FormulaGridProps, 'onNote' | 'onPastEnd'> {
  /** Loads a material before a line uses it. */
  readonly onBring: (materialId: string) => Promise<void>;
  readonly onPut: (material: Material) => Promise<void>;
}

type Open = { readonly kind: 'paste'; readonly text: string } | { readonly kind: 'scale' } | { readonly kind: 'new'; readonly name: string } | { readonly kind: 'note'; readonly line: FormulaLine } | null;

/** Adds a line at the end of the last phase; the first line of all makes its phase. */
function appendLine(line: FormulaLine): Recipe {
  return (draft: ProductDraft) => {
    const last = draft.formula.phases.at(-1);
    if (last) return addLine(last.id, line)(draft);
    const id = newId('phase');
    return addLine(id, line)(addPhase(id, 'Phase A')(draft));
  };
}

/** The formula with everything that changes it. */
export function FormulaPanel(props: FormulaPanelProps) {
  const { draft, nameOf, isReadOnly = false, onChange, onSettle, onBring, onPut } = props;
  const toast = useToast();
  const box = useRef<HTMLDivElement>(null);
  const field = useRef<HTMLInputElement>(null);
  const [open, setOpen] = useState<Open>(null);
  const close = () => setOpen(null);
  const toField = useCallback(() => field.current?.focus(), []);
  const lines = draft.formula.phases.flatMap((phase) => phase.lines);

  const add = (materialId: string) => {
    const line: FormulaLine = { id: newId('line'), materialId, amount: '', unit: lines.length > 0 && lines.every((each) => each.unit === '%') ? '%' : 'g' };
    onChange(appendLine(line));
    requestAnimationFrame(() => focusGrams(box.current, line.id));
  };
  const bring = async (materialId: string) => {
    try {
      await onBring(materialId);
      add(materialId);
    } catch (error) {
      toast(sayError(error));
    }
  };
  const paste = async (groups: Parameters<typeof addPasted>[0]) => {
    try {
      for (const id of new Set(groups.flatMap((group) => group.lines.map((line) => line.materialId)))) await onBring(id);
      onChange(addPasted(groups));
    } catch (error) {
      toast(sayError(error));
    }
  };
  const openPaste = (text = '') => setOpen({ kind: 'paste', text });

  return (
    <Panel title="Formula" className="formula" end={isReadOnly ? null : <TextButton onClick={() => openPaste()}>Paste from a spreadsheet</TextButton>}>
      <div ref={box}>
        <BatchSize draft={draft} isReadOnly={isReadOnly} onChange={onChange} onSettle={onSettle} />
        {lines.length === 0 ? (
          <EmptyState title="No line yet.">
            {isReadOnly ? 'A formulator of the house can add materials.' : 'Type the first material below and press Enter, then its grams or percent. Or paste rows from a spreadsheet.'}
          </EmptyState>
        ) : null}
        {lines.length > 0 || draft.formula.phases.length > 1 ? <FormulaGrid {...props} onNote={(line) => setOpen({ kind: 'note', line })} onPastEnd={toField} /> : null}
        {isReadOnly ? null : (
          <>
            <AddMaterial inputRef={field} onChoose={(id) => void bring(id)} onNew={(name) => setOpen({ kind: 'new', name })} onPaste={openPaste} />
            <div className="formula-tools">
              <Button small icon="plus" onClick={() => onChange(addPhase(newId('phase'), `Phase ${String.fromCharCode(65 + (draft.formula.phases.length % 26))}`))}>Add a phase</Button>
              {lines.length > 0 ? <Button small icon="scale" onClick={() => setOpen({ kind: 'scale' })}>Scale to another batch</Button> : null}
            </div>
          </>
        )}
      </div>
      {open?.kind === 'paste' ? <PasteDialog initial={open.text} phaseName={draft.formula.phases.at(-1)?.name ?? 'Phase A'} hasMakeUp={lines.some((line) => line.unit === 'qs')} onClose={close} onAdd={paste} /> : null}
      {open?.kind === 'scale' ? <ScaleDialog draft={draft} nameOf={nameOf} onClose={close} onChange={onChange} /> : null}
      {open?.kind === 'note' ? <NoteDialog line={open.line} name={nameOf(open.line.materialId)} onClose={close} onWrite={(note) => onChange(setLineNote(open.line.id, note))} /> : null}
      {open?.kind === 'new' ? (
        <NewMaterialDialog
          name={open.name}
          onClose={close}
          onMade={(material) => {
            close();
            void onPut(material).then(() => add(material.id), (error: unknown) => toast(sayError(error)));
          }}
        />
      ) : null}
    </Panel>
  );
}
