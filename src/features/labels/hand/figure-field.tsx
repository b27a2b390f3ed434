import { useState } from 'react';
import { TextField } from '#src/ui/field.tsx';

export interface FigureFieldProps {
  readonly label: string;
  /** In thousandths of what is shown. */
  readonly value: number | undefined;
  readonly onCommit: (value: number | undefined) => void;
  readonly least: number;
  readonly most: number;
  /** Thousandths that an arrow key adds; ten times as much with Shift. */
  readonly step?: number;
  readonly hint?: string;
  /** What an empty field means; a field without it must hold a figure. */
  readonly whenEmpty?: string;
  readonly disabled?: boolean;
}

function toText(value: number | undefined): string {
  return value === undefined ? '' : String(value / 1000);
}

function read(text: string): number | null {
  const plain = text.replace(',', '.').trim();
  return /^-?\d{1,5}(\.\d{0,3})?$/.test(plain) ? Math.round(Number(plain) * 1000) : null;
}

/** A figure that takes effect on Enter, on leaving, and with the arrow keys. */
export function FigureField({ label, value, onCommit, least, most, step = 100, hint, whenEmpty, disabled = false }: FigureFieldProps) {
  // The text under the pen, and the figure it was begun from: another figure sets it aside.
  const [pen, setPen] = useState<{ text: string; from: number | undefined } | null>(null);
  const text = pen && pen.from === value ? pen.text : toText(value);
  const figure = read(text);
  const error = text.trim() === '' ? (whenEmpty === undefined ? 'A figure is missing.' : undefined) : figure === null ? 'Write a figure like 12.5.' : figure < least || figure > most ? `From ${least / 1000} to ${most / 1000}.` : undefined;
  const commit = (): void => {
    if (error || !pen) return;
    setPen(null);
    const next = text.trim() === '' ? undefined : figure!;
    if (next !== value) onCommit(next);
  };
  return (
    <TextField
      label={label} value={text} figure hint={hint} error={pen ? error : undefined} disabled={disabled} placeholder={whenEmpty}
      onChange={(event) => setPen({ text: event.target.value, from: value })}
      onBlur={commit}
      onKeyDown={(event) => {
        if (event.key === 'Enter') commit();
        if (event.key !== 'ArrowUp' && event.key !== 'ArrowDown') return;
        event.preventDefault();
        const by = (event.key === 'ArrowUp' ? 1 : -1) * step * (event.shiftKey ? 10 : 1);
        const next = Math.min(most, Math.max(least, (figure ?? value ?? least) + by));
        setPen(null);
        onCommit(next);
      }}
    />
  );
}
