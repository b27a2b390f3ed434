import { existsSync } from 'node:fs';
import { availableParallelism } from 'node:os';
import { Worker } from 'node:worker_threads';
import type { PlainDate } from '#shared/kernel/plain-date.ts';
import type { Flags, Knowledge } from './check.ts';
import type { InputLine } from './input.ts';
import { judgeLine, type JudgedLine } from './judge-line.ts';

/** What a worker is told when it starts. */
export interface WorkerStart {
  readonly flags: Flags;
  readonly today: PlainDate;
  readonly root: string;
}

/** Batches that each worker has before it or in hand: one to work on, one to go on with. */
export const BATCHES_EACH = 2;

/**
 * What a thread's memory may grow to, in megabytes: the tables and a batch need a fraction of it.
 * Left alone a thread takes what the machine has before it clears up. One that needs more ends,
 * and its batches are judged without it.
 */
const LIMITS = { maxOldGenerationSizeMb: 384, maxYoungGenerationSizeMb: 48 } as const;

interface Waiting {
  readonly batch: readonly InputLine[];
  readonly settle: (judged: readonly JudgedLine[]) => void;
}

/** A thread and what it has before it, the oldest first. */
interface Thread {
  readonly worker: Worker;
  readonly waiting: Waiting[];
}

/** Threads that judge batches of lines; a batch whose thread ends is judged here instead. */
export class LineWorkers {
  readonly #knows: Knowledge;
  readonly #flags: Flags;
  readonly #workers: Thread[];

  constructor(count: number, start: { readonly flags: Flags; readonly knows: Knowledge; readonly root: string }, file: URL = WORKER) {
    const { flags, knows, root } = start;
    this.#knows = knows;
    this.#flags = flags;
    this.#workers = Array.from({ length: count }, () => this.#open(file, { flags: { markets: flags.markets, ...(flags.placed && { placed: flags.placed }), ...(flags.available && { available: flags.available }) }, today: knows.today, root }));
  }

  #open(file: URL, workerData: WorkerStart): Thread {
    const worker = new Worker(file, { workerData, resourceLimits: LIMITS });
    const one: Thread = { worker, waiting: [] };
    worker.on('message', (judged: readonly JudgedLine[]) => one.waiting.shift()!.settle(judged));
    worker.on('error', () => this.#lose(one));
    worker.on('exit', () => this.#lose(one));
    return one;
  }

  #lose(one: Thread): void {
    const at = this.#workers.indexOf(one);
    if (at >= 0) this.#workers.splice(at, 1);
    for (const { batch, settle } of one.waiting.splice(0)) settle(this.#judgeHere(batch));
  }

  #judgeHere(batch: readonly InputLine[]): JudgedLine[] {
    return batch.map((line) => judgeLine(line, this.#flags, this.#knows));
  }

  /** What is said of each line, in their order. Never rejects. */
  judge(batch: readonly InputLine[]): Promise<readonly JudgedLine[]> {
    const free = this.#workers.reduce<Thread | undefined>((least, one) => (!least || one.waiting.length < least.waiting.length ? one : least), undefined);
    if (!free) return Promise.resolve(this.#judgeHere(batch));
    return new Promise((settle) => {
      free.waiting.push({ batch, settle });
      free.worker.postMessage(batch);
    });
  }

  async close(): Promise<void> {
    await Promise.all(this.#workers.splice(0).map(({ worker }) => worker.terminate()));
  }
}

const WORKER = new URL('./line-worker.mjs', import.meta.url);

/** How many threads are worth starting: none on a machine of one core, nor where the worker was not bundled. */
export function usefulWorkers(): number {
  const cores = availableParallelism();
  return cores < 2 || !existsSync(WORKER) ? 0 : Math.min(cores, 8);
}
