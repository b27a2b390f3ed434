import type { Frame, LanguageTables } from './claim-tables.ts';
import { isDenied } from './denial.ts';
import { quote, type Span, type Token } from './match-words.ts';

/** An ingredient that the text names as if it were in the product. */
export interface NamedHit {
  readonly word: string;
  readonly words: string;
  /** Folded beginnings of INCI names, any of which makes it true. */
  readonly starts: readonly string[];
  /** Said to be contained ("with oat"). */
  readonly isContained: boolean;
  /** Named as a substance of its own ("oat oil"). */
  readonly isPart: boolean;
  /** The share that is claimed, in percent. */
  readonly percent?: string;
}

/** How far before an ingredient "with" and "the scent of" reach over a list. */
const REACH = 7;

/** The ingredients that a text names, but for those it says are absent or only smells of. */
export function findNamed(text: string, tokens: readonly Token[], tables: LanguageTables, absences: readonly Span[]): NamedHit[] {
  const found: NamedHit[] = [];
  for (let at = 0; at < tokens.length; ) {
    const hit = tables.ingredients.longestAt(tokens, at);
    if (!hit) {
      at += 1;
      continue;
    }
    const { span, item } = hit;
    at = span.to;
    if (isElsewhere(tokens, span, tables, absences)) continue;
    const share = shareBefore(tokens, span.from);
    const isFollowedByPart = tables.frame.parts.has(tokens[span.to]?.word ?? '');
    const isPart = isFollowedByPart || (span.to > span.from + 1 && tables.frame.parts.has(tokens[span.to - 1]!.word));
    const whole = { from: share?.from ?? span.from, to: isFollowedByPart ? span.to + 1 : span.to };
    found.push({
      word: item.word, starts: item.starts, words: quote(text, tokens, whole), isPart,
      isContained: share !== undefined || isContained(tokens, span, tables),
      ...(share && { percent: share.percent }),
    });
  }
  return found;
}

/** "10 % glycerin", "5 % pure shea butter"; "with 100 % natural shea butter" says how pure it is. */
function shareBefore(tokens: readonly Token[], at: number): { readonly percent: string; readonly from: number } | undefined {
  for (const back of [1, 2]) {
    const from = at - back - 1;
    const figure = tokens[from]?.word ?? '';
    if (tokens[at - back]?.word === '%' && /^\d+(\.\d+)?$/.test(figure) && figure !== '0' && figure !== '100' && tokens[from]!.clause === tokens[at]!.clause) return { percent: figure, from };
  }
  return undefined;
}

function isElsewhere(tokens: readonly Token[], span: Span, tables: LanguageTables, absences: readonly Span[]): boolean {
  const { frame } = tables;
  if (absences.some(({ from, to }) => span.from >= from && span.from < to) || isDenied(tokens, span.from, frame)) return true;
  const before = tokens[span.from - 1]?.word ?? '';
  const next = tokens[span.to]?.word ?? '';
  return frame.likeness.has(before) || frame.elsewhere.has(next) || frame.after.has(next) || isScent(tokens, span, tables);
}

/** In either direction: "cedar and vetiver notes", "the scent of vanilla and cedar", "scented with rose". */
function isScent(tokens: readonly Token[], span: Span, { frame, ingredients }: LanguageTables): boolean {
  const { clause } = tokens[span.from]!;
  if (frame.parts.has(tokens[span.to]?.word ?? '')) return false;
  for (let at = span.to; at < span.to + REACH && tokens[at]?.clause === clause; at += 1) {
    if (frame.scent.has(tokens[at]!.word)) return true;
    if (frame.and.has(tokens[at]!.word) || ingredients.longestAt(tokens, at)) continue;
    // One describing word may stand between: "cedar and warm vetiver notes".
    if (at > span.to + 3) return false;
  }
  for (let at = span.from - 1; at >= 0 && at >= span.from - REACH && tokens[at]!.clause === clause; at -= 1) {
    if (frame.scent.has(tokens[at]!.word) && !frame.after.has(tokens[at + 1]!.word)) return true;
    if (tokens[at + 1]!.isAfterComma) return false;
  }
  return false;
}

function isContained(tokens: readonly Token[], span: Span, { frame }: { readonly frame: Frame }): boolean {
  const { clause } = tokens[span.from]!;
  for (let at = span.from - 1; at >= 0 && at >= span.from - REACH; at -= 1) {
    if (tokens[at]!.clause !== clause) return false;
    if (frame.containing.allAt(tokens, at).some((one) => one.span.to <= span.from)) return true;
  }
  return false;
}
