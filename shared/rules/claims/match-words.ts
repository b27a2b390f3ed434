/** One word of a claim with its place in the text; `clause` counts full stops and the like. */
export interface Token {
  readonly word: string;
  readonly start: number;
  readonly end: number;
  readonly clause: number;
  /** A comma, a colon, a dash or a bracket stands right before it. */
  readonly isAfterComma: boolean;
}

/** A phrase of the tables: whole words, and stems that stand for every word beginning with them. */
export interface Phrase {
  readonly parts: readonly { readonly text: string; readonly isStem: boolean }[];
}

/** A place in a claim: from word `from` up to, not with, word `to`. */
export interface Span {
  readonly from: number;
  readonly to: number;
}

const WORD = /\d+[.,]\d+(?![\p{L}\p{N}])|[\p{L}\p{N}](?:[\p{L}\p{N}\p{M}\u00AD]|['’](?=\p{L}))*|%|[,:()–—.;!?•\n]/gu;
/** The same for plain letters: the tables of all letters take long to load, and most claims need none of them. */
const PLAIN_WORD = /\d+[.,]\d+(?![a-z0-9])|[a-z0-9](?:[a-z0-9]|'(?=[a-z]))*|%|[,:().;!?\n]/gi;
const IS_PLAIN = /^[\x00-\x7f]*$/;
const PAUSE = /^[,:()–—]$/;
const CLAUSE_END = /^[.;!?•\n]$/;

/** Small letters without accents, apostrophes or soft hyphens; a comma in a number is a point. */
export function foldWord(word: string): string {
  if (IS_PLAIN.test(word)) return word.toLowerCase().replaceAll("'", '').replace(/^(\d+),(\d+)$/, '$1.$2');
  return word.toLowerCase().replace(/ß/g, 'ss').replace(/œ/g, 'oe').normalize('NFKD').replace(/[\p{M}'’\u00AD]+/gu, '').replace(/^(\d+),(\d+)$/, '$1.$2');
}

/** The words of a claim. French elisions (`d'alcool`) are two words; hyphens part words. */
export function tokenise(text: string, lang: string): Token[] {
  const tokens: Token[] = [];
  let clause = 0;
  let isAfterComma = false;
  for (const match of text.matchAll(IS_PLAIN.test(text) ? PLAIN_WORD : WORD)) {
    const raw = match[0];
    if (PAUSE.test(raw)) isAfterComma = true;
    else if (CLAUSE_END.test(raw)) clause += 1;
    else {
      const cut = lang === 'fr' ? /['’]/.exec(raw)?.index : undefined;
      const pieces = cut === undefined ? [[raw, 0] as const] : [[raw.slice(0, cut), 0] as const, [raw.slice(cut + 1), cut + 1] as const];
      for (const [piece, at] of pieces) {
        tokens.push({ word: foldWord(piece), start: match.index + at, end: match.index + at + piece.length, clause, isAfterComma });
        isAfterComma = false;
      }
    }
  }
  return tokens;
}

/** Reads a phrase: `not tested on animals`, `eczema*`. */
export function readPhrase(text: string): Phrase {
  return { parts: text.split(' ').map((part) => (part.endsWith('*') ? { text: part.slice(0, -1), isStem: true } : { text: part, isStem: false })) };
}

/** Whether the phrase stands at this word, within one clause. */
export function standsAt({ parts }: Phrase, tokens: readonly Token[], at: number): boolean {
  const first = tokens[at];
  if (!first) return false;
  for (let index = 0; index < parts.length; index += 1) {
    const token = tokens[at + index];
    const { text, isStem } = parts[index]!;
    if (token?.clause !== first.clause || !(isStem ? token.word.startsWith(text) : token.word === text)) return false;
  }
  return true;
}

/** What was found at a word, and how far it reaches. */
export interface Found<T> {
  readonly item: T;
  readonly span: Span;
}

interface Kept<T> {
  readonly text: string;
  readonly item: T;
  /** Read when a claim first comes near it: most never are. */
  phrase?: Phrase;
}

/** Phrases found by the beginning of their first word, so that no table is run through. */
export class PhraseIndex<T> {
  readonly #byStart = new Map<string, Kept<T>[]>();

  add(text: string, item: T): void {
    const key = beginningOf(text);
    const known = this.#byStart.get(key);
    if (known) known.push({ text, item });
    else this.#byStart.set(key, [{ text, item }]);
  }

  /** Everything whose phrase stands at this word; of one item only its longest phrase. */
  allAt(tokens: readonly Token[], at: number): Found<T>[] {
    const token = tokens[at];
    const candidates = token && this.#byStart.get(token.word.slice(0, 3));
    if (!candidates) return [];
    const best = new Map<T, Span>();
    for (const kept of candidates) {
      const phrase = (kept.phrase ??= readPhrase(kept.text));
      const to = at + phrase.parts.length;
      if (to > (best.get(kept.item)?.to ?? at) && standsAt(phrase, tokens, at)) best.set(kept.item, { from: at, to });
    }
    return [...best].map(([item, span]) => ({ item, span }));
  }

  /** The one with the longest phrase at this word. */
  longestAt(tokens: readonly Token[], at: number): Found<T> | undefined {
    return this.allAt(tokens, at).reduce<Found<T> | undefined>((best, one) => (best && best.span.to >= one.span.to ? best : one), undefined);
  }
}

/** The first three letters of a phrase's first word; stems of the tables have three at least. */
function beginningOf(text: string): string {
  const space = text.indexOf(' ');
  return text.slice(0, space >= 0 && space < 3 ? space : 3);
}

/** The words as the claim writes them. */
export function quote(text: string, tokens: readonly Token[], span: Span): string {
  return text.slice(tokens[span.from]!.start, tokens[span.to - 1]!.end);
}
