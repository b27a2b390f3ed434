import { compare, decimal, toDecimal } from '#shared/kernel/rational.ts';
import type { Finding, FindingKind } from '#shared/engine/types.ts';
import type { Context } from '../context.ts';
import type { AbsenceHit } from './absences.ts';
import { analyseClaim, type Analysis } from './analyse-claim.ts';
import { claimCriteria, type ClaimClass, type ClaimVerdict, type Criterion } from './claim-tables.ts';
import { findMembers, holdsNamed, namedIngredients, shareOf, withWord } from './composition.ts';
import { CLAIM_LANGUAGES } from './languages.ts';
import type { NamedHit } from './named.ts';
import { judgePh } from './ph.ts';

/** One point that a text stands or falls on. */
interface Point {
  readonly verdict: ClaimVerdict;
  readonly by: Criterion;
  readonly rule: string;
  /** The words it stands on, as written. */
  readonly words: string;
  readonly why: string;
  readonly needs?: readonly string[];
  readonly arithmetic?: NonNullable<Finding['arithmetic']>;
}

const DEFAULT_BY: Readonly<Record<ClaimVerdict, Criterion>> = { medicinal: 'medicine', contradicted: 'truthfulness', evidence: 'evidence' };

/**
 * Claims and the product's name, by the common criteria of Regulation (EU) No 655/2013 and the
 * line to medicines and drugs. Each verdict quotes the words it stands on.
 *
 * Reading: an ingredient that a claim says is contained and that is not is a contradiction; one
 * that a name only calls to mind is a question, because it may be a scent or a fancy name. A
 * claim that denies ("not intended to treat") is none; one that speaks of the look only is
 * cosmetic. A claim in a language without tables is left to a person. Not covered: pictures.
 */
export function judgeClaims(context: Context): Finding[] {
  const { name, claims } = context.document.product;
  const findings: Finding[] = [];
  for (const { text, lang } of claims) {
    const analysis = analyseClaim(text, lang);
    findings.push(...(analysis ? present(text, pointsOf(analysis, context), context) : [unread(text, lang, context)]));
  }
  if (name !== '') findings.push(...present(name, pointsOfName(name, context), context));
  return findings;
}

/** Silence would call it clean. */
function unread(text: string, lang: string, context: Context): Finding {
  return {
    kind: 'claim-evidence',
    severity: 'decide',
    rule: 'claims/language',
    subject: text,
    citation: cite('evidence', context).text,
    message: `Claims are read in English, German and French; this one is marked “${lang}” and was not read.`,
    remedy: `Have “${text}” read by someone who knows the language.`,
    certainty: 'possible',
  };
}

function pointsOf(analysis: Analysis, context: Context): Point[] {
  const ph = analysis.ph && judgePh(analysis.ph, context);
  return [
    ...pointsOfRows(analysis, context),
    ...(ph ? [{ ...ph, by: DEFAULT_BY[ph.verdict], rule: 'claims/ph', words: analysis.ph!.words }] : []),
    ...pointsOfAbsences(analysis.absences, context),
    ...pointsOfNamed(analysis.named, context, false),
  ];
}

/** A name has no language of its own: in the others only what stops sale is looked for. A shade's name is a colour. */
function pointsOfName(name: string, context: Context): Point[] {
  const [own, ...others] = CLAIM_LANGUAGES.map((lang) => analyseClaim(name, lang)!);
  const points = pointsOf({ ...own!, named: [] }, context);
  const named = context.facts.category.decorative ? [] : pointsOfNamed(own!.named, context, true);
  const foreign = others.flatMap((analysis) => [...pointsOfRows(analysis, context), ...pointsOfAbsences(analysis.absences, context)]).filter(({ verdict }) => verdict !== 'evidence');
  return [...points, ...named, ...foreign];
}

function pointsOfRows({ rows }: Analysis, { facts: { market } }: Context): Point[] {
  return rows.flatMap(({ row, words, isSoftened }): Point[] => {
    let verdict = row.verdict[market];
    if (!verdict) return [];
    if (isSoftened) {
      // The look of it is cosmetic; the criteria of the EU still ask for evidence of it.
      if (market === 'US' || market === 'CA') return [];
      verdict = 'evidence';
    }
    const isOwn = row.by !== undefined && row.by.startsWith('drug-') === (verdict === 'medicinal');
    return [{ verdict, by: isOwn ? row.by! : DEFAULT_BY[verdict], rule: `claims/${row.id}`, words, why: row.why }];
  });
}

function pointsOfAbsences(absences: readonly AbsenceHit[], context: Context): Point[] {
  const { mixture } = context;
  if (mixture.substances.length === 0) return [];
  return absences.flatMap(({ of, words }): Point[] => {
    if ('claimClass' in of) return pointsOfClass(of.claimClass, words, context);
    const holds = 'starts' in of ? namedIngredients(of.starts, mixture).map(({ name }) => name) : withWord(of.word, mixture);
    return holds.length === 0 ? [] : [{ verdict: 'contradicted', by: 'truthfulness', rule: 'claims/without-named', words, why: `The product holds ${holds.join(', ')}.` }];
  });
}

function pointsOfClass(claimClass: ClaimClass, words: string, { mixture, facts: { market } }: Context): Point[] {
  const rule = `claims/without-${claimClass.id}`;
  const { sure, perhaps, unknown } = findMembers(claimClass, mixture);
  const { title } = claimClass;
  if (sure.length > 0) return [{ verdict: 'contradicted', by: 'truthfulness', rule, words, why: `The product holds ${title}: ${sure.join(', ')}.` }];
  if (perhaps.length > 0) return [{ verdict: 'evidence', by: 'evidence', rule, words, why: `Whether ${perhaps.join(', ')} ${perhaps.length > 1 ? 'count' : 'counts'} as ${title} depends on origin or purpose; the supplier must say.` }];
  if (unknown.length > 0) return [{ verdict: 'evidence', by: 'evidence', rule, words, why: `What ${unknown.join(', ')} ${unknown.length > 1 ? 'consist' : 'consists'} of is not known here; the supplier must confirm that it brings none of ${title}.` }];
  const agreed = claimClass.agreed?.[market];
  return agreed ? [{ verdict: agreed, by: claimClass.by ?? DEFAULT_BY[agreed], rule, words, why: claimClass.why ?? 'It needs evidence.' }] : [];
}

function pointsOfNamed(named: readonly NamedHit[], context: Context, isName: boolean): Point[] {
  const { mixture } = context;
  if (mixture.substances.length === 0) return [];
  return named.flatMap((hit): Point[] => {
    if (holdsNamed(hit.starts, mixture)) return hit.percent === undefined ? [] : pointsOfShare(hit, hit.percent, context);
    const isSure = isName ? hit.isPart : hit.isContained || hit.isPart;
    const why = isSure ? `It says that ${hit.word} is in the product; nothing of it is.` : `It names ${hit.word}, and nothing of it is in the product; that misleads unless it clearly means the scent.`;
    return [{ verdict: isSure ? 'contradicted' : 'evidence', by: 'named', rule: 'claims/named-ingredient', words: hit.words, why }];
  });
}

/** "With 10 % glycerin": what is claimed against what is in it. */
function pointsOfShare({ starts, word, words }: NamedHit, percent: string, { mixture }: Context): Point[] {
  const own = namedIngredients(starts, mixture);
  if (own.length === 0) return [];
  const claimed = decimal(percent);
  const { min, max } = shareOf(own, mixture);
  const names = own.map(({ name }) => name).join(', ');
  if (compare(claimed, min) <= 0) return [];
  // The figures stand in the arithmetic, which a report without shares leaves out.
  const arithmetic = [{ step: `Claimed, ${word}`, figure: `${percent} %` }, { step: names, figure: compare(min, max) === 0 ? `${toDecimal(max)} %` : `${toDecimal(min)} to ${toDecimal(max)} %` }];
  return compare(claimed, max) > 0
    ? [{ verdict: 'contradicted', by: 'truthfulness', rule: 'claims/share', words, why: `It claims ${percent} % ${word}; less than that is in it.`, arithmetic }]
    : [{ verdict: 'evidence', by: 'evidence', rule: 'claims/share', words, why: `It claims ${percent} % ${word}; the suppliers’ ranges allow less.`, arithmetic }];
}

const KINDS: Readonly<Record<ClaimVerdict, FindingKind>> = { medicinal: 'claim-medicinal', contradicted: 'claim-contradicted', evidence: 'claim-evidence' };
const ORDER: readonly ClaimVerdict[] = ['medicinal', 'contradicted', 'evidence'];
/** What to do, with the words it is about. */
const REMEDY: Readonly<Record<ClaimVerdict, (words: string) => string>> = {
  medicinal: (words) => `Leave out ${words}, or speak of care and appearance only.`,
  contradicted: (words) => `Leave out ${words}, or change the formula so that it is true.`,
  evidence: (words) => `Attach evidence for ${words}, or leave it out.`,
};

/** One finding for each kind: what a claim is wrong about, all its words together. */
function present(text: string, points: readonly Point[], context: Context): Finding[] {
  if (points.length === 0) return [];
  return ORDER.flatMap((verdict): Finding[] => {
    const own = points.filter((point) => point.verdict === verdict && !isSettled(point, points));
    if (own.length === 0) return [];
    const cited = uniq(own.map(({ by }) => by)).map((by) => cite(by, context));
    const words = uniq(own.map((point) => point.words));
    const quoted = words.map((one) => `“${one}”`).join(', ');
    const needs = uniq(own.flatMap((point) => point.needs ?? []));
    const arithmetic = own.flatMap((point) => point.arithmetic ?? []);
    const sourcing = cited.some((one) => one.sourcing === 'memory') ? 'memory' : cited.some((one) => one.sourcing === 'secondary') ? 'secondary' : undefined;
    return [{
      kind: KINDS[verdict],
      severity: verdict === 'evidence' ? 'decide' : 'stop',
      rule: own[0]!.rule,
      subject: text,
      members: words,
      citation: uniq(cited.map((one) => one.text)).join('; '),
      message: `${quoted}: ${uniq(own.map((point) => point.why)).join(' ')}`,
      remedy: own.every(({ by }) => by === 'named') ? `Let ${quoted} be in the product, or name it otherwise.` : REMEDY[verdict](quoted),
      certainty: 'certain',
      ...(arithmetic.length > 0 ? { arithmetic } : {}),
      ...(needs.length > 0 ? { needs } : {}),
      ...(sourcing ? { sourcing } : {}),
    }];
  });
}

/** Evidence is not asked for in a medicinal claim, nor for words that the formula contradicts. */
function isSettled({ verdict, words }: Point, points: readonly Point[]): boolean {
  return verdict === 'evidence' && points.some((other) => other.verdict === 'medicinal' || (other.verdict === 'contradicted' && other.words.includes(words)));
}

const uniq = <T>(values: readonly T[]): T[] => [...new Set(values)];

function cite(by: Criterion, { facts: { market } }: Context): { readonly text: string; readonly sourcing: 'official' | 'secondary' | 'memory' } {
  return claimCriteria[by]![market];
}
