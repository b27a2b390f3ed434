import { add, compare, decimal, parseDecimal, ZERO } from '#shared/kernel/rational.ts';
import { USUAL_OVERLAP_MM, USUAL_STOCK_MM } from './containers.ts';
import type { ContainerSettings } from './label-input.ts';
import { isWithin, micrometresOf, roundLength } from './lengths.ts';
import type { Micrometres } from './scene.ts';
import { LEAST_TAPER, unrollTaper, type Taper } from './taper.ts';

/** A container's label unrolled: its trim and what the layout must know of the body under it. */
export interface Sheet {
  readonly shape: 'cylinder' | 'flat';
  readonly width: Micrometres;
  readonly height: Micrometres;
  /** Strip at either end of a wrap that covers or is covered; 0 on a flat label. */
  readonly overlap: Micrometres;
  /** Length of the label once around, overlap left out; the width of a flat label. */
  readonly round: Micrometres;
  /** Outer diameter, the narrow one of a cone; 0 for a flat face. */
  readonly diameter: Micrometres;
  /** Length once around the wide edge of a cone: areas are never taken smaller than they are. */
  readonly wideRound?: Micrometres;
  /** Set for a cone: the straight sheet is bent onto it. */
  readonly taper?: Taper;
}
export interface ContainerFault {
  readonly field: string;
  readonly message: string;
}

const BOUNDS: Readonly<Record<string, readonly [string, string, string]>> = {
  diameterMm: ['10', '400', 'The diameter'],
  topDiameterMm: ['10', '400', 'The upper diameter'],
  bottomDiameterMm: ['10', '400', 'The lower diameter'],
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
  if (container.shape === 'taper') return readTaper(container);
  if (container.shape === 'flat') {
    const faults = faultsOf({ widthMm: container.widthMm, heightMm: container.heightMm });
    if (faults.length > 0) return { faults };
    const width = micrometresOf(decimal(container.widthMm));
    return { shape: 'flat', width, height: micrometresOf(decimal(container.heightMm)), overlap: 0, round: width, diameter: 0 };
  }
  const { diameterMm, labelHeightMm, overlapMm = USUAL_OVERLAP_MM, stockMm = USUAL_STOCK_MM } = container;
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

/** A cone's label: `labelHeightMm` is measured along the wall, the diameters at the label's two edges. */
function readTaper({ topDiameterMm, bottomDiameterMm, labelHeightMm, overlapMm = USUAL_OVERLAP_MM }: Extract<ContainerSettings, { shape: 'taper' }>): Sheet | { readonly faults: readonly ContainerFault[] } {
  const faults = faultsOf({ topDiameterMm, bottomDiameterMm, labelHeightMm, overlapMm });
  if (faults.length > 0) return { faults };
  const [top, bottom, slant, overlap] = [topDiameterMm, bottomDiameterMm, labelHeightMm, overlapMm].map((text) => micrometresOf(decimal(text))) as [number, number, number, number];
  if (Math.abs(top - bottom) < LEAST_TAPER) return readContainer({ shape: 'cylinder', diameterMm: compare(decimal(topDiameterMm), decimal(bottomDiameterMm)) > 0 ? topDiameterMm : bottomDiameterMm, labelHeightMm, overlapMm, stockMm: '0' });
  const taper = unrollTaper({ top, bottom, slant, overlap });
  if (taper.angle > Math.PI) return { faults: [{ field: 'labelHeightMm', message: `A wall that narrows from ${Math.max(top, bottom) / 1000} to ${Math.min(top, bottom) / 1000} mm over ${labelHeightMm} mm unrolls to more than a half circle. Measure along the wall, or choose a flat label.` }] };
  const atNarrow = Math.round((overlap * taper.narrow) / taper.wide);
  return {
    shape: 'cylinder', taper, height: slant, overlap: atNarrow, diameter: Math.min(top, bottom),
    width: Math.round(taper.angle * taper.narrow),
    round: Math.round(taper.angle * taper.narrow) - atNarrow,
    wideRound: Math.ceil(Math.PI * Math.max(top, bottom)),
  };
}
