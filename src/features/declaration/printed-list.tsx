import { memo, useRef, useState, type KeyboardEvent } from 'react';
import { Dialog } from 'react-aria-components/Dialog';
import { Popover } from 'react-aria-components/Popover';
import { EntrySum, sayShare, type ListedEntry } from './entry-sum.tsx';

export interface PrintedListProps {
  readonly heading: string;
  readonly entries: readonly ListedEntry[];
  readonly totalGrams: string;
  readonly lit: ReadonlySet<string>;
  readonly onLight: (key: string | null) => void;
  /** The bracket or sentence around the shades, as the market prints it. */
  readonly market: string;
  /** Language of the printed names for those who hear them: none, they are INCI. */
  readonly label: string;
}

/** The list as it must be printed, at true size; each name opens to its arithmetic. */
export const PrintedList = memo(function PrintedList({ heading, entries, totalGrams, lit, onLight, market, label }: PrintedListProps) {
  const box = useRef<HTMLDivElement>(null);
  const [active, setActive] = useState(0);
  const [open, setOpen] = useState<string | null>(null);
  const shades = entries.filter((entry) => entry.zone === 'may-contain');
  const listed = entries.filter((entry) => entry.zone !== 'may-contain');
  const opened = entries.find((entry) => entry.key === open);
  const stop = Math.min(active, entries.length - 1);
  const handleKey = (event: KeyboardEvent, index: number, key: string) => {
    const by = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 }[event.key];
    if (by !== undefined && !event.altKey) {
      event.preventDefault();
      box.current?.querySelectorAll<HTMLElement>('[data-word]')[Math.max(0, Math.min(entries.length - 1, index + by))]?.focus();
    } else if (event.key === 'Enter' || event.key === ' ') {
      event.preventDefault();
      setOpen(key);
    }
  };
  const word = (entry: ListedEntry, index: number) => (
    <span
      // Not a button element: its words must break over lines just as they will in print.
      role="button"
      data-word={entry.key}
      tabIndex={index === stop ? 0 : -1}
      aria-haspopup="dialog"
      aria-expanded={open === entry.key}
      className={`word ${entry.isUnsure ? 'unsure' : ''} ${lit.has(entry.key) ? 'lit' : ''}`}
      onPointerEnter={() => onLight(entry.key)}
      onPointerLeave={() => onLight(null)}
      onFocus={() => {
        setActive(index);
        onLight(entry.key);
      }}
      onBlur={() => onLight(null)}
      onClick={() => setOpen(entry.key)}
      onKeyDown={(event) => handleKey(event, index, entry.key)}
    >
      {entry.name}
    </span>
  );
  const anchor = useRef<Element | null>(null);
  return (
    <div className="printed" ref={box} role="group" aria-label={label}>
      <div className="dimension" aria-hidden="true"><span>64 mm</span></div>
      <div className="slip printed-text">
        <b>{heading}:</b>{' '}
        {listed.map((entry, index) => (
          <span key={entry.key}>
            {word(entry, index)}
            {index < listed.length - 1 ? ', ' : ''}
          </span>
        ))}
        {shades.length > 0 ? (
          <span>
            {market === 'US' ? '. May contain: ' : ', [+/- '}
            {shades.map((entry, index) => (
              <span key={entry.key}>
                {word(entry, listed.length + index)}
                {index < shades.length - 1 ? ', ' : ''}
              </span>
            ))}
            {market === 'US' ? '' : ']'}
          </span>
        ) : null}
        {entries.length === 0 ? <span className="none">Nothing to list yet.</span> : null}
      </div>
      {opened ? (
        <Popover
          className="popover sum-popover"
          isOpen
          onOpenChange={(isOpen) => {
            if (!isOpen) setOpen(null);
          }}
          triggerRef={{
            get current() {
              anchor.current = [...(box.current?.querySelectorAll<HTMLElement>('[data-word]') ?? [])].find((each) => each.dataset.word === opened.key) ?? box.current;
              return anchor.current;
            },
          }}
          placement="bottom start"
        >
          <Dialog aria-label={`How ${opened.name} comes to stand here`} className="sum-dialog">
            <h3>{opened.name}, {sayShare(opened.exact)} %</h3>
            <EntrySum entry={opened} totalGrams={totalGrams} />
          </Dialog>
        </Popover>
      ) : null}
    </div>
  );
});
