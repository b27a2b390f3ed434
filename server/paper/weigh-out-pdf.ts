import type { WeighOutModel } from '#shared/report/report-model.ts';
import { BODY_END, BOTTLE, HAIR, INK, INK_2, LEFT, RIGHT, openPaper, type Paper, type Sheet } from './paper.ts';

/** Columns of the weighing table, in millimetres from the paper's left edge. */
const NAME = LEFT + 6;
const NAME_END = LEFT + 62;
const LOT = LEFT + 65;
const LOT_END = LEFT + 87;
const TARGET = LEFT + 105;
const FROM = LEFT + 119;
const TO = LEFT + 133;
const ACTUAL = LEFT + 137;
const ACTUAL_END = LEFT + 162;
const INITIALS = LEFT + 165;
const ROW = 7.95;
const STEP = 7.2;

/** Walks down sheets of weighing rows, opening a new sheet with the table's head where one is full. */
interface Walk {
  sheet: Sheet;
  y: number;
}

function tableHead(sheet: Sheet, y: number): void {
  const type = { face: 'Medium', color: INK_2 } as const;
  sheet.text(NAME, y, 'Material', type);
  sheet.text(LOT, y, 'Lot number', type);
  sheet.text(TARGET, y, 'Target, g', { ...type, align: 'right' });
  sheet.text(FROM, y, 'from', { ...type, align: 'right' });
  sheet.text(TO, y, 'to', { ...type, align: 'right' });
  sheet.text(ACTUAL, y, 'Actual, g', type);
  sheet.text(INITIALS, y, 'Initials', type);
  sheet.line(LEFT, y + 2.2, NAME_END, y + 2.2, 0.75, INK);
  sheet.line(LOT, y + 2.2, RIGHT, y + 2.2, 0.75, INK);
}

function need(paper: Paper, walk: Walk, height: number): void {
  if (walk.y + height <= BODY_END) return;
  walk.sheet = paper.addSheet();
  tableHead(walk.sheet, 29);
  walk.y = 31.2;
}

const tick = (sheet: Sheet, y: number): void => sheet.box(LEFT, y - 3, 3.4, 3.4, { stroke: INK, weight: 0.75 });

/** The write-on batch sheet: targets with their limits, lots, initials, steps with the temperature asked and read. */
export async function renderWeighOutPdf(model: WeighOutModel, contentHash: string, day: string): Promise<Uint8Array> {
  const paper = await openPaper({
    title: `${model.name}: weigh-out sheet`,
    kind: 'weigh-out sheet',
    house: model.house,
    foot: model.dataRelease,
    contentHash,
    day,
  });
  const walk: Walk = { sheet: paper.addSheet(), y: 30.5 };
  const title = { face: 'SemiBold', size: 24 } as const;
  for (const line of paper.wrap(model.name, 178, title)) {
    walk.sheet.text(LEFT - 0.3, walk.y, line, title);
    walk.y += 7.6;
  }
  metaRow(walk.sheet, walk.y, [['Batch', model.batchCode], ['Size', model.size], ['Made on', ''], ['Scale, and its check today', '']]);
  walk.y += 17.5;
  tableHead(walk.sheet, walk.y);
  walk.y += 2.2;
  for (const phase of model.phases) setPhase(paper, walk, phase);
  need(paper, walk, 30);
  walk.sheet.line(LEFT, walk.y, RIGHT, walk.y, 1, INK);
  walk.sheet.text(NAME, walk.y + 5, 'Sum', { face: 'SemiBold' });
  walk.sheet.text(TARGET, walk.y + 5, model.sum, { face: 'SemiBold', size: 15, align: 'right' });
  walk.sheet.text(TARGET + 6, walk.y + 5, model.makesUp, { color: INK_2 });
  walk.y += 12;
  need(paper, walk, 30);
  checkRows(paper, walk);
  for (const caution of ['Accept from–to: ±1 % of the target, never less than ±0.02 g (house limit; common practice). Outside it: stop, write the deviation overleaf, ask.', ...model.cautions]) {
    const lines = paper.wrap(caution, 178);
    need(paper, walk, lines.length * 4.25 + 1.5);
    lines.forEach((line, index) => walk.sheet.text(LEFT, walk.y + index * 4.25, line, { color: INK_2 }));
    walk.y += lines.length * 4.25 + 1.5;
  }
  return paper.close();
}

function metaRow(sheet: Sheet, y: number, cells: readonly (readonly [string, string])[]): void {
  cells.forEach(([label, value], index) => {
    const x = LEFT + index * 46;
    sheet.line(x, y, x + 40, y, 0.75, INK);
    sheet.text(x, y + 3.9, label, { color: INK_2 });
    sheet.text(x, y + 10, value, { face: 'SemiBold', size: 18 });
  });
}

function setPhase(paper: Paper, walk: Walk, phase: WeighOutModel['phases'][number]): void {
  need(paper, walk, 9 + ROW * 2);
  walk.sheet.text(LEFT, walk.y + 6.6, `${phase.letter}\u2002${phase.name}`, { face: 'SemiBold', size: 13, color: BOTTLE });
  walk.sheet.line(LEFT, walk.y + 9, RIGHT, walk.y + 9, 0.75, INK);
  walk.y += 9;
  for (const line of phase.lines) {
    const names = paper.wrap(line.name, NAME_END - NAME);
    const caution = line.caution ? paper.wrap(line.caution, NAME_END - NAME) : [];
    const height = Math.max(ROW, 3.4 + (names.length + caution.length) * 4.25);
    need(paper, walk, height);
    const { sheet, y } = walk;
    const base = y + 5.6;
    tick(sheet, base);
    names.forEach((name, index) => sheet.text(NAME, base + index * 4.25, name));
    caution.forEach((text, index) => sheet.text(NAME, base + (names.length + index) * 4.25, text, { color: INK_2 }));
    sheet.text(TARGET, base, line.target, { face: 'SemiBold', size: 15, align: 'right' });
    sheet.text(FROM, base, line.from, { color: INK_2, align: 'right' });
    sheet.text(TO, base, line.to, { color: INK_2, align: 'right' });
    sheet.line(LEFT, y + height, NAME_END, y + height, 0.5, HAIR);
    sheet.line(LOT_END, y + height, TO, y + height, 0.5, HAIR);
    sheet.line(LOT, y + height, LOT_END, y + height, 0.75, INK);
    sheet.line(ACTUAL, y + height, ACTUAL_END, y + height, 0.75, INK);
    sheet.line(INITIALS, y + height, RIGHT, y + height, 0.75, INK);
    walk.y += height;
  }
  need(paper, walk, 6);
  walk.sheet.text(NAME, walk.y + 4.9, `Phase ${phase.letter}`, { color: INK_2 });
  walk.sheet.text(TARGET, walk.y + 4.9, phase.total, { face: 'SemiBold', align: 'right' });
  walk.sheet.line(LEFT, walk.y + 7.2, RIGHT, walk.y + 7.2, 0.5, HAIR);
  walk.y += 7.2;
  for (const step of phase.steps) setStep(paper, walk, step);
}

function setStep(paper: Paper, walk: Walk, step: WeighOutModel['phases'][number]['steps'][number]): void {
  const lines = paper.wrap(step.text, TO - NAME);
  const height = Math.max(STEP, 3.2 + lines.length * 4.25);
  need(paper, walk, height);
  const { sheet, y } = walk;
  tick(sheet, y + 4.9);
  lines.forEach((line, index) => sheet.text(NAME, y + 4.9 + index * 4.25, line));
  if (step.unit) {
    const unit = `°${step.unit}`;
    sheet.text(ACTUAL, y + 4.9, step.temperature);
    sheet.text(RIGHT, y + 4.9, unit, { align: 'right', color: INK_2 });
    const end = RIGHT - paper.width(unit) - 1;
    sheet.line(end - 9.5, y + 5.4, end, y + 5.4, 0.75, INK);
    sheet.text(end - 10.5, y + 4.9, 'read', { align: 'right', color: INK_2 });
  }
  sheet.line(LEFT, y + height, RIGHT, y + height, 0.5, HAIR);
  walk.y += height;
}

function checkRows(paper: Paper, walk: Walk): void {
  const rows: readonly (readonly (readonly [string, string])[])[] = [
    [['Appearance, odour', ''], ['pH', ' at 20 °C'], ['Yield', ', g'], ['Retained sample', ', place']],
    [['Bottles filled', ''], ['Labels', ' drawn, used, waste'], ['Weighed by', ', date, time'], ['Checked by', ', date, time']],
  ];
  rows.forEach((cells, index) => {
    const y = walk.y + 4 + index * 13.3;
    cells.forEach(([label, rest], column) => {
      const x = LEFT + column * 46;
      walk.sheet.line(x, y, x + 40, y, 0.75, INK);
      walk.sheet.text(x, y + 3.9, label, { face: 'Medium' });
      walk.sheet.text(x + paper.width(label, { face: 'Medium' }), y + 3.9, rest, { color: INK_2 });
    });
  });
  walk.y += 36;
}
