import type { ByHand } from '#shared/contracts/by-hand.ts';
import type { Market } from '#shared/law/types.ts';
import type { Cmyk, PathStep } from './scene.ts';

/** Decimal millimetres as text, as the formula document writes them. */
export type ContainerSettings =
  | { readonly shape: 'cylinder'; readonly diameterMm: string; readonly labelHeightMm: string; readonly overlapMm?: string | undefined; readonly stockMm?: string | undefined; readonly name?: string | undefined }
  | { readonly shape: 'flat'; readonly widthMm: string; readonly heightMm: string; readonly name?: string | undefined }
  | { readonly shape: 'taper'; readonly topDiameterMm: string; readonly bottomDiameterMm: string; readonly labelHeightMm: string; readonly overlapMm?: string | undefined; readonly name?: string | undefined };

export interface BarcodeSettings {
  readonly symbology: 'EAN-13' | 'UPC-A';
  readonly digits: string;
}

/** A picture of the house's, as far as the layout needs it. */
export interface LabelPicture {
  readonly id: string;
  readonly kind: 'photo' | 'drawing';
  readonly name: string;
  /** Pixels of a photo; proportions of a drawing. */
  readonly width: number;
  readonly height: number;
  readonly shapes: readonly { readonly steps: readonly PathStep[]; readonly cmyk: Cmyk; readonly screen: string; readonly evenOdd?: boolean | undefined; readonly stroke?: number | undefined }[];
}

/** All that a label says and stands on: what the layout reads, and nothing else. */
export interface LabelInput {
  readonly market: Market;
  readonly languages: readonly string[];
  readonly container: ContainerSettings;
  readonly bleedMm?: string | undefined;
  readonly brand: string;
  readonly name: string;
  readonly functionName: string;
  readonly claim?: string | undefined;
  readonly netContent: { readonly value: string; readonly unit: 'g' | 'ml' } | null;
  readonly durability: { readonly kind: 'pao'; readonly months: number } | { readonly kind: 'best-before'; readonly date: string } | null;
  readonly directions: string;
  /** Precautions in print order, required wording first, nothing twice. */
  readonly warnings: readonly string[];
  /** Wording that the law wants on the front. */
  readonly frontWarnings?: readonly string[] | undefined;
  /** `Ingredients` and what follows the colon. */
  readonly ingredients: { readonly heading: string; readonly body: string } | null;
  readonly responsiblePerson: { readonly name: string; readonly address: string } | null;
  readonly contact: string;
  readonly countryOfOrigin: string;
  readonly batchCode: string;
  readonly barcode: BarcodeSettings | null;
  readonly template?: string | undefined;
  readonly ink?: string | undefined;
  /** What a person changed on the template's setting. */
  readonly byHand?: ByHand | undefined;
  /** The pictures that it shows; one that is named and not here is told as missing. */
  readonly pictures?: readonly LabelPicture[] | undefined;
  readonly press?: { readonly standard?: 'PDF/X-1a:2003' | 'PDF/X-4' | undefined; readonly condition?: string | undefined } | undefined;
}
