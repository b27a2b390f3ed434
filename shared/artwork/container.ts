import { add, decimal, parseDecimal, ZERO } from '#shared/kernel/rational.ts';
import type { ContainerSettings } from './label-input.ts';
import { isWithin, micrometresOf, roundLength } from './lengths.ts';
import type { Micrometres } from './scene.ts';

/** A container's label unrolled: its trim and what the layout must know of the body under it. */
export interface Sheet {
  readonly shape: 'cylinder' | 'flat';
  readonly width: Micrometres;
  readonly height: Micrometres;
  /** Strip at either end of a wrap that covers or is covered; 0 on a flat label. */
  readonly overlap: Micrometres;
  /** Length of the label once around, overlap left out; the width of a flat label. */
  readonly round: Micrometres;
  /** Outer diameter; 0 for a flat face. */
  readonly diameter: Micrometres;
}
export interface ContainerFault {
  readonly field: string;
  readonly message: string;
}

/** Stock thickness in mm where none is given: film with its adhesive. Common practice, no source. */
const STOCK = '0.06';
const OVERLAP = '5';

const BOUNDS: Readonly<Record<string, readonly [string, string, string]>> = {
  diameterMm: ['10', '400', 'The diameter'],
  labelHeightMm: ['10', '500', 'The label height'],
  widthMm: ['10', '1000', 'The width'],
  heightMm: ['10', '500', 'The height'],
  overlapMm: ['0', '30', 'The overlap'],
  stockMm: ['0', '2', 'The label stock'],
};

function faultsOf(fields: Readonly<Record<string, string>>): ContainerFault[] {
  return Object.entries(fields).flatMap(([field, text]) => {
    const [least, most, words] = BOUNDS[field]!;
    const value = parseDecimal(text);
    if (!value) return [{ field, message: `${words} is not a number of millimetres.` }];
    if (!isWithin(value, least, most)) return [{ field, message: `${words} is ${text} mm. Labels are set from ${least} to ${most} mm.` }];
    return [];
  });
}

/** The sheet of a container, in whole micrometres, or what is wrong with its measures. */
export function readContainer(container: ContainerSettings): Sheet | { readonly faults: readonly ContainerFault[] } {
  if (container.shape === 'taper') {
    return { faults: [{ field: 'shape', message: 'Tapered containers cannot be set yet. Choose a cylinder or a flat label.' }] };
  }
  if (container.shape === 'flat') {
    const faults = faultsOf({ widthMm: container.widthMm, heightMm: container.heightMm });
    if (faults.length > 0) return { faults };
    const width = micrometresOf(decimal(container.widthMm));
    return { shape: 'flat', width, height: micrometresOf(decimal(container.heightMm)), overlap: 0, round: width, diameter: 0 };
  }
  const { diameterMm, labelHeightMm, overlapMm = OVERLAP, stockMm = STOCK } = container;
  const faults = faultsOf({ diameterMm, labelHeightMm, overlapMm, stockMm });
  if (faults.length > 0) return { faults };
  const across = add(decimal(diameterMm), decimal(stockMm));
  return {
    shape: 'cylinder',
    width: roundLength(across, decimal(overlapMm)),
    height: micrometresOf(decimal(labelHeightMm)),
    overlap: micrometresOf(decimal(overlapMm)),
    round: roundLength(across, ZERO),
    diameter: micrometresOf(decimal(diameterMm)),
  };
}
