import { createHash } from 'node:crypto';
import { PDFDocument, PDFHexString, PDFName, PDFString, beginText, endText, rgb, setCharacterSpacing, setFillingColor, setFontAndSize, setTextMatrix, type Color, type PDFPage } from 'pdf-lib';
import { embedPaperFonts, type Face, type PaperFonts } from './paper-fonts.ts';

/** Points in a millimetre. */
const MM = 72 / 25.4;
/** The drawings are specified in CSS pixels at 96 to the inch; paper is set in points. */
export const px = (pixels: number): number => pixels * 0.75;
export const mm = (millimetres: number): number => millimetres * MM;

const hex = (code: string): Color => rgb(...([1, 3, 5].map((at) => Number.parseInt(code.slice(at, at + 2), 16) / 255) as [number, number, number]));
export const INK = hex('#14201B');
export const INK_2 = hex('#4A5852');
export const HAIR = hex('#C9D2CD');
export const BOTTLE = hex('#0E4A3A');
export const AMBER = hex('#8A5200');
export const STOP = hex('#9B1C2E');
export const WHITE = rgb(1, 1, 1);

export interface Type {
  readonly face?: Face;
  /** In CSS pixels, as the drawings give it. */
  readonly size?: number;
  readonly color?: Color;
  readonly align?: 'left' | 'right';
}

/** A page of A4; positions are millimetres from its upper left corner, y at the baseline. */
export interface Sheet {
  readonly page: PDFPage;
  text(x: number, y: number, text: string, type?: Type): void;
  line(x1: number, y1: number, x2: number, y2: number, weight?: number, color?: Color, dash?: number[]): void;
  box(x: number, y: number, width: number, height: number, options: { fill?: Color; stroke?: Color; weight?: number }): void;
  dot(x: number, y: number, radius: number, color: Color): void;
}

/** A document in the making: pages of one running head, with feet added when it is closed. */
export interface Paper {
  readonly fonts: PaperFonts;
  addSheet(): Sheet;
  /** Width of a line in millimetres. */
  width(text: string, type?: Type): number;
  /** Breaks at spaces only; units bound by no-break spaces stay whole. */
  wrap(text: string, measure: number, type?: Type): string[];
  close(): Promise<Uint8Array>;
}

export interface PaperOptions {
  readonly title: string;
  /** After `Colophon` in the running head: `report`, `weigh-out sheet`. */
  readonly kind: string;
  readonly house: string;
  readonly foot: string;
  /** SHA-256 of what the paper speaks of, in hex; also the file's identity. */
  readonly contentHash: string;
  /** The day printed in the file's dates, so that equal input gives equal bytes. */
  readonly day: string;
}

export const LEFT = 16;
export const RIGHT = 194;
const FOOT_RULE = 281.5;
/** Lowest baseline of the body. */
export const BODY_END = 276;

/** A figure and its unit are one word to the line breaker. */
function bindUnits(text: string): string {
  return text.replace(/(\d) (?=(?:°[CF]|%|g|kg|mg|ml|mm|h|min)(?![A-Za-z]))/g, '$1\u00a0');
}

/** Opens an A4 document in the house's paper style. */
export async function openPaper(options: PaperOptions): Promise<Paper> {
  const pdf = await PDFDocument.create({ updateMetadata: false });
  const made = new Date(`${options.day}T12:00:00Z`);
  pdf.setTitle(options.title, { showInWindowTitleBar: true });
  pdf.setCreator('Colophon');
  pdf.setProducer('Colophon');
  pdf.setLanguage('en');
  pdf.setCreationDate(made);
  pdf.setModificationDate(made);
  const fonts = await embedPaperFonts(pdf);
  const sheets: Sheet[] = [];
  const width = (text: string, type: Type = {}): number => fonts[type.face ?? 'Regular'].width(text, px(type.size ?? 12)) / MM;

  const makeSheet = (): Sheet => {
    const page = pdf.addPage([mm(210), mm(297)]);
    const top = mm(297);
    const keys = new Map<Face, PDFName>();
    const keyOf = (face: Face): PDFName => {
      const kept = keys.get(face);
      if (kept) return kept;
      const key = PDFName.of(`F${face}`);
      page.node.setFontDictionary(key, fonts[face].pdf.ref);
      keys.set(face, key);
      return key;
    };
    return {
      page,
      text(x, y, text, type = {}) {
        if (text === '') return;
        const face = type.face ?? 'Regular';
        const size = px(type.size ?? 12);
        const shift = type.align === 'right' ? width(text, type) : 0;
        page.pushOperators(
          beginText(),
          setFillingColor(type.color ?? INK),
          setFontAndSize(keyOf(face), size),
          setCharacterSpacing(0),
          setTextMatrix(1, 0, 0, 1, mm(x - shift), top - mm(y)),
          fonts[face].show(text),
          endText(),
        );
      },
      line(x1, y1, x2, y2, weight = 0.5, color = HAIR, dash) {
        page.drawLine({
          start: { x: mm(x1), y: top - mm(y1) },
          end: { x: mm(x2), y: top - mm(y2) },
          thickness: weight,
          color,
          ...(dash ? { dashArray: dash } : {}),
        });
      },
      box(x, y, boxWidth, height, { fill, stroke, weight = 0.75 }) {
        page.drawRectangle({
          x: mm(x),
          y: top - mm(y + height),
          width: mm(boxWidth),
          height: mm(height),
          ...(fill ? { color: fill } : { opacity: 0 }),
          ...(stroke ? { borderColor: stroke, borderWidth: weight } : {}),
        });
      },
      dot(x, y, radius, color) {
        page.drawCircle({ x: mm(x), y: top - mm(y), size: mm(radius), color });
      },
    };
  };

  const paper: Paper = {
    fonts,
    width,
    wrap(text, measure, type = {}) {
      const lines: string[] = [];
      for (const paragraph of bindUnits(text).split('\n')) {
        let line = '';
        for (const word of paragraph.split(' ')) {
          const longer = line === '' ? word : `${line} ${word}`;
          if (line !== '' && width(longer, type) > measure) {
            lines.push(line);
            line = word;
          } else line = longer;
        }
        lines.push(line);
      }
      return lines;
    },
    addSheet() {
      const sheet = makeSheet();
      sheets.push(sheet);
      sheet.text(LEFT, 18.6, 'Colophon', { face: 'SemiBold' });
      sheet.text(LEFT + width('Colophon ', { face: 'SemiBold' }), 18.6, options.kind, { color: INK_2 });
      sheet.text(RIGHT, 18.6, options.house, { color: INK_2, align: 'right' });
      sheet.line(LEFT, 21, RIGHT, 21, 0.75, INK);
      return sheet;
    },
    async close() {
      const digest = (options.contentHash.slice(0, 32).match(/.{4}/g) ?? []).join(' ');
      sheets.forEach((sheet, index) => {
        sheet.line(LEFT, FOOT_RULE, RIGHT, FOOT_RULE, 0.5, HAIR);
        const lead = 'SHA-256 of the document ';
        sheet.text(LEFT, 285.4, lead, { color: INK_2 });
        sheet.text(LEFT + width(lead), 285.4, `${digest} …`);
        sheet.text(RIGHT, 285.4, `${options.foot} · ${index + 1} of ${sheets.length}`, { color: INK_2, align: 'right' });
      });
      const id = PDFHexString.of(createHash('sha256').update(`${options.kind} ${options.contentHash}`).digest('hex').slice(0, 32));
      pdf.context.trailerInfo.ID = pdf.context.obj([id, id]);
      pdf.catalog.set(PDFName.of('Lang'), PDFString.of('en'));
      return pdf.save({ useObjectStreams: true });
    },
  };
  return paper;
}
