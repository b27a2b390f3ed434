import type { LawRow } from '#shared/law/types.ts';
import { answer } from '../answer.ts';
import type { Context } from '../context.ts';
import type { NotChecked } from '../outcome.ts';
import { bindsPurpose } from './binding.ts';
import { spokenOf } from './spoken-of.ts';

const ENTRY = 'The text of this entry in force in this market was not read, so the entry of the Union is not applied. Look it up there.';
const CHANGED = 'The Union has changed this entry; whether this market follows was not read. Look it up there.';

/**
 * Where a market took over another's text, and its own later text was not read: entries, and
 * changes of entries, that bind elsewhere and are left open here. Nothing is said where the
 * market has a row of its own for the substance.
 */
export function listNotRead(context: Context): NotChecked[] {
  const { market } = context.facts;
  const found: NotChecked[] = [];
  for (const { at, hits } of spokenOf(context.mixture, context.law).hits) {
    const substance = context.mixture.substances[at]!;
    for (const { row } of hits) {
      if (!context.law.instruments.get(row.instrument)?.elsewhere?.[market]) continue;
      const words = row.markets.includes(market) ? changed(row, context) : hasOwn(row, hits, market) ? undefined : ENTRY;
      if (words === undefined || bindsPurpose(row, substance, context.facts) === false || !speaks(row, at, context)) continue;
      found.push({ rule: `${row.id}/not-read`, subject: substance.name, citation: context.law.citation(row, market), words });
    }
  }
  return found;
}

type Hits = ReturnType<typeof spokenOf>['hits'][number]['hits'];

/** A row that this market alone has, of the same list. */
function hasOwn(row: LawRow, hits: Hits, market: string): boolean {
  return hits.some((hit) => hit.row.list === row.list && hit.row.markets.length === 1 && hit.row.markets[0] === market);
}

/** What binds elsewhere only, and has not ended, is a change that this market may have followed. */
function changed(row: LawRow, context: Context): string | undefined {
  return row.provisions.some((one) => isElsewhereOnly(one, context)) ? CHANGED : undefined;
}

function isElsewhereOnly(provision: LawRow['provisions'][number], context: Context): boolean {
  return provision.markets !== undefined && !provision.markets.includes(context.facts.market) && provision.until === undefined;
}

/** Whether any of what is left open would speak of this kind of product. */
function speaks(row: LawRow, at: number, context: Context): boolean {
  const substance = context.mixture.substances[at]!;
  const isOwn = row.markets.includes(context.facts.market);
  return row.provisions.some((one) => (!isOwn || isElsewhereOnly(one, context)) && (one.where === undefined || answer(one.where, { facts: context.facts, substance, needs: new Set() }) !== false));
}
