import type { Readable } from 'node:stream';

/** Where a command reads and writes: results on one side, words for people on the other. */
export interface Io {
  readonly stdin: Readable;
  /** Writes to standard output and waits until there is room for more. */
  write(text: string): Promise<void>;
  /** One line for people, on standard error. */
  tell(line: string): void;
}

export const standardIo: Io = {
  stdin: process.stdin,
  write: (text) =>
    new Promise((resolve) => {
      if (process.stdout.write(text)) resolve();
      else process.stdout.once('drain', resolve);
    }),
  tell: (line) => void process.stderr.write(`${line}\n`),
};
