// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react';
import { afterEach, expect, test } from 'vitest';
import { explainFinding, nameRule } from '#shared/report/explain.ts';
import { findAllergenNotes } from '#src/features/verdicts/allergen-notes.tsx';
import { findHeadroomNote } from '#src/features/verdicts/headroom-note.tsx';
import { Ledger } from '#src/features/verdicts/ledger.tsx';
import { countFindings, mergeFindings } from '#src/features/verdicts/merge.ts';
import { formula, inside, judge, law, line, material, part } from '#tests/support/engine.ts';

afterEach(cleanup);

/** Lavender oil in a wash: linalool 0.09 % is above 0.01 %, limonene 0.003 % is not. */
const wash = formula(
  [material('base', [part('Aqua', '98.8'), part('Phenoxyethanol', '1.2')]), material('oil', [part('Lavandula Angustifolia Oil', '100')], { constituents: [inside('Linalool', '25-38'), inside('Limonene', '1')] })],
  [line('base', '99.7 g'), line('oil', '0.3 g')],
  { product: { category: 'body-wash', markets: ['EU', 'US'] } },
);
const { results } = judge(wash);

function show() {
  render(
    <Ledger
      findings={mergeFindings(results)}
      counts={new Map(results.map((one) => [one.market, countFindings(one.findings)]))}
      sold={['EU']}
      release="test"
      nameOf={(from) => from}
      actOf={() => null}
      waysOf={() => []}
      explain={(finding, market) => explainFinding(finding, market, law)}
      notes={findAllergenNotes(results)}
      isWorking={false}
    />,
  );
}

test('allergens above the threshold are told as named, those below it as unnamed, with their totals', () => {
  const [named, unnamed] = findAllergenNotes(results);
  expect([named!.id, unnamed!.id]).toEqual(['allergens-named', 'allergens-unnamed']);
  expect(named!.cells.get('EU')).toEqual({ figure: '2 named', against: 'above 0.01 %' });
  expect(unnamed!.head).toBe('Limonene stays unnamed');
  expect(unnamed!.sum).toBe('Limonene: 0.003 %, not above 0.01 % (rinse-off).');
  // The United States have no such duty.
  expect([named!.cells.has('US'), unnamed!.cells.has('US')]).toEqual([false, false]);
  show();
  fireEvent.click(screen.getByRole('button', { name: /^Why: Lavandula Oil\/Extract and Linalool are named/ }));
  const row = within(screen.getByRole('table', { name: /Fragrance allergens/ })).getByRole('row', { name: /^Linalool/ });
  expect(row.textContent).toContain('0.075 to 0.114 %');
});

test('a verdict opens to its rule, its parameters, its choices and the official text', () => {
  show();
  fireEvent.click(screen.getByRole('button', { name: /^Why: Bring Phenoxyethanol/ }));
  expect(screen.getByRole('heading', { name: 'What the rule says' })).toBeTruthy();
  expect(screen.getByText('Exactly the maximum is allowed.')).toBeTruthy();
  expect(screen.getByRole('link', { name: 'Official text' }).getAttribute('href')).toBe('https://eur-lex.europa.eu/eli/reg/2009/1223/oj');
  expect(screen.getByText('Maximum').nextElementSibling!.textContent).toBe('1 %');
});

test('the line with the least room is told with what holds it', () => {
  const room = [{ line: 0, share: '50', max: '60', limitedBy: 'order-proved' }, { line: 1, share: '1', max: '1.05', limitedBy: 'eu/annex-v/29' }, { line: 2, share: '3', max: null, limitedBy: null }];
  const [note] = findHeadroomNote('EU', room, (at) => `Line ${at}`, (rule) => nameRule(rule, 'EU', law));
  expect([note!.head, note!.sum, note!.citations[0]]).toEqual(['Line 1 has the least room', '1 % of the product now; up to 1.05 % nothing new is found.', 'Held by Regulation (EC) No 1223/2009, Annex V, entry 29']);
  expect(findHeadroomNote('EU', null, String, String)).toEqual([]);
  expect(findHeadroomNote('EU', [room[2]!], String, String)).toEqual([]);
});
