import { useRef, useState, type KeyboardEvent, type PointerEvent } from 'react';
import { Icon } from '#src/ui/icon.tsx';
import { VerdictMark } from '#src/ui/verdict-mark.tsx';
import { placeAt, type LadderGeometry, type Placed } from './geometry.ts';
import { roughly } from './figures.ts';

export interface LadderRowsProps {
  readonly geometry: LadderGeometry;
  readonly lit: ReadonlySet<string>;
  readonly onLight: (key: string | null) => void;
  readonly onMove?: (key: string, place: number) => void;
  readonly onOpen?: (key: string) => void;
}

interface Drag {
  readonly key: string;
  readonly grab: number;
  readonly top: number;
}

/** The rows at the right: one tab stop, arrows between rows, Alt with an arrow moves a free one. */
export function LadderRows({ geometry, lit, onLight, onMove, onOpen }: LadderRowsProps) {
  const list = useRef<HTMLUListElement>(null);
  const [active, setActive] = useState<string | null>(null);
  const [drag, setDrag] = useState<Drag | null>(null);
  const keys = geometry.rungs.map((placed) => placed.rung.key);
  const free = geometry.rungs.filter((placed) => placed.rung.isFree).map((placed) => placed.rung.key);
  const stop = active !== null && keys.includes(active) ? active : keys[0];
  const isMovable = (placed: Placed) => placed.rung.isFree && onMove !== undefined && free.length > 1;

  const focusRow = (index: number) => list.current?.querySelectorAll<HTMLElement>('[role="option"]')[Math.max(0, Math.min(index, keys.length - 1))]?.focus();
  const handleKey = (event: KeyboardEvent, placed: Placed) => {
    const by = event.key === 'ArrowUp' ? -1 : event.key === 'ArrowDown' ? 1 : 0;
    if (by !== 0) {
      event.preventDefault();
      if (!event.altKey) return focusRow(placed.index + by);
      const place = free.indexOf(placed.rung.key) + by;
      if (isMovable(placed) && place >= 0 && place < free.length) onMove?.(placed.rung.key, place);
    } else if (event.key === 'Home' || event.key === 'End') {
      event.preventDefault();
      focusRow(event.key === 'Home' ? 0 : keys.length - 1);
    } else if (event.key === 'Enter' || event.key === ' ') {
      event.preventDefault();
      onOpen?.(placed.rung.key);
    }
  };
  const handleDown = (event: PointerEvent<HTMLElement>, placed: Placed) => {
    const isGrip = (event.target as Element).closest('.grip') !== null;
    // On touch only the grip drags, so that the page can still be scrolled over the rows.
    if (!isMovable(placed) || event.button !== 0 || (event.pointerType === 'touch' && !isGrip)) return;
    event.preventDefault();
    event.currentTarget.focus();
    event.currentTarget.setPointerCapture(event.pointerId);
    setDrag({ key: placed.rung.key, grab: event.clientY - placed.row, top: placed.row });
  };
  const handleDrag = (event: PointerEvent<HTMLElement>) => {
    if (!drag) return;
    const top = event.clientY - drag.grab;
    setDrag({ ...drag, top });
    const place = placeAt(geometry, top);
    if (place !== free.indexOf(drag.key)) onMove?.(drag.key, place);
  };

  return (
    <ul className="rows" role="listbox" aria-label="Ingredients in printed order" ref={list}>
      {geometry.rungs.map((placed) => {
        const { rung } = placed;
        const isDragged = drag?.key === rung.key;
        const movable = isMovable(placed);
        const style = { width: geometry.rowWidth - 4, top: (isDragged ? drag.top : placed.row) - 11 };
        return (
          <li
            key={rung.key}
            role="option"
            aria-selected={lit.has(rung.key)}
            tabIndex={rung.key === stop ? 0 : -1}
            className={`${movable ? 'free' : ''} ${rung.zone === 'unnamed' ? 'off' : ''} ${isDragged ? 'drag' : ''} ${lit.has(rung.key) ? 'lit' : ''}`}
            style={style}
            onFocus={() => {
              setActive(rung.key);
              onLight(rung.key);
            }}
            onBlur={() => onLight(null)}
            onPointerEnter={() => onLight(rung.key)}
            onPointerLeave={() => onLight(null)}
            onKeyDown={(event) => handleKey(event, placed)}
            onClick={() => (movable ? undefined : onOpen?.(rung.key))}
            onDoubleClick={() => onOpen?.(rung.key)}
            onPointerDown={(event) => handleDown(event, placed)}
            onPointerMove={isDragged ? handleDrag : undefined}
            onPointerUp={isDragged ? () => setDrag(null) : undefined}
            onPointerCancel={isDragged ? () => setDrag(null) : undefined}
          >
            <span className="name">{rung.name}</span>
            {rung.isUnsure ? <VerdictMark weight="decide" silent /> : null}
            <span className="share" title={`${rung.typical} %`}>
              {rung.zone === 'unnamed' ? `at most ${roughly(rung.max)}` : roughly(rung.typical)}
              <span className="sr-only"> percent{rung.isUnsure ? ', needs a decision' : ''}{movable ? ', may stand anywhere in the free zone; Alt and an arrow key move it' : ''}</span>
            </span>
            <span className="grip">{movable ? <Icon name="grip" /> : null}</span>
          </li>
        );
      })}
    </ul>
  );
}
