import { compare, decimal, divide, HUNDRED, multiply, parseDecimal, subtract, toDecimal, type Rational } from '#shared/kernel/rational.ts';
import type { FormulaLine, Phase, ProductDraft } from '#shared/contracts/product-draft.ts';
import { weighFormula } from './weigh.ts';

/** Every change of a formula, as a pure step from one draft to the next. */
export type Recipe = (draft: ProductDraft) => ProductDraft;

/** Places kept where an exact figure does not end: a microgram in grams. */
const PLACES = 6;

function withPhases(draft: ProductDraft, phases: Phase[]): ProductDraft {
  return { ...draft, formula: { ...draft.formula, phases } };
}

function mapLine(draft: ProductDraft, lineId: string, change: (line: FormulaLine) => FormulaLine): ProductDraft {
  let changed = false;
  const phases = draft.formula.phases.map((phase) => {
    const lines = phase.lines.map((line) => {
      if (line.id !== lineId) return line;
      const next = change(line);
      if (next !== line) changed = true;
      return next;
    });
    return changed ? { ...phase, lines } : phase;
  });
  return changed ? withPhases(draft, phases) : draft;
}

function endsWithin(value: Rational, places: number): boolean {
  return compare(decimal(toDecimal(value, places)), value) === 0;
}

/** Writes a line's grams. A percent line stays one only where the percent says the same exactly. */
export function setGrams(lineId: string, grams: string): Recipe {
  return (draft) =>
    mapLine(draft, lineId, (line) => {
      if (line.unit !== '%') return line.amount === grams && line.unit === 'g' ? line : { ...line, unit: 'g', amount: grams };
      if (grams === '') return { ...line, amount: '' };
      const batch = draft.formula.batchSize ? parseDecimal(draft.formula.batchSize.value) : HUNDRED;
      const mass = parseDecimal(grams);
      if (!batch || !mass || batch.n === 0n) return { ...line, unit: 'g', amount: grams };
      const percent = divide(multiply(mass, HUNDRED), batch);
      return endsWithin(percent, PLACES) ? { ...line, amount: toDecimal(percent, PLACES) } : { ...line, unit: 'g', amount: grams };
    });
}

/** Writes a line's percent. A gram line stays in grams: of the batch, or beside the other lines as they are. */
export function setPercent(lineId: string, percent: string): Recipe {
  return (draft) => {
    const weighed = weighFormula(draft.formula);
    return mapLine(draft, lineId, (line) => {
      if (line.unit === '%') return line.amount === percent ? line : { ...line, amount: percent };
      const share = parseDecimal(percent);
      if (!share) return { ...line, unit: 'g', amount: '' };
      if (weighed.batch) return { ...line, unit: 'g', amount: toDecimal(divide(multiply(share, weighed.batch), HUNDRED), 12) };
      const others = subtract(weighed.total, weighed.lines.get(lineId)!.mass);
      const left = subtract(HUNDRED, share);
      if (others.n <= 0n || left.n <= 0n) return { ...line, unit: '%', amount: percent };
      return { ...line, unit: 'g', amount: toDecimal(divide(multiply(share, others), left), PLACES) };
    });
  };
}

/** Lets a line make up the batch; the line that did so before keeps the grams it then had. */
export function makeUpWith(lineId: string): Recipe {
  return (draft) => {
    const weighed = weighFormula(draft.formula);
    const phases = draft.formula.phases.map((phase) => ({
      ...phase,
      lines: phase.lines.map((line): FormulaLine => {
        if (line.id === lineId) return { ...line, unit: 'qs', amount: '', pastedPercent: undefined };
        return line.unit === 'qs' ? { ...line, unit: 'g', amount: weighed.lines.get(line.id)!.grams } : line;
      }),
    }));
    return withPhases(draft, phases);
  };
}

/** A line that made up the batch keeps the grams it has now. */
export function fixMakeUp(lineId: string): Recipe {
  return (draft) => {
    const grams = weighFormula(draft.formula).lines.get(lineId)?.grams ?? '';
    return mapLine(draft, lineId, (line) => ({ ...line, unit: 'g', amount: grams }));
  };
}

/** Settles a contradiction of a pasted sheet: the grams stand, or the percent is taken. */
export function keepGrams(lineId: string): Recipe {
  return (draft) => mapLine(draft, lineId, (line) => ({ ...line, pastedPercent: undefined }));
}
export function takePasted(lineId: string, percent: string): Recipe {
  return (draft) => keepGrams(lineId)(setPercent(lineId, percent)(draft));
}

/** Puts a line into a phase, at the end or at `at`. */
export function addLine(phaseId: string, line: FormulaLine, at?: number): Recipe {
  return (draft) =>
    withPhases(
      draft,
      draft.formula.phases.map((phase) => (phase.id === phaseId ? { ...phase, lines: phase.lines.toSpliced(at ?? phase.lines.length, 0, line) } : phase)),
    );
}

export function removeLine(lineId: string): Recipe {
  return (draft) => withPhases(draft, draft.formula.phases.map((phase) => ({ ...phase, lines: phase.lines.filter((line) => line.id !== lineId) })));
}

export function setLineNote(lineId: string, note: string): Recipe {
  return (draft) => mapLine(draft, lineId, (line) => ({ ...line, note: note === '' ? undefined : note }));
}

/** Moves a line to a place in a phase; `to` counts places in that phase without the line itself. */
export function moveLine(lineId: string, phaseId: string, to: number): Recipe {
  return (draft) => {
    const line = draft.formula.phases.flatMap((phase) => phase.lines).find((each) => each.id === lineId);
    if (!line) return draft;
    return withPhases(
      draft,
      draft.formula.phases.map((phase) => {
        const lines = phase.lines.filter((each) => each.id !== lineId);
        return { ...phase, lines: phase.id === phaseId ? lines.toSpliced(Math.max(0, Math.min(to, lines.length)), 0, line) : lines };
      }),
    );
  };
}

/** Moves a line one place up or down, over the edge of its phase into the next one. */
export function stepLine(lineId: string, by: -1 | 1): Recipe {
  return (draft) => {
    const at = draft.formula.phases.findIndex((phase) => phase.lines.some((line) => line.id === lineId));
    const phase = draft.formula.phases[at];
    if (!phase) return draft;
    const place = phase.lines.findIndex((line) => line.id === lineId) + by;
    if (place >= 0 && place < phase.lines.length) return moveLine(lineId, phase.id, place)(draft);
    const next = draft.formula.phases[at + by];
    return next ? moveLine(lineId, next.id, by < 0 ? next.lines.length : 0)(draft) : draft;
  };
}
