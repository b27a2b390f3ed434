import type { FontMetrics } from './metrics.ts';
import type { Micrometres, Weight } from './scene.ts';

/** A word and how a line may end before it. */
export interface Word {
  readonly text: string;
  readonly weight: Weight;
  /** `free`; `name`: inside an ingredient's name, dearer; `never`. */
  readonly before: 'free' | 'name' | 'never';
}
export type Line = readonly Word[];
export interface Broken {
  readonly lines: readonly Line[];
  /** A word, or words bound together, longer than the measure. */
  readonly tooWide?: { readonly text: string; readonly by: Micrometres };
}

/** Prices of a paragraph's lines; the set with the least sum is taken. */
const SLACK = 10;
const A_LINE = 1.2;
const INSIDE_NAME = 7.2;
const SHORT_LAST = 2.6;
const SHORT = 0.28;

interface Measured {
  /** Start and end of each word on one endless line, in font units. */
  readonly start: readonly number[];
  readonly end: readonly number[];
}

function measure(words: readonly Word[], metrics: FontMetrics): Measured {
  const start: number[] = [];
  const end: number[] = [];
  let at = 0;
  words.forEach((word, i) => {
    const before = words[i - 1];
    if (before) {
      const face = metrics.face(before.weight);
      at += face.kern(before.text.at(-1)!, ' ') + face.advance(' ');
      if (before.weight === word.weight) at += face.kern(' ', word.text[0]!);
    }
    start.push(at);
    at += metrics.face(word.weight).run(word.text).advance;
    end.push(at);
  });
  return { start, end };
}

/**
 * Breaks one paragraph for a measure: never inside a word, never where words are bound, and
 * with the least sum of prices over the whole paragraph. `few` asks for the fewest lines first.
 */
export function breakParagraph(words: readonly Word[], size: Micrometres, width: Micrometres, metrics: FontMetrics, few = false): Broken {
  const { start, end } = measure(words, metrics);
  const room = (width * 1000) / size;
  const best: { price: number; from: number }[] = [{ price: 0, from: -1 }];
  let tooWide: Broken['tooWide'];
  for (let j = 1; j <= words.length; j += 1) {
    let choice = { price: Infinity, from: -1 };
    const isLast = j === words.length;
    for (let i = j - 1; i >= 0; i -= 1) {
      const length = end[j - 1]! - start[i]!;
      const isBound = i > 0 && words[i]!.before === 'never';
      if (length > room && !(isBound || choice.from === -1)) break;
      if (isBound) continue;
      let price = best[i]!.price + A_LINE * (few ? 100 : 1);
      if (length > room) {
        const by = Math.ceil(((length - room) * size) / 1000);
        // Only a set of bound words that no break could shorten is a fault; it is priced out where anything else holds.
        price += 1e6 + by;
      } else {
        const slack = (room - length) / room;
        price += isLast ? (length < SHORT * room ? SHORT_LAST : 0) : SLACK * slack * slack;
      }
      if (i > 0 && words[i]!.before === 'name') price += INSIDE_NAME;
      if (price < choice.price) choice = { price, from: i };
    }
    best.push(choice);
  }
  const lines: Line[] = [];
  for (let j = words.length; j > 0; ) {
    const { from } = best[j]!;
    const length = end[j - 1]! - start[from]!;
    if (length > room) tooWide = { text: words.slice(from, j).map((word) => word.text).join(' '), by: Math.ceil(((length - room) * size) / 1000) };
    lines.unshift(words.slice(from, j));
    j = from;
  }
  return tooWide ? { lines, tooWide } : { lines };
}

/** Words of plain text; a figure keeps its unit. */
export function plainWords(text: string, weight: Weight): Word[] {
  const parts = text.split(/\s+/).filter(Boolean);
  return parts.map((part, i) => {
    const before = parts[i - 1] ?? '';
    const isUnit = /^(ml|g|kg|l|L|mm|cm|m|oz|lb|%|°C|°F|h|min|hours?|minutes?|days?)[.,;:)]*$/.test(part) && /\d$/.test(before);
    return { text: part, weight, before: isUnit || before === '&' ? 'never' : 'free' };
  });
}

/**
 * Words of an ingredient list. A line may end after a comma, dearly inside a name, and never
 * before "(nano)", between "CI" and its number, after "No." or "+/-", or before a colour's number.
 */
export function ingredientWords(body: string, weight: Weight): Word[] {
  const parts = body.split(/\s+/).filter(Boolean);
  return parts.map((part, i) => {
    const before = parts[i - 1] ?? '';
    const isBound =
      /^\(nano\)/i.test(part) || (/^\[?\(?CI$/i.test(before) && /^\d/.test(part)) || /^(No\.|n°|Nr\.)$/i.test(before) ||
      /^[[(]?(\+\/[-–]|±)$/.test(before) || /^\d{1,3}[.,;\])]*$/.test(part);
    const endsEntry = i === 0 || /[,;:•]$/.test(before) || /^\[/.test(part);
    return { text: part, weight, before: isBound ? 'never' : endsEntry ? 'free' : 'name' };
  });
}
