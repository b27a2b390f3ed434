// @vitest-environment jsdom
import { cleanup, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import type { LabelSettings, ProductDraft } from '#shared/contracts/product-draft.ts';
import { LabelStudio } from '#src/features/labels/label-studio.tsx';
import { bodyWash, listOf } from '#tests/shared/artwork/samples.ts';

// jsdom has no CSS.escape, which the dialog's library asks for.
beforeEach(() => {
  vi.stubGlobal('CSS', { escape: (text: string) => text });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  localStorage.clear();
});

const label: LabelSettings = {
  container: { shape: 'cylinder', diameterMm: '58', labelHeightMm: '90', overlapMm: '5' }, bleedMm: '3', languages: ['en'], market: 'EU',
  barcode: { symbology: 'EAN-13', digits: '9521234567899' }, press: { standard: 'PDF/X-1a:2003', condition: 'FOGRA39' }, template: 'galley', ink: 'juniper',
};
const draft: ProductDraft = {
  name: bodyWash.name, brand: bodyWash.brand, category: 'body-wash', markets: ['EU', 'US'], placedOnMarket: null, availableOn: null, flags: {}, facts: {}, readyForUse: null,
  netContent: { value: '250', unit: 'ml' }, durability: { kind: 'pao', months: 12 }, claims: [],
  particulars: { responsiblePerson: { EU: bodyWash.responsiblePerson! }, usContact: '', canadaContact: '', countryOfOrigin: '', batchCode: 'BW-0412', function: 'Body wash', directions: bodyWash.directions, warnings: [] },
  mayContain: [], formula: { batchSize: null, phases: [] }, declaration: { freeOrder: {}, joinedNames: false }, label,
};

function Desk({ names = 13, onPressFile = () => Promise.resolve() }: { names?: number; onPressFile?: () => Promise<void> }) {
  const [current, setCurrent] = useState(draft);
  const result = { declaration: { heading: 'Ingredients', text: `Ingredients: ${listOf(names)}`, entries: [1] }, requiredWording: [] };
  return <LabelStudio draft={current} result={result} onChange={(next) => setCurrent({ ...current, label: next })} onPressFile={onPressFile} />;
}

test('the trim, the checks and the declaration are shown', () => {
  render(<Desk />);
  expect(screen.getByText('187.401 × 90 mm')).toBeTruthy();
  expect(screen.getByText(/\d+ checks passed/)).toBeTruthy();
  expect(document.body.textContent).toContain('Cocamidopropyl');
});

test('a wrong check figure is said at its field and stops the press', async () => {
  const person = userEvent.setup();
  render(<Desk />);
  const field = screen.getByLabelText('Figures');
  await person.clear(field);
  await person.type(field, '9521234567898');
  expect((await screen.findAllByText('The last figure is 8; the check figure of 952123456789 is 9.')).length).toBeGreaterThan(0);
  await waitFor(() => expect(screen.getByRole('button', { name: 'Download the press file' })).toHaveProperty('disabled', true));
});

test('a container that is too small says which element needs how much more', async () => {
  const person = userEvent.setup();
  render(<Desk names={60} />);
  const field = screen.getByLabelText('Label height, mm');
  await person.clear(field);
  await person.type(field, '40');
  await waitFor(() => expect(screen.getByRole('alert').textContent).toMatch(/needs? [\d.]+ mm more (height|width)/));
});

test('a flat container changes the trim', async () => {
  const person = userEvent.setup();
  render(<Desk />);
  await person.selectOptions(screen.getByLabelText('Start from'), 'face-80');
  expect(await screen.findByText('80 × 120 mm')).toBeTruthy();
});

test('a tapered tub is set on the unrolled cone, and goes back to a cylinder', async () => {
  const person = userEvent.setup();
  render(<Desk />);
  await person.selectOptions(screen.getByLabelText('Start from'), 'tub-150');
  expect(await screen.findByText('226.529 × 63.196 mm')).toBeTruthy();
  expect(screen.getByRole('button', { name: 'Tapered' }).getAttribute('aria-pressed')).toBe('true');
  expect(document.querySelectorAll('.board text[rotate]').length).toBeGreaterThan(10);
  await person.clear(screen.getByLabelText('Lower diameter, mm'));
  await person.type(screen.getByLabelText('Lower diameter, mm'), '5');
  expect(await screen.findAllByText('The lower diameter is 5 mm. Labels are set from 10 to 400 mm.')).not.toHaveLength(0);
  await person.click(screen.getByRole('button', { name: 'Round' }));
  expect(await screen.findByLabelText('Diameter, mm')).toBeTruthy();
});

test('a press file that cannot be had is said in words', async () => {
  const person = userEvent.setup();
  render(<Desk onPressFile={() => Promise.reject(new Error('The server could not be reached.'))} />);
  await person.click(screen.getByRole('button', { name: 'Download the press file' }));
  expect(await screen.findByText('The server could not be reached.')).toBeTruthy();
});

test('a screen is measured once against a bank card', async () => {
  const person = userEvent.setup();
  render(<Desk />);
  expect(screen.getByText(/This screen was never measured/)).toBeTruthy();
  await person.click(screen.getByRole('button', { name: 'Check with a bank card' }));
  await person.click(await screen.findByRole('button', { name: 'Keep this size' }));
  expect(await screen.findByText(/Calibrated on/)).toBeTruthy();
  expect(JSON.parse(localStorage.getItem('colophon.screen')!)).toMatchObject({ pixelsPerMm: 96 / 25.4 });
});
