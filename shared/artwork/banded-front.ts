import { netFoot } from './feet.ts';
import { sizeToFill } from './metrics.ts';
import type { ElementName, Item, Micrometres, Text, Weight } from './scene.ts';
import { breakFor, leadingOf, leastText, strongWeight, textItem, type Job, type Overflow, type Placed, type Setting } from './setting.ts';
import { plainWords } from './breaking.ts';
import { fitTitle } from './title.ts';

/** One line of display type, letterspaced in thousandths of the em. */
interface Line {
  readonly element: ElementName;
  readonly text: string;
  /** The words as they are written, where the line is set in capitals. */
  readonly says?: string;
  readonly weight: Weight;
  readonly size: Micrometres;
  readonly tracking: number;
  readonly ink: string;
  /** Between the base line above and this cap line. */
  readonly gap: Micrometres;
}

export interface BandedBox {
  readonly x: Micrometres;
  readonly width: Micrometres;
  /** Cap line of the first text. */
  readonly top: Micrometres;
  /** Last base line. */
  readonly foot: Micrometres;
}

function trackedAdvance(job: Job, text: string, weight: Weight, tracking: number): number {
  return job.metrics.face(weight).run(text).advance + tracking * Math.max(0, Array.from(text).length - 1);
}

/** A run with room between its letters. */
function trackedItem(job: Job, line: Line, x: Micrometres, y: Micrometres, about?: Micrometres): Text {
  const plain = textItem(job.metrics, { element: line.element, text: line.text, weight: line.weight, size: line.size, x, y, ink: line.ink });
  return {
    ...plain,
    offsets: plain.offsets.map((offset, i) => offset + line.tracking * i),
    advance: plain.advance + line.tracking * Math.max(0, plain.offsets.length - 1),
    ...(about !== undefined && { about }),
    ...(line.says !== undefined && { says: line.says }),
  };
}

function lineLength(job: Job, line: Pick<Line, 'text' | 'weight' | 'size' | 'tracking'>): Micrometres {
  return Math.ceil((trackedAdvance(job, line.text, line.weight, line.tracking) * line.size) / 1000);
}

function rise(job: Job, line: Line): Micrometres {
  return Math.ceil((job.metrics.face(line.weight).capHeight * line.size) / 1000);
}

function stackHeight(job: Job, lines: readonly Line[]): Micrometres {
  return lines.reduce((total, line, i) => total + rise(job, line) + (i > 0 ? line.gap : 0), 0);
}

/** The written words of lines that were set in capitals. */
function spokenLines(lines: readonly string[], written: string): string[] {
  const words = written.split(/\s+/).filter(Boolean);
  let at = 0;
  return lines.map((line) => {
    const count = line.split(/\s+/).filter(Boolean).length;
    at += count;
    return words.slice(at - count, at).join(' ');
  });
}

/** Largest letterspaced title for a width, on up to three lines. */
function fitTracked(job: Job, text: string, face: { weight: Weight; tracking: number }, box: { width: Micrometres; height: Micrometres; most: Micrometres }): { lines: readonly string[]; size: Micrometres } {
  const fitted = fitTitle(text, job.metrics.face(face.weight), { ...box, leading: 1240 });
  const longest = Math.max(1, ...fitted.lines.map((line) => trackedAdvance(job, line, face.weight, face.tracking)));
  return { lines: fitted.lines, size: Math.min(fitted.size, Math.floor((box.width * 1000) / longest)) };
}

export interface BandedStyle {
  readonly align: 'middle' | 'left';
  readonly capitals: boolean;
  readonly name: { readonly weight: Weight; readonly tracking: number; readonly most: Micrometres };
  readonly fn: { readonly weight: Weight; readonly tracking: number; readonly most: Micrometres };
  readonly brand: { readonly tracking: number; readonly most: Micrometres };
}

/** Drawn sizes: capitals between rules, and the calm print under a stitched edge. */
export const FILLET_STYLE = (job: Job): BandedStyle => ({
  align: 'middle', capitals: true,
  name: { weight: 300, tracking: 90, most: Math.round(8400 * job.scale * 1.25) },
  fn: { weight: strongWeight(job), tracking: 160, most: Math.round(3900 * job.scale * 1.2) },
  brand: { tracking: 160, most: Math.round(2700 * job.scale * 1.2) },
});
export const HEADBAND_STYLE = (job: Job): BandedStyle => ({
  align: 'left', capitals: false,
  name: { weight: job.isNorthAmerican ? 700 : 600, tracking: 0, most: Math.round(9600 * job.scale) },
  fn: { weight: job.isNorthAmerican ? 700 : 300, tracking: 0, most: Math.round(9600 * job.scale) },
  brand: { tracking: 0, most: Math.round(3100 * job.scale) },
});

function titleLines(job: Job, style: BandedStyle, box: { width: Micrometres; height: Micrometres }): Line[] {
  const { content } = job;
  const say = (text: string): string => (style.capitals ? text.toLocaleUpperCase('en') : text);
  const leastFn = leastText(job, style.fn.weight);
  const fnText = say(content.functionName);
  const fnSize = fnText === '' ? 0 : Math.max(leastFn, Math.min(style.fn.most, fitTracked(job, fnText, style.fn, { width: box.width, height: Math.max(box.height * 0.32, leastFn * 2), most: style.fn.most }).size));
  const fn = fnText === '' ? { lines: [] as readonly string[], size: 0 } : { ...fitTracked(job, fnText, style.fn, { width: box.width, height: box.height, most: fnSize }), size: fnSize };
  const fnRise = fn.lines.length * Math.round(fn.size * 1.24);
  const name = fitTracked(job, say(content.name), style.name, { width: box.width, height: Math.max(1, box.height - fnRise), most: style.name.most });
  // Name and function in one size where neither gives much away.
  const one = !style.capitals && fn.size > 0 ? Math.min(name.size, fitTracked(job, fnText, style.fn, { width: box.width, height: box.height, most: name.size }).size) : 0;
  const isOne = one > 0 && one * 10 >= name.size * 7 && one * (name.lines.length + fn.lines.length) * 1.18 <= box.height;
  const [nameSize, fnSized] = isOne ? [one, one] : [name.size, fn.size];
  return [
    ...name.lines.map((text, i): Line => ({ element: 'name', text, ...(style.capitals && { says: spokenLines(name.lines, content.name)[i]! }), ...style.name, size: nameSize, ink: 'ink', gap: i === 0 ? 0 : Math.round(nameSize * 0.42) })),
    ...fn.lines.map((text, i): Line => ({ element: 'function', text, ...(style.capitals && { says: spokenLines(fn.lines, content.functionName)[i]! }), ...style.fn, size: fnSized, ink: 'ink', gap: i === 0 ? Math.max(900, Math.round(isOne ? one * 0.36 : nameSize * 0.4)) : Math.round(fnSized * 0.42) })),
  ];
}

function smallLines(job: Job, setting: Setting, width: Micrometres): Line[] {
  const { claim, frontWarnings } = job.content;
  const texts = [...(claim && setting.claim ? [{ element: 'claim' as const, text: claim }] : []), ...frontWarnings.map((text) => ({ element: 'warnings' as const, text }))];
  return texts.flatMap(({ element, text }) =>
    breakFor(job, plainWords(text, 400), setting.size, width, true).lines.map((line, i): Line => ({
      element, text: line.map((word) => word.text).join(' '), weight: 400, size: setting.size, tracking: 0, ink: 'black',
      gap: i === 0 ? Math.round(setting.size * (setting.tight === 2 ? 0.8 : 1.2)) : leadingOf(setting) - Math.round(setting.size * 0.698),
    })),
  );
}

function brandLines(job: Job, style: BandedStyle, width: Micrometres): Line[] {
  if (!job.content.brand) return [];
  const text = style.capitals ? job.content.brand.toLocaleUpperCase('en') : job.content.brand;
  const least = leastText(job, 500);
  const most = Math.max(least, style.brand.most);
  const fitted = sizeToFill(job.metrics.face(500), text, Math.round(width / (1 + style.brand.tracking / 700)), most) >= least
    ? fitTracked(job, text, { weight: 500, tracking: style.brand.tracking }, { width, height: most * 0.75, most })
    : fitTracked(job, text, { weight: 500, tracking: style.brand.tracking }, { width, height: most * 4, most });
  const size = Math.max(least, fitted.size);
  return fitted.lines.map((line, i): Line => ({ element: 'brand', text: line, ...(style.capitals && { says: spokenLines(fitted.lines, job.content.brand)[i]! }), weight: 500, size, tracking: style.brand.tracking, ink: style.capitals ? 'ink' : 'black', gap: i === 0 ? 0 : Math.round(size * 0.45) }));
}

/** Where the lines of the front stand, the net content on the last base line. */
export function bandedFront(job: Job, setting: Setting, box: BandedBox, style: BandedStyle): Placed {
  const net = job.content.net ? netFoot(job, box.width, 'black') : null;
  const bottom = net ? box.foot - net.height - net.clear[2] : box.foot;
  const brand = brandLines(job, style, box.width);
  const small = smallLines(job, setting, box.width);
  const brandRoom = stackHeight(job, brand) + (brand.length > 0 ? Math.round((setting.tight === 2 ? 1700 : style.align === 'left' ? 3300 : 2700) * Math.max(0.6, Math.min(1.3, job.scale))) : 0);
  const smallRoom = small.reduce((total, line) => total + line.gap + rise(job, line), 0);
  const height = bottom - box.top - brandRoom - smallRoom;
  const title = titleLines(job, style, { width: box.width, height: Math.max(1, height) });
  const lines = [...title, ...small];
  const overflows = overflowsOf(job, [...brand, ...lines], box.width, stackHeight(job, lines) - (bottom - box.top - brandRoom));
  const middle = box.x + Math.round(box.width / 2);
  // Slack goes above and below the title, two parts to three: it stands a little high.
  const slack = Math.max(0, bottom - box.top - brandRoom - stackHeight(job, lines));
  const draw = (stack: readonly Line[], top: Micrometres): Item[] => {
    let y = top;
    return stack.map((line, i) => {
      y += (i > 0 ? line.gap : 0) + rise(job, line);
      const spoken = i < stack.length - 1 && stack[i + 1]!.element === line.element ? { ...line, text: `${line.text} `, ...(line.says !== undefined && { says: `${line.says} ` }) } : line;
      if (style.align === 'middle') return trackedItem(job, spoken, middle - Math.round(lineLength(job, line) / 2), y, middle);
      return trackedItem(job, spoken, box.x - Math.round((job.metrics.face(line.weight).bearing(line.text[0] ?? ' ') * line.size) / 1000), y);
    });
  };
  const netX = style.align === 'middle' && net ? middle - Math.round(net.width / 2) : box.x;
  const netItems = net ? net.draw(netX, box.foot).map((item): Item => (style.align === 'middle' && item.kind === 'text' ? { ...item, about: middle } : item)) : [];
  return {
    items: [...draw(brand, box.top), ...draw(lines, box.top + brandRoom + (style.align === 'middle' ? Math.round(slack * 0.4) : 0)), ...netItems],
    overflows: [...overflows, ...(net?.overflow ? [net.overflow] : [])],
  };
}

function overflowsOf(job: Job, lines: readonly Line[], width: Micrometres, over: Micrometres): Overflow[] {
  const out: Overflow[] = [];
  for (const line of lines) {
    const least = line.element === 'name' ? Math.round(leastText(job, line.weight) * 1.2) : leastText(job, line.weight);
    const needed = lineLength(job, { ...line, size: Math.max(least, line.size) }) - width;
    if (needed > 0) out.push({ element: line.element, direction: 'width', missing: needed, room: width, word: line.text });
    else if (line.size < least) out.push({ element: line.element, direction: 'height', missing: least - line.size, room: width });
  }
  if (over > 0 && out.length === 0) out.push({ element: 'function', direction: 'height', missing: over, room: width });
  return out;
}
