import { expect, test } from 'vitest';
import type { ClaimEvidence } from '#shared/contracts/evidence.contract.ts';
import type { Finding, FindingKind } from '#shared/engine/types.ts';
import { buildClaimRows, sayAnswer } from '#src/features/claims/claim-rows.ts';
import { markWords } from '#src/features/claims/mark-words.ts';
import { uuid } from '../fixtures.ts';

const finding = (kind: FindingKind, subject: string, members: string[]): Finding => ({ kind, severity: kind === 'claim-evidence' ? 'decide' : 'stop', rule: 'claims/x', subject, members, citation: 'Somewhere', message: 'Why.' });
const paper = (n: number, claim: string): ClaimEvidence => ({ id: uuid(n), claim, kind: 'study', fileName: `${n}.pdf`, mediaType: 'application/pdf', bytes: 9, sha256: '', dated: null, addedAt: '2026-12-01T09:00:00.000Z', addedBy: 'Ines Tarrow' });

test('quoted words are marked where they stand, the weightier verdict over the lighter', () => {
  expect(markWords('Gentle, hypoallergenic, cures eczema', [{ words: 'hypoallergenic', weight: 'decide' }, { words: 'cures eczema', weight: 'stop' }])).toEqual([
    { text: 'Gentle, ' }, { text: 'hypoallergenic', weight: 'decide' }, { text: ', ' }, { text: 'cures eczema', weight: 'stop' },
  ]);
  expect(markWords('proven to cure', [{ words: 'cure', weight: 'stop' }, { words: 'proven to cure', weight: 'decide' }])).toEqual([{ text: 'proven to ', weight: 'decide' }, { text: 'cure', weight: 'stop' }]);
});

test('words that do not stand in the claim mark nothing, and every letter stays', () => {
  expect(markWords('Soft', [{ words: 'hard', weight: 'stop' }, { words: '', weight: 'stop' }])).toEqual([{ text: 'Soft' }]);
  expect(markWords('', [])).toEqual([]);
});

test('each claim has its row with every market, the name comes last', () => {
  const draft = { name: 'Oat Wash', claims: [{ text: 'Vegan', lang: 'en' }, { text: 'Soft', lang: 'en' }] };
  const { rows } = buildClaimRows(draft, [{ market: 'EU', findings: [finding('claim-evidence', 'Vegan', ['Vegan']), finding('limit-exceeded', 'Vegan', [])] }, { market: 'US', findings: [] }], []);
  expect(rows.map(({ text, isName, asksEvidence, isBeyondEvidence, byMarket }) => [text, isName, asksEvidence, isBeyondEvidence, sayAnswer(byMarket.get('EU')!), sayAnswer(byMarket.get('US')!)])).toEqual([
    ['Vegan', false, true, false, 'to be shown', 'nothing found'],
    ['Soft', false, false, false, 'nothing found', 'nothing found'],
    ['Oat Wash', true, false, false, 'nothing found', 'nothing found'],
  ]);
});

test('a claim that only stops sale is beyond evidence; one that a market would have shown is not', () => {
  const draft = { name: '', claims: [{ text: 'SPF 30', lang: 'en' }, { text: 'Cures', lang: 'en' }] };
  const results = [
    { market: 'EU' as const, findings: [finding('claim-evidence', 'SPF 30', ['SPF']), finding('claim-medicinal', 'Cures', ['Cures'])] },
    { market: 'US' as const, findings: [finding('claim-medicinal', 'SPF 30', ['SPF']), finding('claim-medicinal', 'Cures', ['Cures'])] },
  ];
  expect(buildClaimRows(draft, results, []).rows.map(({ isBeyondEvidence }) => isBeyondEvidence)).toEqual([false, true]);
});

test('papers go to the claim they were attached for; those of dropped words stay in sight', () => {
  const { rows, leftOver } = buildClaimRows({ name: 'Wash', claims: [{ text: 'Vegan', lang: 'en' }] }, [], [paper(1, 'Vegan'), paper(2, 'Organic'), paper(3, '')]);
  expect(rows.map(({ papers }) => papers.map(({ fileName }) => fileName))).toEqual([['1.pdf'], []]);
  expect(leftOver.map(({ fileName }) => fileName)).toEqual(['2.pdf', '3.pdf']);
});

test('a claim in a language without tables is not called clean', () => {
  const { rows } = buildClaimRows({ name: 'Wash', claims: [{ text: 'Zacht', lang: 'nl' }, { text: 'Doux', lang: 'fr' }] }, [], []);
  expect(rows.map(({ text, isJudged }) => [text, isJudged])).toEqual([['Zacht', false], ['Doux', true], ['Wash', true]]);
});
