import type { FormulaLine, Phase, ProductDraft } from '#shared/contracts/product-draft.ts';
import type { MaterialFields, MaterialSummary } from '#shared/contracts/materials.contract.ts';
import { readFormulaBlock } from '#shared/dictionary/read-sheet.ts';
import type { FormulaPaste, FormulaPasteLine } from '#shared/dictionary/read-sheet.ts';
import { add, decimal, parseDecimal, sum, toDecimal } from '#shared/kernel/rational.ts';

/** What a pasted formula would become: its lines, and for each name the material that the house already has. */
export interface PastePlan extends FormulaPaste {
  readonly known: ReadonlyMap<string, MaterialSummary>;
  /** Names without a material: these are created, to be completed later. */
  readonly missing: readonly string[];
}

const fold = (name: string): string => name.trim().toLowerCase().replace(/\s+/g, ' ');

/** Reads the paste and finds the house's materials by their name, or by the one ingredient they are. */
export function planPaste(text: string, materials: readonly MaterialSummary[]): PastePlan {
  const paste = text.trim() === '' ? { lines: [], problems: [] } : readFormulaBlock(text);
  const known = new Map<string, MaterialSummary>();
  const missing = new Set<string>();
  for (const { name } of paste.lines) {
    const key = fold(name);
    const found = materials.find((one) => fold(one.tradeName) === key) ?? materials.find((one) => one.parts === 1 && one.inci.some((inci) => fold(inci) === key));
    if (found) known.set(name, found);
    else missing.add(name);
  }
  return { ...paste, known, missing: [...missing] };
}

/** A material written down from its name alone: one ingredient, to be checked against the supplier's sheet. */
export function materialFromName(name: string): MaterialFields {
  return {
    tradeName: name, supplier: '', declareAs: 'ingredients', composition: [{ inci: name, percent: '100' }], constituents: [],
    pricePerKg: null, currency: 'EUR', notes: 'Written down from a pasted formula. Its composition is still to be checked against the supplier’s sheet.', handling: {},
  };
}

/** The formula of the draft: phases as pasted, grams where they are given, the batch as their sum. */
export function formulaOf(lines: readonly FormulaPasteLine[], materialIdOf: (name: string) => string, newId: () => string): ProductDraft['formula'] {
  const phases = new Map<string, FormulaLine[]>();
  for (const line of lines) {
    const name = line.phase.trim() || 'Phase A';
    const list = phases.get(name) ?? phases.set(name, []).get(name)!;
    list.push({ id: newId(), materialId: materialIdOf(line.name), ...amountOf(line) });
  }
  return { batchSize: batchOf(lines), phases: [...phases].map(([name, list]): Phase => ({ id: newId(), name: name.slice(0, 80), lines: list, steps: [] })) };
}

function amountOf(line: FormulaPasteLine): Pick<FormulaLine, 'amount' | 'unit' | 'pastedPercent'> {
  if (line.qs) return { amount: '', unit: 'qs' };
  if (line.grams !== undefined) return { amount: line.grams, unit: 'g', ...(line.percent === undefined ? {} : { pastedPercent: line.percent }) };
  return { amount: line.percent ?? '', unit: '%' };
}

/** The sum of all grams; 100 g where the sheet is in percent or a line makes up the batch. */
function batchOf(lines: readonly FormulaPasteLine[]): { value: string; unit: 'g' } {
  const grams = lines.flatMap((line) => (line.grams !== undefined && parseDecimal(line.grams) ? [decimal(line.grams)] : []));
  if (grams.length !== lines.length || grams.length === 0) return { value: '100', unit: 'g' };
  return { value: toDecimal(grams.reduce((total, one) => add(total, one), sum([]))), unit: 'g' };
}
