import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { RequiredWording, Severity } from '#shared/engine/types.ts';
import { weighLines } from '#shared/engine/weigh-lines.ts';
import { toDecimal, type Rational } from '#shared/kernel/rational.ts';
import type { Exposure, Market } from '#shared/law/types.ts';
import { mergeFindings, withholdFigures, type ToldFinding } from './merge-findings.ts';
import { particularRows } from './particulars.ts';
import type { LadderRow, MergedFinding, ReportModel } from './report-model.ts';
import { countInWords, dayInWords, listInWords, MARKET_NAMES, shareAsBand } from './words.ts';

interface Share {
  readonly min: string;
  readonly typical: string;
  readonly max: string;
}

/** The part of a result document that a report reads. */
export interface ReportedResult {
  readonly market: Market;
  readonly placedOnMarket: string;
  readonly availableOn: string;
  readonly exposure: Exposure;
  readonly declaration: {
    readonly heading: string;
    readonly text: string;
    readonly entries: readonly { readonly name: string; readonly inci: string; readonly zone: string; readonly share?: Share }[];
  };
  readonly allergens: readonly { readonly name: string; readonly total: Share; readonly threshold: string; readonly disclose: boolean }[];
  readonly findings: readonly ToldFinding[];
  readonly requiredWording: readonly RequiredWording[];
  /** Conditions of the law that nothing entered can decide, each beginning with its subject. */
  readonly notChecked?: readonly string[] | undefined;
}

export interface ReportInput {
  readonly house: string;
  readonly document: FormulaDocument;
  readonly results: readonly ReportedResult[];
  /** Of the law tables and the dictionary, as a result document names them. */
  readonly dataRelease: string;
  readonly lawReadOn: string;
  /** False for outsiders: shares become bands, figures and the ladder are left out. */
  readonly showShares: boolean;
}

const NOT_CHECKED = [
  'Stability, microbiology, preservative efficacy and compatibility with the pack: no rule can read these from a formula.',
  'Traces and impurities beyond those entered with the materials, purity of the lots used, and animal-testing statements.',
  'The safety assessment of the finished product, and national rules that are not in the data release.',
  'Whether evidence for a claim holds: only that it is called for.',
];
const CAUTIONS = [
  'This report compares one formula with the rules in one data release. It advises and does not certify: it is not a safety assessment, and it does not replace the cosmetic product safety report or the product information file. A qualified person has to assess the product, and local law has to be read.',
  'Before sale, have preservation tested (challenge test) and stability followed. Patch testing shows irritation in few people only and proves no product safe.',
  'Shares rest on the suppliers’ figures and on weights as added. Allergens are taken at the top of their ranges. A change of supplier, of amount or of date calls for a new report.',
];

/** The compliance report of one formula as plain data. */
export function buildReport(input: ReportInput): ReportModel {
  const { document, results } = input;
  const merged = mergeFindings(results);
  const findings = input.showShares ? merged : withholdFigures(merged);
  const byWeight = (weight: Severity): MergedFinding[] => findings.filter((finding) => finding.severity === weight);
  const verdicts = { stop: byWeight('stop'), decide: byWeight('decide'), note: byWeight('note') };
  const ladder = input.showShares ? ladderOf(results[0], merged) : undefined;
  return {
    house: input.house,
    name: document.product.name,
    function: document.product.particulars?.function ?? '',
    subtitle: subtitleOf(document, results),
    markets: results.map((result) => result.market),
    counts: { stop: verdicts.stop.length, decide: verdicts.decide.length, note: verdicts.note.length },
    finding: findingSentence(verdicts),
    declarations: results.map((result) => ({
      label: result.market === 'UK' ? 'UK (Great Britain)' : MARKET_NAMES[result.market],
      heading: result.declaration.heading,
      names: namesOf(result.declaration),
      text: result.declaration.text,
    })),
    requiredWording: results.flatMap((result) =>
      result.requiredWording.map((wording) => ({ market: result.market, text: wording.text, lang: wording.lang, citation: wording.citation, isOfficialText: wording.isOfficialText !== false })),
    ),
    verdicts,
    ...(ladder && { ladder }),
    formula: formulaOf(document, input.showShares),
    particulars: particularRows(document),
    notChecked: notCheckedOf(document, results),
    cautions: CAUTIONS,
    dataRelease: input.dataRelease,
    lawReadOn: dayInWords(input.lawReadOn),
  };
}

/** The printed names, to be kept whole when lines are broken: a comma inside a name has no space after it. */
function namesOf(declaration: ReportedResult['declaration']): string[] {
  const lead = `${declaration.heading}: `;
  const body = declaration.text.startsWith(lead) ? declaration.text.slice(lead.length) : declaration.text;
  return body.replace(/\.$/, '').split(', ');
}

/** What the law asks and nothing entered decides, then what no formula can show. */
function notCheckedOf(document: FormulaDocument, results: readonly ReportedResult[]): string[] {
  const particulars = document.product.particulars ? [] : ['Label particulars: none are entered, so none were checked.'];
  const open = new Set(results.flatMap((result) => result.notChecked ?? []));
  return [...particulars, ...open, ...NOT_CHECKED];
}

function subtitleOf(document: FormulaDocument, results: readonly ReportedResult[]): string {
  const first = results[0];
  const { netContent, particulars } = document.product;
  const dates = first
    ? first.placedOnMarket === first.availableOn
      ? `as sold on ${dayInWords(first.placedOnMarket)}`
      : `as first sold on ${dayInWords(first.placedOnMarket)}, still on the shelf on ${dayInWords(first.availableOn)}`
    : '';
  const parts = [
    first ? (first.exposure === 'rinse-off' ? 'Rinse-off' : 'Leave-on') : '',
    netContent ? `${netContent.value}\u00a0${netContent.unit}` : '',
    particulars?.batchCode ? `batch ${particulars.batchCode}` : '',
  ].filter(Boolean);
  return `${listInWords(results.map((result) => result.market))}, ${dates}. ${parts.join(', ')}.`;
}

function findingSentence(verdicts: ReportModel['verdicts']): string {
  const waiting = verdicts.decide.length;
  const broken = verdicts.stop.length;
  const first = broken === 0 ? 'No rule in the law data named below is broken.' : `${countInWords(broken)} ${broken === 1 ? 'point stops' : 'points stop'} sale.`;
  if (waiting === 0) return first;
  return `${first} ${countInWords(waiting)} ${waiting === 1 ? 'point waits' : 'points wait'} for a person before the label is printed.`;
}

function ladderOf(result: ReportedResult | undefined, findings: readonly MergedFinding[]): ReportModel['ladder'] | undefined {
  if (!result) return undefined;
  const doubtful = new Set(findings.filter((finding) => finding.kind.endsWith('-uncertain')).map((finding) => finding.subject));
  const seen = new Set<string>();
  const rows: LadderRow[] = [];
  for (const entry of result.declaration.entries) {
    if (!entry.share || entry.zone === 'may-contain' || entry.share.typical === '0') continue;
    seen.add(entry.name);
    seen.add(entry.inci);
    rows.push({ name: entry.name, ...entry.share, zone: entry.zone as LadderRow['zone'], isUncertain: doubtful.has(entry.inci) });
  }
  for (const allergen of result.allergens)
    if (!allergen.disclose && !seen.has(allergen.name) && allergen.total.max !== '0')
      rows.push({ name: allergen.name, ...allergen.total, zone: 'unnamed', isUncertain: false });
  const threshold = result.allergens[0]?.threshold;
  return {
    market: result.market,
    note: `${result.market}. Share in % of the whole, typical figure, then the range that the suppliers’ figures allow. Squares: substances inside a material.`,
    rows,
    freeBelow: '1',
    allergenLine: threshold ? { at: threshold, label: `${threshold} %: allergens in ${result.exposure}` } : null,
  };
}

/** A column of figures with the same number of decimals: two, or as many up to four as one of them needs. */
function column(values: readonly Rational[]): string[] {
  const texts = values.map((value) => toDecimal(value, 4).split('.'));
  const places = texts.reduce((most, [, fraction = '']) => (fraction.length > most ? fraction.length : most), 2);
  return texts.map(([whole, fraction = '']) => `${whole}.${fraction.padEnd(places, '0')}`);
}

function formulaOf(document: FormulaDocument, isExact: boolean): ReportModel['formula'] {
  const weighed = weighLines(document);
  const names = new Map(document.materials.map((material) => [material.id, material.tradeName || material.id]));
  const total = { n: weighed.total, d: weighed.den };
  const masses = weighed.masses.map((mass): Rational => ({ n: mass, d: weighed.den }));
  const shares = weighed.masses.map((mass): Rational => ({ n: mass * 100n, d: weighed.total === 0n ? 1n : weighed.total }));
  const grams = column([...masses, total]);
  const percents = column(shares);
  const phases = new Map<string, { name: string; note: string; grams: string; percent: string }[]>();
  document.formula.lines.forEach((line, index) => {
    const lines = phases.get(line.phase) ?? [];
    lines.push({
      name: names.get(line.material) ?? line.material,
      note: isExact && line.unit === 'qs' ? 'makes up' : '',
      grams: isExact ? grams[index]! : '',
      percent: isExact ? percents[index]! : shareAsBand(shares[index]!),
    });
    phases.set(line.phase, lines);
  });
  return {
    basis: isExact ? `As added, ${toDecimal(total, 4)} g` : 'Bands of the Canadian notification form; exact shares are kept by the house',
    isExact,
    phases: [...phases].map(([name, lines]) => ({ name: name || 'Formula', lines })),
    total: { grams: isExact ? grams.at(-1)! : '', percent: isExact ? '100.00' : '100' },
  };
}
