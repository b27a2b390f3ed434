import type { Finding, Substance } from '#shared/engine/types.ts';
import { isInForce } from '#shared/law/as-at.ts';
import type { LawRow, Purpose, RowList } from '#shared/law/types.ts';
import type { Context } from '../context.ts';
import { bindsPurpose, isColourIndexName } from '../substances/binding.ts';
import { spokenOf } from '../substances/spoken-of.ts';

const LISTS: readonly { readonly purpose: Purpose; readonly list: RowList; readonly annex: string; readonly noun: string }[] = [
  { purpose: 'colourant', list: 'colourant', annex: 'Annex IV', noun: 'colourants' },
  { purpose: 'preservative', list: 'preservative', annex: 'Annex V', noun: 'preservatives' },
  { purpose: 'uv-filter', list: 'uv-filter', annex: 'Annex VI', noun: 'UV filters' },
];

/**
 * Article 14(1)(c) to (e): colourants, preservatives and UV filters only from their annexes.
 * Judged where the purpose is stated, and for a CI number even where it is not. Hair dyes are
 * left to Annex III.
 */
export function judgePositiveLists(context: Context): Finding[] {
  const { market } = context.facts;
  if (market !== 'EU' && market !== 'UK') return [];
  const findings: Finding[] = [];
  for (const at of spokenOf(context.mixture, context.law).purposeful) {
    const substance = context.mixture.substances[at]!;
    if (!substance.as.ingredient) continue;
    for (const list of LISTS) {
      if (isUsedAs(substance, list.purpose, context) && !isListed(substance, list.list, context)) findings.push(present(substance.name, list, context));
    }
  }
  return [...findings, ...judgeShades(context)];
}

function isUsedAs(substance: Substance, purpose: Purpose, context: Context): boolean {
  if (purpose === 'colourant' && context.facts.category.tags.includes('hair-dye')) return false;
  return substance.purposes.length > 0 ? substance.purposes.includes(purpose) : purpose === 'colourant' && isColourIndexName(substance.name);
}

function isListed(substance: Substance, list: RowList, context: Context): boolean {
  return context.law.rowsFor(substance).some(({ row }) => isOn(row, list, context) && bindsPurpose(row, substance, context.facts) !== false);
}

function isOn(row: LawRow, list: RowList, context: Context): boolean {
  return row.list === list && row.markets.includes(context.facts.market) && isInForce(row, context.days);
}

/** Colourants that only some shades hold are judged by name alone. */
function judgeShades(context: Context): Finding[] {
  const colourants = LISTS[0]!;
  return context.document.product.mayContain
    .filter(({ inci }) => !context.law.rowsFor({ name: inci, cas: [] }).some(({ row }) => isOn(row, 'colourant', context)))
    .map(({ inci }) => present(inci, colourants, context));
}

function present(subject: string, list: (typeof LISTS)[number], context: Context): Finding {
  const short = context.facts.market === 'UK' ? context.law.instruments.get('eu-1223-2009')!.elsewhere!.UK!.short : 'Regulation (EC) No 1223/2009';
  return {
    kind: 'use-not-listed',
    severity: 'stop',
    rule: `eu/article-14/${list.list}`,
    subject,
    citation: `${short}, Article 14(1) and ${list.annex}`,
    message: `${subject} is not on the list of ${list.noun} (${list.annex}).`,
    remedy: `Choose one of the listed ${list.noun}.`,
    certainty: 'certain',
    ...(context.facts.market === 'UK' ? { sourcing: 'secondary' as const } : {}),
  };
}
