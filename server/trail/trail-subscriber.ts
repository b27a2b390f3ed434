import type { ChangeSet, EventSubscriber, FlushEventArgs } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import { hashOf } from './chain.ts';
import { sayChanges } from './say-changes.ts';
import { trailOf, type TrailAct } from './trail-context.ts';

type Row = Readonly<Record<string, unknown>>;

interface Kind {
  readonly kind: string;
  /** What the record is called in a sentence. */
  readonly name: (row: Row) => string;
  readonly product?: (row: Row) => string | null;
}

const text = (value: unknown): string => (typeof value === 'string' ? value : '');

/** Records whose changes are told. A table that is only the echo of another is left out with its reason. */
const KINDS: Readonly<Record<string, Kind>> = {
  Product: { kind: 'product', name: (row) => text(row['name']), product: (row) => text(row['id']) },
  Material: { kind: 'material', name: (row) => text(row['tradeName']) },
  MaterialDocument: { kind: 'paper of a material', name: (row) => text(row['fileName']) },
  ProductEvidence: { kind: 'evidence paper', name: (row) => text(row['fileName']), product: (row) => text(row['productId']) },
  HousePicture: { kind: 'picture', name: (row) => text(row['name']) },
  House: { kind: 'house', name: (row) => text(row['name']) },
  Membership: { kind: 'membership', name: (row) => text(row['personId']) },
};
/** Echoes: the uses of materials and the revisions follow from the product's own change. */
const ECHOES: ReadonlySet<string> = new Set(['ProductMaterial', 'ProductRevision', 'Person']);

/** The record as the table holds it, JSON columns read. */
function plain(row: object | undefined): Row {
  const out: Record<string, unknown> = {};
  for (const [key, value] of Object.entries(row ?? {})) {
    if (key.startsWith('__')) continue;
    out[key] = value instanceof Date ? value.toISOString() : typeof value === 'string' && /^[[{]/.test(value) ? readJson(value) : value;
  }
  return out;
}

function readJson(value: string): unknown {
  try {
    return JSON.parse(value) as unknown;
  } catch {
    return value;
  }
}

const ACTS: Readonly<Record<string, string>> = { create: 'added', update: 'saved', delete: 'removed', delete_early: 'removed' };

function actOf(change: ChangeSet<object>): TrailAct | null {
  const name = change.name;
  if (ECHOES.has(name)) return null;
  const kind = KINDS[name] ?? { kind: name.replaceAll(/(?!^)([A-Z])/g, (letter) => ` ${letter.toLowerCase()}`).toLowerCase(), name: (row: Row) => text(row['name']) || text(row['id']) };
  const before = plain(change.originalEntity);
  const after = { ...before, ...plain(change.payload), ...(change.type === 'create' ? plain(change.entity) : {}) };
  const isGone = change.type === 'delete' || change.type === 'delete_early';
  const row = isGone ? { ...plain(change.entity), ...before } : after;
  const { draft: draftBefore, particulars: particularsBefore, ...ownBefore } = before;
  const { draft: draftAfter, particulars: particularsAfter, ...ownAfter } = after;
  // A product's draft and a house's particulars are its content, not a part of it.
  const flatBefore = { ...ownBefore, ...(draftBefore as object), ...(particularsBefore as object) };
  const flatAfter = { ...ownAfter, ...(draftAfter as object), ...(particularsAfter as object) };
  const putAway = change.type === 'update' && before['archived'] !== after['archived'];
  return {
    act: putAway ? (after['archived'] === true ? 'put away' : 'put back') : ACTS[change.type]!,
    subjectKind: kind.kind,
    subjectId: text(row['id']) || null,
    subject: kind.name(row),
    productId: kind.product?.(row) ?? null,
    changes: change.type === 'update' ? sayChanges(flatBefore, flatAfter) : [],
    recordHash: isGone ? null : hashOf(after),
  };
}

/** Listens to every write of the mapper and notes it in the trail of its transaction. */
export class TrailSubscriber implements EventSubscriber {
  onFlush(args: FlushEventArgs): void {
    const trail = trailOf(args.em as EntityManager);
    if (!trail) return;
    for (const change of args.uow.getChangeSets()) {
      const act = actOf(change as ChangeSet<object>);
      if (act) trail.acts.push(act);
    }
  }
}
