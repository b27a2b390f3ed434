import { renderLabelInput } from '#server/artwork/render-label.ts';
import { layOutLabel } from '#shared/artwork/layout.ts';
import { plexMetrics } from '#shared/artwork/plex-metrics.ts';
import { bodyWash, listOf } from '#tests/shared/artwork/samples.ts';

export interface LabelBenchRow {
  readonly name: string;
  readonly figure: number;
  readonly unit: 'ms' | 'KB';
  /** What it must not exceed. */
  readonly most: number;
}

const ROUNDS = 30;
const median = (figures: readonly number[]): number => [...figures].sort((a, b) => a - b)[Math.floor(figures.length / 2)]!;

async function timed(work: () => unknown): Promise<number> {
  const times: number[] = [];
  for (let i = 0; i < ROUNDS + 3; i += 1) {
    const from = performance.now();
    await work();
    if (i >= 3) times.push(performance.now() - from);
  }
  return median(times);
}

/** Medians of the label's layout and press file, warm. */
export async function runLabelBench(): Promise<LabelBenchRow[]> {
  const long = { ...bodyWash, ingredients: { heading: 'Ingredients', body: listOf(40) } };
  const rendered = await renderLabelInput(bodyWash, '2026-12-01');
  const size = 'pdf' in rendered ? rendered.pdf.length / 1024 : Infinity;
  return [
    { name: 'label: layout, 13 ingredients', figure: await timed(() => layOutLabel(bodyWash, plexMetrics)), unit: 'ms', most: 16 },
    { name: 'label: layout, 40 ingredients', figure: await timed(() => layOutLabel(long, plexMetrics)), unit: 'ms', most: 100 },
    { name: 'label: press file, warm', figure: await timed(() => renderLabelInput(bodyWash, '2026-12-01')), unit: 'ms', most: 100 },
    { name: 'label: press file size', figure: size, unit: 'KB', most: 25 },
  ];
}
