import { createReadStream, readFileSync, statSync } from 'node:fs';
import type { Readable } from 'node:stream';
import { StringDecoder } from 'node:string_decoder';
import type { Fault } from '#shared/contracts/formula-document.ts';

/** Largest single document, and largest line of a JSON Lines file, in bytes. */
export const LARGEST_INPUT = 32 * 1024 * 1024;

/** An input that is not usable, with every fault. */
export class Unusable extends Error {
  override readonly name = 'Unusable';
  readonly faults: readonly Fault[];
  constructor(faults: readonly Fault[]) {
    super(faults.map(({ pointer, message }) => `${pointer || '/'}: ${message}`).join('\n'));
    this.faults = faults;
  }
}

function unusable(message: string): Unusable {
  return new Unusable([{ pointer: '', message }]);
}

/** Reads a whole file, or standard input for `-`. @throws Unusable when it cannot be read or is too large */
export async function readText(file: string, stdin: Readable): Promise<string> {
  if (file === '-') return decode(await gather(stdin));
  try {
    if (statSync(file).size > LARGEST_INPUT) throw unusable(`The file is larger than ${LARGEST_INPUT / 1024 / 1024} MB.`);
    return decode(readFileSync(file));
  } catch (error) {
    if (error instanceof Unusable) throw error;
    throw unusable(`The file ${file} cannot be read (${error instanceof Error && 'code' in error ? String(error.code) : 'unknown reason'}).`);
  }
}

async function gather(stream: Readable): Promise<Buffer> {
  const chunks: Buffer[] = [];
  let size = 0;
  for await (const chunk of stream) {
    const bytes = Buffer.from(chunk as Uint8Array);
    size += bytes.length;
    if (size > LARGEST_INPUT) throw unusable(`The input is larger than ${LARGEST_INPUT / 1024 / 1024} MB.`);
    chunks.push(bytes);
  }
  return Buffer.concat(chunks);
}

function decode(bytes: Uint8Array): string {
  try {
    // Drops a byte-order mark and refuses what is not UTF-8.
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    throw unusable('The text is not written in UTF-8.');
  }
}

/** Parses JSON text. @throws Unusable when it is none */
export function parseJson(text: string): unknown {
  const plain = text.startsWith('\uFEFF') ? text.slice(1) : text;
  try {
    return JSON.parse(plain) as unknown;
  } catch (error) {
    // Nesting deeper than the parser's stack ends in a RangeError: as unusable as a syntax error.
    const reason = error instanceof SyntaxError ? error.message.replace(/\s+/g, ' ').slice(0, 200) : 'it is nested too deeply';
    throw unusable(`This is not JSON: ${reason}`);
  }
}

/** One line of a JSON Lines file; `text` is `null` where it is longer than can be read. */
export interface InputLine {
  readonly number: number;
  readonly text: string | null;
}

/** The lines of a file or of standard input, one at a time, in flat memory. */
export async function* readLines(file: string, stdin: Readable): AsyncGenerator<InputLine> {
  const stream = file === '-' ? stdin : createReadStream(file);
  const decoder = new StringDecoder('utf8');
  let rest = '';
  let isTooLong = false;
  let number = 0;
  const finish = (text: string): InputLine => {
    number += 1;
    const line = { number, text: isTooLong ? null : number === 1 && text.startsWith('\uFEFF') ? text.slice(1) : text };
    isTooLong = false;
    return line;
  };
  for await (const chunk of stream) {
    const pieces = (rest + decoder.write(Buffer.from(chunk as Uint8Array))).split('\n');
    rest = pieces.pop()!;
    for (const piece of pieces) yield finish(piece);
    if (rest.length > LARGEST_INPUT) {
      rest = '';
      isTooLong = true;
    }
  }
  rest += decoder.end();
  if (rest !== '' || isTooLong) yield finish(rest);
}
