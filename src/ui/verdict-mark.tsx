import type { ReactNode } from 'react';

export type VerdictWeight = 'stop' | 'decide' | 'note';
const WORDS: Readonly<Record<VerdictWeight, string>> = { stop: 'Stops sale', decide: 'Needs a decision', note: 'Worth knowing' };

/** A verdict's weight as a shape; give it `silent` where its word stands beside it. */
export function VerdictMark({ weight, silent = false }: { weight: VerdictWeight; silent?: boolean }) {
  return silent ? (
    <i className={`mark ${weight}`} aria-hidden="true" />
  ) : (
    <i className={`mark ${weight}`} role="img" aria-label={WORDS[weight]} title={WORDS[weight]} />
  );
}

/** The mark with its word, or with other words of the same weight (`2 need a decision`). */
export function VerdictWord({ weight, children }: { weight: VerdictWeight; children?: ReactNode }) {
  return (
    <span className={`weight ${weight}`}>
      <VerdictMark weight={weight} silent />
      <span>{children ?? WORDS[weight]}</span>
    </span>
  );
}

/** The weight's own word. */
export function sayWeight(weight: VerdictWeight): string {
  return WORDS[weight];
}
