import { MARKETS } from '#shared/law/types.ts';
import { isAbsent, show, type DocumentWalk } from './document-walk.ts';
import { readByHand } from './read-by-hand.ts';
import type { DocumentContainer, DocumentLabel } from './formula-document.ts';

const LENGTHS = { EAN: 13, UPC: 12 };

/** Reads `/label`. */
export function readLabel(walk: DocumentWalk, value: unknown): DocumentLabel | undefined {
  const label = walk.object(value, '/label');
  if (!label) return undefined;
  const container = readContainer(walk, label['container']);
  const bleedMm = walk.decimal(label['bleedMm'], '/label/bleedMm');
  const languages = isAbsent(label['languages'])
    ? undefined
    : walk.list(label['languages'], '/label/languages', 40).flatMap((item, index) => walk.text(item, `/label/languages/${index}`, { most: 40, isNeeded: true }) ?? []);
  const market = walk.choice(label['market'], '/label/market', MARKETS);
  const barcode = readBarcode(walk, label['barcode']);
  const press = walk.object(label['press'], '/label/press');
  const standard = press && walk.choice(press['standard'], '/label/press/standard', ['PDF/X-1a:2003', 'PDF/X-4'] as const);
  const condition = press && walk.text(press['condition'], '/label/press/condition', { most: 200 });
  const template = walk.text(label['template'], '/label/template', { most: 80 });
  const ink = walk.text(label['ink'], '/label/ink', { most: 80 });
  const byHand = readByHand(walk, label['byHand']);
  return {
    ...(container && { container }),
    ...(bleedMm !== undefined && { bleedMm }),
    ...(languages && { languages }),
    ...(market && { market }),
    ...(barcode && { barcode }),
    ...(press && { press: { ...(standard && { standard }), ...(condition !== undefined && { condition }) } }),
    ...(template !== undefined && { template }),
    ...(ink !== undefined && { ink }),
    ...(byHand && { byHand }),
  };
}

function readContainer(walk: DocumentWalk, value: unknown): DocumentContainer | undefined {
  const at = '/label/container';
  const object = walk.object(value, at);
  if (!object) return undefined;
  const shape = walk.choice(object['shape'], `${at}/shape`, ['cylinder', 'flat', 'taper'] as const, true);
  const size = (key: string): string => walk.decimal(object[key], `${at}/${key}`, { isPositive: true }, true) ?? '0';
  const extra = (key: string): string | undefined => walk.decimal(object[key], `${at}/${key}`);
  if (shape === 'flat') return { shape, widthMm: size('widthMm'), heightMm: size('heightMm') };
  if (shape === 'taper') {
    return { shape, topDiameterMm: size('topDiameterMm'), bottomDiameterMm: size('bottomDiameterMm'), labelHeightMm: size('labelHeightMm'), overlapMm: extra('overlapMm') ?? '0' };
  }
  if (shape === undefined) return undefined;
  const stockMm = extra('stockMm');
  return { shape, diameterMm: size('diameterMm'), labelHeightMm: size('labelHeightMm'), overlapMm: extra('overlapMm') ?? '0', ...(stockMm !== undefined && { stockMm }) };
}

function readBarcode(walk: DocumentWalk, value: unknown): DocumentLabel['barcode'] {
  const at = '/label/barcode';
  const object = walk.object(value, at);
  if (!object) return undefined;
  const symbology = walk.choice(object['symbology'], `${at}/symbology`, ['EAN-13', 'UPC-A'] as const, true);
  const digits = walk.text(object['digits'], `${at}/digits`, { most: 40, isNeeded: true });
  if (symbology === undefined || digits === undefined) return undefined;
  const length = symbology === 'EAN-13' ? LENGTHS.EAN : LENGTHS.UPC;
  if (!/^\d+$/.test(digits) || digits.length !== length) return walk.fault(`${at}/digits`, `${symbology} has ${length} digits: ${show(digits)}.`);
  const check = gs1CheckDigit(digits.slice(0, -1));
  if (!digits.endsWith(check)) return walk.fault(`${at}/digits`, `The check digit is wrong: after ${digits.slice(0, -1)} comes ${check}.`);
  return { symbology, digits };
}

/** The GS1 check digit of the digits before it: weights 3, 1, 3 … from the right (GS1 General Specifications, mod 10). */
export function gs1CheckDigit(digits: string): string {
  let total = 0n;
  for (let place = 0; place < digits.length; place += 1) {
    const digit = BigInt(digits[digits.length - 1 - place]!);
    total += place % 2 === 0 ? digit * 3n : digit;
  }
  return `${(10n - (total % 10n)) % 10n}`;
}
