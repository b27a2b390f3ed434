import { useMemo, useState } from 'react';
import type { Material, MaterialFields } from '#shared/contracts/materials.contract.ts';
import { sayWhen } from '#src/lib/say.ts';
import { Button, TextButton } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { findDiffering, mergeFields } from './conflict.ts';
import type { Differing, PartKey, Side } from './conflict.ts';

export interface ConflictDialogProps {
  /** The version both began from, if it is still known here. */
  readonly base: MaterialFields | null;
  readonly mine: MaterialFields;
  readonly theirs: Material;
  readonly onChoose: (fields: MaterialFields) => void;
  readonly onClose: () => void;
}

/** Two people changed one material: both versions beside each other, chosen part by part or whole. */
export function ConflictDialog({ base, mine, theirs, onChoose, onClose }: ConflictDialogProps) {
  const differing = useMemo(() => findDiffering(base, mine, theirs), [base, mine, theirs]);
  const [choice, setChoice] = useState<Partial<Record<PartKey, Side>>>(() => Object.fromEntries(differing.map((one) => [one.key, one.onlyChangedBy ?? 'mine'])));
  const all = (side: Side) => setChoice(Object.fromEntries(differing.map((one) => [one.key, side])));
  return (
    <Dialog
      title={`${theirs.savedBy} saved this material before you`}
      size="broad"
      role="alertdialog"
      isOpen
      onClose={onClose}
      foot={<><Button onClick={onClose}>Go back to my version</Button><Button weight="act" onClick={() => onChoose(mergeFields(mine, theirs, choice))}>Save what is chosen</Button></>}
    >
      <p className="quiet max-w-[68ch]">
        Version {theirs.version} was saved {sayWhen(theirs.savedAt)}. Nothing of either is lost: choose part by part. Where only one of you changed a part, that one is chosen already.
      </p>
      <p className="mt-3 flex gap-4"><TextButton onClick={() => all('mine')}>All of mine</TextButton><TextButton onClick={() => all('theirs')}>All of {theirs.savedBy}’s</TextButton></p>
      <div className="mt-2 max-h-[52vh] overflow-auto">
        {differing.map((one) => <Choice key={one.key} one={one} theirName={theirs.savedBy} side={choice[one.key] ?? 'mine'} onChoose={(side) => setChoice((before) => ({ ...before, [one.key]: side }))} />)}
        {differing.length === 0 ? <p className="py-3">Both versions say the same. Saving keeps it so.</p> : null}
      </div>
    </Dialog>
  );
}

function Choice({ one, theirName, side, onChoose }: { one: Differing; theirName: string; side: Side; onChoose: (side: Side) => void }) {
  const option = (which: Side, words: string, text: string) => (
    <label className={`choice side ${side === which ? 'on' : ''}`} htmlFor={`side-${one.key}-${which}`}>
      <input id={`side-${one.key}-${which}`} type="radio" name={`side-${one.key}`} checked={side === which} onChange={() => onChoose(which)} />
      <span className="whitespace-pre-line [overflow-wrap:anywhere]"><span className="quiet text-12">{words}</span>{`\n${text}`}</span>
    </label>
  );
  return (
    <fieldset className="sides">
      <legend>{one.word}</legend>
      {option('mine', one.onlyChangedBy === 'theirs' ? 'Mine, unchanged' : 'Mine', one.mine)}
      {option('theirs', one.onlyChangedBy === 'mine' ? `${theirName}’s, unchanged` : `${theirName}’s`, one.theirs)}
    </fieldset>
  );
}
