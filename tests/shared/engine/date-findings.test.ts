import { describe, expect, test } from 'vitest';
import { judgeDays } from '#shared/engine/date-findings.ts';
import { plainDate } from '#shared/kernel/plain-date.ts';
import { formula, judge, law, line, material, part } from '#tests/support/engine.ts';

const kinds = (placed: string, available: string): string[] => judgeDays({ placedOnMarket: placed, availableOn: available }, law).map(({ subject }) => subject);

describe('days outside the tables', () => {
  // Regulation (EC) No 1223/2009 applies from 11 July 2013; the last date of the tables is the end of a transition.
  test.each<[string, string, string[]]>([
    ['2013-07-10', '2013-07-10', ['2013-07-10']],
    ['2013-07-11', '2013-07-11', []],
    [law.coveredUntil, law.coveredUntil, []],
    ['2026-12-01', '2040-01-01', ['2040-01-01']],
    ['1999-01-01', '2040-01-01', ['1999-01-01', '2040-01-01']],
  ])('first sold on %s and still sold on %s', (placed, available, expected) => {
    expect(kinds(placed, available)).toEqual(expected);
  });

  test('the day after the last one is not guessed', () => {
    const [finding] = judgeDays({ placedOnMarket: '2028-08-02', availableOn: '2028-08-02' }, { ...law, coveredUntil: plainDate('2028-08-01') });
    expect([finding?.severity, finding?.message]).toEqual(['decide', expect.stringContaining('what will bind on 2028-08-02 is not guessed')]);
  });

  test('a document with such a day is judged all the same, and says so first', () => {
    const document = formula([material('water', [part('Aqua', '100')])], [line('water', '100 g')]);
    const { findings } = judge(document, { placedOnMarket: plainDate('2040-01-01'), availableOn: plainDate('2040-01-01') }).results[0]!;
    expect(findings.filter(({ severity }) => severity === 'decide').map(({ kind }) => kind)[0]).toBe('date-not-covered');
  });
});
