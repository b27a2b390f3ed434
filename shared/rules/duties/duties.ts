import { hasBegun } from '#shared/law/as-at.ts';
import { answer } from '../answer.ts';
import type { Context } from '../context.ts';
import type { NotChecked } from '../outcome.ts';

/**
 * Duties of the market that nothing entered decides, for the list of what was not checked: those
 * meant for a report, in force on the days judged, for this kind of product.
 */
export function listDuties(context: Context): NotChecked[] {
  const found: NotChecked[] = [];
  for (const duty of context.law.duties) {
    if (duty.market !== context.facts.market || !duty.onReport || !hasBegun(duty.from, context.days)) continue;
    if (duty.where && answer(duty.where, { facts: context.facts, needs: new Set() }) === false) continue;
    const doubt = duty.sourcing === 'memory' ? ' From memory.' : '';
    found.push({ rule: duty.id, subject: duty.subject, citation: duty.citation, words: `${duty.says} ${duty.because}${doubt}` });
  }
  return found;
}
