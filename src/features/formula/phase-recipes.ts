import { divide, multiply, parseDecimal, toDecimal } from '#shared/kernel/rational.ts';
import type { FormulaLine, Phase, ProductDraft } from '#shared/contracts/product-draft.ts';
import type { Recipe } from './recipes.ts';
import { weighFormula } from './weigh.ts';

/** Places kept where a scaled figure does not end: a microgram. */
const PLACES = 6;

function withPhases(draft: ProductDraft, phases: Phase[]): ProductDraft {
  return { ...draft, formula: { ...draft.formula, phases } };
}

export function addPhase(id: string, name: string): Recipe {
  return (draft) => withPhases(draft, [...draft.formula.phases, { id, name, lines: [], steps: [] }]);
}

export function renamePhase(id: string, name: string): Recipe {
  return (draft) => withPhases(draft, draft.formula.phases.map((phase) => (phase.id === id ? { ...phase, name } : phase)));
}

/** Removes a phase; its lines and steps join the phase before it, or the one after the first. */
export function removePhase(id: string): Recipe {
  return (draft) => {
    const phases = draft.formula.phases;
    const at = phases.findIndex((phase) => phase.id === id);
    const gone = phases[at];
    if (!gone) return draft;
    const heir = at > 0 ? at - 1 : at + 1;
    return withPhases(
      draft,
      phases.flatMap((phase, index) => {
        if (index === at) return [];
        if (index !== heir) return [phase];
        return at > 0
          ? [{ ...phase, lines: [...phase.lines, ...gone.lines], steps: [...phase.steps, ...gone.steps] }]
          : [{ ...phase, lines: [...gone.lines, ...phase.lines], steps: [...gone.steps, ...phase.steps] }];
      }),
    );
  };
}

export function movePhase(id: string, by: -1 | 1): Recipe {
  return (draft) => {
    const at = draft.formula.phases.findIndex((phase) => phase.id === id);
    const phase = draft.formula.phases[at];
    const to = at + by;
    if (!phase || to < 0 || to >= draft.formula.phases.length) return draft;
    return withPhases(draft, draft.formula.phases.toSpliced(at, 1).toSpliced(to, 0, phase));
  };
}

export function setBatchSize(grams: string): Recipe {
  return (draft) => ({ ...draft, formula: { ...draft.formula, batchSize: grams === '' ? null : { value: grams, unit: 'g' } } });
}

/** What scaling to another batch would write, and whether every figure ends exactly. */
export interface Scaled {
  readonly lines: readonly { readonly id: string; readonly before: string; readonly after: string }[];
  readonly isExact: boolean;
}

/** Every gram line times the new batch over the old one; percent lines and the make-up line follow by themselves. */
export function scaleLines(draft: ProductDraft, grams: string): Scaled | null {
  const weighed = weighFormula(draft.formula);
  const from = weighed.batch ?? weighed.total;
  const to = parseDecimal(grams);
  if (!to || to.n <= 0n || from.n <= 0n) return null;
  let isExact = true;
  const lines = draft.formula.phases
    .flatMap((phase) => phase.lines)
    .filter((line) => line.unit === 'g' && line.amount !== '')
    .map((line) => {
      const scaled = divide(multiply(parseDecimal(line.amount)!, to), from);
      const after = toDecimal(scaled, PLACES);
      const back = parseDecimal(after)!;
      if (back.n * scaled.d !== scaled.n * back.d) isExact = false;
      return { id: line.id, before: line.amount, after };
    });
  return { lines, isExact };
}

export function scaleTo(grams: string): Recipe {
  return (draft) => {
    const scaled = scaleLines(draft, grams);
    if (!scaled) return draft;
    const after = new Map(scaled.lines.map((line) => [line.id, line.after]));
    const phases = draft.formula.phases.map((phase) => ({
      ...phase,
      lines: phase.lines.map((line) => (after.has(line.id) ? { ...line, amount: after.get(line.id)! } : line)),
    }));
    return setBatchSize(grams)(withPhases(draft, phases));
  };
}

/** Adds pasted lines, phase by phase; a phase that exists by name takes its lines, others are made. */
export function addPasted(groups: readonly { readonly id: string; readonly name: string; readonly lines: readonly FormulaLine[] }[]): Recipe {
  return (draft) => {
    const phases = [...draft.formula.phases];
    for (const group of groups) {
      const at = phases.findIndex((phase) => phase.name.trim().toLowerCase() === group.name.trim().toLowerCase());
      const there = phases[at];
      if (there) phases[at] = { ...there, lines: [...there.lines, ...group.lines] };
      else phases.push({ id: group.id, name: group.name, lines: [...group.lines], steps: [] });
    }
    return withPhases(draft, phases);
  };
}
