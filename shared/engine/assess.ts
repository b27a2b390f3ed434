import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Dictionary } from '#shared/dictionary/types.ts';
import { DomainError } from '#shared/kernel/errors.ts';
import { parsePlainDate, type PlainDate } from '#shared/kernel/plain-date.ts';
import { decimal, ONE, type Rational } from '#shared/kernel/rational.ts';
import type { LawBook } from '#shared/law/law-book.ts';
import type { AllergenGroup, Category, Market, ProductFlag } from '#shared/law/types.ts';
import { groupAllergens } from './allergens.ts';
import type { Assessment, MarketAssessment } from './assessment.ts';
import { blendFormula, type Blend, type BlendedSubstance } from './blend.ts';
import { judgeDays } from './date-findings.ts';
import { findHeadroom } from './headroom.ts';
import { headroomOf, judgeBlend, type JudgedProduct } from './judge-blend.ts';
import type { Finding, ProductFacts, Severity } from './types.ts';
import { totalMass } from './weigh-lines.ts';

export interface AssessOptions {
  readonly law: LawBook;
  readonly dictionary: Dictionary;
  /** Instead of the document's own. */
  readonly markets?: readonly Market[];
  readonly placedOnMarket?: PlainDate;
  readonly availableOn?: PlainDate;
  /** The day that both dates default to. */
  readonly today: PlainDate;
}

/**
 * Judges a formula document in its markets. Pure and exact: the browser runs it at each
 * keystroke, the server on save, and both must say the same.
 * @throws DomainError when the category is not in the tables (the reader refuses it earlier).
 */
export function assess(document: FormulaDocument, options: AssessOptions): Assessment {
  const { law, dictionary } = options;
  const category = law.categories.get(document.product.category);
  if (!category) throw new DomainError(`no category "${document.product.category}"`);
  const blend = blendFormula(document, dictionary);
  const grouped = groupAllergens(blend, law);
  const shared: Shared = { document, options, category, blend, grouped };
  const markets = options.markets && options.markets.length > 0 ? options.markets : document.product.markets;
  const { weighed } = blend;
  return {
    document,
    dataRelease: `law ${law.release}, dictionary ${dictionary.release}`,
    totalMass: totalMass(weighed),
    lines: document.formula.lines.map((line, index) => ({
      line: index,
      materialId: line.material,
      mass: { n: weighed.masses[index]!, d: weighed.den },
      share: { n: weighed.masses[index]! * 100n, d: weighed.total === 0n ? 1n : weighed.total },
      isMadeUp: line.unit === 'qs',
    })),
    compositions: blend.materials.map(({ prepared }) => ({ materialId: prepared.material.id, state: prepared.state, typicalSum: prepared.typicalSum })),
    blend,
    results: [...new Set(markets)].map((market) => assessMarket(shared, market)),
  };
}

interface Shared {
  readonly document: FormulaDocument;
  readonly options: AssessOptions;
  readonly category: Category;
  readonly blend: Blend;
  readonly grouped: ReadonlyMap<AllergenGroup, readonly BlendedSubstance[]>;
}

function assessMarket(shared: Shared, market: Market): MarketAssessment {
  const { document, options, category, blend } = shared;
  const facts = productFacts(document, category, market, options);
  const product: JudgedProduct = { document, facts, law: options.law, dictionary: options.dictionary };
  const { declaration, verdicts, judged, findings } = judgeBlend(product, blend, shared.grouped);
  let headroom: ReturnType<MarketAssessment['headroom']> | undefined;
  return {
    market,
    placedOnMarket: facts.placedOnMarket,
    availableOn: facts.availableOn,
    exposure: category.exposure,
    declaration,
    allergens: verdicts,
    findings: byWeight([...judgeDays(facts, options.law), ...findings]),
    requiredWording: judged.requiredWording,
    notChecked: [...new Set(judged.notChecked.map(({ subject, words, citation }) => `${subject}: ${words} (${citation})`))],
    headroom: () => (headroom ??= findHeadroom(headroomOf(product, blend, { declaration, findings }))),
  };
}

const WEIGHTS: readonly Severity[] = ['stop', 'decide', 'note'];

/** What stops sale first; otherwise in the order found. */
function byWeight(findings: readonly Finding[]): Finding[] {
  return WEIGHTS.flatMap((severity) => findings.filter((finding) => finding.severity === severity));
}

/** What the rules know of the product in one market: the document's answers over the category's. */
export function productFacts(
  document: FormulaDocument,
  category: Category,
  market: Market,
  options: Pick<AssessOptions, 'today' | 'placedOnMarket' | 'availableOn'>,
): ProductFacts {
  const { product } = document;
  const flag = (name: ProductFlag): boolean => product.flags[name] ?? category.flags[name] ?? false;
  const aerosol = flag('aerosol');
  return {
    market,
    placedOnMarket: options.placedOnMarket ?? readDay(product.placedOnMarket) ?? options.today,
    availableOn: options.availableOn ?? readDay(product.availableOn) ?? options.today,
    category,
    flags: {
      under3: flag('under3'),
      professionalUseOnly: flag('professionalUseOnly'),
      aerosol,
      // A pressurised pack sprays unless it is said not to.
      spray: product.flags.spray ?? category.flags.spray ?? aerosol,
      intimateHygiene: flag('intimateHygiene'),
    },
    facts: { ...category.facts, ...product.facts },
    ...materialFacts(document),
    readyForUse: readyForUse(product.readyForUse),
  };
}

function materialFacts({ materials }: FormulaDocument): Pick<ProductFacts, 'materialFacts'> {
  const answered = materials.filter(({ facts }) => facts !== undefined);
  return answered.length === 0 ? {} : { materialFacts: new Map(answered.map(({ id, facts }) => [id, facts!])) };
}

function readDay(text: string | undefined): PlainDate | undefined {
  return text === undefined ? undefined : (parsePlainDate(text) ?? undefined);
}

function readyForUse(parts: FormulaDocument['product']['readyForUse']): Rational {
  if (!parts) return ONE;
  const own = decimal(parts.productParts);
  const other = decimal(parts.otherParts);
  const all = own.n * other.d + other.n * own.d;
  return all === 0n ? ONE : { n: own.n * other.d, d: all };
}
