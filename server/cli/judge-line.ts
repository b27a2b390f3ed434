import type { Fault } from '#shared/contracts/formula-document.ts';
import { checkDocument, readDocument, stopsSale, type Flags, type Knowledge } from './check.ts';
import { Unusable, type InputLine } from './input.ts';

/** What is said of one line of a JSON Lines file. */
export interface JudgedLine {
  /** One line of JSON, with its end. */
  readonly text: string;
  /** Words for people. */
  readonly tells: readonly string[];
  /** 1 where something stops sale, 2 where the line is unusable. */
  readonly status: 0 | 1 | 2;
}

/** Judges one line. Whatever is wrong with it is its answer: nothing is thrown, so no line loses another. */
export function judgeLine({ number, text }: InputLine, flags: Flags, knows: Knowledge): JudgedLine {
  try {
    if (text === null) throw new Unusable([{ pointer: '', message: 'This line is longer than can be read.' }]);
    const result = checkDocument(readDocument(text, flags, knows), flags, knows);
    return { text: `${JSON.stringify(result)}\n`, tells: [], status: stopsSale(result) ? 1 : 0 };
  } catch (error) {
    const faults: readonly Fault[] = error instanceof Unusable ? error.faults : [{ pointer: '', message: `This document could not be judged: ${error instanceof Error ? error.message : 'unknown reason'}` }];
    return {
      text: `${JSON.stringify({ document: 'error/1', line: number, faults })}\n`,
      tells: faults.map(({ pointer, message }) => `line ${number}: ${pointer || '/'}: ${message}`),
      status: 2,
    };
  }
}
