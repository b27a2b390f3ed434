import { join } from 'node:path';
import { readEntries } from './tables.ts';

/** The dictionary of data/dictionary as one text that is read faster than its tables; it is made with the bundle, and is only used beside it. */
export function packDictionary(root: string): string {
  return JSON.stringify(readEntries(join(root, 'data/dictionary')));
}
