import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import fontkit from '@pdf-lib/fontkit';
import type { Weight } from '#shared/artwork/scene.ts';
import { stripHinting } from './strip-hinting.ts';
import { joinFont, unwrapWoff } from './woff.ts';

/** What we use of a parsed font: glyphs by code point, and shaping with named features. */
export interface ParsedFont {
  readonly unitsPerEm: number;
  readonly capHeight: number;
  readonly xHeight: number;
  readonly ascent: number;
  readonly descent: number;
  readonly characterSet: readonly number[];
  hasGlyphForCodePoint(codePoint: number): boolean;
  glyphForCodePoint(codePoint: number): ParsedGlyph;
  layout(text: string, features?: Readonly<Record<string, boolean>>): {
    readonly glyphs: readonly ParsedGlyph[];
    readonly positions: readonly { readonly xAdvance: number }[];
  };
}
export interface ParsedGlyph {
  readonly id: number;
  readonly advanceWidth: number;
  readonly bbox: { readonly minX: number; readonly minY: number; readonly maxX: number; readonly maxY: number };
  readonly path: { readonly commands: readonly { readonly command: string; readonly args: readonly number[] }[] };
}

export interface LoadedFont {
  readonly weight: Weight;
  /** Plain TrueType bytes: what is embedded. */
  readonly bytes: Uint8Array;
  readonly font: ParsedFont;
}

const STYLES: Readonly<Record<Weight, string>> = { 300: 'Light', 400: 'Regular', 500: 'Medium', 600: 'SemiBold', 700: 'Bold' };
export const WEIGHTS: readonly Weight[] = [300, 400, 500, 600, 700];

const loaded = new Map<Weight, LoadedFont>();

/** The parsed font of one weight, read and parsed once per process. */
export function loadFont(weight: Weight): LoadedFont {
  const known = loaded.get(weight);
  if (known) return known;
  const file = createRequire(import.meta.url).resolve(`@ibm/plex-sans/fonts/complete/woff/IBMPlexSans-${STYLES[weight]}.woff`);
  const { flavour, tables } = unwrapWoff(readFileSync(file));
  const bytes = joinFont({ flavour, tables: stripHinting(tables) });
  const entry: LoadedFont = { weight, bytes, font: knowCharacters(fontkit.create(bytes) as unknown as ParsedFont) };
  loaded.set(weight, entry);
  return entry;
}

/**
 * A glyph keeps the characters it was first met with, for as long as the font is parsed. Met first without
 * any, the text of every later file would lack it: `346 25` for 346.25.
 */
function knowCharacters(font: ParsedFont): ParsedFont {
  for (const codePoint of font.characterSet) {
    // A ligature is to be met as the letters it stands for.
    if (codePoint < 0xfb00 || codePoint > 0xfb06) font.glyphForCodePoint(codePoint);
  }
  return font;
}

/** PostScript name of a weight, as the embedded font is called after its subset tag. */
export function fontName(weight: Weight): string {
  return `IBMPlexSans-${STYLES[weight]}`;
}
