import type { ReportModel } from '#shared/report/report-model.ts';
import { BOTTLE, HAIR, INK, INK_2, RIGHT, type Paper, type Sheet, type Type } from './paper.ts';
import { TEXT, type Piece } from './flow.ts';

interface Cell {
  readonly x: number;
  readonly text: string;
  readonly type?: Type;
  readonly measure?: number;
}

/** One row with a rule under it; cells wrap inside their measure. */
export function row(paper: Paper, cells: readonly Cell[], rule: { weight: number; color: typeof INK } = { weight: 0.5, color: HAIR }): Piece {
  const wrapped = cells.map((cell) => ({ ...cell, lines: cell.measure ? paper.wrap(cell.text, cell.measure, cell.type) : [cell.text] }));
  const deepest = Math.max(...wrapped.map((cell) => cell.lines.length));
  const height = deepest * 4.25 + 1.85;
  return {
    height,
    paint(sheet: Sheet, y: number) {
      for (const cell of wrapped) cell.lines.forEach((line, index) => sheet.text(cell.x, y + 4.15 + index * 4.25, line, cell.type));
      if (rule.weight > 0) sheet.line(TEXT, y + height, RIGHT, y + height, rule.weight, rule.color);
    },
  };
}

/** Right edge of the grams column. */
const GRAMS = RIGHT - 24;
const heavy = { weight: 0.75, color: INK };
const head = { face: 'Medium', color: INK_2 } as const;

/** The head of the formula's table. */
export function formulaHead(paper: Paper, formula: ReportModel['formula']): Piece {
  const right = { ...head, align: 'right' as const };
  const grams = formula.isExact ? [{ x: GRAMS, text: 'g', type: right }] : [];
  return { ...row(paper, [{ x: TEXT, text: 'Material', type: head }, ...grams, { x: RIGHT, text: formula.isExact ? '%' : '% of the whole', type: right }], heavy), keepsWithNext: true };
}

/** Names, grams and percent, phase by phase, with the total under a full rule. */
export function formulaTable(paper: Paper, formula: ReportModel['formula']): Piece[] {
  const pieces: Piece[] = [formulaHead(paper, formula)];
  const bodies = formula.phases.filter((phase) => phase.lines.length > 0);
  bodies.forEach((phase, phaseIndex) => {
    pieces.push({ ...row(paper, [{ x: TEXT, text: phase.name, type: { face: 'SemiBold', color: BOTTLE } }]), keepsWithNext: true });
    phase.lines.forEach((line, index) => {
      const isLast = phaseIndex === bodies.length - 1 && index === phase.lines.length - 1;
      const name = row(
        paper,
        [
          { x: TEXT, text: line.name, measure: 84 },
          ...(formula.isExact ? [{ x: GRAMS, text: line.grams, type: { align: 'right' as const } }] : []),
          { x: RIGHT, text: line.percent, type: { align: 'right' } },
        ],
        isLast ? { weight: 1, color: INK } : undefined,
      );
      const noteX = TEXT + paper.width(`${line.name} `);
      pieces.push({
        ...name,
        keepsWithNext: isLast,
        paint(sheet, y, isFirst) {
          name.paint(sheet, y, isFirst);
          if (line.note && noteX < TEXT + 70) sheet.text(noteX, y + 4.15, line.note, { color: INK_2 });
        },
      });
    });
  });
  const bold = { face: 'SemiBold', align: 'right' } as const;
  pieces.push(
    row(paper, [{ x: TEXT, text: 'Sum', type: { face: 'SemiBold' } }, ...(formula.isExact ? [{ x: GRAMS, text: formula.total.grams, type: bold }] : []), { x: RIGHT, text: formula.total.percent, type: bold }], { weight: 0, color: INK }),
  );
  return pieces;
}

export function particularsTable(paper: Paper, rows: ReportModel['particulars']): Piece[] {
  const value = TEXT + 36;
  const rule = TEXT + 108;
  return [
    { ...row(paper, [{ x: TEXT, text: 'Particular', type: head }, { x: value, text: 'On the label', type: head }, { x: rule, text: 'Rule', type: head }], heavy), keepsWithNext: true },
    ...rows.map((item) =>
      row(paper, [
        { x: TEXT, text: item.name, measure: 34 },
        { x: value, text: item.value, measure: 69 },
        { x: rule, text: item.rule, type: { color: INK_2 }, measure: 32 },
      ]),
    ),
  ];
}

/** Three columns to sign by hand. */
export function signOff(): Piece {
  const width = 43;
  return {
    height: 45,
    paint(sheet, y) {
      ['Prepared by', 'Checked by', 'Released by'].forEach((title, column) => {
        const x = TEXT + column * 48.5;
        sheet.text(x, y + 3.2, title, { face: 'SemiBold' });
        ['Signature', 'Name', 'Date'].forEach((label, index) => {
          const at = y + 13 + index * 11.2;
          sheet.line(x, at, x + width, at, 0.5, INK);
          sheet.text(x, at + 3.9, label, { color: INK_2 });
        });
      });
    },
  };
}
