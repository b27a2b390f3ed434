import { useState } from 'react';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import { Button } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { TextField } from '#src/ui/field.tsx';
import { previewScale, scaleTo, setBatchSize } from './phase-recipes.ts';
import { readNumber } from './read-number.ts';
import type { Recipe } from './recipes.ts';
import { focusFirst } from './focus-first.ts';

export interface BatchSizeProps {
  readonly draft: ProductDraft;
  readonly isReadOnly: boolean;
  readonly onChange: (recipe: Recipe, join?: string) => void;
  readonly onSettle: () => void;
}

function readBatch(text: string): { grams: string } | { fault: string } {
  const read = readNumber(text, 'g');
  if (!read.ok) return { fault: read.why };
  if (read.text !== '' && /^0*(\.0*)?$/.test(read.text)) return { fault: 'A batch weighs more than nothing.' };
  return { grams: read.text };
}

/** The size the lines have to add up to. */
export function BatchSize({ draft, isReadOnly, onChange, onSettle }: BatchSizeProps) {
  const [typed, setTyped] = useState<string | null>(null);
  const value = draft.formula.batchSize?.value ?? '';
  const read = typed === null ? null : readBatch(typed);
  return (
    <div className="batch-size">
      <TextField
        label="Batch size, g"
        figure
        readOnly={isReadOnly}
        placeholder="not set"
        value={typed ?? value}
        error={read && 'fault' in read ? read.fault : undefined}
        onChange={(event) => {
          setTyped(event.target.value);
          const next = readBatch(event.target.value);
          if ('grams' in next) onChange(setBatchSize(next.grams), 'batch');
        }}
        onBlur={() => {
          if (!read || 'grams' in read) setTyped(null);
          onSettle();
        }}
      />
    </div>
  );
}

/** Scales the formula to another batch: every gram line in proportion. */
export function ScaleDialog({ draft, nameOf, onClose, onChange }: { draft: ProductDraft; nameOf: (materialId: string) => string; onClose: () => void; onChange: (recipe: Recipe) => void }) {
  const [typed, setTyped] = useState('');
  const read = readBatch(typed);
  const scaled = 'grams' in read && read.grams !== '' ? previewScale(draft, read.grams) : null;
  const lines = new Map(draft.formula.phases.flatMap((phase) => phase.lines.map((line) => [line.id, line] as const)));
  return (
    <Dialog
      title="Scale to another batch"
      isOpen
      size="wide"
      onClose={onClose}
      foot={
        <>
          <Button onClick={onClose}>Back</Button>
          <Button
            weight="act"
            disabled={!scaled}
            onClick={() => {
              if ('grams' in read) onChange(scaleTo(read.grams));
              onClose();
            }}
          >
            Scale the formula
          </Button>
        </>
      }
    >
      <p className="quiet">Lines in grams are scaled in proportion; percent lines and the line that makes up the batch follow by themselves. It can be undone.</p>
      <TextField className="mt-3" label="New batch size, g" figure ref={focusFirst} value={typed} error={'fault' in read ? read.fault : undefined} onChange={(event) => setTyped(event.target.value)} />
      {typed !== '' && 'grams' in read && !scaled ? <p className="hint">There is nothing to scale yet.</p> : null}
      {scaled ? (
        <div className="paste-preview">
          <table className="table">
            <caption className="sr-only">Grams before and after</caption>
            <thead><tr><th scope="col">Material</th><th scope="col" className="num">now, g</th><th scope="col" className="num">then, g</th></tr></thead>
            <tbody>
              {scaled.map((line) => (
                <tr key={line.id}>
                  <td>{nameOf(lines.get(line.id)!.materialId)}</td>
                  <td className="num">{line.before}</td>
                  <td className="num">{line.after}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      ) : null}
    </Dialog>
  );
}
