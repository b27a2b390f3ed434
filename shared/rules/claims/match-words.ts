/** One word of a claim with its place in the text; `clause` counts full stops and the like. */
export interface Token {
  readonly word: string;
  readonly start: number;
  readonly end: number;
  readonly clause: number;
}

/** A phrase of the tables: whole words, and stems that stand for every word beginning with them. */
export interface Phrase {
  readonly parts: readonly { readonly text: string; readonly isStem: boolean }[];
}

const WORD = /[\p{L}\p{N}]+(?:['’]\p{L}+)?|%|[.;!?•]/gu;

/** Small letters without accents or apostrophes. */
export function foldWord(word: string): string {
  return word.toLowerCase().replace(/ß/g, 'ss').replace(/œ/g, 'oe').normalize('NFKD').replace(/[\p{M}'’]+/gu, '');
}

/** The words of a claim. French elisions (`d'alcool`) are two words; hyphens part words. */
export function tokenise(text: string, lang: string): Token[] {
  const tokens: Token[] = [];
  let clause = 0;
  for (const match of text.matchAll(WORD)) {
    const raw = match[0];
    if (/^[.;!?•]$/.test(raw)) {
      clause += 1;
      continue;
    }
    const cut = lang === 'fr' ? /['’]/.exec(raw)?.index : undefined;
    const pieces = cut === undefined ? [[raw, 0] as const] : [[raw.slice(0, cut), 0] as const, [raw.slice(cut + 1), cut + 1] as const];
    for (const [piece, at] of pieces) tokens.push({ word: foldWord(piece), start: match.index + at, end: match.index + at + piece.length, clause });
  }
  return tokens;
}

/** Reads a phrase: `not tested on animals`, `eczema*`. */
export function readPhrase(text: string): Phrase {
  return { parts: text.split(' ').map((part) => (part.endsWith('*') ? { text: part.slice(0, -1), isStem: true } : { text: part, isStem: false })) };
}

/** Whether the phrase stands at this word, within one clause. */
export function standsAt(phrase: Phrase, tokens: readonly Token[], at: number): boolean {
  const first = tokens[at];
  if (!first || at < 0) return false;
  return phrase.parts.every((part, index) => {
    const token = tokens[at + index];
    return token !== undefined && token.clause === first.clause && (part.isStem ? token.word.startsWith(part.text) : token.word === part.text);
  });
}

/** A place in a claim: from word `from` up to, not with, word `to`. */
export interface Span {
  readonly from: number;
  readonly to: number;
}

/** The longest of these phrases that stands at this word. */
export function longestAt(phrases: readonly Phrase[], tokens: readonly Token[], at: number): Span | undefined {
  let best: Span | undefined;
  for (const phrase of phrases) {
    if (standsAt(phrase, tokens, at) && (!best || phrase.parts.length > best.to - at)) best = { from: at, to: at + phrase.parts.length };
  }
  return best;
}

/** The words as the claim writes them. */
export function quote(text: string, tokens: readonly Token[], span: Span): string {
  return text.slice(tokens[span.from]!.start, tokens[span.to - 1]!.end);
}
