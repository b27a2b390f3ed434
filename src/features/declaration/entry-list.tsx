import { useRef, useState, type KeyboardEvent, type PointerEvent } from 'react';
import { IconButton } from '#src/ui/button.tsx';
import { Icon } from '#src/ui/icon.tsx';
import { VerdictMark } from '#src/ui/verdict-mark.tsx';
import { EntrySum, sayShare, type ListedEntry } from './entry-sum.tsx';

export interface EntryListProps {
  readonly entries: readonly ListedEntry[];
  readonly totalGrams: string;
  /** `below 1 %` or `1 % or less`. */
  readonly freeLine: string;
  readonly lit: ReadonlySet<string>;
  readonly onLight: (key: string | null) => void;
  readonly onMove?: (key: string, place: number) => void;
}

const ZONE_HEAD: Readonly<Record<ListedEntry['zone'], string>> = {
  ordered: 'In descending order',
  free: 'Any order',
  allergen: 'Any order',
  colourant: 'Colourants close the list',
  'may-contain': 'May contain',
  unnamed: '',
};
const headOf = (entry: ListedEntry, freeLine: string) => (entry.isFree ? `${ZONE_HEAD.free}, ${freeLine}` : ZONE_HEAD[entry.zone]);

/** Every entry as a row: number, name, share; it opens to its sum, and free ones can be moved. */
export function EntryList({ entries, totalGrams, freeLine, lit, onLight, onMove }: EntryListProps) {
  const list = useRef<HTMLOListElement>(null);
  const [open, setOpen] = useState<ReadonlySet<string>>(new Set());
  const drag = useRef<{ key: string; pointer: number } | null>(null);
  const [dragged, setDragged] = useState<string | null>(null);
  const free = entries.filter((entry) => entry.isFree).map((entry) => entry.key);
  const toggle = (key: string) => setOpen((before) => (before.has(key) ? new Set([...before].filter((each) => each !== key)) : new Set([...before, key])));
  const move = (key: string, by: number) => {
    const place = free.indexOf(key) + by;
    if (place >= 0 && place < free.length) onMove?.(key, place);
  };
  const handleKey = (event: KeyboardEvent, key: string) => {
    if (!event.altKey || (event.key !== 'ArrowUp' && event.key !== 'ArrowDown')) return;
    event.preventDefault();
    move(key, event.key === 'ArrowUp' ? -1 : 1);
  };
  const handleDrag = (event: PointerEvent) => {
    const held = drag.current;
    if (!held || event.pointerId !== held.pointer) return;
    const rows = [...(list.current?.querySelectorAll<HTMLElement>('[data-free]') ?? [])];
    const at = rows.findIndex((row) => event.clientY < row.getBoundingClientRect().bottom);
    const place = at < 0 ? rows.length - 1 : at;
    if (place !== free.indexOf(held.key)) onMove?.(held.key, place);
  };
  const endDrag = () => {
    drag.current = null;
    setDragged(null);
  };
  return (
    <ol className="entry-list" ref={list}>
      {entries.map((entry, index) => {
        const movable = entry.isFree && onMove !== undefined && free.length > 1;
        const place = free.indexOf(entry.key);
        const head = headOf(entry, freeLine);
        const isNewZone = index === 0 || head !== headOf(entries[index - 1]!, freeLine);
        return (
          <li
            key={entry.key}
            data-free={entry.isFree || undefined}
            className={`${lit.has(entry.key) ? 'lit' : ''} ${dragged === entry.key ? 'drag' : ''}`}
            onPointerEnter={() => onLight(entry.key)}
            onPointerLeave={() => onLight(null)}
          >
            {isNewZone ? <p className="zone-head">{head}</p> : null}
            <div className="entry-row">
              <span
                className={`grip ${movable ? 'can' : ''}`}
                onPointerDown={(event) => {
                  if (!movable || event.button !== 0) return;
                  event.currentTarget.setPointerCapture(event.pointerId);
                  drag.current = { key: entry.key, pointer: event.pointerId };
                  setDragged(entry.key);
                }}
                onPointerMove={handleDrag}
                onPointerUp={endDrag}
                onPointerCancel={endDrag}
              >
                {movable ? <Icon name="grip" /> : null}
              </span>
              <button type="button" className="entry-name" aria-expanded={open.has(entry.key)} onClick={() => toggle(entry.key)} onKeyDown={(event) => movable && handleKey(event, entry.key)} onFocus={() => onLight(entry.key)} onBlur={() => onLight(null)}>
                <span className="place">{index + 1}</span>
                <span>{entry.name}</span>
                {entry.isUnsure ? <VerdictMark weight="decide" /> : null}
              </button>
              <span className="share" title={`${entry.exact.typical} %`}>{sayShare(entry.exact)} %</span>
              <span className="moves">
                {movable ? (
                  <>
                    <IconButton icon="up" word={`${entry.name}: earlier`} disabled={place === 0} onClick={() => move(entry.key, -1)} />
                    <IconButton icon="down" word={`${entry.name}: later`} disabled={place === free.length - 1} onClick={() => move(entry.key, 1)} />
                  </>
                ) : null}
              </span>
            </div>
            {open.has(entry.key) ? <EntrySum entry={entry} totalGrams={totalGrams} /> : null}
          </li>
        );
      })}
    </ol>
  );
}
