import { useRef, useState, type PointerEvent } from 'react';
import type { ByHand, HandFrame } from '#shared/contracts/by-hand.ts';
import type { HandKey } from '#shared/artwork/hand/elements.ts';
import type { Scene } from '#shared/artwork/scene.ts';
import { around, moveThings, pullFrame, setFrame, thingOf, withGroups, type Handle } from './edit-hand.ts';
import { snapFrame, snapLines, snapSides, type SnapLine } from './snap.ts';
import type { Hand } from './use-hand.ts';

export interface HandLayerProps {
  readonly hand: Hand;
  readonly scene: Scene;
  /** Millimetres of one pixel of the screen. */
  readonly px: number;
  readonly isLocked: boolean;
}

interface Drag {
  readonly pointer: number;
  readonly x: number;
  readonly y: number;
  readonly keys: readonly HandKey[];
  readonly handle: Handle | null;
  readonly join: string;
  /** The label the drag set out from; absent until the pointer has really moved. */
  base: ByHand | null;
  lines: readonly SnapLine[];
}

const HANDLES: readonly (readonly [Handle, number, number])[] = [['nw', 0, 0], ['n', 0.5, 0], ['ne', 1, 0], ['e', 1, 0.5], ['se', 1, 1], ['s', 0.5, 1], ['sw', 0, 1], ['w', 0, 0.5]];
/** Pixels a press may tremble before it becomes a drag, and within which lines draw an edge to them. */
const TREMBLE = 3;
const REACH = 6;
const mm = (micrometres: number): number => micrometres / 1000;

/** What can be taken in the hand, laid over the label: press to choose, drag to move, pull at the handles. */
export function HandLayer({ hand, scene, px, isLocked }: HandLayerProps) {
  const drag = useRef<Drag | null>(null);
  const [met, setMet] = useState<readonly SnapLine[]>([]);
  const micrometres = (pixels: number): number => Math.round(pixels * px * 1000);

  const begin = (event: PointerEvent<SVGElement>, keys: readonly HandKey[], handle: Handle | null): void => {
    if (event.button !== 0 || isLocked) return;
    event.stopPropagation();
    event.currentTarget.setPointerCapture(event.pointerId);
    drag.current = { pointer: event.pointerId, x: event.clientX, y: event.clientY, keys, handle, join: `hand:drag:${event.pointerId}:${event.timeStamp}`, base: null, lines: [] };
  };
  const follow = (event: PointerEvent<SVGElement>): void => {
    const held = drag.current;
    if (!held || held.pointer !== event.pointerId) return;
    const [across, down] = [event.clientX - held.x, event.clientY - held.y];
    if (!held.base) {
      if (Math.hypot(across, down) < TREMBLE) return;
      held.base = hand.begin(held.keys);
      const moving = new Set(withGroups(held.base, held.keys));
      held.lines = snapLines(scene, hand.things.filter(({ key }) => !moving.has(key)).map(({ frame }) => frame));
    }
    const reach = event.altKey ? 0 : micrometres(REACH);
    const { next, lines } = held.handle ? pulled(held, held.base, micrometres(across), micrometres(down), reach) : moved(held, held.base, micrometres(across), micrometres(down), reach);
    setMet(event.altKey ? [] : lines);
    hand.show(next, held.join);
  };
  const end = (): void => {
    drag.current = null;
    setMet([]);
  };
  const events = { onPointerMove: follow, onPointerUp: end, onPointerCancel: end };

  const single = hand.chosen.length === 1 ? hand.things.find(({ key }) => key === hand.chosen[0]) : undefined;
  return (
    <g className="hand">
      {hand.things.map(({ key, frame, isLocked: isHeld }) => {
        const isOn = hand.chosen.includes(key);
        return (
          <rect
            key={key} {...boxOf(frame, px)} className={`hand-thing${isOn ? ' on' : ''}${isHeld ? ' held' : ''}`} strokeWidth={(isOn ? 1.5 : 1) * px} data-key={key}
            onPointerDown={(event) => {
              const keys = isOn && !event.shiftKey ? hand.chosen : [key];
              if (!isOn || event.shiftKey) hand.choose(key, event.shiftKey);
              if (!isHeld) begin(event, keys, null);
              else event.stopPropagation();
            }}
            {...events}
          >
            <title>{hand.nameOf(key)}</title>
          </rect>
        );
      })}
      {single && !single.isLocked && !isLocked ? HANDLES.map(([handle, u, v]) => (
        <rect
          key={handle} className="hand-handle" style={{ cursor: `${handle}-resize` }} strokeWidth={1.5 * px}
          x={mm(single.frame.x + single.frame.width * u) - 4 * px} y={mm(single.frame.y + single.frame.height * v) - 4 * px} width={8 * px} height={8 * px}
          onPointerDown={(event) => begin(event, [single.key], handle)} {...events}
        />
      )) : null}
      {met.map((line) => (line.axis === 'x'
        ? <line key={`x${line.at}`} className="hand-guide" x1={mm(line.at)} x2={mm(line.at)} y1={-mm(scene.bleed)} y2={mm(scene.trim.height + scene.bleed)} strokeWidth={px} />
        : <line key={`y${line.at}`} className="hand-guide" y1={mm(line.at)} y2={mm(line.at)} x1={-mm(scene.bleed)} x2={mm(scene.trim.width + scene.bleed)} strokeWidth={px} />))}
    </g>
  );
}

function moved(held: Drag, base: ByHand, dx: number, dy: number, reach: number): { next: ByHand; lines: readonly SnapLine[] } {
  const keys = withGroups(base, held.keys);
  const frames = keys.flatMap((key) => thingOf(base, key)?.frame ?? []);
  if (frames.length === 0) return { next: base, lines: [] };
  const whole = around(frames);
  const snapped = snapFrame({ ...whole, x: whole.x + dx, y: whole.y + dy }, held.lines, reach);
  return { next: moveThings(base, keys, dx + snapped.dx, dy + snapped.dy), lines: snapped.met };
}

function pulled(held: Drag, base: ByHand, dx: number, dy: number, reach: number): { next: ByHand; lines: readonly SnapLine[] } {
  const [key] = held.keys;
  const frame = key && thingOf(base, key)?.frame;
  if (!key || !frame || !held.handle) return { next: base, lines: [] };
  const snapped = snapSides(pullFrame(frame, held.handle, dx, dy), held.handle, held.lines, reach);
  return { next: setFrame(base, key, pullFrame(frame, held.handle, dx + snapped.dx, dy + snapped.dy)), lines: snapped.met };
}

/** At least as large as a fingertip's pixel: thin rules can be pressed too. */
function boxOf(frame: HandFrame, px: number): { x: number; y: number; width: number; height: number } {
  const [width, height] = [Math.max(mm(frame.width), 8 * px), Math.max(mm(frame.height), 8 * px)];
  return { x: mm(frame.x) - (width - mm(frame.width)) / 2, y: mm(frame.y) - (height - mm(frame.height)) / 2, width, height };
}
