import type { ClaimClass, LanguageTables } from './claim-tables.ts';
import { isDenied } from './denial.ts';
import { quote, type Span, type Token } from './match-words.ts';

/** What a claim says is absent: a class of ingredients, a named one, or a word of an INCI name. */
export interface AbsenceHit {
  readonly of: { readonly claimClass: ClaimClass } | { readonly starts: readonly string[]; readonly word: string } | { readonly word: string };
  readonly words: string;
  readonly span: Span;
}

type Of = AbsenceHit['of'];
interface Placed {
  readonly of: Of;
  readonly span: Span;
}

/** How far "free from" lists, and how many words in a row may be strange to the tables. */
const LIST_REACH = 24;
const STRANGE = 3;
/** Shorter words are never taken for the name of an ingredient. */
const NAME_LENGTH = 5;

/** "Free from parabens and silicones", "paraben- and silicone-free", "vegan". */
export function findAbsences(text: string, tokens: readonly Token[], tables: LanguageTables): AbsenceHit[] {
  const found = new Map<string, Placed>();
  const add = (one: Placed): void => {
    const key = keyOf(one.of);
    if (!found.has(key)) found.set(key, one);
  };
  const { before, after } = tables.frame;
  for (let at = 0; at < tokens.length; at += 1) {
    const start = before.longestAt(tokens, at);
    if (start && !isDenied(tokens, at, tables.frame)) listAfter(tokens, start.span, tables).forEach(add);
    if (after.has(tokens[at]!.word) && !isFollowed(tokens, at)) listBefore(tokens, at, tables).forEach(add);
    const plain = tables.plain.longestAt(tokens, at);
    if (plain && !isDenied(tokens, at, tables.frame) && !isOfIngredient(plain.item, tokens, plain.span.to, tables)) add({ of: { claimClass: plain.item }, span: plain.span });
    const joined = joinedClass(tokens[at]!.word, tables);
    if (joined) add({ of: { claimClass: joined }, span: { from: at, to: at + 1 } });
  }
  return [...found.values()].map(({ of, span }) => ({ of, span, words: quote(text, tokens, span) }));
}

const keyOf = (of: Of): string => ('claimClass' in of ? `class ${of.claimClass.id}` : of.word);

/** "With 100 % natural shea butter" speaks of the butter alone. */
function isOfIngredient({ id }: ClaimClass, tokens: readonly Token[], at: number, { ingredients }: LanguageTables): boolean {
  return id === 'not-natural' && [0, 1].some((ahead) => ingredients.longestAt(tokens, at + ahead) !== undefined);
}

/** "Free from" and "free delivery" do not speak of what stands before. */
function isFollowed(tokens: readonly Token[], at: number): boolean {
  const next = tokens[at + 1];
  return next?.clause === tokens[at]!.clause && (next.word === 'from' || next.word === 'of');
}

/** German joins the word and "frei": parabenfrei; hurried English does so too. */
function joinedClass(word: string, { frame, single }: LanguageTables): ClaimClass | undefined {
  for (const ending of frame.after) {
    if (word.length < ending.length + 3 || !word.endsWith(ending)) continue;
    const own = word.slice(0, -ending.length);
    const hit = single.find(({ text, isStem }) => (isStem ? own.startsWith(text) : own === text));
    if (hit) return hit.claimClass;
  }
  return undefined;
}

function nameAt(tokens: readonly Token[], at: number, tables: LanguageTables): Placed | undefined {
  const ofClass = tables.classes.longestAt(tokens, at);
  const ingredient = tables.ingredients.longestAt(tokens, at);
  if (ofClass && (!ingredient || ofClass.span.to >= ingredient.span.to)) return { of: { claimClass: ofClass.item }, span: ofClass.span };
  return ingredient && { of: { starts: ingredient.item.starts, word: ingredient.item.word }, span: ingredient.span };
}

function listAfter(tokens: readonly Token[], start: Span, tables: LanguageTables): Placed[] {
  const found: Placed[] = [];
  const { clause } = tokens[start.from]!;
  let strange = 0;
  for (let at = start.to; at < tokens.length && at < start.to + LIST_REACH; ) {
    const token = tokens[at]!;
    const isNext = at > start.to && tables.frame.before.longestAt(tokens, at) !== undefined;
    if (isNext || token.clause !== clause || tables.frame.stop.has(token.word) || strange > STRANGE) break;
    const hit = nameAt(tokens, at, tables);
    if (hit) {
      // "No soap residue" speaks of something else.
      if (!tables.frame.elsewhere.has(tokens[hit.span.to]?.word ?? '')) found.push({ of: hit.of, span: { from: start.from, to: hit.span.to } });
      at = hit.span.to;
      strange = 0;
    } else {
      if (token.word.length >= NAME_LENGTH && !tables.frame.and.has(token.word)) found.push({ of: { word: token.word }, span: { from: start.from, to: at + 1 } });
      if (!tables.frame.and.has(token.word)) strange += 1;
      at += 1;
    }
  }
  return found;
}

function listBefore(tokens: readonly Token[], at: number, tables: LanguageTables): Placed[] {
  const found: Placed[] = [];
  const { clause } = tokens[at]!;
  for (let end = at; end > 0; ) {
    const hit = [end - 4, end - 3, end - 2, end - 1].map((from) => (from < 0 ? undefined : nameAt(tokens, from, tables))).find((one) => one?.span.to === end);
    const last = tokens[end - 1]!;
    if (hit && tokens[hit.span.from]!.clause === clause) {
      if (!isDenied(tokens, hit.span.from, tables.frame)) found.push({ of: hit.of, span: { from: hit.span.from, to: at + 1 } });
      end = hit.span.from;
    } else if (found.length === 0 && end === at && last.clause === clause && last.word.length >= NAME_LENGTH && !tables.frame.and.has(last.word)) {
      found.push({ of: { word: last.word }, span: { from: end - 1, to: at + 1 } });
      end -= 1;
    } else if (found.length > 0 && tables.frame.and.has(last.word)) end -= 1;
    else break;
  }
  return found;
}
