import { useId, useState } from 'react';
import { parsePlainDate } from '#shared/kernel/plain-date.ts';
import { sayDay } from '#src/lib/say.ts';

export interface DayBoxProps {
  readonly label: string;
  readonly day: string;
  readonly covered: { readonly from: string; readonly until: string };
  readonly least?: string;
  /** The last day that may be asked for. */
  readonly most: string;
  readonly onDay: (day: string) => void;
}

/** As a `ref`: takes the focus once. */
function focusFirst(element: HTMLElement | null): void {
  element?.focus();
}

/** A day that reads as part of a sentence and can be written or picked where it stands. */
export function DayBox({ label, day, covered, least = covered.from, most, onDay }: DayBoxProps) {
  const id = useId();
  const [isOpen, setOpen] = useState(false);
  const [fault, setFault] = useState('');
  if (!isOpen) {
    return (
      <button type="button" className="day-box" aria-label={`${label}: ${sayDay(day)}. Change`} onClick={() => setOpen(true)}>
        {sayDay(day)}
      </button>
    );
  }
  const take = (text: string) => {
    if (text === day) return;
    const read = parsePlainDate(text);
    if (!read) return setFault('Pick a day that exists.');
    if (read < least) return setFault(least === covered.from ? `The law data begin on ${sayDay(covered.from)}.` : `Not before ${sayDay(least)}.`);
    if (read > most) return setFault(`The law data end on ${sayDay(covered.until)}; what comes later is not guessed.`);
    setFault('');
    onDay(read);
  };
  return (
    <span className="day-edit">
      <input
        type="date"
        // The field takes the place of the button that was just pressed: the focus belongs here.
        ref={focusFirst}
        aria-label={label}
        aria-describedby={fault ? id : undefined}
        aria-invalid={fault !== '' || undefined}
        defaultValue={day}
        min={least}
        max={most}
        onChange={(event) => event.target.value !== '' && take(event.target.value)}
        onBlur={() => {
          setOpen(false);
          setFault('');
        }}
        onKeyDown={(event) => (event.key === 'Enter' || event.key === 'Escape') && event.currentTarget.blur()}
      />
      {fault ? <span id={id} role="alert" className="day-fault">{fault}</span> : null}
    </span>
  );
}
