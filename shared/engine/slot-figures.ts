import type { Figure } from '#shared/kernel/figure.ts';
import type { MixingPlan, Share } from './mixing-plan.ts';

/** Least, usual and greatest figure of every slot of a plan, over the blend's denominator. */
export interface Slots {
  at(slot: number): { readonly lo: Figure; readonly typ: Figure; readonly hi: Figure };
}

/**
 * Adds up every slot. `isSafe` promises that no sum reaches 2^53: then one pass in doubles is
 * exact. Otherwise BigInts, added up slot by slot as they are asked for.
 */
export function slotFigures(plan: MixingPlan, weights: readonly Figure[], isSafe: boolean): Slots {
  return isSafe && plan.safe ? new SafeSlots(plan, weights as readonly number[]) : new BigSlots(plan, weights as readonly bigint[]);
}

class SafeSlots implements Slots {
  readonly #lo: Float64Array;
  readonly #typ: Float64Array;
  readonly #hi: Float64Array;

  constructor({ safe, slotCount }: MixingPlan, weights: readonly number[]) {
    const lo = (this.#lo = new Float64Array(slotCount));
    const typ = (this.#typ = new Float64Array(slotCount));
    const hi = (this.#hi = new Float64Array(slotCount));
    const { at, slot, lo: least, typ: usual, hi: greatest } = safe!;
    for (let index = 0; index < at.length; index += 1) {
      const weight = weights[at[index]!]!;
      const into = slot[index]!;
      lo[into]! += weight * least[index]!;
      typ[into]! += weight * usual[index]!;
      hi[into]! += weight * greatest[index]!;
    }
  }

  at(slot: number): { lo: number; typ: number; hi: number } {
    return { lo: this.#lo[slot]!, typ: this.#typ[slot]!, hi: this.#hi[slot]! };
  }
}

const bySlot = new WeakMap<MixingPlan, readonly (readonly Share[])[]>();

function sharesBySlot(plan: MixingPlan): readonly (readonly Share[])[] {
  let found = bySlot.get(plan);
  if (!found) {
    const lists = Array.from({ length: plan.slotCount }, (): Share[] => []);
    for (const share of plan.shares) lists[share.slot]!.push(share);
    bySlot.set(plan, (found = lists));
  }
  return found;
}

class BigSlots implements Slots {
  readonly #plan: MixingPlan;
  readonly #weights: readonly bigint[];

  constructor(plan: MixingPlan, weights: readonly bigint[]) {
    this.#plan = plan;
    this.#weights = weights;
  }

  at(slot: number): { lo: bigint; typ: bigint; hi: bigint } {
    let lo = 0n;
    let typ = 0n;
    let hi = 0n;
    for (const { at, group } of sharesBySlot(this.#plan)[slot]!) {
      const weight = this.#weights[at]!;
      lo += weight * group.lo;
      typ += weight * group.typ;
      hi += weight * group.hi;
    }
    return { lo, typ, hi };
  }
}
