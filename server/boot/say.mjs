/**
 * What the starter says, and the one kind of failure it knows: a sentence
 * that tells the reader what to do next. Anything else thrown is a fault of
 * ours and is shown with its trace.
 */

/** A stop with a sentence for the reader; no trace is printed for it. */
export class Stop extends Error {
  /** @param {string} sentence */
  constructor(sentence) {
    super(sentence);
    this.name = 'Stop';
  }
}

// Whoever read our words may leave before we do (a closed terminal, a pipe that ended): no reason to fail.
for (const stream of [process.stdout, process.stderr]) stream.on('error', () => {});

/** @param {string} line */
export function say(line) {
  process.stdout.write(`${line}\n`);
}

/** Says nothing; for callers that only want the work done. */
export function silent() {}

/** Sentences for the faults of disks and ports, whoever met them.
 * @param {unknown} error
 * @param {string} where what was being done, for the reader
 * @returns {Stop | undefined} undefined when the fault is not one of these */
export function explain(error, where) {
  if (error instanceof Stop) return error;
  const code = error && typeof error === 'object' && 'code' in error ? error.code : undefined;
  const path = error && typeof error === 'object' && 'path' in error ? ` (${error.path})` : '';
  switch (code) {
    case 'ENOSPC':
    case 'EDQUOT':
      return new Stop(`The disk is full: ${where}${path}. Free about 1 GB and start again; nothing that was saved is lost.`);
    case 'EACCES':
    case 'EPERM':
      return new Stop(`This account may not write there: ${where}${path}. Start as the owner of that folder, or set COLOPHON_DATA to a folder you may write.`);
    case 'EROFS':
      return new Stop(`The disk is read-only: ${where}${path}. Set COLOPHON_DATA to a folder on a disk that can be written.`);
    case 'EADDRINUSE':
      return new Stop(`The port is taken by another program: ${where}. Set PORT to a free one and start again.`);
    case 'EMFILE':
    case 'ENFILE':
      return new Stop(`Too many files are open on this machine: ${where}. Close some programs, or raise the limit with "ulimit -n 4096", and start again.`);
    default:
      return undefined;
  }
}
