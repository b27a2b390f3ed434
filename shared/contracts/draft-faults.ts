import type { ProductDraft } from './product-draft.ts';

/** What a draft's schema cannot see: how its lines stand to each other. */
export interface DraftFault {
  readonly pointer: string;
  readonly message: string;
}

/** Most lines of one formula, over all its phases. */
export const LINES_LIMIT = 500;

/** Every fault that keeps a draft from being saved, by JSON Pointer into the draft. Unfinished work is no fault. */
export function findDraftFaults(draft: Pick<ProductDraft, 'formula'>): DraftFault[] {
  const faults: DraftFault[] = [];
  const seen = new Set<string>();
  const once = (id: string, pointer: string) => {
    if (seen.has(id)) faults.push({ pointer, message: 'Two parts of this formula carry the same mark. Reload the page.' });
    seen.add(id);
  };
  let lines = 0;
  let makesUp = 0;
  draft.formula.phases.forEach((phase, at) => {
    const base = `/formula/phases/${at.toString()}`;
    once(phase.id, `${base}/id`);
    phase.steps.forEach((step, index) => {
      once(step.id, `${base}/steps/${index.toString()}/id`);
    });
    phase.lines.forEach((line, index) => {
      const pointer = `${base}/lines/${index.toString()}`;
      once(line.id, `${pointer}/id`);
      lines += 1;
      if (lines === LINES_LIMIT + 1) faults.push({ pointer, message: `A formula holds at most ${LINES_LIMIT.toString()} lines.` });
      if (line.unit !== 'qs') return;
      makesUp += 1;
      if (makesUp > 1) faults.push({ pointer: `${pointer}/unit`, message: 'Only one line can make up the batch.' });
      if (line.amount !== '') faults.push({ pointer: `${pointer}/amount`, message: 'The line that makes up the batch has no amount of its own.' });
    });
  });
  return faults;
}
