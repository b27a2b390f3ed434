import type { ClaimEvidence } from '#shared/contracts/evidence.contract.ts';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import type { Finding } from '#shared/engine/types.ts';
import type { Market } from '#shared/law/types.ts';
import { judgedIn } from '#shared/rules/claims/languages.ts';
import { markWords, type Stretch } from './mark-words.ts';

interface Result {
  readonly market: Market;
  readonly findings: readonly Finding[];
}

/** A claim, or the product's name, with what each market says of it and the papers behind it. */
export interface ClaimRowView {
  readonly text: string;
  readonly lang: string;
  readonly isName: boolean;
  /** In a language that has tables; a name has none of its own. */
  readonly isJudged: boolean;
  readonly stretches: readonly Stretch[];
  readonly byMarket: ReadonlyMap<Market, readonly Finding[]>;
  readonly asksEvidence: boolean;
  /** No paper mends it: every verdict on it stops sale. */
  readonly isBeyondEvidence: boolean;
  readonly papers: readonly ClaimEvidence[];
}

/** One row a claim, the name last; papers of words that no longer stand there are left over. */
export function buildClaimRows(draft: Pick<ProductDraft, 'name' | 'claims'>, results: readonly Result[], papers: readonly ClaimEvidence[]): { readonly rows: ClaimRowView[]; readonly leftOver: ClaimEvidence[] } {
  const texts = new Map<string, { readonly text: string; readonly lang: string; readonly isName: boolean }>();
  for (const { text, lang } of draft.claims) texts.set(text, { text, lang, isName: false });
  if (draft.name.trim() !== '' && !texts.has(draft.name)) texts.set(draft.name, { text: draft.name, lang: '', isName: true });
  const rows = [...texts.values()].map(({ text, lang, isName }): ClaimRowView => {
    const byMarket = new Map(results.map(({ market, findings }) => [market, findings.filter(({ kind, subject }) => kind.startsWith('claim-') && subject === text)] as const));
    const findings = [...byMarket.values()].flat();
    return {
      text, lang, isName, byMarket,
      isJudged: isName || judgedIn(lang) !== undefined,
      stretches: markWords(text, findings.flatMap(({ members = [], severity }) => members.map((words) => ({ words, weight: severity })))),
      asksEvidence: findings.some(({ kind }) => kind === 'claim-evidence'),
      isBeyondEvidence: findings.length > 0 && findings.every(({ severity }) => severity === 'stop'),
      papers: papers.filter(({ claim }) => claim === text),
    };
  });
  return { rows, leftOver: papers.filter(({ claim }) => !texts.has(claim)) };
}

const WORDS: Readonly<Record<string, string>> = { 'claim-medicinal': 'a medicine or drug', 'claim-contradicted': 'not true of it', 'claim-evidence': 'to be shown' };

/** What stands in a market's column: the weightiest answer. */
export function sayAnswer(findings: readonly Finding[]): string {
  return findings[0] ? (WORDS[findings[0].kind] ?? '') : 'nothing found';
}
