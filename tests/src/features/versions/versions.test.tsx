// @vitest-environment jsdom
import { cleanup, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { getRevision, listRevisions } from '#shared/contracts/revisions.contract.ts';
import type { MarketAssessment } from '#shared/engine/assessment.ts';
import { setGrams } from '#src/features/formula/recipes.ts';
import { VersionsPanel } from '#src/features/versions/versions-panel.tsx';
import { FakeServer } from '#tests/support/fake-server.ts';
import { makeDraft, nameOf, uuid } from '../fixtures.ts';

const old = makeDraft();
const now = setGrams('gum', '7')(old);
const line = (version: number) => ({ version, savedAt: '2026-11-30T10:00:00.000Z', savedBy: 'Ines Tarrow' });
const result = (names: readonly string[], findings: readonly object[]) => ({ findings, requiredWording: [], declaration: { text: names.join(', '), entries: names.map((name) => ({ name })) } }) as unknown as MarketAssessment;
const stop = { kind: 'limit-exceeded', severity: 'stop', subject: 'Xanthan Gum', rule: 'r', message: 'Xanthan Gum: 7 % is too much.' };
const judge = vi.fn((draft: typeof now) => (draft === now ? result(['Aqua', 'Xanthan Gum'], [stop]) : result(['Aqua'], [])));

let server: FakeServer;
beforeEach(() => {
  server = new FakeServer().on(getRevision, ({ params }) => ({ ...line(Number(params['version'])), draft: old }));
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});
const open = (onTakeUp?: (draft: typeof now) => void) =>
  render(<QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}><VersionsPanel id={uuid(1)} draft={now} version={3} nameOf={nameOf} judge={judge as never} onTakeUp={onTakeUp} /></QueryClientProvider>);

test('the last version is compared with what stands now: each change in words, and what the law says to it', async () => {
  server.on(listRevisions, () => ({ items: [line(3), line(2), line(1)] }));
  open();
  const table = within(await screen.findByRole('table'));
  expect(table.getByRole('row', { name: /Xanthan gum/ }).textContent).toMatch(/7 g$/);
  const law = within(screen.getByRole('region', { name: 'What the law says to it' }));
  // Said once for all the markets in which it is the same.
  expect(law.getAllByRole('heading', { level: 4 }).map((one) => one.textContent)).toEqual([now.markets.length > 1 ? `${now.markets.slice(0, -1).join(', ')} and ${now.markets.at(-1)}` : now.markets[0]]);
  expect(law.getByText(/7 % is too much/)).toBeTruthy();
  expect(law.getByText(/now names Xanthan Gum/)).toBeTruthy();
  expect(screen.getByLabelText<HTMLSelectElement>('Compare with').value).toBe('2');
});

test('an earlier version is taken up again at a press', async () => {
  server.on(listRevisions, () => ({ items: [line(3), line(2)] }));
  const onTakeUp = vi.fn();
  open(onTakeUp);
  await userEvent.click(await screen.findByRole('button', { name: 'Take version 2 up again' }));
  expect(onTakeUp).toHaveBeenCalledExactlyOnceWith(old);
});

test('a reader is offered no way to change it', async () => {
  server.on(listRevisions, () => ({ items: [line(3), line(2)] }));
  open();
  await screen.findByRole('table');
  expect(screen.queryByRole('button', { name: /again/ })).toBeNull();
});

test('a product saved once says that there is nothing to compare yet', async () => {
  server.on(listRevisions, () => ({ items: [line(3)] }));
  open();
  expect(await screen.findByText(/one version so far/)).toBeTruthy();
});
