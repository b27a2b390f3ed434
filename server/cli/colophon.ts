import { plainDate, type PlainDate } from '#shared/kernel/plain-date.ts';
import { readArguments, USAGE, type Arguments } from './arguments.ts';
import { Unusable } from './input.ts';
import { standardIo, type Io } from './io.ts';

/** Status of an input that is not usable. */
const UNUSABLE = 2;

/**
 * The product without a browser or a database. Standard output carries only the result;
 * words for people go to standard error.
 * @returns the exit status: 0, 1 where something stops sale or does not fit, 2 for unusable input
 */
export async function runColophon(words: readonly string[], root: string, io: Io = standardIo): Promise<number> {
  const read = readArguments(words);
  if ('mistakes' in read) {
    for (const mistake of read.mistakes) io.tell(mistake);
    io.tell(USAGE);
    return UNUSABLE;
  }
  try {
    return await runCommand(read.arguments, root, io);
  } catch (error) {
    if (!(error instanceof Unusable)) throw error;
    io.tell(error.message);
    return UNUSABLE;
  }
}

async function runCommand(given: Arguments, root: string, io: Io): Promise<number> {
  if (given.command === 'schema') {
    const { writeSchema } = await import('./schema.ts');
    return writeSchema(given.file, io);
  }
  const { openKnowledge } = await import('./tables.ts');
  const knows = openKnowledge(root, today());
  switch (given.command) {
    case 'check': {
      if (given.file.endsWith('.jsonl')) {
        const { checkLines } = await import('./check-lines.ts');
        return checkLines(given, knows, { io, root });
      }
      const { checkFile } = await import('./check.ts');
      return checkFile(given, knows, io);
    }
    case 'label': {
      const { writeLabel } = await import('./label.ts');
      return writeLabel({ ...given, out: given.out! }, knows, io);
    }
    case 'read': {
      const { readList } = await import('./read.ts');
      return readList(given, knows, io);
    }
  }
}

/** The machine's calendar day. */
function today(): PlainDate {
  const now = new Date();
  const two = (value: number): string => `${value}`.padStart(2, '0');
  return plainDate(`${`${now.getFullYear()}`.padStart(4, '0')}-${two(now.getMonth() + 1)}-${two(now.getDate())}`);
}
