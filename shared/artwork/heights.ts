import type { Market } from '#shared/law/types.ts';
import type { Sheet } from './container.ts';
import type { Micrometres } from './scene.ts';

/** Heights are kept in nanometres: an inch is 25 400 000 of them, so that sixteenths are whole. */
type Nanometres = number;
const SIXTEENTH: Nanometres = 1_587_500;

export interface Minimum {
  readonly height: Nanometres;
  /** What is measured. */
  readonly of: 'small o' | 'figures';
  readonly citation: string;
  /** Why this row of the table. */
  readonly because: string;
}
export interface Minimums {
  readonly text: Minimum;
  readonly netContent: Minimum;
  /** Bottom share of the panel in which net content stands, in thousandths; 0 where none is asked. */
  readonly netContentZone: number;
  /** Height of the ℮ where one is printed. */
  readonly eMark: Nanometres;
  /** Letters of a symbol's figure. */
  readonly symbolFigure: Nanometres;
}

/**
 * Height of the container beyond its label, and of a face beyond its label on each side. The
 * area that sets the figures is the container's; only its label is known here, so it is taken
 * larger, never smaller. Common practice, no source.
 */
const BODY_BEYOND_WRAP: Micrometres = 15_000;
const FACE_BEYOND_LABEL: Micrometres = 6_000;

/**
 * Area of the principal display panel in square micrometres: 40 % of height times round for a
 * cylinder, height times width for a face (21 CFR 701.10, secondary; C.R.C. c. 417, s. 2).
 */
export function panelArea(sheet: Sheet): bigint {
  return sheet.shape === 'cylinder'
    ? (BigInt(sheet.wideRound ?? sheet.round) * BigInt(sheet.height + BODY_BEYOND_WRAP) * 4n) / 10n
    : BigInt(sheet.width + FACE_BEYOND_LABEL) * BigInt(sheet.height + FACE_BEYOND_LABEL);
}

const SQUARE_INCH = 25_400n * 25_400n;
const SQUARE_CENTIMETRE = 10_000n * 10_000n;

/** 21 CFR 701.13(i): most square inches, least sixteenths of an inch. First three rows secondary, last two from memory. */
const US_ROWS: readonly (readonly [bigint | null, number])[] = [[5n, 1], [25n, 2], [100n, 3], [400n, 4], [null, 8]];
/** Consumer Packaging and Labelling Regulations, C.R.C. c. 417, s. 14: most square centimetres, least height. */
const CA_ROWS: readonly (readonly [bigint | null, Nanometres])[] = [[32n, 1_600_000], [258n, 3_200_000], [645n, 6_400_000], [2580n, 9_500_000], [null, 12_700_000]];
/** Directive 76/211/EEC, Annex I, 3.1 (secondary); the same figures in the Weights and Measures (Packaged Goods) Regulations 2006 (from memory). */
const METRIC_ROWS: readonly (readonly [bigint | null, Nanometres])[] = [[50n, 2_000_000], [200n, 3_000_000], [1000n, 4_000_000], [null, 6_000_000]];

/**
 * Surface that could carry a label, in square micrometres: the wall of a cylinder, both faces of
 * a flat pack; taken larger than the label, so that the relief for small packs is never claimed
 * by a pack that may be larger.
 */
function labellingSurface(sheet: Sheet): bigint {
  return sheet.shape === 'cylinder' ? BigInt(sheet.wideRound ?? sheet.round) * BigInt(sheet.height + BODY_BEYOND_WRAP) : 2n * panelArea(sheet);
}

function usMinimums(sheet: Sheet, hasWarnings: boolean): Minimums {
  const area = panelArea(sheet);
  // Below 12 square inches the ingredient list may be half as high (21 CFR 701.3, secondary); warnings keep 740.2.
  const isSmall = !hasWarnings && labellingSurface(sheet) < 12n * SQUARE_INCH;
  const [most, sixteenths] = US_ROWS.find(([limit]) => limit === null || area <= limit * SQUARE_INCH)!;
  return {
    text: isSmall
      ? { height: SIXTEENTH / 2, of: 'small o', citation: '21 CFR 701.3', because: '1/32 inch, less than 12 square inches to label' }
      : { height: SIXTEENTH, of: 'small o', citation: '21 CFR 701.3(b) and 740.2', because: '1/16 inch' },
    netContent: {
      height: sixteenths * SIXTEENTH, of: 'small o', citation: '21 CFR 701.13',
      because: most === null ? 'a panel over 400 square inches' : `a panel of ${most} square inches or less`,
    },
    netContentZone: most === 5n ? 0 : 300,
    eMark: 0,
    symbolFigure: isSmall ? SIXTEENTH / 2 : SIXTEENTH,
  };
}

function caMinimums(area: bigint): Minimums {
  const [most, height] = CA_ROWS.find(([limit]) => limit === null || area <= limit * SQUARE_CENTIMETRE)!;
  return {
    text: { height: 1_600_000, of: 'small o', citation: 'Consumer Packaging and Labelling Regulations, C.R.C. c. 417, s. 15', because: '1.6 mm' },
    netContent: {
      height, of: 'figures', citation: 'Consumer Packaging and Labelling Regulations, C.R.C. c. 417, s. 14',
      because: most === null ? 'a display surface over 2580 cm²' : `a display surface of ${most} cm² or less`,
    },
    netContentZone: 0,
    eMark: 0,
    symbolFigure: 1_600_000,
  };
}

function metricMinimums(market: Market, quantity: bigint | null): Minimums {
  const [most, height] = METRIC_ROWS.find(([limit]) => quantity === null || limit === null || quantity <= limit)!;
  const law = market === 'UK' ? 'Weights and Measures (Packaged Goods) Regulations 2006' : 'Directive 76/211/EEC, Annex I, 3.1';
  return {
    text: { height: 1_200_000, of: 'small o', citation: 'House floor: the law asks for legible and names no height', because: '1.2 mm' },
    netContent: { height, of: 'figures', citation: law, because: most === null ? 'a content over 1000 g or ml' : `a content up to ${most} g or ml` },
    netContentZone: 0,
    eMark: 3_000_000,
    symbolFigure: 1_200_000,
  };
}

/**
 * The least letter heights of a market on one sheet. `quantity` is the nominal content in g or
 * ml, rounded up to the next whole unit so that a row's edge is never crossed by rounding. A label that
 * carries warnings gets no relief for small packs.
 */
export function minimumsFor(market: Market, sheet: Sheet, quantity: bigint | null, hasWarnings = true): Minimums {
  if (market === 'US') return usMinimums(sheet, hasWarnings);
  if (market === 'CA') return caMinimums(panelArea(sheet));
  return metricMinimums(market, quantity);
}

/** Smallest em whose share (thousandths) is at least a height. */
export function sizeForHeight(height: Nanometres, share: number): Micrometres {
  return Math.ceil(height / share);
}

/** Height in nanometres of a share of an em. */
export function heightAt(size: Micrometres, share: number): Nanometres {
  return size * share;
}
