import { Fragment, useCallback, useMemo, useRef, type KeyboardEvent } from 'react';
import type { FormulaLine, Phase, ProductDraft } from '#shared/contracts/product-draft.ts';
import type { MenuEntry } from '#src/ui/menu.tsx';
import { announce } from '#src/ui/announcer.tsx';
import { LineRow } from './line-row.tsx';
import { PhaseHead } from './phase-head.tsx';
import { movePhase, removePhase, renamePhase } from './phase-recipes.ts';
import { fixMakeUp, keepGrams, makeUpWith, moveLine, removeLine, setGrams, setPercent, stepLine, takePasted, type Recipe } from './recipes.ts';
import { PastedSlip, SuspectSlip, type SuspectWords } from './slip-note.tsx';
import { TotalRow } from './total-row.tsx';
import { useLineDrag, type Landing } from './use-line-drag.ts';
import { findRow, stepFrom } from './walk.ts';
import { contradictsPasted, weighFormula } from './weigh.ts';
import './formula.css';

export interface FormulaGridProps {
  readonly draft: ProductDraft;
  readonly nameOf: (materialId: string) => string;
  /** Slips that would close the batch's gap, by line number. */
  readonly suspects: readonly { readonly line: number; readonly written: string; readonly perhaps: string; readonly slip: 'digits-exchanged' | 'point-shifted' }[];
  /** Lit lines, with what each gives to the lit ingredient. */
  readonly lit: ReadonlyMap<number, string>;
  readonly isReadOnly?: boolean;
  readonly onChange: (recipe: Recipe, join?: string) => void;
  readonly onSettle: () => void;
  readonly onLight: (line: number | null) => void;
  readonly onNote: (line: FormulaLine) => void;
  readonly onOpenMaterial: (materialId: string) => void;
  /** Enter after the last line. */
  readonly onPastEnd: () => void;
}

/** The formula as a grid: phases, lines, grams and percent side by side, the total under the column. */
export function FormulaGrid(props: FormulaGridProps) {
  const { draft, nameOf, lit, isReadOnly = false, onChange, onSettle, onPastEnd } = props;
  const table = useRef<HTMLTableElement>(null);
  const weighed = useMemo(() => weighFormula(draft.formula), [draft.formula]);
  const lines = draft.formula.phases.flatMap((phase) => phase.lines);
  const suspects = props.suspects.flatMap((each): SuspectWords[] => {
    const line = lines[each.line];
    return line ? [{ lineId: line.id, name: nameOf(line.materialId), written: each.written, perhaps: each.perhaps, slip: each.slip, unit: line.unit }] : [];
  });
  const takeSuspect = (suspect: SuspectWords) => onChange(suspect.unit === '%' ? setPercent(suspect.lineId, suspect.perhaps) : setGrams(suspect.lineId, suspect.perhaps));

  const handleDrop = useCallback((lineId: string, landing: Landing) => onChange(moveLine(lineId, landing.phaseId, landing.place)), [onChange]);
  const { dragged, handleGrab } = useLineDrag(table, handleDrop);
  const handleGrams = useCallback((id: string, text: string) => onChange(setGrams(id, text), `g:${id}`), [onChange]);
  const handlePercent = useCallback((id: string, text: string) => onChange(setPercent(id, text), `%:${id}`), [onChange]);
  const handleWalk = useCallback(
    (event: KeyboardEvent<HTMLInputElement>) => {
      const step = stepFrom(event);
      if (step === null) return;
      event.preventDefault();
      if (step === 'past-end') onPastEnd();
      else step.to.focus();
    },
    [onPastEnd],
  );
  const handleRowKey = useCallback(
    (event: KeyboardEvent, lineId: string) => {
      const by = event.key === 'ArrowUp' ? -1 : event.key === 'ArrowDown' ? 1 : 0;
      if (by === 0 || !event.altKey || isReadOnly) return;
      event.preventDefault();
      const column = (event.target as HTMLElement).dataset.column;
      onChange(stepLine(lineId, by));
      announce(by < 0 ? 'Moved up.' : 'Moved down.');
      // The row is drawn anew in another phase: the focus follows it.
      requestAnimationFrame(() => findRow(table.current, lineId)?.querySelector<HTMLElement>(column ? `input[data-column="${column}"]` : 'button')?.focus());
    },
    [onChange, isReadOnly],
  );
  const phaseKey = draft.formula.phases.map((phase) => `${phase.id}:${phase.name}`).join('|');
  const batchWords = weighed.batch ? ` in ${draft.formula.batchSize?.value} g` : '';

  return (
    <table className="grid-table" ref={table}>
      <caption className="sr-only">Formula lines by phase, in grams and percent</caption>
      <thead>
        <tr>
          <th scope="col">Material</th>
          <th scope="col" className="num">g</th>
          <th scope="col" className="num">%</th>
        </tr>
      </thead>
      {draft.formula.phases.map((phase, at) => (
        <tbody key={phase.id} data-phase={phase.id}>
          <PhaseHead
            phase={phase}
            grams={weighed.phases[at]!.grams}
            percent={weighed.phases[at]!.percent}
            isFirst={at === 0}
            isLast={at === draft.formula.phases.length - 1}
            isReadOnly={isReadOnly}
            onRename={(name) => onChange(renamePhase(phase.id, name))}
            onMove={(by) => onChange(movePhase(phase.id, by))}
            onRemove={() => onChange(removePhase(phase.id))}
          />
          {phase.lines.length === 0 ? (
            <tr className="empty-phase">
              <td colSpan={3}>Nothing in this phase yet. Add a material below, or drag a line here.</td>
            </tr>
          ) : null}
          {phase.lines.map((line, place) => {
            const each = weighed.lines.get(line.id)!;
            const suspect = weighed.isOff ? suspects.find((one) => one.lineId === line.id) : undefined;
            const isDoubtful = contradictsPasted(each);
            return (
              <Fragment key={line.id}>
                {landsBefore(dragged, phase, line.id, place) ? <LandingRow /> : null}
                <LineRow
                  weighed={each}
                  name={nameOf(line.materialId)}
                  isLit={lit.has(each.index)}
                  gives={lit.get(each.index) ?? ''}
                  isDragged={dragged?.lineId === line.id}
                  isDoubtful={isDoubtful || suspect !== undefined}
                  isReadOnly={isReadOnly}
                  menu={() => lineMenu(line, phase, draft.formula.phases, props)}
                  menuKey={`${phaseKey}|${place}|${phase.lines.length}|${at}`}
                  onLight={props.onLight}
                  onGrams={handleGrams}
                  onPercent={handlePercent}
                  onSettle={onSettle}
                  onWalk={handleWalk}
                  onRowKey={handleRowKey}
                  onGrab={handleGrab}
                />
                {isDoubtful && !isReadOnly ? (
                  <PastedSlip weighed={each} batchWords={batchWords} onKeep={() => onChange(keepGrams(line.id))} onTake={(percent) => onChange(takePasted(line.id, percent))} />
                ) : suspect && !isReadOnly ? (
                  <SuspectSlip suspect={suspect} onTake={() => takeSuspect(suspect)} />
                ) : null}
              </Fragment>
            );
          })}
          {dragged?.landing.phaseId === phase.id && dragged.landing.place >= phase.lines.filter((line) => line.id !== dragged.lineId).length ? <LandingRow /> : null}
        </tbody>
      ))}
      <TotalRow weighed={weighed} makesUpName={weighed.makesUp ? nameOf(weighed.makesUp.line.materialId) : null} suspects={isReadOnly ? [] : suspects} onTake={takeSuspect} />
    </table>
  );
}

function landsBefore(dragged: { lineId: string; landing: Landing } | null, phase: Phase, lineId: string, place: number): boolean {
  if (!dragged || dragged.landing.phaseId !== phase.id || lineId === dragged.lineId) return false;
  const from = phase.lines.findIndex((line) => line.id === dragged.lineId);
  return dragged.landing.place === (from >= 0 && from < place ? place - 1 : place);
}

function LandingRow() {
  return (
    <tr className="landing" aria-hidden="true">
      <td colSpan={3} />
    </tr>
  );
}

function lineMenu(line: FormulaLine, phase: Phase, phases: readonly Phase[], props: FormulaGridProps): MenuEntry[] {
  const { onChange } = props;
  const first = phases[0]?.lines[0]?.id === line.id;
  const last = phases.at(-1)?.lines.at(-1)?.id === line.id;
  return [
    { id: 'Move up', word: 'Move up', onAction: () => onChange(stepLine(line.id, -1)), isDisabled: first },
    { id: 'Move down', word: 'Move down', onAction: () => onChange(stepLine(line.id, 1)), isDisabled: last },
    ...phases
      .filter((each) => each.id !== phase.id)
      .map((each) => ({ id: `Move to ${each.id}`, word: `Move to ${each.name}`, onAction: () => onChange(moveLine(line.id, each.id, each.lines.length)) })),
    line.unit === 'qs'
      ? { id: 'Fix', word: 'Fix the grams it has now', onAction: () => onChange(fixMakeUp(line.id)) }
      : { id: 'Make up', word: 'Make up the batch with it', onAction: () => onChange(makeUpWith(line.id)) },
    { id: 'Note', word: line.note ? 'Change the note' : 'Add a note', onAction: () => props.onNote(line) },
    { id: 'Open', word: 'Open the material', onAction: () => props.onOpenMaterial(line.materialId) },
    { id: 'Remove', word: 'Remove the line', onAction: () => onChange(removeLine(line.id)) },
  ];
}
