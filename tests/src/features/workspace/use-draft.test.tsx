// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { act, cleanup, render, renderHook, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import type { ReactNode } from 'react';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { ConflictDialog } from '#src/features/workspace/conflict-dialog.tsx';
import { isDraft, judgeDraft, useDraftDesk } from '#src/features/workspace/use-draft.ts';
import { draftStore } from '#src/lib/drafts.ts';
import { makeDraft, makeProduct, nameOf, uuid } from '../fixtures.ts';

const store = () => draftStore('house', 'product', uuid(90), isDraft);
const wrapper = ({ children }: { children: ReactNode }) => <QueryClientProvider client={new QueryClient()}>{children}</QueryClientProvider>;
const rename = (name: string) => (draft: ReturnType<typeof makeDraft>) => ({ ...draft, name });

beforeEach(() => {
  localStorage.clear();
  // The test page has no CSS object; the dialog's library asks it to escape names.
  vi.stubGlobal('CSS', { escape: (text: string) => text });
  // No server: every request fails, as with a lost connection.
  vi.stubGlobal('fetch', () => Promise.reject(new TypeError('no connection')));
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

test('what was typed survives a reload and can be taken up again', () => {
  const first = renderHook(() => useDraftDesk(makeProduct(), ['p'], store()), { wrapper });
  act(() => first.result.current.change(rename('Typed before the reload')));
  first.unmount();
  const { result } = renderHook(() => useDraftDesk(makeProduct(), ['p'], store()), { wrapper });
  expect(result.current.draft.name).toBe('Sluice Wash');
  expect(result.current.kept?.value.name).toBe('Typed before the reload');
  act(() => result.current.takeKept());
  expect(result.current.draft.name).toBe('Typed before the reload');
  expect(result.current.kept).toBeNull();
});

test('kept work that is let go does not come back', () => {
  store().keep(makeDraft({ name: 'Old' }), 7);
  const first = renderHook(() => useDraftDesk(makeProduct(), ['p'], store()), { wrapper });
  act(() => first.result.current.dropKept());
  first.unmount();
  expect(renderHook(() => useDraftDesk(makeProduct(), ['p'], store()), { wrapper }).result.current.kept).toBeNull();
});

test('work that the server has already is not offered', () => {
  store().keep(makeDraft(), 7);
  expect(renderHook(() => useDraftDesk(makeProduct(), ['p'], store()), { wrapper }).result.current.kept).toBeNull();
});

test('undo and redo go through the draft, and a name that is missing holds saving back', () => {
  const { result } = renderHook(() => useDraftDesk(makeProduct(), ['p'], store()), { wrapper });
  act(() => result.current.change(rename('')));
  expect(judgeDraft(result.current.draft)).toBe('Give it a name.');
  act(() => result.current.undo());
  expect(result.current.draft.name).toBe('Sluice Wash');
  act(() => result.current.redo());
  expect(result.current.draft.name).toBe('');
});

test('the conflict dialog shows both versions in words and saves what is chosen', async () => {
  const user = userEvent.setup();
  const onResolve = vi.fn();
  const base = makeDraft();
  const theirs = { ...makeProduct(makeDraft({ name: 'Their name' }), 8), savedBy: 'Tom Reed' };
  render(<ConflictDialog base={base} mine={makeDraft({ name: 'My name' })} theirs={theirs} nameOf={nameOf} onResolve={onResolve} />);
  expect(screen.getByRole('alertdialog').textContent).toContain('Tom Reed saved version 8');
  expect(screen.getByRole<HTMLInputElement>('radio', { name: 'Name: yours, My name' }).checked).toBe(true);
  await user.click(screen.getByRole('radio', { name: 'Name: theirs, Their name' }));
  await user.click(screen.getByText('Save what is chosen'));
  expect(onResolve).toHaveBeenCalledWith(theirs, expect.objectContaining({ name: 'Their name' }));
});
