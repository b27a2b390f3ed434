import { useMemo, useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { FormulaLine } from '#shared/contracts/product-draft.ts';
import { listMaterials, type MaterialSummary } from '#shared/contracts/materials.contract.ts';
import { readFormulaBlock, type FormulaPasteLine } from '#shared/dictionary/read-sheet.ts';
import { foldName } from '#shared/law/fold.ts';
import { call } from '#src/lib/api/call.ts';
import { Button } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { AreaField } from '#src/ui/field.tsx';
import { newId } from './new-id.ts';
import { focusFirst } from './focus-first.ts';

export interface PastedGroup {
  readonly id: string;
  readonly name: string;
  readonly lines: readonly FormulaLine[];
}
export interface PasteDialogProps {
  readonly initial: string;
  /** Where lines go that name no phase. */
  readonly phaseName: string;
  readonly hasMakeUp: boolean;
  readonly onClose: () => void;
  /** Materials in use are loaded before the lines appear. */
  readonly onAdd: (groups: readonly PastedGroup[]) => Promise<void>;
}

/** The house's material of this name, by trade name or as the only one of that INCI name. */
export function matchMaterial(name: string, materials: readonly MaterialSummary[]): MaterialSummary | undefined {
  const key = foldName(name);
  const byTrade = materials.find((material) => foldName(material.tradeName) === key);
  if (byTrade) return byTrade;
  const byInci = materials.filter((material) => material.inci.length === 1 && foldName(material.inci[0]!) === key);
  return byInci.length === 1 ? byInci[0] : undefined;
}

/** Lines as the draft keeps them; grams count where a sheet gives both, and its percent is remembered. */
export function toGroups(lines: readonly FormulaPasteLine[], materialOf: (row: number) => string | undefined, phaseName: string, hasMakeUp: boolean): PastedGroup[] {
  const groups = new Map<string, FormulaLine[]>();
  let makesUp = hasMakeUp;
  for (const line of lines) {
    const materialId = materialOf(line.row);
    if (materialId === undefined) continue;
    const base = { id: newId('line'), materialId };
    const isRest = line.qs === true && !makesUp;
    if (isRest) makesUp = true;
    const entry: FormulaLine = isRest
      ? { ...base, amount: '', unit: 'qs' }
      : line.grams !== undefined
        ? { ...base, amount: line.grams, unit: 'g', ...(line.percent !== undefined && { pastedPercent: line.percent }) }
        : { ...base, amount: line.percent ?? '', unit: line.percent !== undefined ? '%' : 'g' };
    const name = line.phase === '' ? phaseName : /^[A-Z0-9]{1,3}$/.test(line.phase) ? `Phase ${line.phase}` : line.phase;
    groups.set(name, [...(groups.get(name) ?? []), entry]);
  }
  return [...groups].map(([name, entries]) => ({ id: newId('phase'), name, lines: entries }));
}

/** Reads what was copied from a spreadsheet, shows how it was understood, and adds it. */
export function PasteDialog({ initial, phaseName, hasMakeUp, onClose, onAdd }: PasteDialogProps) {
  const [text, setText] = useState(initial);
  const [chosen, setChosen] = useState<Readonly<Record<number, string>>>({});
  const [isBusy, setBusy] = useState(false);
  const { data } = useQuery({ queryKey: ['materials', 'all-names'], queryFn: ({ signal }) => loadAll(signal) });
  const materials = useMemo(() => data ?? [], [data]);
  const paste = useMemo(() => (text.trim() === '' ? { lines: [], problems: [] } : readFormulaBlock(text)), [text]);
  const materialOf = (row: number) => {
    if (chosen[row] !== undefined) return chosen[row] === '' ? undefined : chosen[row];
    const line = paste.lines.find((each) => each.row === row);
    return line ? matchMaterial(line.name, materials)?.id : undefined;
  };
  const ready = paste.lines.filter((line) => materialOf(line.row) !== undefined).length;
  return (
    <Dialog
      title="Paste from a spreadsheet"
      isOpen
      size="wide"
      onClose={onClose}
      foot={
        <>
          <Button onClick={onClose}>Back</Button>
          <Button
            weight="act"
            busy={isBusy}
            disabled={ready === 0}
            onClick={() => {
              setBusy(true);
              void onAdd(toGroups(paste.lines, materialOf, phaseName, hasMakeUp)).finally(onClose);
            }}
          >
            {ready === 0 ? 'Add the lines' : `Add ${ready} ${ready === 1 ? 'line' : 'lines'}`}
          </Button>
        </>
      }
    >
      <p className="quiet">Copy the rows with their names and amounts, grams or percent or both, and paste them here. “q.s.” marks the line that makes up the batch.</p>
      <AreaField className="mt-3" label="Rows" rows={6} ref={focusFirst} spellCheck={false} value={text} onChange={(event) => setText(event.target.value)} />
      {paste.problems.map((problem) => <p key={`${problem.row}${problem.message}`} className="error mt-2"><i className="mark stop" aria-hidden="true" /><span>Row {problem.row}: {problem.message}</span></p>)}
      {paste.lines.length > 0 ? (
        <div className="paste-preview">
          <table className="table">
            <caption className="sr-only">How the rows were understood</caption>
            <thead><tr><th scope="col">As pasted</th><th scope="col">Your material</th><th scope="col">Phase</th><th scope="col" className="num">g</th><th scope="col" className="num">%</th></tr></thead>
            <tbody>
              {paste.lines.map((line) => (
                <tr key={line.row}>
                  <td>{line.name}</td>
                  <td>
                    <select className="input" aria-label={`Material for ${line.name}`} value={materialOf(line.row) ?? ''} onChange={(event) => setChosen({ ...chosen, [line.row]: event.target.value })}>
                      <option value="">not found: leave it out</option>
                      {materials.map((material) => <option key={material.id} value={material.id}>{material.tradeName}</option>)}
                    </select>
                  </td>
                  <td>{line.phase || phaseName}</td>
                  <td className="num">{line.qs ? 'makes up' : line.grams}</td>
                  <td className="num">{line.percent}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      ) : null}
    </Dialog>
  );
}

/** Every material's name; a small house has tens or hundreds. */
async function loadAll(signal: AbortSignal): Promise<MaterialSummary[]> {
  const found: MaterialSummary[] = [];
  for (let page = 1; page <= 50; page++) {
    const { items, total } = await call(listMaterials, { query: { page } }, signal);
    found.push(...items);
    if (found.length >= total || items.length === 0) break;
  }
  return found;
}
