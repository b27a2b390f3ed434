import { describe, expect, test } from 'vitest';
import { FURTHER } from './claims-further.ts';
import { HELD_OUT } from './claims-held-out.ts';
import { NEAR_THE_LINE } from './claims-near-the-line.ts';
import { CLAIMS } from './claims-table.ts';
import { MARKETS, readTable, type ClaimCase } from './read-claims-table.ts';
import { precision, recall, scoreClaims } from './score-claims.ts';

const WORKED = [...CLAIMS, ...NEAR_THE_LINE, ...FURTHER];
const keyOf = ({ text, formula, lang }: ClaimCase): string => `${text.toLowerCase()} ${formula} ${lang}`;

describe('the tables that the words were fitted to', () => {
  const score = scoreClaims(WORKED);
  test('they hold hundreds of claims, two in five of them innocent', () => {
    expect(new Set(WORKED.map(keyOf)).size).toBeGreaterThanOrEqual(600);
    expect(score.innocent / score.claims).toBeGreaterThanOrEqual(0.4);
  });
  test('every claim is judged as its table says, but for those named here', () => {
    expect([...new Set(score.misses.map(({ text }) => text))]).toEqual(['The cure for a dull morning is a walk, not soap', 'Healed is what a pot is when the glaze closes; ours holds soap']);
  });
});

describe('the table that was held out', () => {
  const score = scoreClaims(HELD_OUT);
  test('it holds at least 80 claims, two in five of them innocent', () => {
    expect(score.claims).toBeGreaterThanOrEqual(80);
    expect(score.innocent / score.claims).toBeGreaterThanOrEqual(0.4);
  });
  test('nothing of it stands in the other tables', () => {
    const worked = new Set(WORKED.map(({ text }) => text.toLowerCase()));
    expect(HELD_OUT.filter(({ text }) => worked.has(text.toLowerCase())).map(({ text }) => text)).toEqual([]);
  });
  test('precision and recall stay as high as first measured, or nearly', () => {
    expect(precision(score)).toBeGreaterThanOrEqual(94);
    expect(recall(score)).toBeGreaterThanOrEqual(93);
    expect(score.falseAlarms / score.innocentPlaces).toBeLessThan(0.05);
  });
});

test.each(['m | gel', 'q | gel | Text', 'm m m | gel | Text'])('a line that is none is refused: %s', (line) => {
  expect(() => readTable(line)).toThrow('not a line of the table');
});

test('one verdict stands for all markets, two for EU and UK, then US and CA', () => {
  expect(readTable('e m | gel | Text')[0]!.expected).toEqual({ EU: ['claim-evidence'], UK: ['claim-evidence'], US: ['claim-medicinal'], CA: ['claim-medicinal'] });
  expect(MARKETS.map((market) => readTable('- | gel | Text')[0]!.expected[market])).toEqual([[], [], [], []]);
});
