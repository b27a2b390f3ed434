import { figureToDecimal, toRational, type Figure } from '#shared/kernel/figure.ts';
import type { Rational } from '#shared/kernel/rational.ts';
import type { Interval } from './types.ts';

/** An interval kept as whole numbers over one denominator; fractions and texts are made when asked for. */
export class FigureInterval implements Interval {
  readonly lo: Figure;
  readonly typ: Figure;
  readonly hi: Figure;
  readonly den: Figure;
  #text: { readonly min: string; readonly typical: string; readonly max: string } | undefined;

  constructor(figures: { readonly lo: Figure; readonly typ: Figure; readonly hi: Figure }, den: Figure) {
    this.lo = figures.lo;
    this.typ = figures.typ;
    this.hi = figures.hi;
    this.den = den;
  }

  get min(): Rational {
    return toRational(this.lo, this.den);
  }
  get typical(): Rational {
    return toRational(this.typ, this.den);
  }
  get max(): Rational {
    return toRational(this.hi, this.den);
  }

  /** Decimal texts of at most 12 places. Most shares are fixed: one text then serves all three. */
  get text(): { readonly min: string; readonly typical: string; readonly max: string } {
    if (this.#text) return this.#text;
    const { lo, typ, hi, den } = this;
    const typical = figureToDecimal(typ, den);
    return (this.#text = { min: lo === typ ? typical : figureToDecimal(lo, den), typical, max: hi === typ ? typical : figureToDecimal(hi, den) });
  }
}
