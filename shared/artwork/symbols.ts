import type { Micrometres, PathStep } from './scene.ts';

/** A drawing on a unit square of 1000, of our own; `stroke` absent means filled. */
interface Stroke {
  readonly steps: readonly (readonly [string, ...number[]])[];
  readonly filled?: boolean;
}
export interface Drawing {
  /** Width for a height of 1000. */
  readonly width: number;
  readonly strokes: readonly Stroke[];
}

/** Open jar: the period after opening (Regulation (EC) No 1223/2009, Annex VII, point 2). The months stand inside. */
export const openJar: Drawing = {
  width: 830,
  strokes: [
    { steps: [['M', 55, 460], ['L', 55, 900], ['C', 55, 957, 83, 985, 140, 985], ['L', 690, 985], ['C', 747, 985, 775, 957, 775, 900], ['L', 775, 460]] },
    { steps: [['M', 20, 400], ['L', 810, 400], ['L', 810, 460], ['L', 20, 460], ['Z']] },
    { steps: [['M', 70, 245], ['L', 775, 20], ['L', 805, 115], ['L', 100, 340], ['Z']] },
  ],
};

/** Hourglass: the date of minimum durability (Annex VII, point 3). */
export const hourglass: Drawing = {
  width: 620,
  strokes: [
    { steps: [['M', 40, 40], ['L', 580, 40]] },
    { steps: [['M', 40, 960], ['L', 580, 960]] },
    { steps: [['M', 100, 40], ['C', 100, 280, 280, 400, 280, 500], ['C', 280, 600, 100, 720, 100, 960]] },
    { steps: [['M', 520, 40], ['C', 520, 280, 340, 400, 340, 500], ['C', 340, 600, 520, 720, 520, 960]] },
    { filled: true, steps: [['M', 170, 900], ['C', 180, 800, 250, 740, 310, 690], ['C', 370, 740, 440, 800, 450, 900], ['Z']] },
    { filled: true, steps: [['M', 215, 300], ['L', 405, 300], ['C', 380, 350, 340, 400, 310, 460], ['C', 280, 400, 240, 350, 215, 300], ['Z']] },
  ],
};

/** Hand pointing into an open book: enclosed or attached information (Annex VII, point 1). */
export const handInBook: Drawing = {
  width: 1300,
  strokes: [
    { steps: [['M', 650, 320], ['C', 520, 220, 300, 200, 60, 250], ['L', 60, 900], ['C', 300, 850, 520, 870, 650, 970], ['C', 780, 870, 1000, 850, 1240, 900], ['L', 1240, 560]] },
    { steps: [['M', 650, 320], ['L', 650, 970]] },
    { steps: [['M', 650, 320], ['C', 700, 285, 760, 262, 820, 248]] },
    { steps: [['M', 800, 640], ['C', 770, 660, 740, 620, 765, 595], ['L', 985, 385], ['C', 960, 330, 985, 280, 1040, 240], ['L', 1190, 120], ['L', 1275, 225], ['L', 1150, 330], ['L', 1150, 420], ['C', 1150, 480, 1100, 500, 1050, 460], ['L', 800, 640]] },
    { steps: [['M', 1050, 460], ['C', 1030, 435, 1010, 410, 985, 385]] },
  ],
};

/** A drawing at a height, its upper left corner given: strokes of at least 0.22 mm. */
export function drawSymbol(drawing: Drawing, x: Micrometres, y: Micrometres, height: Micrometres): { steps: PathStep[]; stroke?: Micrometres }[] {
  const stroke = Math.max(220, Math.round(height * 0.034));
  return drawing.strokes.map(({ steps, filled }) => ({
    steps: steps.map(([command, ...figures]) => [command, ...figures.map((figure, i) => (i % 2 === 0 ? x : y) + Math.round((figure * height) / 1000))]) as unknown as PathStep[],
    ...(filled ? {} : { stroke }),
  }));
}
