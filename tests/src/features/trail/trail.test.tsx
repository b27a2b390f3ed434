// @vitest-environment jsdom
import { cleanup, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { listTrail, verifyTrail, type TrailLine } from '#shared/contracts/trail.contract.ts';
import { FakeServer, signedIn } from '#tests/support/fake-server.ts';
import { openRoom } from '#tests/support/open-room.tsx';

const line = (place: number, more: Partial<TrailLine> = {}): TrailLine => ({
  place, at: '2026-11-30T10:00:00.000Z', actor: 'Ines Tarrow', act: 'saved', subjectKind: 'product', subjectId: `00000000-0000-4000-8000-0000000000${10 + place}`, subject: `Wash ${place}`, productId: null, changes: [], hash: `${place}`.repeat(64).slice(0, 64), ...more,
});
let server: FakeServer;
beforeEach(() => {
  server = signedIn(new FakeServer());
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

test('entries stand by day, newest first, with who, what, and the change in words', async () => {
  server.on(listTrail, () => ({ items: [line(3, { changes: [{ where: 'Formula, phase, “Water”, line, 1, amount', before: '5', after: '6' }] }), line(2, { at: '2026-11-29T10:00:00.000Z', act: 'added' })] }));
  openRoom('/trail');
  const day = within(await screen.findByRole('region', { name: '30 Nov 2026' }));
  expect(day.getAllByRole('listitem')[0]!.textContent).toContain('Ines Tarrow saved Wash 3');
  expect(day.getByText('5').tagName).toBe('DEL');
  expect(day.getByText('6').tagName).toBe('INS');
  expect(screen.getByRole('region', { name: '29 Nov 2026' }).textContent).toContain('added Wash 2');
  expect(screen.getByText('This is the beginning of the trail.')).toBeTruthy();
});

test('older entries are fetched when asked, from where the page ended', async () => {
  const asked: (string | null)[] = [];
  server.on(listTrail, ({ query }) => {
    asked.push(query.get('before'));
    return query.get('before') ? { items: [line(1)] } : { items: [line(2)], next: 2 };
  });
  openRoom('/trail');
  await userEvent.click(await screen.findByRole('button', { name: 'Older entries' }));
  expect(await screen.findByText('Wash 1')).toBeTruthy();
  expect(asked).toEqual([null, '2']);
});

test('many changes wait behind their number', async () => {
  server.on(listTrail, () => ({ items: [line(2, { changes: Array.from({ length: 5 }, (_, i) => ({ where: `Part ${i}`, before: 'a', after: 'b' })) })] }));
  openRoom('/trail');
  expect(await screen.findByText('5 changes')).toBeTruthy();
});

test('a broken chain is told with its place and what to do', async () => {
  server.on(listTrail, () => ({ items: [line(2)] })).on(verifyTrail, () => ({ isWhole: false as const, entries: 9, place: 4, why: 'does not bear the seal of what it says' }));
  openRoom('/trail');
  await userEvent.click(await screen.findByRole('button', { name: 'Verify the chain' }));
  expect(await screen.findByText('The chain breaks at entry 4.')).toBeTruthy();
});
