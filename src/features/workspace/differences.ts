import type { FormulaLine, Phase, ProductDraft } from '#shared/contracts/product-draft.ts';
import { PLAIN_ASPECTS, type Aspect } from './aspects.ts';

export type Side = 'mine' | 'theirs';

/** One point on which two versions of a draft differ, in words. */
export interface Difference {
  readonly id: string;
  readonly title: string;
  readonly before: string;
  readonly mine: string;
  readonly theirs: string;
  readonly changedBy: Side | 'both';
  /** What is taken unless someone chooses: the side that changed it; hers where both did. */
  readonly suggested: Side;
}

/** Values are plain JSON; key order follows the contract on both sides. */
const same = (a: unknown, b: unknown) => JSON.stringify(a) === JSON.stringify(b);

const linesOf = (draft: ProductDraft) => new Map(draft.formula.phases.flatMap((phase) => phase.lines.map((line) => [line.id, line] as const)));
const structureOf = (draft: ProductDraft) => draft.formula.phases.map(({ id, name, lines }) => ({ id, name, lines: lines.map((line) => line.id) }));

function sayLine(line: FormulaLine | undefined): string {
  if (!line) return 'not in the formula';
  const amount = line.unit === 'qs' ? 'makes up the batch' : line.amount === '' ? 'no amount yet' : `${line.amount} ${line.unit}`;
  return line.note ? `${amount} (${line.note})` : amount;
}

function sayStructure(draft: ProductDraft, nameOf: (materialId: string) => string): string {
  return draft.formula.phases.map((phase) => `${phase.name}: ${phase.lines.map((line) => nameOf(line.materialId)).join(', ') || 'empty'}`).join('; ');
}

function saySteps(phase: Phase | undefined): string {
  if (!phase || phase.steps.length === 0) return 'no steps';
  return phase.steps.map((step, index) => `${index + 1}. ${step.text}`).join(' ');
}

function differ(id: string, title: string, values: { base: unknown; mine: unknown; theirs: unknown }, words: { before: string; mine: string; theirs: string }): Difference | null {
  if (same(values.mine, values.theirs)) return null;
  const changedBy = same(values.base, values.mine) ? 'theirs' : same(values.base, values.theirs) ? 'mine' : 'both';
  return { id, title, ...words, changedBy, suggested: changedBy === 'theirs' ? 'theirs' : 'mine' };
}

/** Every point on which `mine` and `theirs`, both begun from `base`, differ. */
export function compareDrafts(base: ProductDraft, mine: ProductDraft, theirs: ProductDraft, nameOf: (materialId: string) => string): Difference[] {
  const found: (Difference | null)[] = PLAIN_ASPECTS.map((aspect) =>
    differ(
      aspect.id,
      aspect.title,
      { base: aspect.read(base), mine: aspect.read(mine), theirs: aspect.read(theirs) },
      { before: aspect.say(aspect.read(base)), mine: aspect.say(aspect.read(mine)), theirs: aspect.say(aspect.read(theirs)) },
    ),
  );
  const lines = [linesOf(base), linesOf(mine), linesOf(theirs)] as const;
  for (const id of new Set([...lines[1].keys(), ...lines[2].keys()])) {
    const [b, m, t] = lines.map((map) => map.get(id)) as [FormulaLine?, FormulaLine?, FormulaLine?];
    found.push(differ(`line.${id}`, nameOf((m ?? t)!.materialId), { base: b, mine: m, theirs: t }, { before: sayLine(b), mine: sayLine(m), theirs: sayLine(t) }));
  }
  found.push(...compareSteps(base, mine, theirs));
  const kept = (draft: ProductDraft) => commonStructure(draft, lines[1], lines[2]);
  found.push(
    differ(
      'structure',
      'Order of phases and lines',
      { base: kept(base), mine: kept(mine), theirs: kept(theirs) },
      { before: sayStructure(base, nameOf), mine: sayStructure(mine, nameOf), theirs: sayStructure(theirs, nameOf) },
    ),
  );
  return found.filter((difference) => difference !== null);
}

/** Phases with only those lines that both sides have: a line added by one side is no change of order. */
function commonStructure(draft: ProductDraft, mine: ReadonlyMap<string, FormulaLine>, theirs: ReadonlyMap<string, FormulaLine>) {
  return structureOf(draft).map((phase) => ({ ...phase, lines: phase.lines.filter((id) => mine.has(id) && theirs.has(id)) }));
}

function compareSteps(base: ProductDraft, mine: ProductDraft, theirs: ProductDraft): (Difference | null)[] {
  const phase = (draft: ProductDraft, id: string) => draft.formula.phases.find((each) => each.id === id);
  const ids = new Set([...mine.formula.phases, ...theirs.formula.phases].map((each) => each.id));
  return [...ids].map((id) => {
    const [b, m, t] = [phase(base, id), phase(mine, id), phase(theirs, id)];
    return differ(
      `steps.${id}`,
      `Steps of ${(m ?? t)!.name}`,
      { base: b?.steps ?? [], mine: m?.steps ?? [], theirs: t?.steps ?? [] },
      { before: saySteps(b), mine: saySteps(m), theirs: saySteps(t) },
    );
  });
}

/** One draft from two: each point from the side chosen for it, where nothing is chosen from the side suggested. */
export function mergeDrafts(mine: ProductDraft, theirs: ProductDraft, differences: readonly Difference[], chosen: Readonly<Record<string, Side>>): ProductDraft {
  const sideOf = new Map(differences.map((difference) => [difference.id, chosen[difference.id] ?? difference.suggested]));
  const pick = (id: string) => (sideOf.get(id) === 'theirs' ? theirs : mine);
  let merged: ProductDraft = mine;
  for (const aspect of PLAIN_ASPECTS as readonly Aspect[]) merged = aspect.write(merged, aspect.read(pick(aspect.id)));
  return { ...merged, formula: { ...merged.formula, phases: mergePhases(pick('structure'), mine, theirs, sideOf) } };
}

function mergePhases(lead: ProductDraft, mine: ProductDraft, theirs: ProductDraft, sideOf: ReadonlyMap<string, Side>): Phase[] {
  const from = (id: string) => (sideOf.get(id) === 'theirs' ? theirs : mine);
  const other = lead === mine ? theirs : mine;
  const lineIn = (id: string) => linesOf(from(`line.${id}`)).get(id);
  const placed = new Set<string>();
  const phases = lead.formula.phases.map((phase): Phase => {
    const lines = phase.lines.flatMap((line) => {
      placed.add(line.id);
      return lineIn(line.id) ?? [];
    });
    const stepsFrom = from(`steps.${phase.id}`).formula.phases.find((each) => each.id === phase.id) ?? phase;
    return { ...phase, lines, steps: stepsFrom.steps };
  });
  for (const phase of other.formula.phases) {
    const missing = phase.lines.filter((line) => !placed.has(line.id)).flatMap((line) => lineIn(line.id) ?? []);
    if (missing.length === 0) continue;
    const at = phases.findIndex((each) => each.id === phase.id);
    if (at >= 0) phases[at] = { ...phases[at]!, lines: [...phases[at]!.lines, ...missing] };
    else phases.push({ ...phase, lines: missing });
  }
  return phases;
}
