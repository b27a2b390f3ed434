import type { Material } from '#shared/contracts/materials.contract.ts';
import type { Phase, ProcessStep, ProductDraft } from '#shared/contracts/product-draft.ts';
import type { Finding } from '#shared/engine/types.ts';
import { compare, divide, multiply, parseDecimal, subtract, add, toDecimal, type Rational } from '#shared/kernel/rational.ts';

const NINE_FIFTHS: Rational = { n: 9n, d: 5n };
const THIRTY_TWO: Rational = { n: 32n, d: 1n };

/** Degrees Celsius as Fahrenheit, exact; `null` for anything but a decimal. */
export function toFahrenheit(celsius: string): string | null {
  const value = parseDecimal(celsius);
  return value ? toDecimal(add(multiply(value, NINE_FIFTHS), THIRTY_TWO)) : null;
}

/** Degrees Fahrenheit as Celsius, rounded half-even to 12 places where it does not end. */
export function toCelsius(fahrenheit: string): string | null {
  const value = parseDecimal(fahrenheit);
  return value ? toDecimal(celsiusOf(value)) : null;
}

function celsiusOf(fahrenheit: Rational): Rational {
  return divide(subtract(fahrenheit, THIRTY_TWO), NINE_FIFTHS);
}

/**
 * `handling-limit` (decide) for each process step that a material of its phase does not bear,
 * or may not: hotter than its heat limit, too short to hydrate, or a product pH outside its
 * window. The limits are the supplier's word or common practice; no law stands behind them.
 */
export function judgeHandling(draft: ProductDraft, materials: readonly Material[]): Finding[] {
  const byId = new Map(materials.map((material) => [material.id, material]));
  const found: Finding[] = [];
  for (const phase of draft.formula.phases) {
    const inPhase = [...new Set(phase.lines.map((line) => line.materialId))].flatMap((id) => byId.get(id) ?? []);
    for (const material of inPhase) {
      for (const step of phase.steps) found.push(...judgeHeat(phase, step, material));
      found.push(...judgeHydration(phase, material));
    }
  }
  const used = new Set(draft.formula.phases.flatMap((phase) => phase.lines.map((line) => line.materialId)));
  for (const material of materials) if (used.has(material.id)) found.push(...judgePh(draft, material));
  return found;
}

function basisOf(material: Material): string {
  return material.handling.basis === 'supplier' ? "The supplier's word on the material" : 'Common practice, no source';
}

function base(material: Material, rule: string): Pick<Finding, 'kind' | 'severity' | 'rule' | 'subject' | 'citation'> {
  return { kind: 'handling-limit', severity: 'decide', rule, subject: material.tradeName, citation: basisOf(material) };
}

function judgeHeat(phase: Phase, step: ProcessStep, material: Material): Finding[] {
  const limit = parseDecimal(material.handling.heatLimitC ?? '');
  const { temperature } = step;
  const written = temperature?.to ?? temperature?.from;
  const value = parseDecimal(written ?? '');
  if (!limit || !temperature || !value) return [];
  const celsius = temperature.unit === 'F' ? celsiusOf(value) : value;
  if (compare(celsius, limit) <= 0) return [];
  const shown = temperature.unit === 'F' ? `${written} °F (${toDecimal(celsius, 1)} °C)` : `${written} °C`;
  return [{
    ...base(material, 'handling-heat'),
    measured: toDecimal(celsius),
    limit: toDecimal(limit),
    unit: '°C',
    message: `${phase.name} is heated to ${shown}, but ${material.tradeName} should stay at or below ${toDecimal(limit)} °C.`,
    remedy: `Add ${material.tradeName} in a cooler phase, or lower the temperature of this step.`,
    arithmetic: [
      { step: 'Temperature of the step', figure: shown, from: step.id },
      { step: 'Heat limit of the material', figure: `${toDecimal(limit)} °C`, from: material.id },
    ],
  }];
}

/** The longest hold of the phase against the hours the material needs; steps without a time say nothing. */
function judgeHydration(phase: Phase, material: Material): Finding[] {
  const needed = parseDecimal(material.handling.hydrateHours ?? '');
  if (!needed || needed.n === 0n) return [];
  let longest: Rational | undefined;
  for (const { time } of phase.steps) {
    const value = parseDecimal(time?.value ?? '');
    if (!time || !value) continue;
    const hours = time.unit === 'min' ? divide(value, { n: 60n, d: 1n }) : value;
    if (!longest || compare(hours, longest) > 0) longest = hours;
  }
  if (!longest || compare(longest, needed) >= 0) return [];
  return [{
    ...base(material, 'handling-hydration'),
    measured: toDecimal(longest),
    limit: toDecimal(needed),
    unit: 'h',
    message: `The longest hold of ${phase.name} is ${toDecimal(longest, 2)} h, but ${material.tradeName} needs ${toDecimal(needed)} h to hydrate.`,
    remedy: `Hold ${phase.name} for at least ${toDecimal(needed)} h.`,
    arithmetic: [
      { step: 'Longest hold of the phase', figure: `${toDecimal(longest, 2)} h` },
      { step: 'Hours to hydrate', figure: `${toDecimal(needed)} h`, from: material.id },
    ],
  }];
}

function judgePh(draft: ProductDraft, material: Material): Finding[] {
  const { phFrom, phTo } = material.handling;
  const from = parseDecimal(phFrom ?? '');
  const to = parseDecimal(phTo ?? '');
  if (!from && !to) return [];
  const window = from && to ? `between pH ${toDecimal(from)} and ${toDecimal(to)}` : from ? `at pH ${toDecimal(from)} or above` : `at pH ${toDecimal(to!)} or below`;
  const fact = draft.facts['pH'];
  const ph = typeof fact === 'string' ? parseDecimal(fact.trim()) : null;
  if (!ph) return [];
  if ((!from || compare(ph, from) >= 0) && (!to || compare(ph, to) <= 0)) return [];
  return [{
    ...base(material, 'handling-ph'),
    measured: toDecimal(ph),
    limit: toDecimal(from && compare(ph, from) < 0 ? from : to!),
    unit: 'pH',
    message: `${material.tradeName} works ${window}; the product is at pH ${toDecimal(ph)}.`,
    remedy: `Adjust the pH of the product, or choose another material than ${material.tradeName}.`,
  }];
}
