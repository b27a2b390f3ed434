import type { Arguments } from './arguments.ts';
import type { Knowledge } from './check.ts';
import { Unusable } from './input.ts';
import type { Io } from './io.ts';

/** `read`: not built yet; says so instead of guessing. @throws Unusable always */
export function readList(_given: Arguments, _knows: Knowledge, _io: Io): Promise<number> {
  return Promise.reject(new Unusable([{ pointer: '', message: 'Reading a pasted list is not possible yet.' }]));
}
