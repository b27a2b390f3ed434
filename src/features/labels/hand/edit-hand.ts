import type { AddedElement, ByHand, FreedElement, HandFrame, HandStyle } from '#shared/contracts/by-hand.ts';
import type { FreeElement } from '#shared/contracts/free-elements.ts';
import type { HandKey } from '#shared/artwork/hand/elements.ts';

/** One thing that was changed by hand, whichever list it stands in. */
export type HandThing = FreedElement | AddedElement;

export function keyOfThing(thing: HandThing): HandKey {
  return 'element' in thing ? thing.element : `own:${thing.id}`;
}

export function thingOf(byHand: ByHand, key: HandKey): HandThing | undefined {
  return [...byHand.freed, ...byHand.added].find((thing) => keyOfThing(thing) === key);
}

/** All that move together with one thing: its group, or itself. */
export function withGroups(byHand: ByHand, keys: readonly HandKey[]): readonly HandKey[] {
  const groups = new Set(keys.flatMap((key) => thingOf(byHand, key)?.group ?? []));
  const fellows = [...byHand.freed, ...byHand.added].filter(({ group }) => group !== undefined && groups.has(group)).map(keyOfThing);
  return [...new Set([...keys, ...fellows])];
}

/** Every chosen thing that is not locked, changed. */
export function changeThings(byHand: ByHand, keys: readonly HandKey[], change: <T extends HandThing>(thing: T) => T, evenLocked = false): ByHand {
  const chosen = new Set(keys);
  const apply = <T extends HandThing>(thing: T): T => (chosen.has(keyOfThing(thing)) && (evenLocked || !thing.locked) ? change(thing) : thing);
  return { freed: byHand.freed.map(apply), added: byHand.added.map(apply) };
}

/** Elements of the template among the keys are set free first; what is free already stays as it is. */
export function freeAll(byHand: ByHand, keys: readonly HandKey[], free: (element: FreeElement) => FreedElement | null): ByHand {
  const news = keys.flatMap((key) => (key.startsWith('own:') || thingOf(byHand, key) ? [] : (free(key as FreeElement) ?? [])));
  return news.length === 0 ? byHand : { ...byHand, freed: [...byHand.freed, ...news] };
}

export function moveThings(byHand: ByHand, keys: readonly HandKey[], dx: number, dy: number): ByHand {
  return changeThings(byHand, keys, (thing) => ({ ...thing, frame: { ...thing.frame, x: thing.frame.x + dx, y: thing.frame.y + dy } }));
}

export function setFrame(byHand: ByHand, key: HandKey, frame: HandFrame): ByHand {
  return changeThings(byHand, [key], (thing) => ({ ...thing, frame }));
}

/** `undefined` in a style takes the choice back. */
export function setStyle(byHand: ByHand, keys: readonly HandKey[], style: Partial<{ [K in keyof HandStyle]: HandStyle[K] | undefined }>): ByHand {
  return changeThings(byHand, keys, (thing) => ({ ...thing, style: Object.fromEntries(Object.entries({ ...thing.style, ...style }).filter(([, value]) => value !== undefined)) }));
}

/** Freed elements go back into their template; own things go. Locked ones stay. */
export function removeThings(byHand: ByHand, keys: readonly HandKey[]): ByHand {
  const stays = (thing: HandThing): boolean => Boolean(thing.locked) || !keys.includes(keyOfThing(thing));
  return { freed: byHand.freed.filter(stays), added: byHand.added.filter(stays) };
}

export function addThing(byHand: ByHand, thing: AddedElement): ByHand {
  return { ...byHand, added: [...byHand.added, thing] };
}

/** Copies of own things, a little lower and to the right; an element of the law stands once and is not copied. */
export function copyThings(byHand: ByHand, keys: readonly HandKey[], newId: () => string): { byHand: ByHand; copies: readonly HandKey[] } {
  const copies = byHand.added.filter((thing) => keys.includes(keyOfThing(thing))).map((thing) => ({ ...thing, id: newId(), frame: { ...thing.frame, x: thing.frame.x + 2000, y: thing.frame.y + 2000 }, locked: undefined, group: undefined })).map((thing) => JSON.parse(JSON.stringify(thing)) as AddedElement);
  return { byHand: { ...byHand, added: [...byHand.added, ...copies] }, copies: copies.map(keyOfThing) };
}

export function lockThings(byHand: ByHand, keys: readonly HandKey[], locked: boolean): ByHand {
  return changeThings(byHand, keys, ({ locked: _, ...thing }) => ({ ...thing, ...(locked && { locked }) }) as never, true);
}

export function groupThings(byHand: ByHand, keys: readonly HandKey[], group: string | null): ByHand {
  return changeThings(byHand, keys, ({ group: _, ...thing }) => ({ ...thing, ...(group !== null && { group }) }) as never, true);
}

/** Own things further back or further to the front; among themselves they keep their order. */
export function orderThings(byHand: ByHand, keys: readonly HandKey[], to: 'front' | 'back'): ByHand {
  const isChosen = (thing: AddedElement): boolean => keys.includes(keyOfThing(thing));
  const [chosen, others] = [byHand.added.filter(isChosen), byHand.added.filter((thing) => !isChosen(thing))];
  return { ...byHand, added: to === 'front' ? [...others, ...chosen] : [...chosen, ...others] };
}

export type Alignment = 'left' | 'centre' | 'right' | 'top' | 'middle' | 'bottom';

/** Lines frames up: several with each other, one alone with the room it is given. */
export function alignThings(byHand: ByHand, keys: readonly HandKey[], how: Alignment, room: HandFrame): ByHand {
  const frames = keys.flatMap((key) => thingOf(byHand, key)?.frame ?? []);
  const whole = frames.length > 1 ? around(frames) : room;
  return changeThings(byHand, keys, (thing) => {
    const { width, height } = thing.frame;
    const x = { left: whole.x, centre: whole.x + Math.round((whole.width - width) / 2), right: whole.x + whole.width - width }[how as 'left'];
    const y = { top: whole.y, middle: whole.y + Math.round((whole.height - height) / 2), bottom: whole.y + whole.height - height }[how as 'top'];
    return { ...thing, frame: { ...thing.frame, ...(x !== undefined && { x }), ...(y !== undefined && { y }) } };
  });
}

/** Three or more at equal distances between the outermost two. */
export function spreadThings(byHand: ByHand, keys: readonly HandKey[], along: 'x' | 'y'): ByHand {
  const side = along === 'x' ? 'width' : 'height';
  const things = keys.flatMap((key) => thingOf(byHand, key) ?? []).sort((a, b) => a.frame[along] - b.frame[along]);
  if (things.length < 3) return byHand;
  const [first, last] = [things[0]!, things.at(-1)!];
  const filled = things.reduce((total, { frame }) => total + frame[side], 0);
  const gap = (last.frame[along] + last.frame[side] - first.frame[along] - filled) / (things.length - 1);
  const at = new Map<HandKey, number>();
  let place = first.frame[along];
  for (const thing of things) {
    at.set(keyOfThing(thing), Math.round(place));
    place += thing.frame[side] + gap;
  }
  return changeThings(byHand, keys, (thing) => ({ ...thing, frame: { ...thing.frame, [along]: at.get(keyOfThing(thing)) ?? thing.frame[along] } }));
}

/** The least frame around several. */
export function around(frames: readonly HandFrame[]): HandFrame {
  const x = Math.min(...frames.map((frame) => frame.x));
  const y = Math.min(...frames.map((frame) => frame.y));
  return { x, y, width: Math.max(...frames.map((frame) => frame.x + frame.width)) - x, height: Math.max(...frames.map((frame) => frame.y + frame.height)) - y };
}

export type Handle = 'nw' | 'n' | 'ne' | 'e' | 'se' | 's' | 'sw' | 'w';
const LEAST = 500;

/** A frame pulled at one of its handles; the opposite side stays, and no side goes under half a millimetre. */
export function pullFrame(frame: HandFrame, handle: Handle, dx: number, dy: number): HandFrame {
  let { x, y, width, height } = frame;
  if (handle.includes('e')) width = Math.max(LEAST, width + dx);
  if (handle.includes('s')) height = Math.max(LEAST, height + dy);
  if (handle.includes('w')) [x, width] = [Math.min(x + dx, x + width - LEAST), Math.max(LEAST, width - dx)];
  if (handle.includes('n')) [y, height] = [Math.min(y + dy, y + height - LEAST), Math.max(LEAST, height - dy)];
  return { x, y, width, height };
}
