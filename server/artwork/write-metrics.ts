import { writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { loadFont, WEIGHTS, type ParsedFont } from './fonts.ts';

/**
 * Writes shared/artwork/metrics/*.json: the widths, left bearings and kerning of the label
 * type, so that screen and press file can be laid out without opening a font.
 * Run with `npx tsx server/artwork/write-metrics.ts` after the font package changes.
 */

/** Latin with its accents, Greek, Cyrillic, and the signs that labels use. */
const RANGES: readonly (readonly [number, number])[] = [
  [0x20, 0x7e], [0xa1, 0x17f], [0x218, 0x21b], [0x386, 0x3ce], [0x400, 0x45f],
  [0x1e80, 0x1e85], [0x1ef2, 0x1ef3], [0x2013, 0x2014], [0x2018, 0x201e], [0x2022, 0x2022], [0x2026, 0x2026],
  [0x2039, 0x203a], [0x20ac, 0x20ac], [0x2116, 0x2116], [0x2122, 0x2122], [0x2126, 0x2126], [0x212e, 0x212e], [0x2212, 0x2212], [0x2264, 0x2265],
];
const VERSALS = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789';

/** Shaping without ligatures: one character is one glyph, so that text stays searchable letter by letter. */
const FEATURES = { liga: false, dlig: false, calt: false };

function characters(font: ParsedFont): string[] {
  return RANGES.flatMap(([from, to]) => Array.from({ length: to - from + 1 }, (_, i) => from + i))
    .filter((code) => font.hasGlyphForCodePoint(code) && code !== 0xad)
    .map((code) => String.fromCodePoint(code));
}

/** Rows of kerning, one per left character, in font units. */
function kernRows(font: ParsedFont, chars: readonly string[]): number[][] {
  return chars.map((left) => {
    const shaped = font.layout(chars.map((right) => left + right).join(''), FEATURES);
    if (shaped.glyphs.length !== chars.length * 2) throw new RangeError(`"${left}" does not shape letter by letter`);
    return chars.map((_, i) => shaped.positions[i * 2]!.xAdvance - shaped.glyphs[i * 2]!.advanceWidth);
  });
}

/** Gives equal vectors one class number, in order of first use. */
function classes(vectors: readonly number[][]): { of: number[]; first: number[] } {
  const seen = new Map<string, number>();
  const first: number[] = [];
  const of = vectors.map((vector, index) => {
    const key = vector.join();
    const known = seen.get(key);
    if (known !== undefined) return known;
    seen.set(key, first.length);
    first.push(index);
    return first.length - 1;
  });
  return { of, first };
}

function outline(font: ParsedFont, letter: string): (string | number)[] {
  return font.glyphForCodePoint(letter.codePointAt(0)!).path.commands.flatMap(({ command, args }) => [
    { moveTo: 'M', lineTo: 'L', quadraticCurveTo: 'Q', bezierCurveTo: 'C', closePath: 'Z' }[command] ?? '?',
    ...args,
  ]);
}

function write(name: string, value: unknown): void {
  writeFileSync(fileURLToPath(new URL(`../../shared/artwork/metrics/${name}.json`, import.meta.url)), `${JSON.stringify(value)}\n`);
}

for (const weight of WEIGHTS) {
  const { font } = loadFont(weight);
  const chars = characters(font);
  const glyphs = chars.map((char) => font.glyphForCodePoint(char.codePointAt(0)!));
  const rows = kernRows(font, chars);
  const left = classes(rows);
  const right = classes(chars.map((_, column) => rows.map((row) => row[column]!)));
  const o = font.glyphForCodePoint(0x6f).bbox;
  write(`plex-${weight}`, {
    weight,
    capHeight: font.capHeight,
    xHeight: font.xHeight,
    roundO: o.maxY,
    ascent: font.ascent,
    descent: font.descent,
    chars: chars.join(''),
    advances: glyphs.map((glyph) => glyph.advanceWidth),
    bearings: glyphs.map((glyph) => (Number.isFinite(glyph.bbox.minX) ? glyph.bbox.minX ?? 0 : 0)),
    leftClass: left.of,
    rightClass: right.of,
    kerning: left.first.map((row) => right.first.flatMap((column, index) => (rows[row]![column] ? [index, rows[row]![column]!] : []))),
  });
}
write('versals', Object.fromEntries([...VERSALS].map((letter) => [letter, outline(loadFont(700).font, letter)])));
