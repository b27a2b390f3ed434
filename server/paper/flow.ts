import { BODY_END, BOTTLE, HAIR, INK_2, LEFT, RIGHT, type Paper, type Sheet, type Type } from './paper.ts';

/** Left edge and width of the text column beside the hanging side heads, in millimetres. */
export const TEXT = 54;
export const TEXT_WIDTH = RIGHT - TEXT;
const SIDE_WIDTH = 32;

/** A piece that is never split over two pages. Its `paint` gets the y of its top edge. */
export interface Piece {
  readonly height: number;
  /** Keeps with the piece after it, so that a heading never stands alone at a page's foot. */
  readonly keepsWithNext?: boolean;
  paint(sheet: Sheet, y: number, isFirstOnPage: boolean): void;
}

export interface Section {
  readonly head: string;
  readonly headType?: Type;
  readonly note?: string;
  readonly pieces: readonly Piece[];
  /** Painted again at the head of each page the section runs on to: a table's head. */
  readonly repeats?: Piece;
}

export const gap = (height: number): Piece => ({ height, paint: () => undefined });

/** A paragraph of the text column. */
export function paragraph(paper: Paper, text: string, options: { type?: Type; leading?: number; after?: number; x?: number; measure?: number } = {}): Piece {
  const { type = {}, leading = 4.25, after = 2.1, x = TEXT, measure = TEXT_WIDTH } = options;
  const lines = paper.wrap(text, measure, type);
  return {
    height: lines.length * leading + after,
    paint: (sheet, y) => lines.forEach((line, index) => sheet.text(x, y + 3.2 + index * leading, line, type)),
  };
}

/** Sets sections down the pages: side head at the left, pieces at the right, a hairline over each section. */
export function setSections(paper: Paper, first: Sheet, startY: number, sections: readonly Section[]): void {
  let sheet = first;
  let y = startY;
  let isTop = false;
  const turn = (): void => {
    sheet = paper.addSheet();
    y = 25;
    isTop = true;
  };
  for (const section of sections) {
    if (section.pieces.length === 0) continue;
    const sideLines = [...paper.wrap(section.head, SIDE_WIDTH, { face: 'SemiBold', size: 13 })];
    const noteLines = section.note ? paper.wrap(section.note, SIDE_WIDTH) : [];
    const sideHeight = sideLines.length * 4.25 + (noteLines.length ? 1.2 + noteLines.length * 4.25 : 0);
    const opening = Math.max(blockHeight(section.pieces, 0), sideHeight);
    if (y + 2.6 + opening > BODY_END) turn();
    if (!isTop) sheet.line(LEFT, y, RIGHT, y, 0.5, HAIR);
    y += 2.6;
    sideLines.forEach((line, index) => sheet.text(LEFT, y + 3.3 + index * 4.25, line, { face: 'SemiBold', size: 13, color: BOTTLE, ...section.headType }));
    noteLines.forEach((line, index) => sheet.text(LEFT, y + 4.5 + sideLines.length * 4.25 + index * 4.25, line, { color: INK_2 }));
    const headFoot = y + sideHeight;
    let isFirst = true;
    section.pieces.forEach((piece, index) => {
      if (!isFirst && y + blockHeight(section.pieces, index) > BODY_END) {
        turn();
        isFirst = true;
        y += 2.6;
        if (section.repeats) {
          section.repeats.paint(sheet, y, true);
          y += section.repeats.height;
        }
      }
      piece.paint(sheet, y, isFirst);
      y += piece.height;
      isFirst = false;
      isTop = false;
    });
    y = Math.max(y, headFoot < BODY_END && headFoot > y && headFoot - y < 40 ? headFoot : y) + 3.2;
  }
}

/** Height of a piece together with those it must keep with. */
function blockHeight(pieces: readonly Piece[], from: number): number {
  let height = 0;
  for (let index = from; index < pieces.length; index += 1) {
    height += pieces[index]!.height;
    if (!pieces[index]!.keepsWithNext) break;
  }
  return height;
}
