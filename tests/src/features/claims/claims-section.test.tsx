// @vitest-environment jsdom
import { cleanup, render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { listEvidence, removeEvidence, type ClaimEvidence } from '#shared/contracts/evidence.contract.ts';
import type { Finding } from '#shared/engine/types.ts';
import { Providers } from '#src/app/providers.tsx';
import { createQueryClient } from '#src/lib/query-client.ts';
import { ClaimsSection } from '#src/features/claims/claims-section.tsx';
import { FakeServer, signedIn } from '#tests/support/fake-server.ts';
import { uuid } from '../fixtures.ts';

const PAPER: ClaimEvidence = { id: uuid(5), claim: 'Hypoallergenic', kind: 'test-report', fileName: 'patch test.pdf', mediaType: 'application/pdf', bytes: 2048, sha256: '', dated: '2026-05-04', addedAt: '2026-12-01T09:00:00.000Z', addedBy: 'Ines Tarrow' };
const asks: Finding = { kind: 'claim-evidence', severity: 'decide', rule: 'claims/hypoallergenic', subject: 'Hypoallergenic', members: ['Hypoallergenic'], citation: 'Somewhere', message: 'Why.' };
const draft = { name: 'Sluice Wash', claims: [{ text: 'Hypoallergenic', lang: 'en' }] };

let server: FakeServer;
let papers: ClaimEvidence[];
beforeEach(() => {
  papers = [PAPER];
  // What the test page lacks of a browser's window.
  vi.stubGlobal('CSS', { escape: (text: string) => text });
  server = signedIn(new FakeServer()).on(listEvidence, () => ({ items: papers })).on(removeEvidence, () => ({ items: (papers = []) }));
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function open(more: { readonly isReadOnly?: boolean; readonly draft?: typeof draft } = {}) {
  return render(
    <Providers client={createQueryClient()}>
      <MemoryRouter>
        <ClaimsSection productId={uuid(90)} draft={more.draft ?? draft} results={[{ market: 'EU', findings: [asks] }]} isReadOnly={more.isReadOnly ?? false} editLink={<a href="#particulars">Write one</a>} />
      </MemoryRouter>
    </Providers>,
  );
}

test('a claim shows the words its verdict stands on, the market’s answer and its papers', async () => {
  open();
  const row = await screen.findByRole('article', { name: 'Hypoallergenic' });
  expect(row.querySelector('mark.decide')?.textContent).toBe('Hypoallergenic');
  expect(within(row).getByText('to be shown')).toBeTruthy();
  const link = await within(row).findByRole('link', { name: 'Test report, patch test.pdf' });
  expect(link.getAttribute('href')).toBe(`/api/products/${uuid(90)}/evidence/${uuid(5)}`);
  expect(within(row).getByText(/dated 4 May 2026, 2 KB, attached by Ines Tarrow on 1 Dec 2026/)).toBeTruthy();
});

test('a paper is taken away after a question, and the lack of one is said', async () => {
  open();
  await userEvent.click(await screen.findByRole('button', { name: 'Take away patch test.pdf' }));
  await userEvent.click(within(screen.getByRole('alertdialog')).getByRole('button', { name: 'Take away' }));
  await waitFor(() => expect(server.sent(removeEvidence)).toHaveLength(1));
  await screen.findByText('No evidence attached yet.');
});

test('a file to attach asks for its kind and day; one that is too large is refused at once', async () => {
  open();
  const group = await screen.findByRole('group', { name: 'Attach evidence for Hypoallergenic' });
  const field = within(group).getByLabelText(/Attach evidence/);
  const large = new File(['x'], 'film.pdf', { type: 'application/pdf' });
  Object.defineProperty(large, 'size', { value: 21 * 1024 * 1024 });
  await userEvent.upload(field, large);
  expect(within(group).getByText(/film.pdf is 21.0 MB/)).toBeTruthy();
  await userEvent.upload(within(group).getByLabelText(/Attach evidence/), new File(['%PDF-'], 'study.pdf', { type: 'application/pdf' }));
  expect(within(group).getByText('study.pdf')).toBeTruthy();
  expect(within(group).getByLabelText('Kind')).toBeTruthy();
  await userEvent.click(within(group).getByRole('button', { name: 'Not this one' }));
  expect(within(group).queryByText('study.pdf')).toBeNull();
});

test('whoever only reads can open papers and nothing else', async () => {
  open({ isReadOnly: true });
  await screen.findByRole('link', { name: 'Test report, patch test.pdf' });
  expect(screen.queryByRole('button', { name: /Take away/ })).toBeNull();
  expect(screen.queryByRole('group', { name: /Attach evidence/ })).toBeNull();
});

test('without a claim the place to write one is shown, and papers of dropped words stay', async () => {
  open({ draft: { name: 'Sluice Wash', claims: [] } });
  expect(screen.getByRole('link', { name: 'Write one' })).toBeTruthy();
  await screen.findByRole('heading', { name: 'Papers for words that no longer stand here' });
  expect(screen.getByText(/for “Hypoallergenic”/)).toBeTruthy();
});
