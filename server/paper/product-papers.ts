import { createHash } from 'node:crypto';
import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import type { HandlingLimits } from '#shared/contracts/materials.contract.ts';
import type { ResultDocument } from '#shared/contracts/result-document.ts';
import type { Rational } from '#shared/kernel/rational.ts';
import { buildReport } from '#shared/report/build-report.ts';
import { buildWeighOut } from '#shared/report/build-weigh-out.ts';
import { renderReportPdf } from './report-pdf.ts';
import { renderWeighOutPdf } from './weigh-out-pdf.ts';

/** SHA-256, in hex, of the JSON of what a paper speaks of. */
export function contentHash(...parts: readonly unknown[]): string {
  const hash = createHash('sha256');
  for (const part of parts) hash.update(JSON.stringify(part));
  return hash.digest('hex');
}

export interface ReportPaperInput {
  readonly house: string;
  readonly document: FormulaDocument;
  readonly result: ResultDocument;
  /** `YYYY-MM-DD`: when the law tables were read. */
  readonly lawReadOn: string;
  /** `YYYY-MM-DD`: the day the paper is made. */
  readonly day: string;
  readonly showShares: boolean;
}

/** The compliance report of a product as PDF bytes. */
export async function renderProductReport(input: ReportPaperInput): Promise<Uint8Array> {
  const model = buildReport({
    house: input.house,
    document: input.document,
    results: input.result.results,
    dataRelease: input.result.dataRelease,
    lawReadOn: input.lawReadOn,
    showShares: input.showShares,
  });
  return renderReportPdf(model, contentHash(input.document, input.result), input.day);
}

export interface WeighOutPaperInput {
  readonly house: string;
  readonly document: FormulaDocument;
  readonly draft: ProductDraft;
  /** By material id. */
  readonly handling: Readonly<Record<string, HandlingLimits>>;
  readonly batchGrams?: Rational;
  readonly dataRelease: string;
  readonly day: string;
}

/** The weigh-out sheet of a product as PDF bytes. */
export async function renderProductWeighOut(input: WeighOutPaperInput): Promise<Uint8Array> {
  const steps = Object.fromEntries(input.draft.formula.phases.map((phase) => [phase.name, phase.steps.map(printedStep)]));
  const handling = Object.fromEntries(Object.entries(input.handling).map(([id, limits]) => [id, handlingInWords(limits)]));
  const model = buildWeighOut({ ...input, steps, handling });
  return renderWeighOutPdf(model, contentHash(input.document, model), input.day);
}

type Step = ProductDraft['formula']['phases'][number]['steps'][number];

function printedStep(step: Step): { text: string; temperature: string; unit: 'C' | 'F' | null } {
  const hold = step.time ? ` Hold ${step.time.value}\u00a0${step.time.unit}.` : '';
  if (!step.temperature) return { text: `${step.text}${hold}`, temperature: '', unit: null };
  const { from, to, unit } = step.temperature;
  const asked = from && to ? `${from}–${to}` : to ? `below ${to}` : from ? `${from} and over` : '';
  return { text: `${step.text}${hold}`, temperature: asked ? `${asked}\u00a0°${unit}` : '', unit };
}

/** What to mind with a material, in a line. */
export function handlingInWords(limits: HandlingLimits): string {
  const parts = [
    limits.heatLimitC ? `not over ${limits.heatLimitC} °C` : '',
    limits.phFrom || limits.phTo ? `pH ${limits.phFrom ?? '…'}–${limits.phTo ?? '…'}` : '',
    limits.hydrateHours ? `${limits.hydrateHours} h to hydrate` : '',
  ].filter(Boolean);
  return parts.join(', ');
}
