import { expect, test } from 'vitest';
import { role as roleSchema, type Role } from '#shared/contracts/session.contract.ts';
import { can, THINGS, type Thing } from '#shared/policies/can.ts';

/** What each role may change, written a second time by hand: a change of the policy must be made twice. */
const EDITS: Readonly<Record<Role, readonly Thing[]>> = {
  owner: ['house', 'materials', 'products', 'labels'],
  formulator: ['materials', 'products', 'labels'],
  assessor: [],
  artworker: ['labels'],
  seller: [],
};

test.each(roleSchema.options)('%s reads everything of the house', (role) => {
  expect(THINGS.filter((thing) => can({ roles: [role] }, 'read', thing))).toEqual(THINGS);
});

test.each(roleSchema.options)('%s changes what the table says and nothing else', (role) => {
  expect(THINGS.filter((thing) => can({ roles: [role] }, 'edit', thing))).toEqual(EDITS[role]);
});

test('several roles add up', () => {
  expect(can({ roles: ['seller', 'artworker'] }, 'edit', 'labels')).toBe(true);
  expect(can({ roles: ['seller', 'artworker'] }, 'edit', 'products')).toBe(false);
});

test('without a role nothing is allowed', () => {
  expect(THINGS.some((thing) => can({ roles: [] }, 'read', thing) || can({ roles: [] }, 'edit', thing))).toBe(false);
});
