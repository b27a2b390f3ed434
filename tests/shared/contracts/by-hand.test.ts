import fc from 'fast-check';
import { expect, test } from 'vitest';
import { byHand as contract, type ByHand } from '#shared/contracts/by-hand.ts';
import { DocumentWalk } from '#shared/contracts/document-walk.ts';
import { FREE_ELEMENTS } from '#shared/contracts/free-elements.ts';
import { readByHand } from '#shared/contracts/read-by-hand.ts';
import { layOutLabel } from '#shared/artwork/layout.ts';
import { plexMetrics } from '#shared/artwork/plex-metrics.ts';
import { bodyWash } from '../artwork/samples.ts';

const read = (value: unknown) => {
  const walk = new DocumentWalk();
  return { read: readByHand(walk, value), faults: walk.faults };
};

const frame = fc.record({ x: fc.integer({ min: -50_000, max: 250_000 }), y: fc.integer({ min: -50_000, max: 150_000 }), width: fc.integer({ min: 100, max: 200_000 }), height: fc.integer({ min: 100, max: 100_000 }) });
const style = fc.record({
  size: fc.integer({ min: 500, max: 60_000 }), weight: fc.constantFrom(300 as const, 400 as const, 500 as const, 600 as const, 700 as const), align: fc.constantFrom('left' as const, 'centre' as const, 'right' as const),
  tracking: fc.integer({ min: -30, max: 400 }), leading: fc.integer({ min: 900, max: 3000 }), capitals: fc.constant(true), ink: fc.constantFrom('black' as const, 'ink' as const, 'tint' as const, 'light' as const), columns: fc.integer({ min: 1, max: 4 }),
}, { requiredKeys: [] });
const common = { frame, style };
const text = fc.string({ minLength: 1, maxLength: 60 }).map((words) => words.trim()).filter((words) => words !== '');
const added = fc.array(fc.oneof(
  fc.record({ kind: fc.constant('text' as const), text, ...common }), fc.record({ kind: fc.constant('code' as const), text, ...common }),
  fc.record({ kind: fc.constant('rule' as const), ...common }), fc.record({ kind: fc.constantFrom('box' as const, 'oval' as const), ...common }),
), { maxLength: 5 }).map((list) => list.map((one, index) => ({ id: `t${index}`, ...one })));
const anyHand = fc.record({ freed: fc.uniqueArray(fc.record({ element: fc.constantFrom(...FREE_ELEMENTS), ...common }), { selector: (one) => one.element, maxLength: 6 }), added }) as fc.Arbitrary<ByHand>;

test('what the contract takes, the reader of documents reads back as it is', () => {
  fc.assert(fc.property(anyHand, (value) => {
    expect(contract.parse(value)).toEqual(value);
    expect(read(JSON.parse(JSON.stringify(value)))).toEqual({ read: value, faults: [] });
  }), { numRuns: 300 });
});

test('whatever is moved by hand, a label is laid out, in whole micrometres, with words for every fault', () => {
  fc.assert(fc.property(anyHand, (value) => {
    const { scene, misfits } = layOutLabel({ ...bodyWash, byHand: value }, plexMetrics);
    expect(scene).not.toBeNull();
    for (const misfit of misfits) expect(misfit.message).not.toMatch(/undefined|NaN|null/);
    for (const item of scene!.items) if (item.kind === 'text') expect([item.x, item.y, item.size].every(Number.isInteger)).toBe(true);
  }), { numRuns: 150 });
});

test.each([
  ['a figure that is no whole number', { freed: [{ element: 'name', frame: { x: 0.5, y: 0, width: 1000, height: 1000 } }] }, '/label/byHand/freed/0/frame/x'],
  ['a frame without width', { freed: [{ element: 'name', frame: { x: 0, y: 0, height: 1000 } }] }, '/label/byHand/freed/0/frame'],
  ['an element that is not known', { freed: [{ element: 'lid', frame: { x: 0, y: 0, width: 1000, height: 1000 } }] }, '/label/byHand/freed/0/element'],
  ['an element set free twice', { freed: [0, 1].map(() => ({ element: 'name', frame: { x: 0, y: 0, width: 1000, height: 1000 } })) }, '/label/byHand/freed'],
  ['a weight that the type lacks', { freed: [{ element: 'name', frame: { x: 0, y: 0, width: 1000, height: 1000 }, style: { weight: 450 } }] }, '/label/byHand/freed/0/style/weight'],
  ['a text without words', { added: [{ id: 'a', kind: 'text', text: ' ', frame: { x: 0, y: 0, width: 1000, height: 1000 } }] }, '/label/byHand/added/0/text'],
  ['a thing that is not a group of fields', { added: ['rule'] }, '/label/byHand/added/0'],
])('%s is a fault at its place', (_, value, pointer) => {
  expect(read(value).faults.map((fault) => fault.pointer)).toContain(pointer);
});
