import { isInForce } from '#shared/law/as-at.ts';
import { answer } from '../answer.ts';
import type { Context } from '../context.ts';
import type { DueWording } from './require-wording.ts';

/** Warnings that a kind of product carries, whatever is in it (21 CFR 740; Cosmetic Regulations of Canada). */
export function judgeProductWarnings(context: Context): DueWording[] {
  const due: DueWording[] = [];
  for (const warning of context.law.warnings) {
    if (warning.market !== context.facts.market || !isInForce(warning, context.days)) continue;
    const needs = new Set<string>();
    const isDue = answer(warning.where, { facts: context.facts, needs });
    if (isDue === false || (isDue === undefined && warning.onlyWhenKnown)) continue;
    due.push({
      wordingId: warning.wording,
      rule: warning.id,
      subject: warning.subject,
      citation: warning.citation,
      certainty: isDue === true ? 'certain' : 'possible',
      needs: [...needs],
      ...(warning.sourcing === 'official' ? {} : { sourcing: warning.sourcing }),
      ...(warning.reading ? { reading: warning.reading } : {}),
    });
  }
  return due;
}
