import { useCallback, useMemo, useState } from 'react';
import { NOTHING_BY_HAND, type AddedElement, type ByHand, type HandFrame, type HandStyle } from '#shared/contracts/by-hand.ts';
import type { Picture } from '#shared/contracts/pictures.contract.ts';
import type { LabelSettings } from '#shared/contracts/product-draft.ts';
import type { FreeElement } from '#shared/contracts/free-elements.ts';
import { freeElement, handBoxes, type HandKey } from '#shared/artwork/hand/elements.ts';
import { plexMetrics } from '#shared/artwork/plex-metrics.ts';
import type { Scene } from '#shared/artwork/scene.ts';
import { addThing, alignThings, copyThings, freeAll, groupThings, keyOfThing, lockThings, moveThings, orderThings, removeThings, setFrame, setStyle, spreadThings, thingOf, withGroups, type Alignment } from './edit-hand.ts';
import { nameOfThing } from './things.ts';

export interface HandOptions {
  readonly label: LabelSettings;
  /** The house's pictures, whose names stand in lists. */
  readonly pictures?: readonly Pick<Picture, 'id' | 'name'>[] | undefined;
  /** The straight scene on which things are moved. */
  readonly scene: Scene | null;
  readonly onChange: (label: LabelSettings, join?: string) => void;
}

/** A thing that can be chosen: where it stands, and whether it was changed by hand. */
export interface Chosen {
  readonly key: HandKey;
  readonly frame: HandFrame;
  readonly isFree: boolean;
  readonly isLocked: boolean;
}

let made = 0;
/** A name that no other thing of this label bears. */
function newName(byHand: ByHand): string {
  const taken = new Set(byHand.added.map(({ id }) => id));
  do made += 1; while (taken.has(`t${made}`));
  return `t${made}`;
}

/** The choice and every act of composing by hand, as steps of the product's own history. */
export function useHand({ label, scene, pictures, onChange }: HandOptions) {
  const byHand = label.byHand ?? NOTHING_BY_HAND;
  const [chosen, setChosen] = useState<readonly HandKey[]>([]);
  const boxes = useMemo(() => (scene ? handBoxes(scene, plexMetrics) : new Map<HandKey, HandFrame>()), [scene]);
  const free = useCallback((element: FreeElement) => (scene ? freeElement(scene, element, plexMetrics) : null), [scene]);
  // What has no ink just now, as a text whose words are being rewritten, is still there to be chosen.
  const things = useMemo(() => [...new Set([...boxes.keys(), ...[...byHand.freed, ...byHand.added].map(keyOfThing)])].map((key): Chosen => {
    const thing = thingOf(byHand, key);
    return { key, frame: thing?.frame ?? boxes.get(key)!, isFree: thing !== undefined, isLocked: Boolean(thing?.locked) };
  }), [boxes, byHand]);
  const keys = useMemo(() => chosen.filter((key) => boxes.has(key) || thingOf(byHand, key)), [chosen, boxes, byHand]);

  const set = (next: ByHand, join?: string): void => {
    if (next === byHand) return;
    const isEmpty = next.freed.length + next.added.length === 0;
    onChange({ ...label, byHand: isEmpty ? undefined : next }, join);
  };
  const all = (): readonly HandKey[] => withGroups(byHand, keys);
  /** The label with the chosen elements set free, so that they can be changed. */
  const freed = (which: readonly HandKey[] = all()): ByHand => freeAll(byHand, which, free);

  return {
    byHand, things, chosen: keys,
    /** How it is set now, by hand or by the template. */
    styleOf: (key: HandKey): HandStyle => thingOf(byHand, key)?.style ?? (key.startsWith('own:') ? {} : (free(key as FreeElement)?.style ?? {})),
    nameOf: (key: HandKey) => nameOfThing(byHand, key, pictures),
    choose: (key: HandKey | null, isMore = false) => setChosen((before) => (key === null ? [] : isMore ? (before.includes(key) ? before.filter((one) => one !== key) : [...before, key]) : withGroups(byHand, [key]))),
    chooseAll: () => setChosen(things.map(({ key }) => key)),
    /** Sets the chosen free and gives the label on which a drag begins. */
    begin: (which: readonly HandKey[]): ByHand => freeAll(byHand, withGroups(byHand, which), free),
    show: (next: ByHand, join: string) => set(next, join),
    move: (dx: number, dy: number) => set(moveThings(freed(), all(), dx, dy), `hand:move:${keys.join()}`),
    resize: (frame: HandFrame) => { if (keys[0]) set(setFrame(freed([keys[0]]), keys[0], frame), `hand:size:${keys[0]}`); },
    style: (style: Partial<{ [K in keyof HandStyle]: HandStyle[K] | undefined }>) => set(setStyle(freed(keys), keys, style), `hand:style:${keys.join()}:${Object.keys(style).join()}`),
    text: (text: string) => { const [key] = keys; if (key) set({ ...byHand, added: byHand.added.map((one) => (`own:${one.id}` === key && 'text' in one ? { ...one, text } : one)) }, `hand:text:${key}`); },
    stroke: (stroke: number | undefined) => set({ ...byHand, added: byHand.added.map((one) => (keys.includes(`own:${one.id}`) && (one.kind === 'box' || one.kind === 'oval') ? { ...one, stroke } : one)) }),
    align: (how: Alignment) => { if (scene) set(alignThings(freed(keys), keys, how, scene.safe)); },
    spread: (along: 'x' | 'y') => set(spreadThings(freed(keys), keys, along)),
    lock: (locked: boolean) => set(lockThings(freed(keys), keys, locked)),
    group: (isGroup: boolean) => set(groupThings(freed(keys), keys, isGroup ? `g${newName(byHand)}` : null)),
    order: (to: 'front' | 'back') => set(orderThings(byHand, keys, to)),
    remove: () => { set(removeThings(byHand, all())); setChosen([]); },
    copy: () => { const { byHand: next, copies } = copyThings(byHand, keys, () => newName(byHand)); set(next); if (copies.length > 0) setChosen(copies); },
    add: (make: (id: string) => AddedElement) => { const thing = make(newName(byHand)); set(addThing(byHand, thing)); setChosen([`own:${thing.id}`]); },
    reset: () => { set(NOTHING_BY_HAND); setChosen([]); },
  };
}
export type Hand = ReturnType<typeof useHand>;
