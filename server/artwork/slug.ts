import type { Box, Ink, Micrometres, Scene, Text } from '#shared/artwork/scene.ts';
import { plexMetrics } from '#shared/artwork/plex-metrics.ts';
import { breakParagraph, plainWords } from '#shared/artwork/breaking.ts';
import { textItem } from '#shared/artwork/setting.ts';

/** Room for marks and slug around the bleed. */
export const SLUG: Micrometres = 12_000;
const MARK_LENGTH: Micrometres = 5000;
const MARK_GAP: Micrometres = 1000;
/** 7 pt. */
const SIZE: Micrometres = 2470;
const ROW: Micrometres = 2900;

/** Crop marks: two at each corner, outside the bleed, on the lines of the trim. */
export function cropMarks({ trim, bleed }: Scene): { from: readonly [Micrometres, Micrometres]; to: readonly [Micrometres, Micrometres] }[] {
  const near = bleed + MARK_GAP;
  const far = near + MARK_LENGTH;
  return ([[0, 0, -1, -1], [trim.width, 0, 1, -1], [0, trim.height, -1, 1], [trim.width, trim.height, 1, 1]] as const).flatMap(([x, y, a, b]) => [
    { from: [x + a * near, y] as const, to: [x + a * far, y] as const },
    { from: [x, y + b * near] as const, to: [x, y + b * far] as const },
  ]);
}

function lines(text: string, width: Micrometres): string[] {
  return breakParagraph(plainWords(text, 400), SIZE, width, plexMetrics, true).lines.map((line) => line.map((word) => word.text).join(' '));
}

/** What stands around the bleed, and how far the sheet reaches above the label for it. */
export interface Slug {
  readonly texts: readonly Text[];
  readonly patches: readonly { readonly box: Box; readonly ink: Ink }[];
  readonly above: Micrometres;
}

/** The slug: what the job is above the label, patches of its inks below. Printed on every plate, cut away. */
export function slugOf(scene: Scene, words: { readonly job: string; readonly press: string }): Slug {
  const { trim, bleed } = scene;
  // Words stand beyond the marks, so they may use the whole width of the sheet.
  const x = -bleed - SLUG + 2000;
  const width = trim.width + 2 * (bleed + SLUG) - 4000;
  const rows = [...lines(words.job, width), ...lines(words.press, width)];
  const lowest = -bleed - MARK_GAP - MARK_LENGTH - 900;
  const text = (line: string, at: Micrometres, y: Micrometres): Text => textItem(plexMetrics, { element: 'rule', text: line, weight: 400, size: SIZE, x: at, y, ink: 'all' });
  const texts = rows.map((line, i) => text(line, x, lowest - (rows.length - 1 - i) * ROW));
  const above = Math.max(SLUG, -(lowest - (rows.length - 1) * ROW) - bleed + 3000);
  return { above, ...inkRow(scene, { x, width, y: trim.height + bleed + SLUG - 2200 }, texts, text) };
}

function inkRow(
  scene: Scene, at: { x: Micrometres; width: Micrometres; y: Micrometres }, before: readonly Text[],
  text: (line: string, x: Micrometres, y: Micrometres) => Text,
): { texts: Text[]; patches: { box: Box; ink: Ink }[] } {
  const used = [...new Set(scene.items.map((item) => item.ink))].map((key) => scene.inks[key]!).filter((ink) => ink.cmyk.some((part) => part > 0));
  const texts = [...before];
  const patches: { box: Box; ink: Ink }[] = [];
  let x = at.x;
  for (const ink of [...used, scene.dieLine.ink]) {
    const name = ink.spot ? `${ink.name}, spot` : `${ink.name} ${ink.cmyk.map((part, i) => 'CMYK'[i]! + part).join(' ')}`;
    const patch = ink.spot ? 0 : 3200;
    const length = patch + Math.ceil((plexMetrics.face(400).run(name).advance * SIZE) / 1000);
    if (x + length > at.x + at.width) break;
    if (patch > 0) patches.push({ ink, box: { x, y: at.y - 2300, width: 2400, height: 2400 } });
    texts.push(text(name, x + patch, at.y));
    x += length + 3000;
  }
  return { texts, patches };
}
