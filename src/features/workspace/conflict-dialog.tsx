import { useState } from 'react';
import type { Product } from '#shared/contracts/products.contract.ts';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import { sayWhen } from '#src/lib/say.ts';
import { Button } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { compareDrafts, mergeDrafts, type Difference, type Side } from './differences.ts';

export interface ConflictDialogProps {
  readonly base: ProductDraft;
  readonly mine: ProductDraft;
  readonly theirs: Product;
  readonly nameOf: (materialId: string) => string;
  readonly onResolve: (theirs: Product, merged: ProductDraft) => void;
}

/** Two people saved the same product: both versions side by side in words, and a choice for each point. */
export function ConflictDialog({ base, mine, theirs, nameOf, onResolve }: ConflictDialogProps) {
  const [chosen, setChosen] = useState<Readonly<Record<string, Side>>>({});
  const differences = compareDrafts(base, mine, theirs.draft, nameOf);
  const takeAll = (side: Side) => setChosen(Object.fromEntries(differences.map((difference) => [difference.id, side])));
  const finish = () => onResolve(theirs, mergeDrafts(mine, theirs.draft, differences, chosen));
  return (
    <Dialog
      title="Two versions of this product"
      role="alertdialog"
      size="broad"
      isOpen
      // It does not close without an answer: nothing may be overwritten in silence.
      onClose={() => undefined}
      foot={
        <>
          <Button onClick={() => takeAll('mine')}>Choose mine everywhere</Button>
          <Button onClick={() => takeAll('theirs')}>Choose theirs everywhere</Button>
          <Button weight="act" onClick={finish}>Save what is chosen</Button>
        </>
      }
    >
      <p className="quiet">
        {theirs.savedBy} saved version {theirs.version} at {sayWhen(theirs.savedAt)}, while you were working on an older one. Nothing is lost. Choose for each point; what only one of you changed is chosen already.
      </p>
      {differences.length === 0 ? (
        <p className="mt-4">Both versions say the same. Save to go on.</p>
      ) : (
        <div className="table-scroll conflict">
          <table className="table">
            <caption className="sr-only">Points on which the two versions differ</caption>
            <thead>
              <tr>
                <th scope="col">What</th>
                <th scope="col">Before</th>
                <th scope="col">Yours</th>
                <th scope="col">By {theirs.savedBy}</th>
              </tr>
            </thead>
            <tbody>
              {differences.map((difference) => (
                <Row key={difference.id} difference={difference} side={chosen[difference.id] ?? difference.suggested} onChoose={(side) => setChosen({ ...chosen, [difference.id]: side })} />
              ))}
            </tbody>
          </table>
        </div>
      )}
    </Dialog>
  );
}

function Row({ difference, side, onChoose }: { difference: Difference; side: Side; onChoose: (side: Side) => void }) {
  const both = difference.changedBy === 'both';
  const cell = (value: Side, words: string, whose: string) => (
    <td className={side === value ? 'chosen' : ''}>
      <label className="choice">
        <input type="radio" name={difference.id} checked={side === value} onChange={() => onChoose(value)} aria-label={`${difference.title}: ${whose}, ${words}`} />
        <span>
          {words}
          {difference.changedBy === value || both ? <span className="changed">changed</span> : null}
        </span>
      </label>
    </td>
  );
  return (
    <tr className={both ? 'both' : ''}>
      <th scope="row">{difference.title}</th>
      <td className="quiet">{difference.before}</td>
      {cell('mine', difference.mine, 'yours')}
      {cell('theirs', difference.theirs, 'theirs')}
    </tr>
  );
}
