import { plainDate } from '#shared/kernel/plain-date.ts';
import { add, decimal, multiply, ONE, ZERO, type Rational } from '#shared/kernel/rational.ts';
import type { DocumentParticulars, FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Finding, FindingKind, Interval, Mixture, ProductFacts, Substance } from '#shared/engine/types.ts';
import { foldName } from '#shared/law/fold.ts';
import { openLawBook, type LawBook } from '#shared/law/law-book.ts';
import { lawTables } from '#shared/law/tables.ts';
import type { Market, ProductFlag, Purpose } from '#shared/law/types.ts';
import { judgeLaw, type LawVerdict } from '#shared/rules/judge-law.ts';

/** The law of this release, opened once for all tests. */
export const law = openLawBook(lawTables);

/** One substance of a test's mixture: a share, or a range of shares, in percent. */
export interface Given {
  readonly name: string;
  readonly percent?: string;
  readonly min?: string;
  readonly max?: string;
  readonly purpose?: Purpose;
  readonly cas?: readonly string[];
  readonly nano?: boolean;
  /** A constituent of a perfume or an oil, or an impurity, instead of an ingredient. */
  readonly as?: 'hidden' | 'incidental';
  readonly material?: string;
}

export interface Asked {
  readonly market?: Market;
  readonly category?: string;
  readonly placed?: string;
  readonly available?: string;
  readonly flags?: Partial<Record<ProductFlag, boolean>>;
  readonly facts?: Readonly<Record<string, string | boolean>>;
  readonly readyForUse?: Rational;
  readonly particulars?: Partial<DocumentParticulars>;
  readonly mayContain?: readonly { readonly inci: string; readonly usName?: string }[];
  readonly usName?: string;
  readonly product?: Partial<FormulaDocument['product']>;
  readonly languages?: readonly string[];
}

function toSubstance(given: Given): Substance {
  const single = given.percent ?? given.min!;
  const min = decimal(given.min ?? single);
  const max = decimal(given.max ?? single);
  const total: Interval = { min, typical: min, max };
  return {
    key: foldName(given.name),
    name: given.name,
    cas: given.cas ?? [],
    purposes: given.purpose ? [given.purpose] : [],
    nano: given.nano ?? false,
    as: { [given.as ?? 'ingredient']: total },
    total,
    sources: [{ materialId: given.material ?? given.name, line: 0, share: total }],
  };
}

function toMixture(substances: readonly Substance[]): Mixture {
  const find = (key: string): Substance | undefined => substances.find((one) => one.key === key);
  return {
    substances,
    find,
    weigh(terms) {
      const side = (end: keyof Interval): Rational => terms.reduce((sum, term) => add(sum, multiply(find(term.key)!.total[end], term.weight)), ZERO);
      return { min: side('min'), typical: side('typical'), max: side('max') };
    },
  };
}

function toDocument(givens: readonly Given[], asked: Asked): FormulaDocument {
  const particulars: DocumentParticulars | undefined = asked.particulars && { responsiblePerson: {}, warnings: [], ...asked.particulars };
  return {
    document: 'formula/1',
    product: { name: 'Test', brand: 'Brackenmere Bathhouse', category: asked.category ?? 'body-wash', markets: [asked.market ?? 'EU'], flags: {}, facts: {}, claims: [], mayContain: asked.mayContain ?? [], ...(particulars ? { particulars } : {}), ...asked.product },
    materials: givens.map((given) => ({ id: given.material ?? given.name, tradeName: given.name, declareAs: 'ingredients', composition: [{ inci: given.name, percent: '100', role: 'ingredient', ...(asked.usName ? { usName: asked.usName } : {}) }], constituents: [] })),
    formula: { lines: [] },
    ...(asked.languages ? { label: { languages: asked.languages } } : {}),
  };
}

/** Judges a small product: substances with their shares, and what the product is. Dates default to 1 December 2026. */
export function judge(givens: readonly Given[], asked: Asked = {}, book: LawBook = law): LawVerdict {
  const category = law.categories.get(asked.category ?? 'body-wash')!;
  const none = { under3: false, professionalUseOnly: false, aerosol: false, spray: false, intimateHygiene: false };
  const available = asked.available ?? '2026-12-01';
  const facts: ProductFacts = {
    market: asked.market ?? 'EU',
    placedOnMarket: plainDate(asked.placed ?? available),
    availableOn: plainDate(available),
    category,
    flags: { ...none, ...category.flags, ...asked.flags },
    facts: asked.facts ?? {},
    readyForUse: asked.readyForUse ?? ONE,
  };
  return judgeLaw(facts, toMixture(givens.map(toSubstance)), toDocument(givens, asked), book);
}

/** `kind subject rule` of each finding of the kinds asked for (all but wording when none is). */
export function said(verdict: LawVerdict, ...kinds: FindingKind[]): string[] {
  const wanted = (one: Finding): boolean => (kinds.length > 0 ? kinds.includes(one.kind) : one.kind !== 'wording-required');
  return verdict.findings.filter(wanted).map((one) => `${one.kind} ${one.subject} ${one.rule}`);
}
