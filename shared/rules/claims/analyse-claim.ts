import { claimTables, namedTables, type ClaimClass, type ClaimRow, type Frame, type LanguageTables } from './claim-tables.ts';
import { longestAt, quote, readPhrase, standsAt, tokenise, type Phrase, type Span, type Token } from './match-words.ts';

/** A row of the tables that a claim's words meet. */
export interface RowHit {
  readonly row: ClaimRow;
  readonly words: string;
  readonly isDenied: boolean;
  /** Only of the look of it. */
  readonly isSoftened: boolean;
}

/** A class of ingredients that the claim says are absent. */
export interface AbsenceHit {
  readonly claimClass: ClaimClass;
  readonly words: string;
}

/** An ingredient that the text names as if it were in the product. */
export interface NamedHit {
  readonly word: string;
  /** Folded beginnings of INCI names, any of which makes it true. */
  readonly starts: readonly string[];
  /** Said to be contained ("with oat", "oat oil"), not only named. */
  readonly isContained: boolean;
}

/** What a text says, whatever the product and the market. */
export interface Analysis {
  readonly rows: readonly RowHit[];
  readonly absences: readonly AbsenceHit[];
  readonly named: readonly NamedHit[];
}

/** How far before a word a denial or "the look of" reaches, and how far "free from" lists. */
const DENIAL_REACH = 4;
const LOOK_REACH = 6;
const LIST_REACH = 16;

const known = new Map<string, Analysis | undefined>();

/**
 * What a claim says in its language; `undefined` where the tables do not hold the language.
 * Remembered, as the same texts are judged again at every change of the formula.
 */
export function analyseClaim(text: string, lang: string): Analysis | undefined {
  const language = lang.toLowerCase().split('-')[0]!;
  const key = `${language}|${text}`;
  if (known.has(key)) return known.get(key);
  if (known.size > 1000) known.clear();
  const tables = claimTables(language);
  const analysis = tables && analyse(text, language, tables);
  known.set(key, analysis);
  return analysis;
}

function analyse(text: string, lang: string, tables: LanguageTables): Analysis {
  const tokens = tokenise(text, lang);
  const spans = findAbsences(tokens, tables);
  return {
    rows: findRows(text, tokens, tables),
    absences: spans.map(({ claimClass, span }) => ({ claimClass, words: quote(text, tokens, span) })),
    named: lang === 'en' ? findNamed(tokens, tables.frame, spans.map(({ span }) => span)) : [],
  };
}

function findRows(text: string, tokens: readonly Token[], { rows, frame }: LanguageTables): RowHit[] {
  return rows.flatMap((row) => {
    for (let at = 0; at < tokens.length; at += 1) {
      const span = longestAt(row.phrases, tokens, at);
      if (!span || isExcepted(row, tokens, span)) continue;
      const near = row.near.length === 0 ? undefined : findNear(row.near, tokens, span);
      if (row.near.length > 0 && !near) continue;
      const words = near ? quote(text, tokens, { from: near.from < span.from ? near.from : span.from, to: near.to > span.to ? near.to : span.to }) : quote(text, tokens, span);
      const first = near && near.from < span.from ? near.from : span.from;
      return [{ row, words, isDenied: isDenied(tokens, first, frame) || isDenied(tokens, span.from, frame), isSoftened: row.softens && isLook(tokens, span, frame) }];
    }
    return [];
  });
}

function isExcepted(row: ClaimRow, tokens: readonly Token[], span: Span): boolean {
  for (let at = span.from - 3; at <= span.to; at += 1) {
    if (row.unless.some((phrase) => standsAt(phrase, tokens, at) && at + phrase.parts.length >= span.from)) return true;
  }
  return false;
}

function findNear(phrases: readonly Phrase[], tokens: readonly Token[], span: Span): Span | undefined {
  const { clause } = tokens[span.from]!;
  for (let at = 0; at < tokens.length; at += 1) {
    if (tokens[at]!.clause !== clause) continue;
    const found = longestAt(phrases, tokens, at);
    if (found && (found.to <= span.from || found.from >= span.to)) return found;
  }
  return undefined;
}

/** "Not intended to treat", "does not": a denial shortly before, unless it is "not only" or "no more". */
function isDenied(tokens: readonly Token[], at: number, frame: Frame): boolean {
  const { clause } = tokens[at]!;
  for (let before = at - 1; before >= 0 && before >= at - DENIAL_REACH; before -= 1) {
    const token = tokens[before]!;
    if (token.clause !== clause) return false;
    if (frame.not.has(token.word) && !frame.notUnless.has(tokens[before + 1]!.word)) return true;
  }
  return false;
}

function isLook(tokens: readonly Token[], span: Span, frame: Frame): boolean {
  const { clause } = tokens[span.from]!;
  for (let at = span.from - LOOK_REACH; at < span.to; at += 1) {
    if (tokens[at]?.clause === clause && frame.look.some((phrase) => standsAt(phrase, tokens, at))) return true;
  }
  return false;
}

interface Absence {
  readonly claimClass: ClaimClass;
  readonly span: Span;
}

/** "Free from parabens and silicones", "paraben- and silicone-free", "vegan". */
function findAbsences(tokens: readonly Token[], tables: LanguageTables): Absence[] {
  const found: Absence[] = [];
  const add = (one: Absence): void => {
    if (!found.some(({ claimClass }) => claimClass === one.claimClass)) found.push(one);
  };
  for (let at = 0; at < tokens.length; at += 1) {
    const start = longestAt(tables.frame.before, tokens, at);
    if (start) for (const one of listAfter(tokens, start, tables)) add(one);
    if (tables.frame.after.has(tokens[at]!.word) && !/^(from|of)$/.test(tokens[at + 1]?.word ?? '')) for (const one of listBefore(tokens, at, tables)) add(one);
    for (const claimClass of tables.classes) {
      const plain = longestAt(claimClass.plain, tokens, at);
      if (plain && !isDenied(tokens, at, tables.frame)) add({ claimClass, span: plain });
      // German joins the word and "frei": parabenfrei.
      const joined = [...tables.frame.after].some((ending) => ending !== 'free' && tokens[at]!.word.endsWith(ending) && isClassWord(claimClass, tokens[at]!.word.slice(0, -ending.length)));
      if (joined) add({ claimClass, span: { from: at, to: at + 1 } });
    }
  }
  return found;
}

function isClassWord(claimClass: ClaimClass, word: string): boolean {
  return word.length > 2 && claimClass.words.some(({ parts }) => parts.length === 1 && (parts[0]!.isStem ? word.startsWith(parts[0]!.text) : word === parts[0]!.text));
}

function longestClass(tokens: readonly Token[], at: number, tables: LanguageTables): Absence | undefined {
  let best: Absence | undefined;
  for (const claimClass of tables.classes) {
    const span = longestAt(claimClass.words, tokens, at);
    if (span && (!best || span.to > best.span.to)) best = { claimClass, span };
  }
  return best;
}

function listAfter(tokens: readonly Token[], start: Span, tables: LanguageTables): Absence[] {
  const found: Absence[] = [];
  const { clause } = tokens[start.from]!;
  let strange = 0;
  for (let at = start.to; at < tokens.length && at < start.to + LIST_REACH; ) {
    const token = tokens[at]!;
    if (token.clause !== clause || tables.frame.stop.has(token.word) || strange > 2) break;
    const hit = longestClass(tokens, at, tables);
    if (hit) {
      found.push({ claimClass: hit.claimClass, span: { from: start.from, to: hit.span.to } });
      at = hit.span.to;
      strange = 0;
    } else {
      if (!tables.frame.and.has(token.word)) strange += 1;
      at += 1;
    }
  }
  return found;
}

function listBefore(tokens: readonly Token[], at: number, tables: LanguageTables): Absence[] {
  const found: Absence[] = [];
  const { clause } = tokens[at]!;
  for (let end = at; end > 0; ) {
    const hit = [end - 3, end - 2, end - 1].map((from) => (from < 0 ? undefined : longestClass(tokens, from, tables))).find((one) => one?.span.to === end);
    if (hit && tokens[hit.span.from]!.clause === clause) {
      found.push({ claimClass: hit.claimClass, span: { from: hit.span.from, to: at + 1 } });
      end = hit.span.from;
    } else if (found.length > 0 && tables.frame.and.has(tokens[end - 1]!.word)) end -= 1;
    else break;
  }
  return found;
}

const containing = namedTables.containing.map(readPhrase);
const partWords = new Set(namedTables.parts);
const scentWords = new Set(namedTables.scent);
const byFirstWord = new Map<string, { readonly phrase: Phrase; readonly word: string; readonly starts: readonly string[] }[]>();
for (const { word, starts } of namedTables.ingredients) {
  const phrase = readPhrase(word);
  const first = phrase.parts[0]!.text;
  byFirstWord.set(first, [...(byFirstWord.get(first) ?? []), { phrase, word, starts: starts.map((text) => text.replaceAll(' ', '')) }]);
}
/** "Like silk" and "collagen production" name nothing that is in the product. */
const LIKENESS = new Set(['like', 'as']);
const ELSEWHERE = new Set(['production', 'synthesis', 'levels', 'fibres', 'fibers', 'free', 'feel', 'touch', 'soft', 'colour', 'color', 'tone', 'shade', 'pink', 'tinted']);

function findNamed(tokens: readonly Token[], frame: Frame, absences: readonly Span[]): NamedHit[] {
  const found: NamedHit[] = [];
  for (let at = 0; at < tokens.length; ) {
    const best = (byFirstWord.get(tokens[at]!.word) ?? byFirstWord.get(tokens[at]!.word.replace(/s$/, '')) ?? [])
      .filter(({ phrase }) => phrase.parts.slice(1).every((part, index) => tokens[at + index + 1]?.word === part.text))
      .sort((a, b) => b.phrase.parts.length - a.phrase.parts.length)[0];
    if (!best) {
      at += 1;
      continue;
    }
    const span = { from: at, to: at + best.phrase.parts.length };
    if (!isElsewhere(tokens, span, frame, absences)) found.push({ word: best.word, starts: best.starts, isContained: isContained(tokens, span) });
    at = span.to;
  }
  return found;
}

function isElsewhere(tokens: readonly Token[], span: Span, frame: Frame, absences: readonly Span[]): boolean {
  if (absences.some(({ from, to }) => span.from >= from && span.from < to) || isDenied(tokens, span.from, frame)) return true;
  const before = tokens[span.from - 1]?.word ?? '';
  const next = [tokens[span.to]?.word ?? '', tokens[span.to + 1]?.word ?? ''];
  const scentBefore = [2, 3].some((back) => scentWords.has(tokens[span.from - back]?.word ?? '')) && before === 'of';
  return LIKENESS.has(before) || ELSEWHERE.has(next[0]!) || next.some((word) => scentWords.has(word) || word === 'free') || scentBefore;
}

function isContained(tokens: readonly Token[], span: Span): boolean {
  if (partWords.has(tokens[span.to]?.word ?? '')) return true;
  const { clause } = tokens[span.from]!;
  for (let at = span.from - 7; at < span.from; at += 1) {
    if (tokens[at]?.clause === clause && containing.some((phrase) => standsAt(phrase, tokens, at))) return true;
  }
  return false;
}
