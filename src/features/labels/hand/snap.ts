import type { HandFrame } from '#shared/contracts/by-hand.ts';
import type { Scene } from '#shared/artwork/scene.ts';

/** A line that edges and middles are drawn to: `x` stands upright, `y` lies. Micrometres. */
export interface SnapLine {
  readonly axis: 'x' | 'y';
  readonly at: number;
}

/** Edges and middles of the sheet, its safe room, its panels and the other things. */
export function snapLines(scene: Scene, others: readonly HandFrame[]): readonly SnapLine[] {
  const lines: SnapLine[] = [];
  const add = (frame: HandFrame, middles = true): void => {
    lines.push({ axis: 'x', at: frame.x }, { axis: 'x', at: frame.x + frame.width }, { axis: 'y', at: frame.y }, { axis: 'y', at: frame.y + frame.height });
    if (middles) lines.push({ axis: 'x', at: frame.x + Math.round(frame.width / 2) }, { axis: 'y', at: frame.y + Math.round(frame.height / 2) });
  };
  add({ x: 0, y: 0, ...scene.trim });
  add(scene.safe);
  scene.panels.forEach((panel) => add(panel));
  others.forEach((frame) => add(frame));
  return lines;
}

export interface Snapped {
  readonly dx: number;
  readonly dy: number;
  /** The lines that were met, to be drawn. */
  readonly met: readonly SnapLine[];
}

function nearest(points: readonly number[], lines: readonly SnapLine[], axis: 'x' | 'y', reach: number): { by: number; line: SnapLine } | null {
  let best: { by: number; line: SnapLine } | null = null;
  for (const line of lines) {
    if (line.axis !== axis) continue;
    for (const point of points) {
      const by = line.at - point;
      if (Math.abs(by) <= reach && (!best || Math.abs(by) < Math.abs(best.by))) best = { by, line };
    }
  }
  return best;
}

/** How far a moved frame is drawn to the nearest lines within reach. */
export function snapFrame(frame: HandFrame, lines: readonly SnapLine[], reach: number): Snapped {
  const x = nearest([frame.x, frame.x + Math.round(frame.width / 2), frame.x + frame.width], lines, 'x', reach);
  const y = nearest([frame.y, frame.y + Math.round(frame.height / 2), frame.y + frame.height], lines, 'y', reach);
  return { dx: x?.by ?? 0, dy: y?.by ?? 0, met: [x?.line, y?.line].filter((line) => line !== undefined) };
}

/** How far the pulled sides of a frame are drawn to the nearest lines within reach. */
export function snapSides(frame: HandFrame, handle: string, lines: readonly SnapLine[], reach: number): Snapped {
  const xs = handle.includes('w') ? [frame.x] : handle.includes('e') ? [frame.x + frame.width] : [];
  const ys = handle.includes('n') ? [frame.y] : handle.includes('s') ? [frame.y + frame.height] : [];
  const x = nearest(xs, lines, 'x', reach);
  const y = nearest(ys, lines, 'y', reach);
  return { dx: x?.by ?? 0, dy: y?.by ?? 0, met: [x?.line, y?.line].filter((line) => line !== undefined) };
}
