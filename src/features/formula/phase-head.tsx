import { useState } from 'react';
import { toDecimal, type Rational } from '#shared/kernel/rational.ts';
import type { Phase } from '#shared/contracts/product-draft.ts';
import { Icon } from '#src/ui/icon.tsx';
import { Menu } from '#src/ui/menu.tsx';
import { focusFirst } from './focus-first.ts';

export interface PhaseHeadProps {
  readonly phase: Phase;
  readonly grams: Rational;
  readonly percent: Rational;
  readonly isFirst: boolean;
  readonly isLast: boolean;
  readonly isReadOnly: boolean;
  readonly onRename: (name: string) => void;
  readonly onMove: (by: -1 | 1) => void;
  readonly onRemove: () => void;
}

/** A phase's name with its sums; its menu renames, moves and removes it. */
export function PhaseHead({ phase, grams, percent, isFirst, isLast, isReadOnly, onRename, onMove, onRemove }: PhaseHeadProps) {
  const [name, setName] = useState<string | null>(null);
  const finish = () => {
    if (name !== null && name.trim() !== '') onRename(name.trim());
    setName(null);
  };
  const heir = isFirst ? 'the one after' : 'the one before';
  return (
    <tr className="phase">
      <th scope="rowgroup">
        <span className="phase-words">
        {isReadOnly ? null : (
          <Menu
            className="handle-button"
            label={`Phase ${phase.name}: rename, move, remove`}
            trigger={<Icon name="down" />}
            entries={[
              { id: 'Rename', word: 'Rename', onAction: () => setName(phase.name) },
              { id: 'Earlier', word: 'Move before the phase above', onAction: () => onMove(-1), isDisabled: isFirst },
              { id: 'Later', word: 'Move after the phase below', onAction: () => onMove(1), isDisabled: isLast },
              {
                id: 'Remove',
                word: phase.lines.length + phase.steps.length > 0 ? `Remove; its lines join ${heir}` : 'Remove the phase',
                onAction: onRemove,
                isDisabled: isFirst && isLast,
              },
            ]}
          />
        )}
        {name === null ? (
          <b>{phase.name}</b>
        ) : (
          <input
            className="phase-name"
            aria-label="Name of the phase"
            maxLength={80}
            // Renaming was just asked for: the focus belongs here.
            ref={focusFirst}
            value={name}
            onChange={(event) => setName(event.target.value)}
            onBlur={finish}
            onKeyDown={(event) => {
              if (event.key === 'Enter') finish();
              if (event.key === 'Escape') setName(null);
            }}
          />
        )}
        </span>
      </th>
      <td className="num" title={`${toDecimal(grams)} g`}>{toDecimal(grams, 3)}</td>
      <td className="num" title={`${toDecimal(percent)} %`}>{toDecimal(percent, 3)}</td>
    </tr>
  );
}
