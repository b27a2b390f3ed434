import type { FindingKind } from '#shared/engine/types.ts';
import { judge, type Asked, type Given } from '#tests/shared/rules/judging.ts';

/** What a rule says of a small product from its first days on, or up to its last (`ends`). */
export interface Boundary {
  readonly market: 'EU' | 'UK';
  readonly rule: string;
  /** The kind of finding, `{ words }` on the label, or `{ notChecked }`: what is listed as not checked. */
  readonly says: FindingKind | { readonly words: string } | { readonly notChecked: string };
  /** The limit the finding rests on, where two of one rule follow each other. */
  readonly limit?: string;
  readonly given: readonly Given[];
  readonly asked: Asked;
  /** First day for batches first supplied, where the rule has two dates. */
  readonly placed?: string;
  /** First day for everything still supplied. */
  readonly available: string;
  readonly ends?: true;
}

/** Whether the rule says it of a product first supplied, and still supplied, on these days. */
export function speaks({ market, rule, says, limit, given, asked }: Boundary, placed: string, available: string): boolean {
  const verdict = judge(given, { ...asked, market, placed, available });
  if (typeof says === 'string') return verdict.findings.some((one) => one.kind === says && one.rule === rule && (limit === undefined || one.limit === limit));
  if ('words' in says) return verdict.requiredWording.some((one) => one.rule === rule && one.text.includes(says.words));
  return verdict.notChecked.some((one) => one.rule === rule && one.words.includes(says.notChecked));
}

/** The day so many days after an ISO date. */
export function dayAfter(day: string, days: number): string {
  return new Date(Date.parse(`${day}T00:00:00Z`) + days * 86_400_000).toISOString().slice(0, 10);
}
