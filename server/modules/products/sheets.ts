import { parseDecimal, type Rational } from '#shared/kernel/rational.ts';
import type { Market } from '#shared/law/types.ts';
import { buildReport } from '#shared/report/build-report.ts';
import { buildWeighOut, type WeighOutInput } from '#shared/report/build-weigh-out.ts';
import type { PressPhoto } from '#server/artwork/paint-label.ts';
import { renderLabelPdf } from '#server/artwork/render-label.ts';
import { AppError, invalid } from '#server/http/app-error.ts';
import { FileAnswer } from '#server/http/file-answer.ts';
import { renderReportPdf } from '#server/paper/report-pdf.ts';
import { renderWeighOutPdf } from '#server/paper/weigh-out-pdf.ts';
import { contentHash, judge, type AsOf, type Dossier, type Knowledge } from './dossier.ts';

/** Fetches the plates of the photos among pictures. */
export type PhotosOf = (pictures: NonNullable<Dossier['pictures']>) => Promise<ReadonlyMap<string, PressPhoto>>;

/** The label of one market as a press file. @throws AppError `does-not-fit` with each element and the room it lacks */
export async function makeLabelPdf(dossier: Dossier, knows: Knowledge, asked: AsOf & { readonly market?: Market }, photosOf: PhotosOf): Promise<FileAnswer> {
  const { market = dossier.product.draft.label.market, ...asOf } = asked;
  const { document, result } = judge(dossier, knows, { ...asOf, markets: [market] });
  const pictures = dossier.pictures ?? [];
  const label = await renderLabelPdf(document, result, { market, pictures, photos: await photosOf(pictures) });
  if ('misfits' in label) {
    throw new AppError('does-not-fit', { issues: label.misfits.map(({ element, message }) => ({ pointer: `/label/${element.replaceAll(' ', '-')}`, message })) });
  }
  return pdf(label.pdf, `${dossier.product.draft.name}, label ${market}.pdf`);
}

/** The compliance report; `hidden` shares are bands for readers outside the house. */
export async function makeReportPdf(dossier: Dossier, knows: Knowledge, asked: AsOf & { readonly shares?: 'exact' | 'hidden' }): Promise<FileAnswer> {
  const { shares = 'exact', ...asOf } = asked;
  const { document, result } = judge(dossier, knows, asOf);
  const model = buildReport({
    house: dossier.house.name,
    document,
    results: result.results,
    dataRelease: result.dataRelease,
    lawReadOn: knows.law.readOn,
    showShares: shares === 'exact',
  });
  const bytes = await renderReportPdf(model, contentHash({ document, result }), knows.today);
  return pdf(bytes, `${dossier.product.draft.name}, report${shares === 'hidden' ? ' without shares' : ''}.pdf`);
}

/** The batch sheet, for the batch as it stands or another size in grams. @throws AppError `invalid` for a size that is none */
export async function makeWeighOutPdf(dossier: Dossier, knows: Knowledge, asked: { readonly batch?: string }): Promise<FileAnswer> {
  const batchGrams = asked.batch === undefined ? undefined : readBatch(asked.batch);
  const { document, result } = judge(dossier, knows);
  const model = buildWeighOut({
    house: dossier.house.name,
    document,
    steps: stepsOf(dossier),
    handling: Object.fromEntries(dossier.materials.map((material) => [material.id, cautionOf(material.handling)])),
    dataRelease: result.dataRelease,
    ...(batchGrams ? { batchGrams } : {}),
  });
  return pdf(await renderWeighOutPdf(model, contentHash(model), knows.today), `${dossier.product.draft.name}, weigh-out sheet.pdf`);
}

function pdf(bytes: Uint8Array, fileName: string): FileAnswer {
  return new FileAnswer({ bytes, mediaType: 'application/pdf', fileName });
}

/** Up to a tonne: past that a small house's sheet is a slip of the hand. */
const LARGEST = 1_000_000n;

function readBatch(text: string): Rational {
  const size = parseDecimal(text.trim());
  if (!size || size.n <= 0n || size.n > LARGEST * size.d) throw invalid({ pointer: '/batch', message: 'Give the batch size in grams, from above 0 to 1000000.' });
  return size;
}

function stepsOf({ product }: Dossier): WeighOutInput['steps'] {
  const steps: Record<string, WeighOutInput['steps'][string][number][]> = {};
  for (const phase of product.draft.formula.phases) {
    // Two phases may bear one name; their steps then stand under it together.
    (steps[phase.name] ??= []).push(
      ...phase.steps.map(({ text, temperature, time }) => ({
        text: time ? `${text} Hold ${time.value}\u00a0${time.unit}.` : text,
        temperature: temperature ? askedOf(temperature) : '',
        unit: temperature?.unit ?? null,
      })),
    );
  }
  return steps;
}

function cautionOf({ heatLimitC, phFrom, phTo, hydrateHours, note }: Dossier['materials'][number]['handling']): string {
  const parts = [
    heatLimitC === undefined ? '' : `not above ${heatLimitC} °C`,
    phFrom === undefined && phTo === undefined ? '' : `pH ${[phFrom, phTo].filter(Boolean).join(' to ')}`,
    hydrateHours === undefined ? '' : `swells ${hydrateHours} h`,
    note ?? '',
  ];
  return parts.filter(Boolean).join('; ');
}

/** `20–25 °C`, `below 40 °C`, `from 70 °C`; empty where neither end is given. */
function askedOf({ from, to, unit }: { readonly from?: string | undefined; readonly to?: string | undefined; readonly unit: 'C' | 'F' }): string {
  const figures = from && to ? `${from}–${to}` : to ? `below ${to}` : from ? `from ${from}` : '';
  return figures && `${figures}\u00a0°${unit}`;
}
