import { findAbsences, type AbsenceHit } from './absences.ts';
import { claimTables, type ClaimRow, type Frame, type LanguageTables } from './claim-tables.ts';
import { isDenied } from './denial.ts';
import { judgedIn } from './languages.ts';
import { quote, standsAt, tokenise, type Span, type Token } from './match-words.ts';
import { findNamed, type NamedHit } from './named.ts';
import { findPh, type PhHit } from './ph.ts';

/** A row of the tables that a claim's words meet. */
export interface RowHit {
  readonly row: ClaimRow;
  readonly words: string;
  /** Only of the look of it. */
  readonly isSoftened: boolean;
}

/** What a text says, whatever the product and the market. */
export interface Analysis {
  readonly rows: readonly RowHit[];
  readonly absences: readonly AbsenceHit[];
  readonly named: readonly NamedHit[];
  readonly ph: PhHit | undefined;
}

/** How far from a word its companion may stand, and how far before it "the look of" reaches. */
const NEAR_REACH = 7;
const LOOK_REACH = 6;
const REMEMBERED = 2000;

const known = new Map<string, Analysis>();

/**
 * What a claim says in its language; `undefined` where the tables do not hold the language.
 * Remembered, as the same texts are judged again at every change of the formula.
 */
export function analyseClaim(text: string, lang: string): Analysis | undefined {
  const language = judgedIn(lang);
  if (!language) return undefined;
  const key = `${language}|${text}`;
  const before = known.get(key);
  if (before) return before;
  if (known.size > REMEMBERED) known.clear();
  const analysis = analyse(text, claimTables(language));
  known.set(key, analysis);
  return analysis;
}

function analyse(text: string, tables: LanguageTables): Analysis {
  const tokens = tokenise(text, tables.lang);
  const absences = findAbsences(text, tokens, tables);
  return {
    rows: findRows(text, tokens, tables),
    absences,
    named: findNamed(text, tokens, tables, absences.map(({ span }) => span)),
    ph: findPh(text, tokens, tables.frame),
  };
}

function findRows(text: string, tokens: readonly Token[], { rows, frame }: LanguageTables): RowHit[] {
  const found = new Map<ClaimRow, RowHit>();
  for (let at = 0; at < tokens.length; at += 1) {
    for (const { item: row, span } of rows.allAt(tokens, at)) {
      if (found.has(row) || isExcepted(row, tokens, span)) continue;
      const near = row.near ? findNear(row.near, tokens, span) : span;
      if (!near) continue;
      const whole = { from: near.from < span.from ? near.from : span.from, to: near.to > span.to ? near.to : span.to };
      if (isDenied(tokens, whole.from, frame) || isDenied(tokens, span.from, frame)) continue;
      found.set(row, { row, words: quote(text, tokens, whole), isSoftened: row.softens && isLook(tokens, span, frame) });
    }
  }
  return [...found.values()];
}

function isExcepted(row: ClaimRow, tokens: readonly Token[], span: Span): boolean {
  for (let at = span.from < 3 ? 0 : span.from - 3; at <= span.to + 1; at += 1) {
    if (row.unless.some((phrase) => standsAt(phrase, tokens, at) && at + phrase.parts.length >= span.from)) return true;
  }
  return false;
}

/** The nearest companion before or after, within the clause. */
function findNear(near: NonNullable<ClaimRow['near']>, tokens: readonly Token[], span: Span): Span | undefined {
  const { clause } = tokens[span.from]!;
  for (let step = 1; step <= NEAR_REACH; step += 1) {
    for (const at of [span.from - step, span.to + step - 1]) {
      if (tokens[at]?.clause !== clause) continue;
      const found = near.longestAt(tokens, at);
      if (found && (found.span.to <= span.from || found.span.from >= span.to)) return found.span;
    }
  }
  return undefined;
}

function isLook(tokens: readonly Token[], span: Span, frame: Frame): boolean {
  const { clause } = tokens[span.from]!;
  const next = tokens[span.to];
  if (next?.clause === clause && frame.lookAfter.has(next.word)) return true;
  for (let at = span.from - LOOK_REACH; at < span.to; at += 1) {
    if (tokens[at]?.clause === clause && frame.look.allAt(tokens, at).length > 0) return true;
  }
  return false;
}
