import type { EntityManager } from '@mikro-orm/postgresql';
import type { TrailChange } from './chain.ts';

/** Who acts, and when, in one transaction. */
export interface TrailActor {
  readonly personId: string | null;
  readonly name: string;
}

/** Something that was done, before it has its place in the chain. */
export interface TrailAct {
  readonly act: string;
  readonly subjectKind: string;
  readonly subjectId: string | null;
  readonly subject: string;
  readonly productId: string | null;
  readonly changes: readonly TrailChange[];
  readonly recordHash: string | null;
}

export interface TrailContext {
  readonly actor: TrailActor;
  readonly acts: TrailAct[];
}

const contexts = new WeakMap<EntityManager, TrailContext>();

/** The trail of the transaction that an entity manager runs in; absent outside of a house. */
export function trailOf(em: EntityManager): TrailContext | undefined {
  return contexts.get(em);
}

/** Opens the trail of one transaction. */
export function openTrail(em: EntityManager, actor: TrailActor): TrailContext {
  const context: TrailContext = { actor, acts: [] };
  contexts.set(em, context);
  return context;
}

/** Notes something that no table's row shows, as a file that was taken. */
export function noteAct(em: EntityManager, act: TrailAct): void {
  trailOf(em)?.acts.push(act);
}
