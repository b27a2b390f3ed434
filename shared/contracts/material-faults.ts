import { add, compare, decimal, HUNDRED, ZERO, type Rational } from '#shared/kernel/rational.ts';
import type { CompositionLine, ConstituentLine, MaterialFields } from './materials.contract.ts';

/** What the fields' own schema cannot see: how the figures of a material stand to each other. */
export interface MaterialFault {
  readonly pointer: string;
  readonly message: string;
}

type Shares = Pick<CompositionLine, 'percent' | 'min' | 'typical' | 'max'>;

/** Half a percent: what a supplier's rounding may leave over, as for any composition. */
const SLACK = decimal('0.5');

/** Every fault of a material's figures, by JSON Pointer: what keeps it from being saved. */
export function findMaterialFaults(fields: Pick<MaterialFields, 'composition' | 'constituents' | 'declareAs' | 'handling'>): MaterialFault[] {
  const faults = [...findShareFaults(fields.composition, '/composition'), ...findShareFaults(fields.constituents, '/constituents')];
  if (fields.declareAs === 'ingredients' && fields.composition.length === 0) {
    faults.push({ pointer: '/composition', message: 'Write down what the material is made of, or say that it is declared as perfume or flavour.' });
  }
  const least = leastTotal(fields.composition);
  if (compare(least, add(HUNDRED, SLACK)) > 0) faults.push({ pointer: '/composition', message: 'The parts add up to more than 100 %.' });
  const { phFrom, phTo } = fields.handling;
  if (phFrom !== undefined && phTo !== undefined && compare(decimal(phFrom), decimal(phTo)) > 0) {
    faults.push({ pointer: '/handling/phTo', message: 'The end of the pH range lies below its start.' });
  }
  return faults;
}

function findShareFaults(lines: readonly (CompositionLine | ConstituentLine)[], base: string): MaterialFault[] {
  return lines.flatMap((line, index) => {
    const at = `${base}/${index.toString()}`;
    if (line.percent !== undefined) {
      const isRange = line.min !== undefined || line.max !== undefined || line.typical !== undefined;
      return isRange ? [{ pointer: `${at}/percent`, message: 'Give one figure or a range, not both.' }] : [];
    }
    return findRangeFaults(line, at);
  });
}

function findRangeFaults({ min, typical, max }: Shares, at: string): MaterialFault[] {
  if (min === undefined && max === undefined) return [{ pointer: `${at}/percent`, message: 'Give the share in percent, or a range.' }];
  if (min === undefined) return [{ pointer: `${at}/min`, message: 'Give the lower end of the range; 0 if there is none.' }];
  if (max === undefined) return [{ pointer: `${at}/max`, message: 'Give the upper end of the range; 100 if there is none.' }];
  if (compare(decimal(min), decimal(max)) > 0) return [{ pointer: `${at}/max`, message: 'The upper end of the range lies below its lower end.' }];
  if (typical === undefined) return [];
  const isOutside = compare(decimal(typical), decimal(min)) < 0 || compare(decimal(typical), decimal(max)) > 0;
  return isOutside ? [{ pointer: `${at}/typical`, message: 'The typical share lies outside its range.' }] : [];
}

function leastTotal(lines: readonly CompositionLine[]): Rational {
  return lines.reduce((total, line) => {
    const least = line.percent ?? line.min;
    return least === undefined ? total : add(total, decimal(least));
  }, ZERO);
}
