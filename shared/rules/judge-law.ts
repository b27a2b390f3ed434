import { ZERO } from '#shared/kernel/rational.ts';
import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Finding, Mixture, ProductFacts, RequiredWording, Substance } from '#shared/engine/types.ts';
import { foldName } from '#shared/law/fold.ts';
import type { LawBook } from '#shared/law/law-book.ts';
import type { LawRow } from '#shared/law/types.ts';
import { judgeClaims } from './claims/judge-claims.ts';
import { judgeUsColours } from './colours/us-colours.ts';
import type { Context } from './context.ts';
import { withCertificates } from './certificates/seen.ts';
import { judgeParticulars, listOpenParticulars } from './particulars/judge-particulars.ts';
import { judgePositiveLists } from './positive-lists/use-not-listed.ts';
import { judgeFormaldehyde, theoreticalFormaldehyde } from './preservatives/formaldehyde.ts';
import { listDuties } from './duties/duties.ts';
import { judgeIsothiazolinones } from './preservatives/isothiazolinones.ts';
import { judgeProductConditions } from './products/product-conditions.ts';
import { judgeMayContain } from './shades/may-contain.ts';
import { gatherRows } from './substances/gather.ts';
import { listNotRead } from './substances/not-read.ts';
import { judgeRow } from './substances/judge-row.ts';
import { judgeRows, presentSubstances } from './substances/judge-substances.ts';
import type { NotChecked, Outcome } from './outcome.ts';
import { judgeUpcoming, presentUpcomingWordings } from './upcoming/judge-upcoming.ts';
import { judgeProductWarnings } from './wording/product-warnings.ts';
import { judgeWordings, presentWording, wordingOf } from './wording/require-wording.ts';

/** What the law of one market says of a product on its two days. */
export interface LawVerdict {
  readonly findings: Finding[];
  readonly requiredWording: RequiredWording[];
  /** Conditions that the product's data cannot decide; for the report's list of what was not checked. */
  readonly notChecked: NotChecked[];
}

/**
 * Judges a product by the law of `facts.market`: prohibited and restricted substances, positive
 * lists, required wording, particulars and what is to come. Pure: the same input gives the same
 * answer, findings in the order of the law.
 */
export function judgeLaw(facts: ProductFacts, mixture: Mixture, document: FormulaDocument, law: LawBook): LawVerdict {
  const { context, notChecked, due, ofSubstances, toCome } = judgeMixture(facts, mixture, document, law);
  const findings = [
    ...ofSubstances,
    ...judgeProductConditions(context),
    ...judgeMayContain(context),
    ...judgeWordings(due, context),
    ...judgeParticulars(context),
    ...judgeClaims(context),
    ...toCome,
  ];
  return { findings, requiredWording: presentWording(due, context), notChecked: [...withCertificates(notChecked, context), ...listNotRead(context), ...listDuties(context), ...listOpenParticulars(context)] };
}

/**
 * The findings of {@link judgeLaw} that can change with the amounts while the same materials take
 * part, in the same order: what hangs on the label, on answers or on which substances are there
 * is left out. `claims` says whether a claim names a share, so that claims hang on amounts too.
 */
export function judgeAmounts(product: { readonly facts: ProductFacts; readonly document: FormulaDocument; readonly law: LawBook }, mixture: Mixture, claims: boolean): Finding[] {
  const { context, due, ofSubstances, toCome } = judgeMixture(product.facts, mixture, product.document, product.law);
  return [...ofSubstances, ...judgeWordings(due, context), ...(claims ? judgeClaims(context) : []), ...toCome];
}

/** What the law says of the substances and their amounts: the part that both ways of asking share. */
function judgeMixture(facts: ProductFacts, mixture: Mixture, document: FormulaDocument, law: LawBook) {
  const formaldehyde = theoreticalFormaldehyde(mixture, law, facts);
  const context: Context = { facts, mixture, document, law, days: facts, ...(formaldehyde ? { theoreticalFormaldehyde: formaldehyde } : {}) };
  const notChecked: NotChecked[] = [];
  const rows = gatherRows(mixture, law, facts.market);
  const outcomes = judgeRows(rows, context, notChecked);
  const later: Context = { ...context, days: { placedOnMarket: law.coveredUntil, availableOn: law.coveredUntil } };

  const formaldehydeNow = judgeFormaldehyde(context);
  const due = [...wordingOf(outcomes, context), ...formaldehydeNow, ...judgeProductWarnings(context)];
  const prohibited = new Set(outcomes.filter((one) => one.type === 'prohibited' && one.certainty === 'certain').flatMap((one) => one.parts.map((part) => part.substance.name)));
  const ofSubstances = [
    ...presentSubstances(outcomes, context),
    ...presentSubstances(judgeShades(context), context),
    ...judgePositiveLists(context).filter((one) => !prohibited.has(one.subject)),
    ...judgeIsothiazolinones(context),
    ...judgeUsColours(context),
  ];
  const toCome = [...judgeUpcoming(rows, outcomes, context), ...presentUpcomingWordings(formaldehydeNow, judgeFormaldehyde(later), context)];
  return { context, notChecked, due, ofSubstances, toCome };
}

/** Colourants of other shades: their uses are judged, their amounts are not known. */
function judgeShades(context: Context): Outcome[] {
  const none = { min: ZERO, typical: ZERO, max: ZERO };
  const outcomes: Outcome[] = [];
  for (const { inci } of context.document.product.mayContain) {
    const substance: Substance = { key: foldName(inci), name: inci, cas: [], purposes: ['colourant'], nano: false, as: { ingredient: none }, total: none, sources: [] };
    const hits = new Map<LawRow, { substance: Substance; member: LawRow['members'][number] }[]>();
    for (const { row, member } of context.law.rowsFor(substance)) {
      if (row.list === 'colourant' && row.markets.includes(context.facts.market)) hits.set(row, [{ substance, member }]);
    }
    for (const [row, parts] of hits) outcomes.push(...judgeRow(row, parts, context).filter((one) => one.type === 'forbidden'));
  }
  return outcomes;
}
