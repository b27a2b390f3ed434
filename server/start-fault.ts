import { ConfigurationError } from './env.ts';

/** A reason not to start, in a sentence that says what to do. */
export class StartFault extends Error {
  constructor(sentence: string) {
    super(sentence);
    this.name = 'StartFault';
  }
}

/**
 * Runs a program's start. A fault that the reader can put right is told in its own sentence,
 * which whoever started the program finds behind these words; any other keeps its trace.
 */
export async function startOrTell(start: () => Promise<void>): Promise<void> {
  try {
    await start();
  } catch (error) {
    const isKnown = error instanceof StartFault || error instanceof ConfigurationError;
    process.stderr.write(isKnown ? `Colophon cannot start: ${error.message}\n` : `${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`);
    process.exit(1);
  }
}
