import { useCallback, useEffect, useRef, useState, type PointerEvent, type RefObject } from 'react';

/** Where a dragged line would land. */
export interface Landing {
  readonly phaseId: string;
  /** Place in that phase, not counting the dragged line itself. */
  readonly place: number;
}

/** Movement below this is a press, not a drag. */
const THRESHOLD = 5;

interface Grab {
  readonly lineId: string;
  readonly pointer: number;
  readonly startY: number;
}

function landingAt(table: HTMLElement, y: number, lineId: string): Landing | null {
  const bodies = [...table.querySelectorAll<HTMLElement>('tbody[data-phase]')];
  const body = bodies.find((each) => y < each.getBoundingClientRect().bottom) ?? bodies.at(-1);
  if (!body) return null;
  const rows = [...body.querySelectorAll<HTMLElement>('tr[data-row]')].filter((row) => row.dataset.row !== lineId);
  const below = rows.findIndex((row) => {
    const box = row.getBoundingClientRect();
    return y < box.top + box.height / 2;
  });
  return { phaseId: body.dataset.phase!, place: below < 0 ? rows.length : below };
}

/** Dragging a line by its grip, within its phase or into another; Escape takes it back. */
export function useLineDrag(table: RefObject<HTMLTableElement | null>, onDrop: (lineId: string, landing: Landing) => void) {
  const [dragged, setDragged] = useState<{ lineId: string; landing: Landing } | null>(null);
  const grab = useRef<Grab | null>(null);
  const latest = useRef(dragged);
  useEffect(() => {
    latest.current = dragged;
  }, [dragged]);

  useEffect(() => {
    const move = (event: globalThis.PointerEvent) => {
      const held = grab.current;
      if (!held || event.pointerId !== held.pointer || !table.current) return;
      if (latest.current === null && Math.abs(event.clientY - held.startY) < THRESHOLD) return;
      event.preventDefault();
      const landing = landingAt(table.current, event.clientY, held.lineId);
      if (landing) setDragged({ lineId: held.lineId, landing });
    };
    const end = (event: globalThis.PointerEvent) => {
      if (event.pointerId !== grab.current?.pointer) return;
      const done = latest.current;
      grab.current = null;
      setDragged(null);
      if (done && event.type === 'pointerup') onDrop(done.lineId, done.landing);
    };
    const cancel = (event: KeyboardEvent) => {
      if (event.key !== 'Escape' || !latest.current) return;
      grab.current = null;
      setDragged(null);
    };
    addEventListener('pointermove', move);
    addEventListener('pointerup', end);
    addEventListener('pointercancel', end);
    addEventListener('keydown', cancel);
    return () => {
      removeEventListener('pointermove', move);
      removeEventListener('pointerup', end);
      removeEventListener('pointercancel', end);
      removeEventListener('keydown', cancel);
    };
  }, [table, onDrop]);

  const handleGrab = useCallback((event: PointerEvent, lineId: string) => {
    if (event.button !== 0) return;
    grab.current = { lineId, pointer: event.pointerId, startY: event.clientY };
  }, []);
  return { dragged, handleGrab };
}
