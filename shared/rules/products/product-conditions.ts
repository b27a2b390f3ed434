import type { Finding } from '#shared/engine/types.ts';
import { answer } from '../answer.ts';
import type { Context } from '../context.ts';

/** Conditions on the product as a whole: broken ones stop sale, open ones ask for the fact they turn on. */
export function judgeProductConditions(context: Context): Finding[] {
  const findings: Finding[] = [];
  for (const condition of context.law.productConditions) {
    if (condition.market !== context.facts.market) continue;
    const needs = new Set<string>();
    const question = { facts: context.facts, needs };
    if (answer(condition.where, question) !== true) continue;
    const holds = answer(condition.requires, question);
    if (holds === true) continue;
    const common = { rule: condition.id, subject: condition.subject, citation: condition.citation, ...(condition.sourcing === 'official' ? {} : { sourcing: condition.sourcing }) };
    findings.push(
      holds === false
        ? { ...common, kind: 'not-for-this-use', severity: 'stop', certainty: 'certain', message: condition.words, remedy: condition.remedy }
        : { ...common, kind: 'limit-uncertain', severity: 'decide', certainty: 'possible', message: `${condition.words} It cannot be told yet whether this holds.`, remedy: `Answer what is open: ${[...needs].join(', ')}.`, needs: [...needs] },
    );
  }
  return findings;
}
