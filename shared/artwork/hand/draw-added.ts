import qrcode from 'qrcode-generator';
import type { AddedElement, HandFrame } from '#shared/contracts/by-hand.ts';
import type { Box, Item, Micrometres, PathStep } from '../scene.ts';

/** Share of a radius at which the handles of a quarter circle stand, in millionths (4/3 · tan 22.5°). */
const QUARTER = 552_285;
/** Clear modules around a QR code: ISO/IEC 18004, 6.3.8. */
const QUIET_MODULES = 4;

/** An oval that fills a frame, as four curves. */
function ovalSteps({ x, y, width, height }: HandFrame): PathStep[] {
  const [a, b] = [width / 2, height / 2];
  const [mx, my] = [x + a, y + b];
  const [ka, kb] = [(a * QUARTER) / 1e6, (b * QUARTER) / 1e6];
  const curve = (...figures: number[]): PathStep => ['C', ...figures.map(Math.round)] as unknown as PathStep;
  return [
    ['M', Math.round(mx), y],
    curve(mx + ka, y, x + width, my - kb, x + width, my), curve(x + width, my + kb, mx + ka, y + height, mx, y + height),
    curve(mx - ka, y + height, x, my + kb, x, my), curve(x, my - kb, mx - ka, y, mx, y), ['Z'],
  ];
}

function boxSteps({ x, y, width, height }: HandFrame): PathStep[] {
  return [['M', x, y], ['L', x + width, y], ['L', x + width, y + height], ['L', x, y + height], ['Z']];
}

/** Readers guess at letters beyond ASCII: in an address they are written in its own escapes (RFC 3986, 2.1). */
function plainAddress(text: string): string {
  return /^[a-z][a-z0-9+.-]*:/i.test(text) ? text.replace(/[^\x21-\x7e]/gu, encodeURIComponent) : text;
}

/** The bytes of a text in UTF-8, by the escapes that every engine of the language knows. */
function toUtf8(text: string): number[] {
  return Array.from(encodeURIComponent(text).matchAll(/%([0-9A-F]{2})|(.)/g), ([, hex, letter]) => (hex === undefined ? letter!.charCodeAt(0) : parseInt(hex, 16)));
}

export interface DrawnCode {
  readonly items: readonly Item[];
  /** Edge of one module. */
  readonly module: Micrometres;
}

/**
 * A QR code in the upper left of its frame, as large as it holds with its quiet zone: dark
 * modules of one row joined to bars. UTF-8, error correction M (ISO/IEC 18004).
 */
export function drawCode(added: Extract<AddedElement, { kind: 'code' }>): DrawnCode {
  qrcode.stringToBytes = toUtf8;
  const code = qrcode(0, 'M');
  code.addData(plainAddress(added.text), 'Byte');
  code.make();
  const count = code.getModuleCount();
  const { frame } = added;
  const module = Math.floor(Math.min(frame.width, frame.height) / (count + 2 * QUIET_MODULES));
  const [left, top] = [frame.x + QUIET_MODULES * module, frame.y + QUIET_MODULES * module];
  const boxes: Box[] = [];
  for (let row = 0; row < count; row += 1) {
    for (let column = 0; column < count; ) {
      let end = column;
      while (end < count && code.isDark(row, end)) end += 1;
      if (end > column) boxes.push({ x: left + column * module, y: top + row * module, width: (end - column) * module, height: module });
      column = end + 1;
    }
  }
  return { items: [{ kind: 'boxes', element: 'code', ink: added.style.ink ?? 'black', boxes, own: added.id }], module };
}

/** A drawing of the house's own: a rule, a box or an oval. */
export function drawShape(added: Extract<AddedElement, { kind: 'rule' | 'box' | 'oval' }>): Item {
  const common = { element: 'drawing', ink: added.style.ink ?? 'ink', own: added.id } as const;
  if (added.kind === 'rule') return { kind: 'boxes', ...common, boxes: [added.frame] };
  const steps = added.kind === 'box' ? boxSteps(added.frame) : ovalSteps(added.frame);
  return added.stroke === undefined
    ? (added.kind === 'box' ? { kind: 'boxes', ...common, boxes: [added.frame] } : { kind: 'path', ...common, steps })
    : { kind: 'path', ...common, steps, stroke: added.stroke };
}
