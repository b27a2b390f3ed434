import type { Frame } from './claim-tables.ts';
import type { Token } from './match-words.ts';

/** How many words before another a denial reaches, the words of a denied list not counted. */
const REACH = 4;

/**
 * "Not intended to treat", "does not": a denial shortly before, unless it is "not only" or "no
 * more". A comma ends its reach ("no parabens, cures eczema"), but not within a list of what is
 * denied ("not intended to diagnose, treat or cure").
 */
export function isDenied(tokens: readonly Token[], at: number, frame: Frame): boolean {
  const { clause } = tokens[at]!;
  let left = REACH;
  for (let before = at - 1; before >= 0 && left > 0; before -= 1) {
    const token = tokens[before]!;
    if (!frame.deniedList.has(token.word)) left -= 1;
    if (token.clause !== clause || (tokens[before + 1]!.isAfterComma && !frame.deniedList.has(token.word))) return false;
    if (frame.not.has(token.word)) return !tokens.slice(before + 1, at).some(({ word }) => frame.notUnless.has(word)) && !frame.notUnless.has(tokens[at]!.word);
  }
  return false;
}
