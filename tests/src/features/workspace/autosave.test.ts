import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import type { Product } from '#shared/contracts/products.contract.ts';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import { createAutosave, type SaveFault } from '#src/features/workspace/autosave.ts';
import { makeDraft, makeProduct } from '../fixtures.ts';

beforeEach(() => vi.useFakeTimers());
afterEach(() => vi.useRealTimers());

/** A server of one product: it counts versions and refuses stale ones. */
function setUp() {
  let stored = makeProduct();
  let fault: SaveFault | null = null;
  const sent: ProductDraft[] = [];
  const kept: { draft: ProductDraft; version: number }[] = [];
  let underWay = 0;
  let most = 0;
  const forget = vi.fn();
  const autosave = createAutosave({
    product: stored,
    delay: 100,
    judge: (draft) => (draft.name === '' ? 'Give it a name.' : null),
    keep: (draft, version) => kept.push({ draft, version }),
    forget,
    explain: (error) => error as SaveFault,
    send: async (version, draft) => {
      most = Math.max(most, ++underWay);
      await new Promise((resolve) => setTimeout(resolve, 50));
      underWay--;
      if (fault) throw fault;
      if (version !== stored.version) throw { kind: 'stale', theirs: stored } satisfies SaveFault;
      sent.push(draft);
      stored = { ...stored, version: version + 1, draft };
      return stored;
    },
  });
  return {
    autosave, sent, kept, forget,
    most: () => most,
    break: (next: SaveFault | null) => (fault = next),
    someoneElse: (change: Partial<ProductDraft>): Product => (stored = { ...stored, version: stored.version + 1, savedBy: 'Tom Reed', draft: { ...stored.draft, ...change } }),
  };
}
const named = (name: string) => makeDraft({ name });

test('several changes go as one, a moment after the last, and are kept on this computer until then', async () => {
  const desk = setUp();
  desk.autosave.change(named('A'));
  desk.autosave.change(named('AB'));
  expect(desk.autosave.state().kind).toBe('waiting');
  expect(desk.kept.at(-1)).toMatchObject({ draft: { name: 'AB' }, version: 7 });
  await vi.advanceTimersByTimeAsync(200);
  expect(desk.sent.map((draft) => draft.name)).toEqual(['AB']);
  expect(desk.autosave.state().kind).toBe('saved');
  expect(desk.forget).toHaveBeenCalledOnce();
});

test('one request is under way at a time, and what was typed meanwhile follows', async () => {
  const desk = setUp();
  desk.autosave.change(named('A'));
  await vi.advanceTimersByTimeAsync(110);
  desk.autosave.change(named('B'));
  desk.autosave.flush();
  await vi.advanceTimersByTimeAsync(500);
  expect(desk.sent.map((draft) => draft.name)).toEqual(['A', 'B']);
  expect(desk.most()).toBe(1);
  expect(desk.autosave.base().version).toBe(9);
});

test('a lost connection is said, the draft is kept, and saving goes on by itself', async () => {
  const desk = setUp();
  desk.break({ kind: 'unreachable', why: 'no connection' });
  desk.autosave.change(named('A'));
  await vi.advanceTimersByTimeAsync(200);
  expect(desk.autosave.state()).toEqual({ kind: 'not-saved', why: 'no connection', retries: true });
  expect(desk.forget).not.toHaveBeenCalled();
  desk.break(null);
  await vi.advanceTimersByTimeAsync(2_200);
  expect(desk.sent.map((draft) => draft.name)).toEqual(['A']);
});

test('a draft that cannot be saved yet says why and is not sent', async () => {
  const desk = setUp();
  desk.autosave.change(named(''));
  await vi.advanceTimersByTimeAsync(300);
  expect(desk.autosave.state()).toEqual({ kind: 'not-saved', why: 'Give it a name.', retries: false });
  expect(desk.sent).toEqual([]);
});

describe('two people saving the same product', () => {
  test('the second sees the other version and nothing is overwritten before she chooses', async () => {
    const desk = setUp();
    const theirs = desk.someoneElse({ brand: 'Other' });
    desk.autosave.change(named('Mine'));
    await vi.advanceTimersByTimeAsync(300);
    expect(desk.autosave.state()).toEqual({ kind: 'conflict', theirs });
    desk.autosave.change(named('Mine still'));
    await vi.advanceTimersByTimeAsync(60_000);
    expect(desk.sent).toEqual([]);
    desk.autosave.resolve(theirs, { ...theirs.draft, name: 'Mine still' });
    await vi.advanceTimersByTimeAsync(200);
    expect(desk.sent).toMatchObject([{ name: 'Mine still', brand: 'Other' }]);
  });
  test('a newer version comes in by itself only while nothing here is unsaved', () => {
    const desk = setUp();
    expect(desk.autosave.adopt(makeProduct(named('Newer'), 8))).toBe(true);
    desk.autosave.change(named('Typing'));
    expect(desk.autosave.adopt(makeProduct(named('Newest'), 9))).toBe(false);
  });
});
