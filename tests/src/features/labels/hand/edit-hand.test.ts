import { describe, expect, test } from 'vitest';
import { NOTHING_BY_HAND, type AddedElement, type ByHand } from '#shared/contracts/by-hand.ts';
import { alignThings, around, copyThings, freeAll, groupThings, lockThings, moveThings, orderThings, pullFrame, removeThings, setStyle, spreadThings, withGroups } from '#src/features/labels/hand/edit-hand.ts';
import { snapFrame, snapLines, snapSides } from '#src/features/labels/hand/snap.ts';
import type { Scene } from '#shared/artwork/scene.ts';

const box = (id: string, x: number, y: number, width = 1000, height = 1000): AddedElement => ({ id, kind: 'box', frame: { x, y, width, height }, style: {} });
const three: ByHand = { freed: [], added: [box('a', 0, 0), box('b', 3000, 500), box('c', 10_000, 2000)] };
const xs = (byHand: ByHand) => byHand.added.map(({ frame }) => frame.x);
const room = { x: 2000, y: 2000, width: 50_000, height: 40_000 };

describe('changes by hand', () => {
  test('a move moves what is chosen, and nothing that is locked', () => {
    const locked = lockThings(three, ['own:b'], true);
    expect(xs(moveThings(locked, ['own:a', 'own:b'], 100, 0))).toEqual([100, 3000, 10_000]);
    expect(xs(moveThings(lockThings(locked, ['own:b'], false), ['own:a', 'own:b'], 100, 0))).toEqual([100, 3100, 10_000]);
  });

  test('a group is chosen whole, and falls apart when it is ungrouped', () => {
    const grouped = groupThings(three, ['own:a', 'own:c'], 'g1');
    expect(withGroups(grouped, ['own:c'])).toEqual(['own:c', 'own:a']);
    expect(withGroups(groupThings(grouped, ['own:a', 'own:c'], null), ['own:c'])).toEqual(['own:c']);
  });

  test('several line up with each other, one alone with the room', () => {
    expect(xs(alignThings(three, ['own:a', 'own:b', 'own:c'], 'right', room))).toEqual([10_000, 10_000, 10_000]);
    expect(alignThings(three, ['own:b'], 'centre', room).added[1]!.frame).toMatchObject({ x: 26_500, y: 500 });
    expect(alignThings(three, ['own:b'], 'bottom', room).added[1]!.frame).toMatchObject({ x: 3000, y: 41_000 });
  });

  test('three are spread at equal distances between the outer two', () => {
    expect(xs(spreadThings(three, ['own:a', 'own:b', 'own:c'], 'x'))).toEqual([0, 5000, 10_000]);
    expect(spreadThings(three, ['own:a', 'own:b'], 'x')).toBe(three);
  });

  test('an element of the template is set free once, and goes back when it is removed', () => {
    const free = () => ({ element: 'name' as const, frame: { x: 1, y: 2, width: 300, height: 400 }, style: {} });
    const once = freeAll(NOTHING_BY_HAND, ['name'], free);
    expect(once.freed).toHaveLength(1);
    expect(freeAll(once, ['name'], free)).toBe(once);
    expect(removeThings(once, ['name'])).toEqual(NOTHING_BY_HAND);
  });

  test('a copy has a name of its own and lies a little apart; the law’s elements are not copied', () => {
    const { byHand, copies } = copyThings(three, ['own:a', 'name'], () => 'z');
    expect(copies).toEqual(['own:z']);
    expect(byHand.added.at(-1)).toEqual(box('z', 2000, 2000));
  });

  test('what is brought to the front is painted last', () => {
    expect(orderThings(three, ['own:a'], 'front').added.map(({ id }) => id)).toEqual(['b', 'c', 'a']);
    expect(orderThings(three, ['own:c'], 'back').added.map(({ id }) => id)).toEqual(['c', 'a', 'b']);
  });

  test('a choice of style is taken back by leaving it empty', () => {
    const styled = setStyle(three, ['own:a'], { ink: 'tint' });
    expect(styled.added[0]!.style).toEqual({ ink: 'tint' });
    expect(setStyle(styled, ['own:a'], { ink: undefined }).added[0]!.style).toEqual({});
  });

  test('a frame pulled at a corner keeps the opposite corner and never turns inside out', () => {
    const frame = { x: 1000, y: 1000, width: 4000, height: 3000 };
    expect(pullFrame(frame, 'nw', -500, 200)).toEqual({ x: 500, y: 1200, width: 4500, height: 2800 });
    expect(pullFrame(frame, 'se', 500, 200)).toEqual({ x: 1000, y: 1000, width: 4500, height: 3200 });
    expect(pullFrame(frame, 'w', 90_000, 0)).toEqual({ x: 4500, y: 1000, width: 500, height: 3000 });
  });
});

describe('lines that edges are drawn to', () => {
  const scene = { trim: { width: 100_000, height: 60_000 }, safe: { x: 2000, y: 2000, width: 96_000, height: 56_000 }, panels: [{ name: 'Front', x: 30_000, y: 0, width: 40_000, height: 60_000 }] } as unknown as Scene;
  const lines = snapLines(scene, [{ x: 10_000, y: 10_000, width: 5000, height: 5000 }]);

  test('an edge near the safe room is drawn to it, one further off is not', () => {
    expect(snapFrame({ x: 2150, y: 33_000, width: 4000, height: 2000 }, lines, 300)).toMatchObject({ dx: -150, dy: 0 });
    expect(snapFrame({ x: 2500, y: 33_000, width: 4000, height: 2000 }, lines, 300)).toMatchObject({ dx: 0, dy: 0 });
  });

  test('a middle is drawn to the middle of the front', () => {
    expect(snapFrame({ x: 47_900, y: 33_000, width: 4000, height: 2000 }, lines, 300)).toMatchObject({ dx: 100, met: [{ axis: 'x', at: 50_000 }] });
  });

  test('a pulled side is drawn, the side that stays is not', () => {
    expect(snapSides({ x: 2100, y: 20_000, width: 8000, height: 2000 }, 'e', lines, 300)).toMatchObject({ dx: -100, dy: 0 });
  });

  test('the frame around several holds them all', () => {
    expect(around(three.added.map(({ frame }) => frame))).toEqual({ x: 0, y: 0, width: 11_000, height: 3000 });
  });
});
