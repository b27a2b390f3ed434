import type { Finding } from '#shared/engine/types.ts';
import type { LawRow } from '#shared/law/types.ts';
import type { Context } from '../context.ts';
import { judgeRow } from './judge-row.ts';
import { mergeReadings } from './merge-readings.ts';
import type { NotChecked, Outcome, Part } from '../outcome.ts';
import { presentOutcome } from './present.ts';

/** What all rows say together, with open readings joined. */
export function judgeRows(rows: ReadonlyMap<LawRow, readonly Part[]>, context: Context, notChecked: NotChecked[] = []): Outcome[] {
  const outcomes: Outcome[] = [];
  for (const [row, all] of rows) {
    const parts = row.list === 'prohibited' ? all.filter(({ substance }) => isIntended(substance)) : all;
    if (parts.length < all.length) noteTraces(row, all, context, notChecked);
    if (parts.length > 0) outcomes.push(...judgeRow(row, parts, context, notChecked));
  }
  return mergeReadings(outcomes);
}

/** Unavoidable traces of a prohibited substance are judged by the safety assessor (Article 17), not here. */
function isIntended(substance: Part['substance']): boolean {
  return substance.as.ingredient !== undefined || substance.as.hidden !== undefined;
}

function noteTraces(row: LawRow, parts: readonly Part[], context: Context, notChecked: NotChecked[]): void {
  for (const { substance } of parts) {
    if (isIntended(substance)) continue;
    notChecked.push({ rule: row.id, subject: substance.name, citation: context.law.citation(row, context.facts.market), words: 'Present as an impurity only: whether the trace is unavoidable and safe is for the assessor.' });
  }
}

/** Findings on substances: everything but wording, which is placed on the label. */
export function presentSubstances(outcomes: readonly Outcome[], context: Context): Finding[] {
  return outcomes.filter((one) => one.type !== 'wording').map((one) => presentOutcome(one, context));
}
