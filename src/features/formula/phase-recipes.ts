import type { FormulaLine, Phase, ProductDraft } from '#shared/contracts/product-draft.ts';
import { scaleBatch } from '#shared/product/scale.ts';
import type { Recipe } from './recipes.ts';

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

/** What scaling would write, line by line; `null` where there is nothing to scale from. */
export function previewScale(draft: ProductDraft, grams: string): readonly { readonly id: string; readonly before: string; readonly after: string }[] | null {
  const scaled = scaleBatch(draft.formula, grams);
  if (!scaled) return null;
  const after = new Map(scaled.phases.flatMap((phase) => phase.lines.map((line) => [line.id, line.amount] as const)));
  return draft.formula.phases
    .flatMap((phase) => phase.lines)
    .filter((line) => line.unit === 'g' && line.amount !== '')
    .map((line) => ({ id: line.id, before: line.amount, after: after.get(line.id) ?? line.amount }));
}

/** The formula at another batch size; unchanged where there is nothing to scale from. */
export function scaleTo(grams: string): Recipe {
  return (draft) => {
    const formula = scaleBatch(draft.formula, grams);
    return formula ? { ...draft, formula } : draft;
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
