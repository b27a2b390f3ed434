import type { Face } from './metrics.ts';
import type { Micrometres } from './scene.ts';

export interface FittedTitle {
  readonly lines: readonly string[];
  readonly size: Micrometres;
}

/** Words that stay with the next one: a line never ends in "&". */
function glued(text: string): string[] {
  const words = text.split(/\s+/).filter(Boolean);
  const out: string[] = [];
  let carry = '';
  for (const word of words) {
    if (word === '&' || word === '+') carry += `${word} `;
    else {
      out.push(carry + word);
      carry = '';
    }
  }
  if (carry) out.push(carry.trim());
  return out;
}

/** Breaks words into a number of lines so that the longest line is as short as can be. */
function evenLines(words: readonly string[], count: number, face: Face): string[] {
  const width = (from: number, to: number): number => face.run(words.slice(from, to).join(' ')).advance;
  const best: { longest: number; from: number }[][] = [[{ longest: 0, from: 0 }]];
  for (let line = 1; line <= count; line += 1) {
    best.push([]);
    for (let to = line; to <= words.length; to += 1) {
      let choice = { longest: Infinity, from: line - 1 };
      for (let from = line - 1; from < to; from += 1) {
        const before = best[line - 1]![from];
        if (!before) continue;
        const longest = Math.max(before.longest, width(from, to));
        if (longest < choice.longest) choice = { longest, from };
      }
      best[line]![to] = choice;
    }
  }
  const lines: string[] = [];
  for (let line = count, to = words.length; line > 0; line -= 1) {
    const { from } = best[line]![to]!;
    lines.unshift(words.slice(from, to).join(' '));
    to = from;
  }
  return lines;
}

/**
 * Display type as large as a width and a height allow: every number of lines is tried and the
 * largest em wins. `leading` in thousandths of the em.
 */
export function fitTitle(text: string, face: Face, box: { width: Micrometres; height: Micrometres; most: Micrometres; leading: number }): FittedTitle {
  const words = glued(text);
  let best: FittedTitle = { lines: [text], size: 0 };
  for (let count = 1; count <= Math.min(words.length, 8); count += 1) {
    const lines = evenLines(words, count, face);
    const longest = Math.max(...lines.map((line) => face.run(line).advance));
    const rise = face.capHeight + (count - 1) * box.leading;
    const size = Math.min(box.most, Math.floor((box.width * 1000) / longest), Math.floor((box.height * 1000) / rise));
    if (size > best.size) best = { lines, size };
  }
  return best;
}

/** Height from the first cap line to the last base line. */
export function titleHeight(title: FittedTitle, face: Face, leading: number): Micrometres {
  return Math.ceil(((face.capHeight + (title.lines.length - 1) * leading) * title.size) / 1000);
}
