import { CustomFontSubsetEmbedder, type PDFContext, type PDFRef } from 'pdf-lib';
import type { Weight } from '#shared/artwork/scene.ts';
import { fontName, loadFont, type ParsedGlyph } from './fonts.ts';

export interface EmbeddedFont {
  readonly ref: PDFRef;
  /** Glyph numbers of the subset, four hex figures each, with their advance. */
  encode(text: string): { readonly code: string; readonly advance: number }[];
  /** Writes the subset; after the last `encode`. */
  embed(): Promise<void>;
}

/** Six letters before the name mark a subset; one of its own per weight, always the same. */
const TAGS: Readonly<Record<Weight, string>> = { 300: 'LABELA', 400: 'LABELB', 500: 'LABELC', 600: 'LABELD', 700: 'LABELE' };

/**
 * One weight in one document. The parsed font is shared by the whole process; shaping is left
 * out, for the scene has placed every character already: one character, one glyph.
 */
export async function embedFont(context: PDFContext, weight: Weight): Promise<EmbeddedFont> {
  const { font, bytes } = loadFont(weight);
  const letterByLetter = Object.create(font, {
    layout: { value: (text: string) => ({ glyphs: Array.from(text, (char) => font.glyphForCodePoint(char.codePointAt(0)!)) }) },
  }) as never;
  const embedder = await CustomFontSubsetEmbedder.for({ create: () => letterByLetter }, bytes, `${TAGS[weight]}+${fontName(weight)}`);
  const ref = context.nextRef();
  return {
    ref,
    encode: (text) => {
      const hex = embedder.encodeText(text).toString().slice(1, -1);
      return Array.from(text, (char, i) => {
        const glyph: ParsedGlyph = font.glyphForCodePoint(char.codePointAt(0)!);
        if (glyph.id === 0) throw new RangeError(`the label type has no "${char}"`);
        return { code: hex.slice(i * 4, i * 4 + 4), advance: glyph.advanceWidth };
      });
    },
    embed: async () => {
      await embedder.embedIntoContext(context, ref);
    },
  };
}
