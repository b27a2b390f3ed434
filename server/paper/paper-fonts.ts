import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import { inflateSync } from 'node:zlib';
import fontkit from '@pdf-lib/fontkit';
import { PDFHexString, PDFNumber, PDFOperator, PDFOperatorNames, type PDFDocument, type PDFFont } from 'pdf-lib';

/** Faces of the house type that paper is set in. */
export type Face = 'Light' | 'Regular' | 'Medium' | 'SemiBold';
const FACES: readonly Face[] = ['Light', 'Regular', 'Medium', 'SemiBold'];

/** The part of fontkit's layout that setting needs; advances in font units (1000 an em). */
interface Layout {
  readonly glyphs: readonly { readonly id: number; readonly advanceWidth: number }[];
  readonly positions: readonly { readonly xAdvance: number }[];
}

/** One embedded face that measures and sets with kerning, which pdf-lib's own `drawText` leaves out. */
export interface PaperFont {
  readonly pdf: PDFFont;
  /** Advance of a line of type, in points. */
  width(text: string, size: number): number;
  /** The operator that shows the line with its kerning. */
  show(text: string): PDFOperator;
  /** Characters of `text` that the face has no glyph for. */
  missing(text: string): readonly string[];
}
export type PaperFonts = Readonly<Record<Face, PaperFont>>;

/**
 * A WOFF 1 file's tables put back into the plain sfnt file they came from (each table is
 * deflated by itself). pdf-lib would embed the WOFF bytes as they are when told not to subset.
 * Source of the layout: W3C, WOFF File Format 1.0, sections 3 to 5.
 */
function unwrapWoff(woff: Buffer): Buffer {
  const count = woff.readUInt16BE(12);
  const entries = Array.from({ length: count }, (_, index) => {
    const at = 44 + index * 20;
    const packed = woff.subarray(woff.readUInt32BE(at + 4), woff.readUInt32BE(at + 4) + woff.readUInt32BE(at + 8));
    const length = woff.readUInt32BE(at + 12);
    return {
      tag: woff.subarray(at, at + 4),
      checksum: woff.readUInt32BE(at + 16),
      data: packed.length === length ? packed : inflateSync(packed),
    };
  });
  const power = 2 ** Math.floor(Math.log2(count));
  const header = Buffer.alloc(12 + 16 * count);
  header.writeUInt32BE(woff.readUInt32BE(4), 0);
  header.writeUInt16BE(count, 4);
  header.writeUInt16BE(power * 16, 6);
  header.writeUInt16BE(Math.log2(power), 8);
  header.writeUInt16BE((count - power) * 16, 10);
  let offset = header.length;
  const bodies = entries.map((entry, index) => {
    const at = 12 + index * 16;
    entry.tag.copy(header, at);
    header.writeUInt32BE(entry.checksum, at + 4);
    header.writeUInt32BE(offset, at + 8);
    header.writeUInt32BE(entry.data.length, at + 12);
    const padded = Buffer.concat([entry.data, Buffer.alloc((4 - (entry.data.length % 4)) % 4)]);
    offset += padded.length;
    return padded;
  });
  return Buffer.concat([header, ...bodies]);
}

const files = new Map<Face, Buffer>();
function fontFile(face: Face): Buffer {
  const kept = files.get(face);
  if (kept) return kept;
  const home = dirname(createRequire(import.meta.url).resolve('@ibm/plex-sans/package.json'));
  const file = unwrapWoff(readFileSync(join(home, 'fonts/complete/woff', `IBMPlexSans-${face}.woff`)));
  files.set(face, file);
  return file;
}

function setting(pdf: PDFFont): PaperFont {
  const kit = (pdf as unknown as { embedder: { font: { layout(text: string): Layout; hasGlyphForCodePoint(point: number): boolean } } }).embedder.font;
  const laid = new Map<string, Layout>();
  const layout = (text: string): Layout => {
    const known = laid.get(text);
    if (known) return known;
    const made = kit.layout(text);
    laid.set(text, made);
    return made;
  };
  return {
    pdf,
    width: (text, size) => (layout(text).positions.reduce((sum, position) => sum + position.xAdvance, 0) * size) / 1000,
    missing: (text) => [...text].filter((character) => !kit.hasGlyphForCodePoint(character.codePointAt(0)!)),
    show(text) {
      const { glyphs, positions } = layout(text);
      const hex = (pdf.encodeText(text) as unknown as { asString(): string }).asString();
      const context = pdf.doc.context;
      const parts = context.obj([]);
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
  pdf.registerFontkit(fontkit);
  const pairs: [Face, PaperFont][] = [];
  for (const [index, face] of FACES.entries()) {
    const customName = `AAAAA${'ABCD'[index]}+IBMPlexSans-${face}`;
    pairs.push([face, setting(await pdf.embedFont(fontFile(face), { subset: true, customName }))]);
  }
  return Object.fromEntries(pairs) as unknown as PaperFonts;
}
