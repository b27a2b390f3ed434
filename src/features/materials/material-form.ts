import type { CompositionLine, ConstituentLine, MaterialFields } from '#shared/contracts/materials.contract.ts';
import { MATERIAL_FACTS } from '#shared/law/material-facts.ts';
import { readDecimal } from '#src/lib/say.ts';

/** A share as it is typed: one figure, or a least and a most. */
export interface ShareFields {
  least: string;
  most: string;
  typical: string;
}
export interface PartFields extends ShareFields {
  inci: string;
  cas: string;
  usName: string;
  purpose: '' | NonNullable<CompositionLine['purpose']>;
  isNano: boolean;
  isIncidental: boolean;
}
export interface ConstituentFields extends ShareFields {
  name: string;
  cas: string;
  basis: '' | NonNullable<ConstituentLine['basis']>;
}
/** What the fields of a material hold: text as typed. */
export interface MaterialForm {
  tradeName: string;
  supplier: string;
  declareAs: MaterialFields['declareAs'];
  composition: PartFields[];
  constituents: ConstituentFields[];
  pricePerKg: string;
  currency: string;
  notes: string;
  handling: {
    heatLimitC: string;
    phFrom: string;
    phTo: string;
    hydrateHours: string;
    basis: '' | 'supplier' | 'common-practice';
    note: string;
  };
  /** Answers about the material itself: text as typed, yes and no as `true` and `false`. */
  facts: Record<string, string>;
}

export const emptyPart: PartFields = { inci: '', cas: '', usName: '', purpose: '', isNano: false, isIncidental: false, least: '', most: '', typical: '' };
export const emptyConstituent: ConstituentFields = { name: '', cas: '', basis: '', least: '', most: '', typical: '' };

/** Every question stands in the form, so that drawing one changes nothing. */
const noFacts: Readonly<Record<string, string>> = Object.fromEntries(Object.keys(MATERIAL_FACTS).map((key) => [key, '']));

export function emptyMaterial(tradeName = ''): MaterialForm {
  return {
    tradeName, supplier: '', declareAs: 'ingredients', composition: [{ ...emptyPart }], constituents: [], pricePerKg: '', currency: 'EUR', notes: '',
    handling: { heatLimitC: '', phFrom: '', phTo: '', hydrateHours: '', basis: '', note: '' },
    facts: { ...noFacts },
  };
}

export function formOf(material: MaterialFields): MaterialForm {
  const { handling } = material;
  return {
    tradeName: material.tradeName,
    supplier: material.supplier,
    declareAs: material.declareAs,
    composition: material.composition.map(partOf),
    constituents: material.constituents.map((line) => ({ name: line.name, cas: line.cas ?? '', basis: line.basis ?? '', ...shareOf(line) })),
    pricePerKg: material.pricePerKg ?? '',
    currency: material.currency,
    notes: material.notes,
    handling: {
      heatLimitC: handling.heatLimitC ?? '', phFrom: handling.phFrom ?? '', phTo: handling.phTo ?? '',
      hydrateHours: handling.hydrateHours ?? '', basis: handling.basis ?? '', note: handling.note ?? '',
    },
    facts: { ...noFacts, ...Object.fromEntries(Object.entries(material.facts ?? {}).map(([key, value]) => [key, String(value)])) },
  };
}

export function partOf(line: CompositionLine): PartFields {
  return {
    inci: line.inci, cas: line.cas ?? '', usName: line.usName ?? '', purpose: line.purpose ?? '',
    isNano: line.nano ?? false, isIncidental: line.role === 'incidental', ...shareOf(line),
  };
}
function shareOf(line: { percent?: string; min?: string; typical?: string; max?: string }): ShareFields {
  return line.percent !== undefined ? { least: line.percent, most: '', typical: '' } : { least: line.min ?? '', most: line.max ?? '', typical: line.typical ?? '' };
}

const isBlankShare = (share: ShareFields) => share.least === '' && share.most === '' && share.typical === '';
/** A line that nobody has begun: it is not sent. */
export const isBlankPart = (part: PartFields): boolean => part.inci.trim() === '' && isBlankShare(part);
export const isBlankConstituent = (part: ConstituentFields): boolean => part.name.trim() === '' && isBlankShare(part);

/** The body that the contract asks for; only the contract judges it. */
export function bodyOf(form: MaterialForm): unknown {
  const { handling } = form;
  return {
    tradeName: form.tradeName,
    supplier: form.supplier,
    declareAs: form.declareAs,
    composition: form.composition.filter((part) => !isBlankPart(part)).map((part) => present({
      inci: part.inci, cas: part.cas, ...shareBody(part), nano: part.isNano || undefined,
      purpose: part.purpose, usName: part.usName, role: part.isIncidental ? 'incidental' : undefined,
    })),
    constituents: form.constituents.filter((part) => !isBlankConstituent(part)).map((part) => present({ name: part.name, cas: part.cas, ...shareBody(part), basis: part.basis })),
    pricePerKg: form.pricePerKg.trim() === '' ? null : readDecimal(form.pricePerKg),
    currency: form.currency.trim().toUpperCase(),
    notes: form.notes,
    handling: present({
      heatLimitC: readDecimal(handling.heatLimitC), phFrom: readDecimal(handling.phFrom), phTo: readDecimal(handling.phTo),
      hydrateHours: readDecimal(handling.hydrateHours), basis: handling.basis, note: handling.note,
    }),
    facts: Object.fromEntries(Object.entries(form.facts ?? {}).filter(([, value]) => value.trim() !== '').map(([key, value]) => [key, factBody(key, value)])),
  };
}

/** A figure as a plain decimal; yes and no as what they are. */
function factBody(key: string, value: string): string | boolean {
  const isYesNo = MATERIAL_FACTS[key] ? MATERIAL_FACTS[key].kind === 'yes-no' : value === 'true' || value === 'false';
  return isYesNo ? value === 'true' : readDecimal(value);
}

function shareBody(share: ShareFields): Record<string, string> {
  const [least, most, typical] = [share.least, share.most, share.typical].map(readDecimal) as [string, string, string];
  return most === '' && typical === '' ? { percent: least } : { min: least, max: most, typical };
}
/** Without what was left empty. */
function present(fields: Record<string, unknown>): Record<string, unknown> {
  return Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== undefined && value !== ''));
}

const SHARE_FIELD: Readonly<Record<string, string>> = { percent: 'least', min: 'least', max: 'most', nano: 'isNano', role: 'isIncidental' };

/** The field that shows a fault found at a path of the body: blank lines are counted back in. */
export function fieldPathOf(path: readonly PropertyKey[], form: MaterialForm): string {
  const [list, at, key] = path.map(String);
  if (list !== 'composition' && list !== 'constituents') return path.map(String).join('.');
  if (at === undefined) return `root.${list}`;
  const kept = list === 'composition' ? indexesOf(form.composition, isBlankPart) : indexesOf(form.constituents, isBlankConstituent);
  const index = kept[Number(at)] ?? Number(at);
  return `${list}.${index}.${key === undefined ? 'least' : (SHARE_FIELD[key] ?? key)}`;
}
function indexesOf<T>(lines: readonly T[], isBlank: (line: T) => boolean): number[] {
  return lines.flatMap((line, index) => (isBlank(line) ? [] : [index]));
}

/** Whether something read back from this computer can stand in the fields. */
export function isMaterialForm(value: unknown): value is MaterialForm {
  const form = value as Partial<MaterialForm> | null;
  return typeof form === 'object' && form !== null && typeof form.tradeName === 'string' && Array.isArray(form.composition) && Array.isArray(form.constituents) && typeof form.handling === 'object';
}

