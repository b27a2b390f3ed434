import { join } from 'node:path';
import type { DocumentConstituent, DocumentLine, DocumentMaterial, DocumentPart, FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { ResultDocument } from '#shared/contracts/result-document.ts';
import { assess, type AssessOptions } from '#shared/engine/assess.ts';
import type { Assessment } from '#shared/engine/assessment.ts';
import { presentResult } from '#shared/engine/present-result.ts';
import { plainDate } from '#shared/kernel/plain-date.ts';
import { openDictionary, openLaw } from '#server/cli/tables.ts';

/** The real tables of the release, opened once for a test file. */
export const law = openLaw();
export const dictionary = openDictionary(join(import.meta.dirname, '../../data/dictionary'), law.release);
export const TODAY = plainDate('2026-12-01');

/** A composition line: `part('Aqua', '48')` or `part('Aqua', '61-65')`, `part('Aqua', '61-63-65')` with a typical share. */
export function part(inci: string, share: string, more: Partial<DocumentPart> = {}): DocumentPart {
  return { inci, role: 'ingredient', ...readShare(share), ...more };
}

export function inside(name: string, share: string): DocumentConstituent {
  return { name, ...readShare(share) };
}

function readShare(share: string): Pick<DocumentPart, 'percent' | 'min' | 'typical' | 'max'> {
  const figures = share.split('-');
  if (figures.length === 1) return { percent: share };
  if (figures.length === 2) return { min: figures[0]!, max: figures[1]! };
  return { min: figures[0]!, typical: figures[1]!, max: figures[2]! };
}

export function material(id: string, composition: readonly DocumentPart[], more: Partial<DocumentMaterial> = {}): DocumentMaterial {
  return { id, tradeName: id, declareAs: 'ingredients', composition, constituents: [], ...more };
}

/** A line: `line('water', '60 g')`, `line('water', '60 %')`, `line('water', 'qs')`. */
export function line(id: string, amount: string): DocumentLine {
  const [figure, unit] = amount === 'qs' ? ['', 'qs'] : amount.split(' ');
  return { material: id, phase: 'A', amount: figure!, unit: unit as DocumentLine['unit'] };
}

export function formula(
  materials: readonly DocumentMaterial[],
  lines: readonly DocumentLine[],
  more: { readonly batchSize?: string; readonly product?: Partial<FormulaDocument['product']>; readonly declaration?: FormulaDocument['declaration'] } = {},
): FormulaDocument {
  return {
    document: 'formula/1',
    product: { name: 'Test cream', brand: 'Brackenmere Bathhouse', category: 'body-lotion', markets: ['EU'], flags: {}, facts: {}, claims: [], mayContain: [], ...more.product },
    materials,
    formula: { lines, ...(more.batchSize !== undefined && { batchSize: more.batchSize }) },
    ...(more.declaration && { declaration: more.declaration }),
  };
}

export function judge(document: FormulaDocument, options: Partial<AssessOptions> = {}): Assessment {
  return assess(document, { law, dictionary, today: TODAY, ...options });
}

export function present(document: FormulaDocument, options: Partial<AssessOptions> = {}): ResultDocument {
  return presentResult(judge(document, options));
}
