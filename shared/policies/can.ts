import type { Role } from '#shared/contracts/session.contract.ts';

/** What a right is about. `labels` is the label part of a product; `downloads` are files made from one. */
export type Thing = 'house' | 'materials' | 'products' | 'labels' | 'downloads' | 'law' | 'trail';
export type Verb = 'read' | 'edit';
/** One right, as a route declares it. */
export type Right = readonly [verb: Verb, thing: Thing];

/** Who asks: the roles held in the house now open. */
export interface Actor {
  readonly roles: readonly Role[];
}

export const THINGS: readonly Thing[] = ['house', 'materials', 'products', 'labels', 'downloads', 'law', 'trail'];

const READ_ALL: Readonly<Record<Thing, readonly Verb[]>> = {
  house: ['read'],
  materials: ['read'],
  products: ['read'],
  labels: ['read'],
  downloads: ['read'],
  law: ['read'],
  trail: ['read'],
};

/**
 * The one table of what each role may do. Everyone in a house reads its work: a seller
 * needs the label and the report, an assessor needs the whole formula.
 */
const RIGHTS: Readonly<Record<Role, Readonly<Record<Thing, readonly Verb[]>>>> = {
  owner: { house: ['read', 'edit'], materials: ['read', 'edit'], products: ['read', 'edit'], labels: ['read', 'edit'], downloads: ['read'], law: ['read'], trail: ['read'] },
  formulator: { ...READ_ALL, materials: ['read', 'edit'], products: ['read', 'edit'], labels: ['read', 'edit'] },
  assessor: READ_ALL,
  artworker: { ...READ_ALL, labels: ['read', 'edit'] },
  seller: READ_ALL,
};

/** Whether someone may do a thing: true where any role held allows it. The server refuses by it, the screens hide by it. */
export function can(actor: Actor, verb: Verb, thing: Thing): boolean {
  return actor.roles.some((role) => RIGHTS[role][thing].includes(verb));
}
