import { useDeferredValue, useMemo, useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { readComposition } from '#shared/dictionary/read-composition.ts';
import { Banner } from '#src/ui/banner.tsx';
import { Button } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { AreaField } from '#src/ui/field.tsx';
import { VerdictWord } from '#src/ui/verdict-mark.tsx';
import { sayCount } from '#src/lib/say.ts';
import type { CompositionLine } from '#shared/dictionary/read-composition.ts';
import { emptyPart } from './material-form.ts';
import type { PartFields } from './material-form.ts';
import { ingredientQueries } from './queries.ts';

/** Pasting a supplier's line or columns from a spreadsheet, with a look at what was read before it counts. */
export function PasteDialog({ hasParts, onTake, onClose }: { hasParts: boolean; onTake: (parts: PartFields[], how: 'instead' | 'after') => void; onClose: () => void }) {
  const [text, setText] = useState('');
  const settled = useDeferredValue(text);
  const { lines: pasted, problems } = useMemo(() => (settled.trim() === '' ? NOTHING : readComposition(settled)), [settled]);
  const { data } = useQuery(ingredientQueries.resolve(pasted.map((part) => ({ name: part.name, ...(part.cas ? { cas: part.cas } : {}) }))));
  const found = useMemo(() => new Map(data?.items.map((item) => [item.name, item])), [data]);
  const isKnown = (written: string) => found.get(written)?.match === 'exact' || found.get(written)?.match === 'synonym';
  const nameOf = (written: string) => (isKnown(written) ? (found.get(written)?.entry?.inci ?? written) : written);
  const unknown = pasted.filter((part) => found.size > 0 && !isKnown(part.name)).length;
  const take = (how: 'instead' | 'after') => onTake(pasted.map((line) => partOf(line, nameOf(line.name))), how);
  return (
    <Dialog
      title="Paste a composition"
      size="wide"
      isOpen
      onClose={onClose}
      foot={
        <>
          <Button onClick={onClose}>Not now</Button>
          {hasParts ? <Button disabled={pasted.length === 0} onClick={() => take('after')}>Add to what stands</Button> : null}
          <Button weight="act" disabled={pasted.length === 0} onClick={() => take('instead')}>{hasParts ? 'Put instead of what stands' : 'Fill in'}</Button>
        </>
      }
    >
      <AreaField
        label="A supplier’s line, or columns from a spreadsheet"
        hint="Such as Aqua (and) Glycerin (and) Avena Sativa Kernel Extract, or a name and its percent on each line. Ranges such as 61-65 are read too."
        rows={6}
        value={text}
        onChange={(event) => setText(event.target.value)}
      />
      {problems.length > 0 ? (
        <div className="mt-3">
          <Banner weight="decide" title={problems.length === 1 ? 'One row was not read.' : `${problems.length} rows were not read.`}>
            <ul>{problems.slice(0, 6).map((problem) => <li key={`${problem.row}-${problem.message}`}>Row {problem.row}: {problem.message}</li>)}</ul>
          </Banner>
        </div>
      ) : null}
      {pasted.length > 0 ? (
        <div className="mt-4 max-h-[38vh] overflow-auto">
          <table className="table" aria-label="As read">
            <thead><tr><th scope="col">As pasted</th><th scope="col">Will stand as</th><th scope="col" className="num">share %</th></tr></thead>
            <tbody>
              {pasted.map((part, index) => (
                <tr key={index}>
                  <td className="quiet">{part.name}</td>
                  <td>{nameOf(part.name)} {found.size > 0 && !isKnown(part.name) ? <VerdictWord weight="decide">not known{found.get(part.name)?.suggestions[0] ? `, perhaps ${found.get(part.name)!.suggestions[0]!.inci}` : ''}</VerdictWord> : null}</td>
                  <td className="num">{part.percent ?? (part.max ? `${part.min} to ${part.max}` : <span className="quiet">not given</span>)}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      ) : null}
      {pasted.length > 0 ? <p className="hint mt-2" role="status">{sayCount(pasted.length, 'ingredient')} read{unknown > 0 ? `, ${unknown} not known by that name` : ''}.</p> : null}
    </Dialog>
  );
}

const NOTHING = { lines: [], problems: [] };
function partOf(line: CompositionLine, inci: string): PartFields {
  return { ...emptyPart, inci, cas: line.cas ?? '', least: line.percent ?? line.min ?? '', most: line.percent === undefined ? (line.max ?? '') : '' };
}
