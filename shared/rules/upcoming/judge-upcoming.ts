import { isToCome } from '#shared/law/as-at.ts';
import type { Dates, LawRow } from '#shared/law/types.ts';
import type { Finding } from '#shared/engine/types.ts';
import type { Context } from '../context.ts';
import { judgeRows } from '../substances/judge-substances.ts';
import { presentOutcome } from '../substances/present.ts';
import type { Outcome, Part } from '../outcome.ts';
import { isMissing, type DueWording } from '../wording/require-wording.ts';

/**
 * Rules that do not bind yet and that this product would then break: the rows with dates to
 * come are judged once more for the days on which everything known binds, and what is new is
 * told as a note with its own dates.
 */
export function judgeUpcoming(rows: ReadonlyMap<LawRow, readonly Part[]>, now: readonly Outcome[], context: Context): Finding[] {
  const dated = new Map([...rows].filter(([row]) => hasDatesToCome(row, context)));
  if (dated.size === 0) return [];
  const last = context.law.coveredUntil;
  const later: Context = { ...context, days: { placedOnMarket: last, availableOn: last } };
  const known = new Set(now.map(keyOf));
  const fresh = judgeRows(dated, later).filter((one) => !known.has(keyOf(one)) && one.from !== undefined && isToCome({ from: one.from }, context.days));
  return fresh.filter((one) => one.type !== 'wording' || isWordingLacking(one, later)).map((one) => present(one, later));
}

function hasDatesToCome(row: LawRow, context: Context): boolean {
  return isToCome(row, context.days) || row.provisions.some((one) => isToCome(one, context.days));
}

function keyOf(one: Outcome): string {
  return `${one.type} ${one.row.id} ${one.provision.letter} ${one.limitText ?? ''} ${one.words ?? ''} ${one.wordingId ?? ''} ${one.certainty}`;
}

function isWordingLacking(one: Outcome, context: Context): boolean {
  return context.document.product.particulars === undefined || isMissing(one.wordingId!, context);
}

function present(one: Outcome, context: Context): Finding {
  const finding = presentOutcome(one, context);
  const when = sayWhen(one.from!);
  const words = one.type === 'wording' ? `The label must then say: ${context.law.wording(one.wordingId!, 'en').text}` : finding.message;
  return { ...asNote(finding), effective: effectiveOf(one.from!), message: `${when}: ${words}`, remedy: one.type === 'wording' ? 'Print these words in time.' : finding.remedy! };
}

function asNote(finding: Finding): Finding {
  return { ...finding, kind: 'upcoming', severity: 'note' };
}

function effectiveOf(from: Dates): { from: string; to?: string } {
  return { from: from.placed ?? from.available };
}

function sayWhen(from: Dates): string {
  return from.placed ? `From ${from.placed} for new batches, from ${from.available} for all still sold` : `From ${from.available}`;
}

/** Warnings of dated rules outside the rows, such as the formaldehyde warning, that will be due. */
export function presentUpcomingWordings(now: readonly DueWording[], later: readonly DueWording[], context: Context): Finding[] {
  const known = new Set(now.map((one) => one.rule));
  return later
    .filter((one) => !known.has(one.rule) && one.from !== undefined && (context.document.product.particulars === undefined || isMissing(one.wordingId, context)))
    .map((one) => ({
      kind: 'upcoming',
      severity: 'note',
      rule: one.rule,
      subject: one.subject,
      citation: one.citation,
      effective: { from: one.from!.placed ?? one.from!.available },
      message: `${sayWhen(one.from as Dates)}: the label ${one.certainty === 'certain' ? 'must' : 'may have to'} say: ${context.law.wording(one.wordingId, 'en').text}`,
      remedy: one.needs.length > 0 ? `Answer what is open: ${one.needs.join(', ')}.` : 'Print these words in time.',
      certainty: one.certainty,
      ...(one.sourcing && one.sourcing !== 'official' ? { sourcing: one.sourcing } : {}),
    }));
}
