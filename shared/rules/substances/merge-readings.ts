import { compare } from '#shared/kernel/rational.ts';
import { foldName } from '#shared/law/fold.ts';
import type { Outcome } from '../outcome.ts';

/**
 * Joins what the rows say where a substance's purpose, or a fact, is not known. A limit that is
 * exceeded whatever the answer is becomes certain; a use that only some answers forbid is left
 * out, because another lawful answer remains.
 */
export function mergeReadings(outcomes: readonly Outcome[]): Outcome[] {
  const bySubject = new Map<string, Outcome[]>();
  for (const outcome of outcomes) {
    const key = foldName(outcome.parts[0]!.substance.name);
    const list = bySubject.get(key);
    if (list) list.push(outcome);
    else bySubject.set(key, [outcome]);
  }
  return [...bySubject.values()].flatMap(mergeSubject);
}

function mergeSubject(outcomes: readonly Outcome[]): Outcome[] {
  const dependent = outcomes.filter((one) => one.type !== 'wording' && one.certainty === 'possible' && one.needs.includes('purpose'));
  const settled = outcomes.filter((one) => !dependent.includes(one));
  return [...mergeByFact(settled), ...mergeByPurpose(dependent, outcomes)];
}

/** Two provisions that part on one missing fact, both exceeded: exceeded whatever the fact is. */
function mergeByFact(outcomes: readonly Outcome[]): Outcome[] {
  const open = outcomes.filter((one) => one.type === 'limit' && one.certainty === 'possible' && one.needs.length > 0 && isWhollyAbove(one));
  const byRow = new Map<string, Outcome[]>();
  for (const one of open) byRow.set(one.row.id, [...(byRow.get(one.row.id) ?? []), one]);
  const dropped = new Set<Outcome>();
  const certain: Outcome[] = [];
  for (const [, group] of byRow) {
    if (group.length < 2) continue;
    for (const one of group) dropped.add(one);
    certain.push({ ...mostLenient(group), certainty: 'certain', needs: [] });
  }
  return [...outcomes.filter((one) => !dropped.has(one)), ...certain];
}

/**
 * `dependent` holds what depends on the purpose. A row that forbids or limits the use as a
 * listed function and one that does so for every other use leave no reading open.
 */
function mergeByPurpose(dependent: readonly Outcome[], all: readonly Outcome[]): Outcome[] {
  if (dependent.length === 0) return [];
  const listed = dependent.filter((one) => isPositiveList(one));
  const other = dependent.filter((one) => !isPositiveList(one));
  const isListedClosed = listed.some(isBreach);
  const isOtherClosed = other.some(isBreach);
  if (isListedClosed && isOtherClosed) {
    const limits = dependent.filter((one) => one.type === 'limit' && isWhollyAbove(one));
    const rest = dependent.filter((one) => one.type !== 'limit' && one.type !== 'requires');
    return [...(limits.length > 0 ? [mostLenient(limits)] : []), ...rest].map((one) => ({ ...one, certainty: 'certain', needs: [] }));
  }
  // One reading stays open: only an exceeded limit or a ban is worth a decision, a limit
  // only where nothing certain says more.
  const hasCertainLimit = all.some((one) => one.type === 'limit' && one.certainty === 'certain');
  const limits = hasCertainLimit ? [] : dependent.filter((one) => one.type === 'limit').slice(0, 1);
  return [...limits, ...dependent.filter((one) => one.type === 'prohibited')];
}

function isPositiveList(one: Outcome): boolean {
  return one.row.list === 'preservative' || one.row.list === 'colourant' || one.row.list === 'uv-filter';
}

function isBreach(one: Outcome): boolean {
  return one.type === 'limit' ? isWhollyAbove(one) : one.type === 'forbidden' || one.type === 'unlisted' || one.type === 'prohibited';
}

function isWhollyAbove(one: Outcome): boolean {
  return one.measured !== undefined && one.limit !== undefined && compare(one.measured.min, one.limit) > 0;
}

function mostLenient(outcomes: readonly Outcome[]): Outcome {
  return outcomes.reduce((kept, one) => (compare(one.limit!, kept.limit!) > 0 ? one : kept));
}
