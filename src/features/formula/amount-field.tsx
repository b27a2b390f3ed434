import { useId, useState, type KeyboardEvent } from 'react';
import { readNumber } from './read-number.ts';

export interface AmountFieldProps {
  /** The line it belongs to, and which of its two figures: how the grid finds the next field. */
  readonly lineId: string;
  readonly column: 'g' | '%';
  readonly label: string;
  /** The figure that stands in the draft. */
  readonly value: string;
  /** The exact figure where `value` is shortened for the eye. */
  readonly exact?: string;
  readonly isReadOnly?: boolean;
  /** Something about the figure that is no fault, such as a zero. */
  readonly caution?: string;
  readonly onWrite: (text: string) => void;
  readonly onSettle: () => void;
  readonly onWalk: (event: KeyboardEvent<HTMLInputElement>) => void;
}

/**
 * One figure of the grid. While someone types, what is typed stands as it is; every reading that
 * is a number goes to the draft at once, any other is said here and leaves the draft alone.
 */
export function AmountField({ lineId, column, label, value, exact, isReadOnly = false, caution, onWrite, onSettle, onWalk }: AmountFieldProps) {
  const noteId = useId();
  const [typed, setTyped] = useState<string | null>(null);
  const [before, setBefore] = useState(value);
  const read = typed === null ? null : readNumber(typed, column);
  const fault = read && !read.ok ? read.why : null;
  const note = fault ?? (read?.ok ? read.note : undefined) ?? (typed === null ? caution : undefined);
  return (
    <>
      <input
        inputMode="decimal"
        autoComplete="off"
        spellCheck={false}
        data-line={lineId}
        data-column={column}
        aria-label={label}
        aria-invalid={fault !== null || undefined}
        aria-describedby={note ? noteId : undefined}
        title={exact && exact !== value ? `${exact} ${column}` : undefined}
        readOnly={isReadOnly}
        value={typed ?? value}
        onFocus={(event) => {
          setBefore(value);
          event.currentTarget.select();
        }}
        onChange={(event) => {
          setTyped(event.target.value);
          const next = readNumber(event.target.value, column);
          if (next.ok) onWrite(next.text);
        }}
        onBlur={() => {
          // What is no number stays in the field, with its reason, until it is put right or taken back.
          if (fault === null) setTyped(null);
          onSettle();
        }}
        onKeyDown={(event) => {
          if (event.key === 'Escape') {
            event.preventDefault();
            setTyped(null);
            onWrite(before);
            return;
          }
          onWalk(event);
        }}
      />
      {note ? (
        <span id={noteId} className={fault ? 'cell-note bad' : 'cell-note'} role={fault ? 'alert' : undefined}>
          {note}
        </span>
      ) : null}
    </>
  );
}
