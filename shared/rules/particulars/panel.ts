import type { DocumentContainer } from '#shared/contracts/formula-document.ts';
import { compare, decimal, divide, multiply, parseDecimal, toDecimal, type Rational } from '#shared/kernel/rational.ts';

/** An area of the principal display panel in square centimetres, and how it was come by. */
export interface Panel {
  readonly squareCm: Rational;
  readonly step: string;
}

/** Above π by less than one in ten million: an area is never taken smaller than it is. */
const PI = decimal('3.1415927');
const SQUARE_CM_PER_SQUARE_INCH = decimal('6.4516');

/**
 * The panel's area as measured (`entered`, in cm²), or that of the label on its container: width
 * times height of a flat one, 40 % of round times height of a cylinder (21 CFR 701.10, secondary;
 * C.R.C., c. 417, s. 2). The container itself can be larger than its label.
 */
export function panelOf(entered: string | undefined, container: DocumentContainer | undefined): Panel | undefined {
  const known = entered === undefined ? null : parseDecimal(entered);
  if (known) return { squareCm: known, step: `${entered} cm² entered` };
  if (!container || container.shape === 'taper') return undefined;
  const hundred = decimal('100');
  if (container.shape === 'flat') {
    const [width, height] = [parseDecimal(container.widthMm), parseDecimal(container.heightMm)];
    if (!width || !height) return undefined;
    return { squareCm: divide(multiply(width, height), hundred), step: `${container.widthMm} mm × ${container.heightMm} mm, the label` };
  }
  const [across, height] = [parseDecimal(container.diameterMm), parseDecimal(container.labelHeightMm)];
  if (!across || !height) return undefined;
  const round = multiply(multiply(PI, across), height);
  return { squareCm: divide(multiply(decimal('0.4'), round), hundred), step: `40 % of π × ${container.diameterMm} mm × ${container.labelHeightMm} mm, the label` };
}

/** In square inches: an inch is 2.54 cm exactly. */
export function squareInches(panel: Panel): Rational {
  return divide(panel.squareCm, SQUARE_CM_PER_SQUARE_INCH);
}

/** The row of a table of heights that a figure falls in: the first whose bound it does not exceed. */
export function heightFor(rows: readonly (readonly [string | null, string])[], figure: Rational): { readonly height: string; readonly bound: string | null } {
  const [bound, height] = rows.find(([most]) => most === null || compare(figure, decimal(most)) <= 0)!;
  return { height, bound };
}

/** `up to 200 g or ml`, `over 1000 g or ml`. */
export function sayBound(rows: readonly (readonly [string | null, string])[], bound: string | null, unit: string): string {
  if (bound !== null) return `up to ${bound} ${unit}`;
  return `over ${rows.at(-2)?.[0] ?? '0'} ${unit}`;
}

/** A figure for a step: two places are enough to read it. */
export function sayArea(area: Rational): string {
  return toDecimal(area, 2);
}
