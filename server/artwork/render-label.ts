import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { ResultDocument } from '#shared/contracts/result-document.ts';
import type { Market } from '#shared/law/types.ts';
import type { Check } from '#shared/artwork/checks.ts';
import type { LabelInput, LabelPicture } from '#shared/artwork/label-input.ts';
import { labelMarket, labelOfDocument } from '#shared/artwork/label-of-document.ts';
import { layOutLabel } from '#shared/artwork/layout.ts';
import type { Misfit } from '#shared/artwork/misfits.ts';
import { plexMetrics } from '#shared/artwork/plex-metrics.ts';
import type { Scene } from '#shared/artwork/scene.ts';
import { paintLabel, type PressPhoto } from './paint-label.ts';
import { USUAL_PRESS } from './press.ts';

export type RenderedLabel =
  | { readonly pdf: Uint8Array; readonly scene: Scene; readonly checks: readonly Check[] }
  | { readonly misfits: readonly Misfit[]; readonly checks: readonly Check[] };

export interface RenderOptions {
  /** Another market than the document's label names. */
  readonly market?: Market;
  /** Day the file is dated with, `YYYY-MM-DD`; the day of placing on the market otherwise. */
  readonly date?: string;
  /** The house's pictures that the label shows, and the plates of those that are photos. */
  readonly pictures?: readonly LabelPicture[];
  readonly photos?: ReadonlyMap<string, PressPhoto>;
}

/** The press file of one label input, or what does not fit. */
export async function renderLabelInput(input: LabelInput, date: string, photos?: ReadonlyMap<string, PressPhoto>): Promise<RenderedLabel> {
  const { scene, misfits, checks } = layOutLabel(input, plexMetrics);
  if (!scene || misfits.length > 0) return { misfits, checks };
  const press = { standard: input.press?.standard ?? USUAL_PRESS.standard, condition: input.press?.condition?.trim() || USUAL_PRESS.condition };
  const title = [input.brand, input.name].filter(Boolean).join(' · ') || 'Label';
  const pdf = await paintLabel(scene, { press, title, creator: 'Colophon', date, ...(photos && { photos }) });
  return { pdf, scene, checks };
}

/**
 * The press file of a formula document in one market: its declaration and required wording
 * from the result document, its particulars and container from the document itself.
 * Nothing is painted where something does not fit; `misfits` then says what, in millimetres.
 */
export async function renderLabelPdf(document: FormulaDocument, result: ResultDocument, options: RenderOptions = {}): Promise<RenderedLabel> {
  const market = options.market ?? labelMarket(document);
  const marketResult = result.results.find((candidate) => candidate.market === market);
  const date = options.date ?? marketResult?.placedOnMarket ?? document.product.placedOnMarket ?? '2000-01-01';
  return renderLabelInput({ ...labelOfDocument(document, marketResult, market), pictures: options.pictures }, date, options.photos);
}
