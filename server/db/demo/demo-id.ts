import { createHash } from 'node:crypto';

/** A permanent id for a thing of the demo, from its name: the same in every seeded database. */
export function demoId(name: string): string {
  const hex = createHash('sha256').update(`colophon demo: ${name}`).digest('hex');
  // Version 8 (own making) and the usual variant, as RFC 9562 has it.
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-8${hex.slice(13, 16)}-a${hex.slice(17, 20)}-${hex.slice(20, 32)}`;
}
