import { PDFHexString, PDFNumber, PDFOperator, PDFOperatorNames, type PDFDocument, type PDFFont } from 'pdf-lib';
import { fontName, loadFont, type ParsedFont } from '#server/artwork/fonts.ts';

/** Faces of the house type that paper is set in. */
export type Face = 'Light' | 'Regular' | 'Medium' | 'SemiBold';
const WEIGHTS = { Light: 300, Regular: 400, Medium: 500, SemiBold: 600 } as const;
const TAGS: Readonly<Record<Face, string>> = { Light: 'PAPERA', Regular: 'PAPERB', Medium: 'PAPERC', SemiBold: 'PAPERD' };

/** One embedded face that measures and sets with kerning, which pdf-lib's own `drawText` leaves out. */
export interface PaperFont {
  readonly pdf: PDFFont;
  /** Advance of a line of type, in points. */
  width(text: string, size: number): number;
  /** The operator that shows the line with its kerning. */
  show(text: string): PDFOperator;
}
export type PaperFonts = Readonly<Record<Face, PaperFont>>;

type Layout = ReturnType<ParsedFont['layout']>;

/** Lines laid out before, shared by the process: most of a paper's words come again on the next. */
const KEPT_LINES = 20_000;
const laid = new Map<string, Layout>();

function layOut(font: ParsedFont, face: Face, text: string): Layout {
  const key = `${face} ${text}`;
  const known = laid.get(key);
  if (known) return known;
  if (laid.size >= KEPT_LINES) laid.clear();
  const made = font.layout(text);
  laid.set(key, made);
  return made;
}

function setting(pdf: PDFFont, font: ParsedFont, face: Face): PaperFont {
  return {
    pdf,
    width: (text, size) => (layOut(font, face, text).positions.reduce((sum, position) => sum + position.xAdvance, 0) * size) / font.unitsPerEm,
    show(text) {
      const { glyphs, positions } = layOut(font, face, text);
      const hex = pdf.encodeText(text).toString().slice(1, -1);
      const parts = pdf.doc.context.obj([]);
      let run = '';
      glyphs.forEach((glyph, index) => {
        run += hex.slice(index * 4, index * 4 + 4);
        const kern = positions[index]!.xAdvance - glyph.advanceWidth;
        if (kern !== 0 && index < glyphs.length - 1) {
          parts.push(PDFHexString.of(run));
          parts.push(PDFNumber.of(-kern));
          run = '';
        }
      });
      parts.push(PDFHexString.of(run));
      return PDFOperator.of(PDFOperatorNames.ShowTextAdjusted, [parts as never]);
    },
  };
}

/** Embeds the four faces, subset, under stable names so that equal input gives equal bytes. */
export async function embedPaperFonts(pdf: PDFDocument): Promise<PaperFonts> {
  const fonts: Partial<Record<Face, PaperFont>> = {};
  for (const face of Object.keys(WEIGHTS) as Face[]) {
    const { bytes, font } = loadFont(WEIGHTS[face]);
    // The font stays parsed for the process; pdf-lib would parse it anew for each document.
    pdf.registerFontkit({ create: () => font as never });
    fonts[face] = setting(await pdf.embedFont(bytes, { subset: true, customName: `${TAGS[face]}+${fontName(WEIGHTS[face])}` }), font, face);
  }
  return fonts as PaperFonts;
}
