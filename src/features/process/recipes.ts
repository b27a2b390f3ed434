import type { ProcessStep, ProductDraft } from '#shared/contracts/product-draft.ts';

type Recipe = (draft: ProductDraft) => ProductDraft;

function mapSteps(phaseId: string, change: (steps: readonly ProcessStep[]) => ProcessStep[]): Recipe {
  return (draft) => ({
    ...draft,
    formula: { ...draft.formula, phases: draft.formula.phases.map((phase) => (phase.id === phaseId ? { ...phase, steps: change(phase.steps) } : phase)) },
  });
}

/** Adds an empty step at the end of a phase. */
export function addStep(phaseId: string, id: string): Recipe {
  return mapSteps(phaseId, (steps) => [...steps, { id, text: '', temperature: null, time: null }]);
}
export function removeStep(phaseId: string, id: string): Recipe {
  return mapSteps(phaseId, (steps) => steps.filter((step) => step.id !== id));
}
export function writeStep(phaseId: string, id: string, change: Partial<Omit<ProcessStep, 'id'>>): Recipe {
  return mapSteps(phaseId, (steps) => steps.map((step) => (step.id === id ? { ...step, ...change } : step)));
}
/** Moves a step one place within its phase. */
export function moveStep(phaseId: string, id: string, by: -1 | 1): Recipe {
  return mapSteps(phaseId, (steps) => {
    const at = steps.findIndex((step) => step.id === id);
    const step = steps[at];
    const to = at + by;
    return step && to >= 0 && to < steps.length ? steps.toSpliced(at, 1).toSpliced(to, 0, step) : [...steps];
  });
}
