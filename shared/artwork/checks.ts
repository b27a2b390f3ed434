import { barcodeFault } from './barcode.ts';
import { pixelsPerInch } from './hand/draw-picture.ts';
import { heightAt } from './heights.ts';
import type { LabelInput } from './label-input.ts';
import { exactMillimetres, inMillimetres } from './lengths.ts';
import type { Misfit } from './misfits.ts';
import { textBox, type Scene, type Text } from './scene.ts';
import type { Job, Setting } from './setting.ts';
import { inkBox } from './verify.ts';

/** One line of the list before the press. */
export interface Check {
  readonly id: string;
  readonly state: 'passed' | 'decide' | 'stop' | 'note';
  readonly what: string;
  readonly detail: string;
  /** The figure that decides. */
  readonly figure: string;
  readonly citation?: string;
}
interface Subject {
  readonly input: LabelInput;
  readonly job: Job;
  readonly scene: Scene;
  readonly setting: Setting;
  readonly misfits: readonly Misfit[];
}

const mm = (nanometres: number): string => String(Math.floor(nanometres / 10_000) / 100);

function textCheck({ job, scene }: Subject): Check {
  const { text } = job.minimums;
  const small = scene.items.filter((item): item is Text => item.kind === 'text' && item.element !== 'barcode' && !/^\d+M$/.test(item.text) && item.text !== '℮');
  const lowest = small.reduce<{ height: number; item: Text } | null>((least, item) => {
    const height = heightAt(item.size, job.metrics.face(item.weight).xHeight);
    return !least || height < least.height ? { height, item } : least;
  }, null);
  if (!lowest) return { id: 'text', state: 'note', what: 'Small print', detail: 'there is none', figure: '' };
  const isLow = lowest.height < text.height;
  return {
    id: 'text', state: isLow ? 'stop' : 'passed', what: isLow ? 'Raise the small print' : 'Small print',
    detail: `small o ${mm(lowest.height)} mm in the ${lowest.item.element}`, figure: `${mm(lowest.height)} / ${mm(text.height)} mm`, citation: text.citation,
  };
}

function netCheck({ job, scene, input }: Subject): Check {
  const runs = scene.items.filter((item): item is Text => item.kind === 'text' && item.element === 'net content' && item.text !== '℮');
  if (runs.length === 0) return { id: 'net-content', state: 'decide', what: 'Write the net content', detail: 'none is given', figure: '' };
  const { netContent, netContentZone } = job.minimums;
  const least = runs.reduce((low, run) => Math.min(low, heightAt(run.size, netContent.of === 'figures' ? job.metrics.face(run.weight).capHeight : job.metrics.face(run.weight).xHeight)), Infinity);
  const top = Math.min(...runs.map((run) => textBox(run, job.metrics.face(run.weight).capHeight).y));
  const isHigh = netContentZone > 0 && top * 1000 < scene.trim.height * (1000 - netContentZone);
  const isLow = least < netContent.height;
  const subject = netContent.of === 'figures' ? 'figures' : 'small o';
  return {
    id: 'net-content', state: isLow || isHigh ? 'stop' : 'passed',
    what: isLow ? 'Raise the net content' : isHigh ? 'Move the net content into the lower 30 %' : 'Net content',
    detail: `${input.market}: ${subject} for ${netContent.because}`, figure: `${mm(least)} / ${mm(netContent.height)} mm`, citation: netContent.citation,
  };
}

function eMarkCheck({ job, scene }: Subject): Check[] {
  const mark = scene.items.find((item): item is Text => item.kind === 'text' && item.text === '℮');
  if (!mark) return [];
  const height = heightAt(mark.size, 722);
  return [{
    id: 'e-mark', state: height < job.minimums.eMark ? 'stop' : 'note', what: 'e-mark beside the net content',
    detail: 'it says that the batch was filled and checked by the average rule', figure: `${mm(height)} / 3 mm`, citation: 'Directive 76/211/EEC, Annex I, 3.3',
  }];
}

function placeChecks({ job, scene }: Subject): Check[] {
  const { safe, overlap, trim } = scene;
  const boxes = scene.items.flatMap((item) => inkBox(item, job) ?? []);
  const nearest = Math.min(...boxes.flatMap((box) => [box.y, trim.height - box.y - box.height, box.x, trim.width - box.x - box.width]));
  const outside = boxes.filter((box) => box.x < Math.max(overlap, 2000) || box.y < safe.y || box.x + box.width > trim.width - Math.max(overlap, 2000) || box.y + box.height > safe.y + safe.height);
  const checks: Check[] = [{
    id: 'safe-margin', state: outside.length > 0 ? 'stop' : 'passed', what: outside.length > 0 ? 'Move what stands too near the trim' : 'Safe margin',
    detail: `nearest text or symbol ${inMillimetres(Math.max(0, nearest))} mm from trim`, figure: '2 mm',
  }];
  if (overlap > 0) {
    const covered = boxes.filter((box) => box.x < overlap || box.x + box.width > trim.width - overlap);
    checks.push({ id: 'overlap', state: covered.length > 0 ? 'stop' : 'passed', what: 'Overlap strips', detail: covered.length > 0 ? 'something stands in them' : 'no text, code or symbol in either', figure: `${exactMillimetres(overlap)} mm` });
  }
  return checks;
}

function barcodeChecks({ input, job, scene, setting }: Subject): Check[] {
  if (!input.barcode || input.barcode.digits === '') return [{ id: 'barcode', state: 'note', what: 'No barcode', detail: 'shops that scan will ask for one', figure: '' }];
  const fault = barcodeFault(input.barcode);
  if (fault) return [{ id: 'barcode', state: 'stop', what: 'Correct the barcode', detail: fault, figure: input.barcode.digits }];
  const bars = scene.items.find((item) => item.kind === 'boxes' && item.element === 'barcode');
  const first = bars?.kind === 'boxes' ? bars.boxes[0] : undefined;
  if (!first) return [];
  const module = Math.min(first.width, first.height);
  const percent = Math.floor((module * 100) / 330);
  const turned = setting.ladder ? 'turned, reads downwards' : 'upright';
  const seam = inkBox(bars!, job)!;
  const clear = scene.shape === 'cylinder' ? Math.min(seam.x, scene.trim.width - seam.x - seam.width) : null;
  return [
    { id: 'barcode', state: 'passed', what: 'Barcode', detail: `${input.barcode.digits}, check figure ${input.barcode.digits.at(-1)}, ${turned}`, figure: `X ${exactMillimetres(module)} mm` },
    { id: 'barcode-size', state: percent < 80 ? 'stop' : percent < 90 ? 'note' : 'passed', what: `Barcode at ${percent} %`, detail: setting.ladder ? 'the curve does not limit it' : scene.shape === 'cylinder' ? `${exactMillimetres(job.sheet.diameter)} mm round allows X ${exactMillimetres(Math.min(330, Math.floor((job.sheet.diameter * 5512) / 1e6)))} mm at most` : 'a flat face does not limit it', figure: '80 to 200 %' },
    ...(clear !== null ? [{ id: 'barcode-seam', state: clear < 8000 ? ('note' as const) : ('passed' as const), what: 'Barcode to seam', detail: `${inMillimetres(clear)} mm clear`, figure: '8 mm' }] : []),
  ];
}

function pressChecks({ scene, input }: Subject): Check[] {
  const inks = new Set(scene.items.map((item) => item.ink));
  const totals = [...inks].map((ink) => scene.inks[ink]!.cmyk.reduce((a, b) => a + b, 0));
  const most = Math.max(0, ...totals);
  const texts = scene.items.filter((item): item is Text => item.kind === 'text');
  const jar = scene.items.some((item) => item.element === 'durability');
  return [
    ...(jar ? [{ id: 'durability', state: 'passed' as const, what: input.durability?.kind === 'best-before' ? 'Hourglass' : 'Open jar', detail: input.durability?.kind === 'pao' ? `months read ${input.durability.months}M` : 'date beside it', figure: 'no height in law' }] : []),
    { id: 'bleed', state: scene.bleed < 1500 ? 'note' : 'passed', what: 'Bleed', detail: 'grounds and lines run off', figure: `${exactMillimetres(scene.bleed)} mm` },
    { id: 'inks', state: most > 300 ? 'stop' : 'passed', what: 'Inks', detail: 'small print in black alone, overprinting', figure: `at most ${most} %` },
    { id: 'fonts', state: 'passed', what: 'Fonts', detail: `embedded, ${new Set(texts.map((text) => text.weight)).size} weights`, figure: 'IBM Plex Sans' },
    { id: 'reading-order', state: 'passed', what: 'Reading order', detail: 'front, use, ingredients, house', figure: `${texts.length} runs` },
    { id: 'die-line', state: 'passed', what: 'Die line', detail: 'spot, overprints, painted last', figure: `${exactMillimetres(scene.dieLine.stroke)} mm` },
  ];
}

/** Least pixels to the inch of a photo: under the first it is coarse, under the second blocks are seen. Common practice, no source. */
const FINE = 300;
const COARSE = 150;

function pictureChecks({ input, scene }: Subject): Check[] {
  return scene.items.flatMap((item): Check[] => {
    if (item.kind !== 'picture') return [];
    const picture = input.pictures?.find(({ id }) => id === item.picture);
    const dots = picture ? pixelsPerInch(picture.width, item.box.width) : 0;
    const state = dots < COARSE ? 'stop' : dots < FINE ? 'decide' : 'passed';
    return [{ id: `picture-${item.own ?? item.picture}`, state, what: state === 'passed' ? 'Picture' : 'Send the picture larger or print it smaller', detail: `${picture?.name ?? 'a picture'}, turned into process inks, at most 300 %`, figure: `${dots} / ${FINE} ppi` }];
  });
}

/** The list before the press: what must be done first, then what passed, each with its figure. */
export function checkLabel(subject: Subject): Check[] {
  const misfits = subject.misfits.map((misfit, i): Check => ({ id: `room-${i}`, state: 'stop', what: 'Give it more room', detail: misfit.message, figure: misfit.missing > 0 ? `${inMillimetres(misfit.missing)} mm` : '' }));
  const rank = { stop: 0, decide: 1, note: 2, passed: 3 } as const;
  return [...misfits, netCheck(subject), textCheck(subject), ...eMarkCheck(subject), ...placeChecks(subject), ...barcodeChecks(subject), ...pictureChecks(subject), ...pressChecks(subject)]
    .sort((a, b) => rank[a.state] - rank[b.state]);
}
