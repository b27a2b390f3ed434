import type { Arguments } from './arguments.ts';
import type { Knowledge } from './check.ts';
import { readLines, type InputLine } from './input.ts';
import type { Io } from './io.ts';
import { judgeLine, type JudgedLine } from './judge-line.ts';
import { BATCHES_EACH, LineWorkers, usefulWorkers } from './line-workers.ts';

/** Lines that are judged before other threads are worth their start. */
const FIRST_LINES = 32;
/** A batch ends with whichever comes first. */
const BATCH_LINES = 16;
const BATCH_LETTERS = 512 * 1024;

/** Where a run reads its tables and writes its answers, and how many threads it may start (by default as many as are useful). */
export interface Surroundings {
  readonly io: Io;
  readonly root: string;
  readonly workers?: number;
}

/**
 * `check` of a JSON Lines file: one result a line, in order; an unusable line is answered in its
 * place. A long file is shared among threads; only a few batches are ever under way, so that
 * memory stays flat however long the file and however slow the reader.
 */
export async function checkLines(given: Arguments, knows: Knowledge, { io, root, workers }: Surroundings): Promise<number> {
  let status = 0;
  const answer = async (lines: readonly JudgedLine[]): Promise<void> => {
    for (const line of lines) {
      if (line.status > status) status = line.status;
      line.tells.forEach((words) => io.tell(words));
    }
    await io.write(lines.map(({ text }) => text).join(''));
  };
  let pool: LineWorkers | undefined;
  const underWay: Promise<readonly JudgedLine[]>[] = [];
  const count = workers ?? usefulWorkers();
  try {
    let seen = 0;
    for await (const batch of batchesOf(usable(readLines(given.file, io.stdin)))) {
      if (seen < FIRST_LINES || count === 0) {
        for (const line of batch) await answer([judgeLine(line, given, knows)]);
        seen += batch.length;
        continue;
      }
      pool ??= new LineWorkers(count, { flags: given, knows, root });
      underWay.push(pool.judge(batch));
      if (underWay.length >= count * BATCHES_EACH) await answer(await underWay.shift()!);
    }
    for (const judged of underWay) await answer(await judged);
  } finally {
    await pool?.close();
  }
  return status;
}

async function* usable(lines: AsyncIterable<InputLine>): AsyncGenerator<InputLine> {
  for await (const line of lines) if (line.text === null || line.text.trim() !== '') yield line;
}

async function* batchesOf(lines: AsyncIterable<InputLine>): AsyncGenerator<readonly InputLine[]> {
  let batch: InputLine[] = [];
  let letters = 0;
  for await (const line of lines) {
    batch.push(line);
    letters += line.text?.length ?? 0;
    if (batch.length < BATCH_LINES && letters < BATCH_LETTERS) continue;
    yield batch;
    batch = [];
    letters = 0;
  }
  if (batch.length > 0) yield batch;
}
