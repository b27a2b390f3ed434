/** One measured promise. */
export interface Row {
  readonly name: string;
  /** Median or percentile as measured, with its unit: `0.41 ms`. */
  readonly measured: string;
  /** A ratio taken within this run, where the promise is one: `6.2 ×`. */
  readonly ratio?: string;
  readonly promise: string;
  readonly isKept: boolean;
}

export function median(values: readonly number[]): number {
  return quantile(values, 0.5);
}

/** The value below which `share` of the measurements lie (nearest rank). */
export function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))]!;
}

/** Runs `work` often enough to be warm, then times it; milliseconds. */
export async function time(work: () => unknown, { warm = 20, runs = 60 } = {}): Promise<number[]> {
  for (let index = 0; index < warm; index += 1) await work();
  const times: number[] = [];
  for (let index = 0; index < runs; index += 1) {
    const start = performance.now();
    await work();
    times.push(performance.now() - start);
  }
  return times;
}

/**
 * Times several kinds of work in turns, so that whatever else the machine does falls on all of
 * them alike; milliseconds of each, medians are fair to compare.
 */
export function timeInTurns(works: readonly (() => unknown)[], { warm = 300, turns = 200 } = {}): number[][] {
  for (const work of works) for (let index = 0; index < warm; index += 1) work();
  const times = works.map((): number[] => []);
  for (let turn = 0; turn < turns; turn += 1) {
    works.forEach((work, index) => {
      // The first call after another kind of work finds cold caches: it is not counted.
      work();
      const start = performance.now();
      work();
      times[index]!.push(performance.now() - start);
    });
  }
  return times;
}

export const ms = (value: number): string => `${value < 10 ? value.toFixed(3) : value.toFixed(1)} ms`;
export const times = (value: number): string => `${value.toFixed(1)} ×`;

export function asTable(rows: readonly Row[]): string {
  const cells = [['what', 'measured', 'ratio', 'promise', ''], ...rows.map((row) => [row.name, row.measured, row.ratio ?? '', row.promise, row.isKept ? 'kept' : 'NOT KEPT'])];
  const widths = cells[0]!.map((_, column) => Math.max(...cells.map((line) => line[column]!.length)));
  return cells.map((line) => line.map((cell, column) => cell.padEnd(widths[column]!)).join('  ')).join('\n');
}
