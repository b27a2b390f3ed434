// @vitest-environment jsdom
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { FactFields } from '#src/features/workspace/fact-fields.tsx';
import { LABEL_FACTS, isProductFact, sayFact, wordsOf } from '#src/features/workspace/fact-words.ts';
import { checkout } from '#tests/support/cluster.ts';

afterEach(cleanup);

/** Worked out from the formula where it is not measured: nobody is asked for it. */
const WORKED_OUT = ['theoreticalFormaldehyde'];

function factsOf(value: unknown, found: Map<string, Set<string>>): void {
  if (Array.isArray(value)) for (const one of value) factsOf(one, found);
  else if (typeof value === 'object' && value !== null) {
    const { fact, is } = value as { fact?: unknown; is?: unknown };
    if (typeof fact === 'string') {
      const kinds = found.get(fact) ?? new Set<string>();
      for (const one of Array.isArray(is) ? is : []) kinds.add(typeof one);
      if (!Array.isArray(is)) kinds.add('figure');
      found.set(fact, kinds);
    }
    for (const one of Object.values(value)) factsOf(one, found);
  }
}

test('every fact that a row of the law asks for has a field of the right kind', () => {
  const folder = join(checkout, 'data/parameters');
  const found = new Map<string, Set<string>>();
  for (const file of readdirSync(folder).filter((name) => name.endsWith('.json'))) factsOf(JSON.parse(readFileSync(join(folder, file), 'utf8')), found);
  expect(found.size).toBeGreaterThan(15);
  const lacking = [...found].filter(([key, kinds]) => !WORKED_OUT.includes(key) && (wordsOf(key) === undefined || (kinds.has('boolean') && wordsOf(key)!.kind !== 'yes-no') || (kinds.has('figure') && wordsOf(key)!.kind !== 'figure')));
  expect(lacking.map(([key]) => key)).toEqual([]);
});

test('a yes-or-no question is answered with yes or no, and taken back', async () => {
  const onFacts = vi.fn();
  const fields = (facts: Record<string, string | boolean>) => <FactFields facts={facts} known={{}} asked={['addedAsSuch', 'purpose']} isReadOnly={false} onFacts={onFacts} onSettle={() => undefined} />;
  const { rerender } = render(fields({}));
  const field = screen.getByLabelText(sayFact('addedAsSuch'));
  await userEvent.selectOptions(field, 'no');
  expect(onFacts).toHaveBeenLastCalledWith({ addedAsSuch: false }, 'fact:addedAsSuch');
  rerender(fields({ addedAsSuch: false }));
  await userEvent.selectOptions(screen.getByLabelText(sayFact('addedAsSuch')), 'not answered');
  expect(onFacts).toHaveBeenLastCalledWith({}, 'fact:addedAsSuch');
  // What a substance is for stands with its material, not with the product.
  expect(screen.queryByLabelText(sayFact('purpose'))).toBeNull();
});

const draw = (facts: Record<string, string | boolean>, asked: readonly string[] = []) => {
  const onFacts = vi.fn();
  render(<FactFields facts={facts} known={{}} asked={asked} isReadOnly={false} onFacts={onFacts} onSettle={() => undefined} />);
  return onFacts;
};

test('what a label may turn on can be answered before a verdict waits for it', async () => {
  const onFacts = draw({});
  for (const key of Object.keys(LABEL_FACTS)) expect(screen.getByLabelText(sayFact(key)).closest('details'), key).not.toBeNull();
  await userEvent.click(screen.getByText('More that the label may turn on'));
  await userEvent.selectOptions(screen.getByLabelText('Free sample'), 'yes');
  expect(onFacts).toHaveBeenLastCalledWith({ freeSample: true }, 'fact:freeSample');
});

test('what a verdict waits for stands in front, and says so', async () => {
  const onFacts = draw({}, ['madeIn', 'durabilityNotRelevant']);
  for (const key of ['madeIn', 'durabilityNotRelevant']) expect(screen.getByLabelText(sayFact(key)).closest('details')).toBeNull();
  expect(screen.getAllByText('A verdict waits for this answer.')).toHaveLength(2);
  await userEvent.selectOptions(screen.getByLabelText('Made in'), 'Canada');
  expect(onFacts).toHaveBeenLastCalledWith({ madeIn: 'CA' }, 'fact:madeIn');
});

test('a text is kept as typed, a figure with a point', async () => {
  const onFacts = draw({ destinations: 'DE', minimumDurabilityMonths: '3' });
  await userEvent.type(screen.getByLabelText('Sold in these Member States'), ',');
  expect(onFacts).toHaveBeenLastCalledWith({ destinations: 'DE,', minimumDurabilityMonths: '3' }, 'fact:destinations');
  await userEvent.type(screen.getByLabelText('Keeps unopened'), ',');
  expect(onFacts).toHaveBeenLastCalledWith({ destinations: 'DE', minimumDurabilityMonths: '3.' }, 'fact:minimumDurabilityMonths');
});

test('what a certificate says is not asked of the product', () => {
  draw({}, ['peanutProteinPpm']);
  expect(isProductFact('peanutProteinPpm')).toBe(false);
  expect(screen.queryByLabelText(sayFact('peanutProteinPpm'))).toBeNull();
});
