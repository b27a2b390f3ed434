// @vitest-environment jsdom
import { render, screen, within } from '@testing-library/react';
import { expect, test } from 'vitest';
import { NotChecked } from '#src/features/verdicts/not-checked.tsx';

test('what a market leaves open is told under its name', () => {
  render(<NotChecked memory={0} handling={[]} results={[{ market: 'UK', notChecked: ['Retinol: not read. (Annex III, entry 376)', 'Notification: before the first sale.'] }, { market: 'US', notChecked: [] }]} />);
  const group = screen.getByText('Great Britain: 2 points of law left open').closest('details')!;
  expect(within(group).getAllByRole('listitem', { hidden: true }).map((one) => one.textContent)).toEqual(['Retinol: not read. (Annex III, entry 376)', 'Notification: before the first sale.']);
  expect(screen.queryByText(/United States/)).toBeNull();
});
