import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Dictionary } from '#shared/dictionary/types.ts';
import { decimal, ONE } from '#shared/kernel/rational.ts';
import { hasBegun } from '#shared/law/as-at.ts';
import type { LawBook } from '#shared/law/law-book.ts';
import type { AllergenGroup } from '#shared/law/types.ts';
import { claimedShares } from '#shared/rules/claims/claimed-shares.ts';
import { judgeAmounts, judgeLaw, type LawVerdict } from '#shared/rules/judge-law.ts';
import { findThresholds } from '#shared/rules/thresholds.ts';
import { groupAllergens, judgeAllergens, type AllergenVerdict } from './allergens.ts';
import type { Declaration } from './assessment.ts';
import { blendFormula, materialsById, type Blend, type BlendedSubstance } from './blend.ts';
import { declare } from './declare.ts';
import { judgeSum } from './formula-findings.ts';
import type { Comparison, HeadroomInput } from './headroom.ts';
import { findListFinding } from './list-headroom.ts';
import { judgeAmbiguities, judgeCompositions, judgeNames, judgeOrder } from './list-findings.ts';
import { LIST_LAW } from './list-law.ts';
import type { MixingPlan } from './mixing-plan.ts';
import { prepareMaterial } from './prepare-material.ts';
import type { Finding, ProductFacts } from './types.ts';
import { withShare } from './weigh-lines.ts';

/** A product in one market on two days, whatever its amounts. */
export interface JudgedProduct {
  readonly document: FormulaDocument;
  readonly facts: ProductFacts;
  readonly law: LawBook;
  readonly dictionary: Dictionary;
}

export interface JudgedBlend {
  readonly declaration: Declaration;
  readonly verdicts: readonly AllergenVerdict[];
  readonly judged: LawVerdict;
  readonly findings: readonly Finding[];
}

type Grouped = ReadonlyMap<AllergenGroup, readonly BlendedSubstance[]>;

/** Everything that is said of a mixture in one market, findings in the order found. */
export function judgeBlend({ document, facts, law, dictionary }: JudgedProduct, blend: Blend, grouped: Grouped = groupAllergens(blend, law)): JudgedBlend {
  const { market, category } = facts;
  const { verdicts, upcoming } = judgeAllergens(blend, grouped, { ...facts, exposure: category.exposure });
  const { declaration, ambiguities } = declare({ document, blend, dictionary, lawBook: law, market, category, allergens: verdicts, grouped });
  const { citation } = LIST_LAW[market];
  const judged = judgeLaw(facts, blend, document, law);
  const findings = [
    ...judgeSum(document, blend.weighed, citation),
    ...judgeCompositions(blend, citation),
    ...judgeNames(blend, dictionary, market),
    ...judgeAmbiguities(ambiguities, market),
    ...judgeOrder(declaration, market),
    ...judged.findings,
    ...upcoming,
  ];
  return { declaration, verdicts, judged, findings };
}

/** As {@link judgeBlend}, of the same materials in other amounts: only findings that amounts can change. */
function judgeTrial(product: JudgedProduct, blend: Blend, claims: boolean): Finding[] {
  const { document, facts, law, dictionary } = product;
  const { market, category } = facts;
  const grouped = groupAllergens(blend, law);
  const { verdicts, upcoming } = judgeAllergens(blend, grouped, { ...facts, exposure: category.exposure });
  const { declaration, ambiguities } = declare({ document, blend, dictionary, lawBook: law, market, category, allergens: verdicts, grouped });
  return [...judgeAmbiguities(ambiguities, market), ...judgeOrder(declaration, market), ...judgeAmounts(product, blend, claims), ...upcoming];
}

/** What headroom asks of a product that has been judged. */
export function headroomOf(product: JudgedProduct, blend: Blend, today: Pick<JudgedBlend, 'declaration' | 'findings'>): HeadroomInput {
  const { document, facts, law, dictionary } = product;
  const byId = materialsById(document.materials);
  const inputFor = (mixed: Blend, declaration: () => Declaration, promised = claimedShares(document, mixed)): HeadroomInput => ({
    blend: mixed,
    today: today.findings,
    materialOf(line) {
      const material = byId.get(document.formula.lines[line]!.material);
      return material && prepareMaterial(material, dictionary);
    },
    mixAt: (line, share) => blendFormula(document, dictionary, withShare(blend.weighed, line, share)),
    judge(other) {
      const { upcoming } = judgeAllergens(other, groupAllergens(other, law), { ...facts, exposure: facts.category.exposure });
      return [...judgeAmounts(product, other, promised.length > 0), ...upcoming];
    },
    // Whether the batch adds up is asked of the amounts as they are written, not of a trial.
    judgeAll: (other) => judgeBlend(product, other).findings.filter(({ kind }) => kind !== 'sum-mismatch'),
    judgeWide: (other) => judgeTrial(product, other, promised.length > 0),
    thresholds: [...comparisonsFor(product, mixed), ...promised.map((one): Comparison => ({ ...one, changesList: false, isLeast: true }))],
    findListFinding: (end) => findListFinding(mixed, end, declaration(), facts.market),
    withBlend: (other) => inputFor(other, () => judgeBlend(product, other).declaration),
  });
  return inputFor(blend, () => today.declaration);
}

const remembered = new WeakMap<LawBook, WeakMap<MixingPlan, Map<string, readonly Comparison[]>>>();

/** Every comparison that the law and the allergen lists make; it hangs on the substances alone. */
function comparisonsFor({ facts, law }: JudgedProduct, blend: Blend): readonly Comparison[] {
  let ofLaw = remembered.get(law);
  if (!ofLaw) remembered.set(law, (ofLaw = new WeakMap()));
  let known = ofLaw.get(blend.plan);
  if (!known) ofLaw.set(blend.plan, (known = new Map()));
  const id = [facts.market, facts.category.exposure, facts.placedOnMarket, facts.availableOn, facts.readyForUse.n, facts.readyForUse.d].join(' ');
  let found = known.get(id);
  if (!found) known.set(id, (found = makeComparisons(facts, law, blend)));
  return found;
}

function makeComparisons(facts: ProductFacts, law: LawBook, blend: Blend): Comparison[] {
  const ofLaw = findThresholds(facts, blend, law).map(({ terms, limit }): Comparison => ({ limit, keys: terms.map(({ key }) => key), changesList: false, weigh: (mixed) => mixed.weigh(terms) }));
  for (const [group, substances] of groupAllergens(blend, law)) {
    const rule = group.markets.find(({ market }) => market === facts.market);
    // A threshold that binds changes the printed names; order can only be in doubt where there are ranges.
    const isToCome = rule !== undefined && !hasBegun(rule.from, facts);
    if (!rule || !(isToCome || blend.plan.hasRanges)) continue;
    const keys = substances.map(({ key }) => key);
    const terms = keys.map((key) => ({ key, weight: ONE }));
    ofLaw.push({ limit: decimal(facts.category.exposure === 'leave-on' ? group.leaveOn : group.rinseOff), keys, changesList: !isToCome, weigh: (mixed) => mixed.weigh(terms) });
  }
  return ofLaw;
}
