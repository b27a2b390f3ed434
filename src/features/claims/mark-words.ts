import type { Severity } from '#shared/engine/types.ts';

/** A stretch of a claim, with the weight of the verdict that stands on it. */
export interface Stretch {
  readonly text: string;
  readonly weight?: Severity;
}
export interface QuotedWords {
  readonly words: string;
  readonly weight: Severity;
}

const ORDER: readonly Severity[] = ['stop', 'decide', 'note'];

/** Parts a claim at the words that verdicts quote; where they overlap the weightier verdict has the letters. */
export function markWords(text: string, quoted: readonly QuotedWords[]): Stretch[] {
  const weights: (Severity | undefined)[] = Array.from({ length: text.length });
  for (const { words, weight } of quoted.toSorted((a, b) => ORDER.indexOf(b.weight) - ORDER.indexOf(a.weight))) {
    const from = words === '' ? -1 : text.indexOf(words);
    if (from >= 0) weights.fill(weight, from, from + words.length);
  }
  const stretches: { text: string; weight?: Severity }[] = [];
  for (let at = 0; at < text.length; at += 1) {
    const weight = weights[at];
    const last = stretches.at(-1);
    if (last && last.weight === weight) last.text += text[at]!;
    else stretches.push(weight ? { text: text[at]!, weight } : { text: text[at]! });
  }
  return stretches;
}
