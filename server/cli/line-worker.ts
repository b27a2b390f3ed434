import { parentPort, workerData } from 'node:worker_threads';
import type { InputLine } from './input.ts';
import { judgeLine } from './judge-line.ts';
import type { WorkerStart } from './line-workers.ts';
import { openKnowledge } from './tables.ts';

/** One of the threads that share a JSON Lines file: batches of lines in, what is said of them out, in order. */
const { flags, today, root } = workerData as WorkerStart;
const knows = openKnowledge(root, today);

parentPort!.on('message', (batch: readonly InputLine[]) => {
  parentPort!.postMessage(batch.map((line) => judgeLine(line, flags, knows)));
});
