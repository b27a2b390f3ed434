import type { Finding, FindingKind } from '#shared/engine/types.ts';
import type { Context } from '../context.ts';
import type { NotChecked } from '../outcome.ts';
import { analyseClaim, type Analysis, type NamedHit } from './analyse-claim.ts';
import { CLAIM_LANGUAGES, claimCitations, type ClaimVerdict } from './claim-tables.ts';
import { findMembers, holdsNamed } from './composition.ts';

/** One point that a text stands or falls on. */
interface Point {
  readonly verdict: ClaimVerdict;
  readonly rule: string;
  /** The words it stands on, as written. */
  readonly words: string;
  readonly why: string;
  readonly needs?: readonly string[];
  readonly isNamed?: boolean;
}

/**
 * Claims and the product's name, by the common criteria of Regulation (EU) No 655/2013 and the
 * line to medicines and drugs. Each verdict quotes the words it stands on.
 *
 * Reading: an ingredient that a claim says is contained and that is not is a contradiction; one
 * that a name only calls to mind is a question, because it may be a scent or a fancy name. A
 * claim that denies ("not intended to treat") is none; one that speaks of the look only is
 * cosmetic. Not covered: pictures, and languages other than those of the tables.
 */
export function judgeClaims(context: Context, notChecked: NotChecked[]): Finding[] {
  const { name, claims } = context.document.product;
  const findings = claims.flatMap(({ text, lang }) => {
    const analysis = analyseClaim(text, lang);
    if (!analysis) {
      notChecked.push({ rule: 'claims/language', subject: text, citation: citationOf('evidence', context).text, words: `Claims are judged in ${CLAIM_LANGUAGES.join(', ')} only; this one is marked "${lang}".` });
      return [];
    }
    return present(text, [...pointsOfRows(analysis, context), ...pointsOfAbsences(analysis, context), ...pointsOfNamed(analysis.named, context, false)], context);
  });
  const ofName = name === '' || context.facts.category.decorative ? undefined : analyseClaim(name, 'en');
  if (!ofName) return findings;
  return [...findings, ...present(name, [...pointsOfRows(ofName, context), ...pointsOfAbsences(ofName, context), ...pointsOfNamed(ofName.named, context, true)], context)];
}

function pointsOfRows({ rows }: Analysis, context: Context): Point[] {
  const { market } = context.facts;
  return rows.flatMap(({ row, words, isDenied, isSoftened }): Point[] => {
    let verdict = row.verdict[market];
    if (!verdict || (isDenied && verdict === 'medicinal')) return [];
    if (isSoftened && verdict === 'medicinal') {
      // The look of it is cosmetic; the criteria of the EU still ask for evidence of it.
      if (market === 'US' || market === 'CA') return [];
      verdict = 'evidence';
    }
    return [{ verdict, rule: `claims/${row.id}`, words, why: row.why }];
  });
}

function pointsOfAbsences({ absences }: Analysis, context: Context): Point[] {
  const { market } = context.facts;
  if (context.mixture.substances.length === 0) return [];
  return absences.flatMap(({ claimClass, words }): Point[] => {
    const rule = `claims/without-${claimClass.id}`;
    const { sure, perhaps } = findMembers(claimClass, context.mixture);
    if (sure.length > 0) return [{ verdict: 'contradicted', rule, words, why: `The product holds ${claimClass.title}: ${sure.join(', ')}.` }];
    if (perhaps.length > 0) return [{ verdict: 'evidence', rule, words, why: `Whether ${perhaps.join(', ')} ${perhaps.length > 1 ? 'count' : 'counts'} as ${claimClass.title} depends on origin or purpose; the supplier must say.` }];
    const agreed = claimClass.agreed?.[market];
    return agreed ? [{ verdict: agreed, rule, words, why: claimClass.why ?? 'It needs evidence.' }] : [];
  });
}

function pointsOfNamed(named: readonly NamedHit[], context: Context, isName: boolean): Point[] {
  if (context.mixture.substances.length === 0) return [];
  return named.filter(({ starts }) => !holdsNamed(starts, context.mixture)).map(({ word, isContained }) => ({
    verdict: isContained && !isName ? 'contradicted' : 'evidence',
    rule: 'claims/named-ingredient',
    words: word,
    why: isContained && !isName ? `It says that ${word} is in the product; nothing of it is.` : `It names ${word}, and nothing of it is in the product; that misleads unless it clearly means the scent.`,
    isNamed: true,
  }));
}

const KINDS: Readonly<Record<ClaimVerdict, FindingKind>> = { medicinal: 'claim-medicinal', contradicted: 'claim-contradicted', evidence: 'claim-evidence' };
const ORDER: readonly ClaimVerdict[] = ['medicinal', 'contradicted', 'evidence'];
const REMEDY: Readonly<Record<ClaimVerdict, string>> = {
  medicinal: 'Leave these words out, or speak of care and appearance only.',
  contradicted: 'Leave these words out, or change the formula so that they are true.',
  evidence: 'Attach the evidence to the product, or leave these words out.',
};

/** One finding for each kind: what a claim is wrong about, all its words together. Evidence for a medicinal claim is not asked for. */
function present(text: string, points: readonly Point[], context: Context): Finding[] {
  return ORDER.flatMap((verdict): Finding[] => {
    const own = points.filter((point) => point.verdict === verdict);
    if (own.length === 0 || (verdict === 'evidence' && points.some((point) => point.verdict === 'medicinal'))) return [];
    const { text: citation, sourcing } = own.every((point) => point.isNamed) ? citationOf('named', context, verdict) : citationOf(verdict, context);
    const words = [...new Set(own.map((point) => point.words))];
    const reasons = [...new Set(own.map((point) => point.why))];
    return [{
      kind: KINDS[verdict],
      severity: verdict === 'evidence' ? 'decide' : 'stop',
      rule: own[0]!.rule,
      subject: text,
      members: words,
      citation,
      message: `${words.map((one) => `“${one}”`).join(', ')}: ${reasons.join(' ')}`,
      remedy: own.every((point) => point.isNamed) ? 'Let the ingredient be in the product, or name it otherwise.' : REMEDY[verdict],
      certainty: 'certain',
      ...(verdict === 'evidence' ? { needs: ['claimEvidence'] } : {}),
      ...(sourcing === 'official' ? {} : { sourcing }),
    }];
  });
}

function citationOf(kind: ClaimVerdict | 'named', context: Context, fallback: ClaimVerdict = 'evidence') {
  const { market } = context.facts;
  return claimCitations[kind][market] ?? claimCitations[kind === 'named' ? (fallback === 'evidence' ? 'contradicted' : fallback) : kind][market]!;
}
