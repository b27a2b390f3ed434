import { hasBegun, isInForce, isToCome } from '#shared/law/as-at.ts';
import type { Finding, ProductFacts } from '#shared/engine/types.ts';
import { answer } from '../answer.ts';
import type { Context } from '../context.ts';
import type { NotChecked } from '../outcome.ts';
import { lookFor, type Look } from './check-particular.ts';
import { rowsOfMarket, type ParticularRow } from './particular-rows.ts';

/**
 * What the rules of this room read beside the answers given: where it was made decides what is
 * imported in each market, and the content of the document beats the one entered as an answer.
 */
export function factsOfLabel({ facts, document }: Pick<Context, 'facts' | 'document'>): ProductFacts {
  const madeIn = facts.facts['madeIn'];
  const content = document.product.netContent?.value;
  if (typeof madeIn !== 'string' && content === undefined) return facts;
  return { ...facts, facts: { ...facts.facts, ...(typeof madeIn === 'string' && madeIn !== '' ? { imported: madeIn !== facts.market } : {}), ...(content === undefined ? {} : { netContent: content }) } };
}

/** One answer settles every market at once, so it is asked for instead of its consequence. */
const ASKED_INSTEAD: Readonly<Record<string, string>> = { imported: 'madeIn' };
const asked = (needs: Iterable<string>): string[] => [...new Set([...needs].map((key) => ASKED_INSTEAD[key] ?? key))];

/**
 * `particular-missing` for each particular the market wants and the label lacks,
 * `particular-uncertain` where an answer is missing, `upcoming` for what binds later; only where
 * the document has particulars.
 */
export function judgeParticulars(context: Context): Finding[] {
  if (!context.document.product.particulars) return [];
  const own: Context = { ...context, facts: factsOfLabel(context) };
  return rowsOfMarket(context.facts.market).flatMap((row) => judgeRow(row, own));
}

function judgeRow(row: ParticularRow, context: Context): Finding[] {
  const isDue = isInForce(row, context.days);
  if ('open' in row.check || (!isDue && !isToCome(row, context.days)) || (row.until && hasBegun(row.until, context.days))) return [];
  const needs = new Set<string>();
  const question = { facts: context.facts, needs };
  const binds = row.where === undefined ? true : answer(row.where, question);
  if (binds === false || (binds === undefined && row.silent)) return [];
  const isFree = row.unless === undefined ? false : answer(row.unless, question);
  if (isFree === true) return [];
  const look = lookFor(row.check, context);
  if (look.met === true || (look.met === undefined && look.open !== undefined)) return [];
  for (const key of look.needs ?? []) needs.add(key);
  const finding = present(row, look, asked(needs), binds === true && look.met === false && !row.doubt);
  if (isDue) return [finding];
  return finding.kind === 'particular-missing' ? [{ ...finding, kind: 'upcoming', severity: 'note', message: `From ${row.from!.available}: ${finding.message}` }] : [];
}

function present(row: ParticularRow, look: Look, needs: readonly string[], isSure: boolean): Finding {
  const words = look.words ?? row.words;
  const { from } = row;
  const rests = {
    rule: row.id, subject: row.subject, ...look.figures, citation: row.citation,
    ...(from ? { effective: { from: from.available } } : {}),
    remedy: look.remedy ?? row.remedy,
    ...(needs.length > 0 ? { needs } : {}),
    ...(row.sourcing === 'official' ? {} : { sourcing: row.sourcing }),
    ...(row.reading ? { reading: row.reading } : {}),
  };
  if (isSure) return { kind: 'particular-missing', severity: 'stop', ...rests, message: `The label lacks the ${words}.`, certainty: 'certain' };
  return { kind: 'particular-uncertain', severity: 'decide', ...rests, message: `The label may lack the ${words}. It cannot be told from what is entered.`, certainty: 'possible' };
}

/** Duties about the label that nothing entered decides, with the least that is known of them. */
export function listOpenParticulars(context: Context): NotChecked[] {
  if (!context.document.product.particulars) return [];
  const own: Context = { ...context, facts: factsOfLabel(context) };
  const found: NotChecked[] = [];
  for (const row of rowsOfMarket(context.facts.market)) {
    if (row.record || !isInForce(row, context.days)) continue;
    const binds = row.where === undefined ? true : answer(row.where, { facts: own.facts, needs: new Set() });
    if (binds === false || (binds === undefined && row.silent)) continue;
    const look = lookFor(row.check, own);
    if (look.open === undefined) continue;
    const says = 'open' in row.check ? row.words : `${row.words.charAt(0).toUpperCase()}${row.words.slice(1)}.`;
    found.push({ rule: row.id, subject: SUBJECTS[row.subject] ?? row.subject, citation: row.citation, words: `${says} ${look.open}${row.sourcing === 'memory' ? ' From memory.' : ''}` });
  }
  return found;
}

/** A field's key as people say it. */
const SUBJECTS: Readonly<Record<string, string>> = {
  responsiblePerson: 'responsible person', netContent: 'net content', eMark: 'e mark', usContact: 'contact for the US', canadaContact: 'contact for Canada', countryOfOrigin: 'country of origin', batchCode: 'batch code',
};
