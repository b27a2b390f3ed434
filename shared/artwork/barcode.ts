import JsBarcode from 'jsbarcode';
import { gs1CheckDigit } from '#shared/contracts/read-label.ts';
import type { BarcodeSettings } from './label-input.ts';
import type { Box, Micrometres } from './scene.ts';

/** Least and best width of one module (GS1 General Specifications, retail: 80 % and 100 %). */
export const LEAST_MODULE: Micrometres = 264;
export const BEST_MODULE: Micrometres = 330;
export const BEST_BAR_HEIGHT: Micrometres = 22_850;

/** What is wrong with a number, in words, or `null`. */
export function barcodeFault({ symbology, digits }: BarcodeSettings): string | null {
  const length = symbology === 'EAN-13' ? 13 : 12;
  if (!/^\d*$/.test(digits)) return `${symbology} takes figures only.`;
  if (digits.length !== length) return `${symbology} takes ${length} figures; ${digits.length} are given.`;
  const expected = gs1CheckDigit(digits.slice(0, -1));
  return expected === digits.at(-1) ? null : `The last figure is ${digits.at(-1)}; the check figure of ${digits.slice(0, -1)} is ${expected}.`;
}

/** The 95 modules of a number that has passed {@link barcodeFault}, `1` for a bar. */
export function modulesOf({ symbology, digits }: BarcodeSettings): string {
  const sink: { encodings?: readonly { readonly data: string }[] } = {};
  JsBarcode(sink, digits, { format: symbology === 'EAN-13' ? 'EAN13' : 'UPC', flat: true });
  return (sink.encodings ?? []).map((part) => part.data).join('');
}

export interface Symbol {
  /** Bars from the first bar's left edge and the bars' top. */
  readonly bars: readonly Box[];
  /** Groups of digits with the middle of the first digit's place; the others follow at seven modules each. */
  readonly digits: readonly { readonly text: string; readonly middle: Micrometres }[];
  readonly module: Micrometres;
  readonly digitSize: Micrometres;
  /** From the bars' top to the digits' base line. */
  readonly depth: Micrometres;
  readonly width: Micrometres;
  readonly quiet: readonly [Micrometres, Micrometres];
}

const CAP = 0.698;

/** Geometry of a symbol at one module width: bars merged, guards five modules longer, nothing shortened. */
export function symbolOf(settings: BarcodeSettings, module: Micrometres): Symbol {
  const modules = modulesOf(settings);
  const isUpc = settings.symbology === 'UPC-A';
  const height = Math.ceil((BEST_BAR_HEIGHT * module) / BEST_MODULE);
  const isGuard = (i: number): boolean => i < 3 || i > 91 || (i > 44 && i < 50) || (isUpc && (i < 10 || i > 84));
  const bars: Box[] = [];
  for (let i = 0; i < modules.length; ) {
    let j = i + 1;
    while (j < modules.length && modules[j] === modules[i] && isGuard(j) === isGuard(i)) j += 1;
    if (modules[i] === '1') bars.push({ x: i * module, y: 0, width: (j - i) * module, height: height + (isGuard(i) ? 5 * module : 0) });
    i = j;
  }
  const digitSize = Math.round(9.2 * module);
  const groups: readonly (readonly [number, number, number])[] = isUpc ? [[0, 1, -6], [1, 6, 13.5], [6, 11, 53.5], [11, 12, 101]] : [[0, 1, -7], [1, 7, 6.5], [7, 13, 53.5]];
  return {
    bars, module, digitSize,
    digits: groups.map(([from, to, middle]) => ({ text: settings.digits.slice(from, to), middle: Math.round(middle * module) })),
    depth: height + Math.round(1.7 * module + CAP * digitSize),
    width: 95 * module,
    quiet: isUpc ? [9 * module, 9 * module] : [11 * module, 7 * module],
  };
}

/**
 * Widest module upright on a round body: the outer guards may lie at most 30° from the middle,
 * so 95 modules in a sixth of the round (GS1, from memory); 0 where even 80 % would bend too far.
 */
export function uprightModule(diameter: Micrometres): Micrometres {
  if (diameter === 0) return BEST_MODULE;
  const widest = Math.min(BEST_MODULE, Math.floor((diameter * 5512) / 1_000_000));
  return widest >= LEAST_MODULE ? widest : 0;
}
