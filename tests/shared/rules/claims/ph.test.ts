import { expect, test } from 'vitest';
import type { Context } from '#shared/rules/context.ts';
import { claimTables } from '#shared/rules/claims/claim-tables.ts';
import { tokenise } from '#shared/rules/claims/match-words.ts';
import { findPh, judgePh } from '#shared/rules/claims/ph.ts';

function judged(claim: string, pH?: string): string {
  const hit = findPh(claim, tokenise(claim, 'en'), claimTables('en').frame);
  if (!hit) return 'no pH';
  const verdict = judgePh(hit, { facts: { facts: pH === undefined ? {} : { pH } } } as unknown as Context);
  return verdict ? [verdict.verdict, ...(verdict.needs ?? [])].join(' ') : 'agrees';
}

test.each([
  ['pH 5.5', '5.5', 'agrees'],
  ['pH 5.5', '6', 'agrees'],
  ['pH 5.5', '6.0000001', 'contradicted'],
  ['pH 5.5', '5', 'agrees'],
  ['pH 5.5', '4.99', 'contradicted'],
  ['pH of 5,5', '5.5', 'agrees'],
  ['pH-balanced', '4', 'agrees'],
  ['pH-balanced', '7', 'agrees'],
  ['pH-balanced', '7.01', 'contradicted'],
  ['pH-balanced', '3.99', 'contradicted'],
  ['pH neutral', '4.9', 'contradicted'],
  ['pH-balanced', undefined, 'evidence pH'],
  ['pH-balanced', 'about five', 'evidence pH'],
  ['Soft', '5', 'no pH'],
])('"%s" at pH %s: %s', (claim, pH, expected) => expect(judged(claim, pH)).toBe(expected));
