import { expect, test } from 'vitest';
import type { ContainerSettings, LabelInput } from '#shared/artwork/label-input.ts';
import { layOutLabel } from '#shared/artwork/layout.ts';
import { plexMetrics } from '#shared/artwork/plex-metrics.ts';
import type { Scene, Text } from '#shared/artwork/scene.ts';
import { inkBox } from '#shared/artwork/verify.ts';
import { bodyWash, inMarket, listOf } from './samples.ts';

const lay = (input: LabelInput) => layOutLabel(input, plexMetrics);
const textsOf = (scene: Scene, element?: string): Text[] => scene.items.filter((item): item is Text => item.kind === 'text' && (element === undefined || item.element === element));
const wrap = (diameterMm: string, labelHeightMm: string): ContainerSettings => ({ shape: 'cylinder', diameterMm, labelHeightMm, overlapMm: '5' });
const flat = (widthMm: string, heightMm: string): ContainerSettings => ({ shape: 'flat', widthMm, heightMm });
const said = (scene: Scene, element: string): string => textsOf(scene, element).map((item) => item.text).join('').replace(/\s+/g, ' ').trim();

/** Least height of a small o or a figure in nanometres, from the market's own text (see heights.test). */
const TEXT = { EU: 1_200_000, UK: 1_200_000, US: 1_587_500, CA: 1_600_000 } as const;
const CONTAINERS = [wrap('40', '160'), wrap('58', '90'), wrap('58', '120'), wrap('70', '90'), wrap('90', '200'), flat('100', '150'), flat('150', '100'), flat('150', '200')];

test.each((['EU', 'UK', 'US', 'CA'] as const).flatMap((market) => CONTAINERS.map((container) => [market, container] as const)))('%s on %o: every letter, margin and quiet zone holds', (market, container) => {
  const { scene, misfits, checks } = lay({ ...inMarket(market), container });
  expect(misfits).toEqual([]);
  expect(checks.filter((check) => check.state === 'stop')).toEqual([]);
  for (const item of textsOf(scene!)) {
    const face = plexMetrics.face(item.weight);
    const figures = /^[\d ]+M?$|^℮$/.test(item.text);
    expect(item.size * (figures ? face.capHeight : face.xHeight), item.text).toBeGreaterThanOrEqual(TEXT[market]);
  }
  const edge = Math.max(2000, scene!.overlap);
  for (const item of scene!.items) {
    const box = inkBox(item, { metrics: plexMetrics });
    if (!box) continue;
    expect(box.x).toBeGreaterThanOrEqual(edge);
    expect(box.x + box.width).toBeLessThanOrEqual(scene!.trim.width - edge);
    expect(box.y).toBeGreaterThanOrEqual(2000);
    expect(box.y + box.height).toBeLessThanOrEqual(scene!.trim.height - 2000);
  }
});

test('every figure of a scene is a whole micrometre', () => {
  const { scene } = lay(bodyWash);
  for (const item of scene!.items) {
    const figures = item.kind === 'text' ? [item.x, item.y, item.size] : item.kind === 'boxes' ? item.boxes.flatMap((box) => [box.x, box.y, box.width, box.height]) : item.kind === 'picture' ? Object.values(item.box) : item.steps.flatMap(([, ...rest]) => rest as number[]);
    for (const figure of figures) expect(Number.isInteger(figure)).toBe(true);
  }
});

test('the trim is the container', () => {
  expect(lay(bodyWash).scene!.trim).toEqual({ width: 187_401, height: 90_000 });
  expect(lay({ ...bodyWash, container: flat('80', '120') }).scene!.trim).toEqual({ width: 80_000, height: 120_000 });
});

test('the label says the whole declaration, word for word', () => {
  for (const count of [5, 20, 30]) {
    const { scene, misfits } = lay({ ...bodyWash, container: wrap('70', '120'), ingredients: { heading: 'Ingredients', body: listOf(count) } });
    expect(misfits).toEqual([]);
    expect(said(scene!, 'ingredients')).toBe(`Ingredients: ${listOf(count)}`);
  }
});

test('texts stand in reading order', () => {
  const order = lay(bodyWash).scene!.items.filter((item) => item.kind === 'text').map((item) => item.element);
  expect([...new Set(order)]).toEqual(['brand', 'name', 'function', 'claim', 'net content', 'directions', 'warnings', 'ingredients', 'responsible person', 'batch', 'durability', 'barcode']);
});

test('a name that ends in its function is set as two', () => {
  const { scene } = lay(bodyWash);
  expect(said(scene!, 'name')).toBe('Juniper & Oat');
  expect(said(scene!, 'function')).toBe('Body Wash');
});

test.each([
  ['EU', '250 ml ℮'], ['US', '8.45 fl oz (250 ml)'], ['CA', '250 ml'],
] as const)('net content in %s reads %s', (market, words) => {
  const { scene } = lay({ ...inMarket(market), container: wrap('70', '120') });
  expect(said(scene!, 'net content')).toBe(words);
});

test('US net contents stand in the lower 30 % of the panel, in letters of 1/8 inch', () => {
  const { scene } = lay(inMarket('US'));
  for (const item of textsOf(scene!, 'net content')) {
    const face = plexMetrics.face(item.weight);
    expect(item.weight).toBe(700);
    expect(item.size * face.xHeight).toBeGreaterThanOrEqual(3_175_000);
    expect(item.y - Math.ceil((face.capHeight * item.size) / 1000)).toBeGreaterThanOrEqual(63_000);
  }
});

test('EU figures over 200 ml are 4 mm and the ℮ 3 mm at least', () => {
  const runs = textsOf(lay(bodyWash).scene!, 'net content');
  const mark = runs.find((run) => run.text === '℮')!;
  expect(mark.size * 722).toBeGreaterThanOrEqual(3_000_000);
  expect(runs[0]!.size * 698).toBeGreaterThanOrEqual(4_000_000);
});

test('what does not fit is named, with the millimetres that are missing', () => {
  const { misfits } = lay({ ...bodyWash, container: wrap('30', '40'), ingredients: { heading: 'Ingredients', body: listOf(60) } });
  expect(misfits.length).toBeGreaterThan(0);
  for (const misfit of misfits) expect(misfit.message).toMatch(/^The .+ needs? \d+(\.\d+)? mm more (height|width).*, with every letter at its least lawful height\.$/);
  expect(Math.max(...misfits.map((misfit) => misfit.missing))).toBeGreaterThan(1000);
});

test('what was missing is enough', () => {
  const short = { ...bodyWash, container: wrap('58', '60'), ingredients: { heading: 'Ingredients', body: listOf(60) } };
  const [gap] = lay(short).misfits;
  expect(gap!.direction).toBe('height');
  const taller = (60_000 + gap!.missing * 1.6 + 4000) / 1000;
  expect(lay({ ...short, container: wrap('58', taller.toFixed(3)) }).misfits).toEqual([]);
});

test('letters that the type lacks are reported, letters with accents are set', () => {
  expect(lay({ ...bodyWash, name: 'Ørsted łąka Grüße Ελλάδα', functionName: '' }).misfits).toEqual([]);
  expect(lay({ ...bodyWash, name: 'Juniper 薬', functionName: '' }).misfits[0]!.message).toBe('The label type has no “薬” (in the name). Write it with other letters.');
});

test('impossible measures are said and nothing is laid out', () => {
  expect(lay({ ...bodyWash, container: wrap('0', '90') })).toEqual({
    scene: null, straight: null, checks: [], misfits: [{ element: 'container', missing: 0, direction: 'measure', message: 'The diameter is 0 mm. Labels are set from 10 to 400 mm.' }],
  });
});

test('on a body under 48 mm the bars are turned, and stay whole', () => {
  const { scene } = lay({ ...bodyWash, container: wrap('40', '160') });
  const bars = scene!.items.find((item) => item.kind === 'boxes' && item.element === 'barcode');
  const boxes = bars!.kind === 'boxes' ? bars!.boxes : [];
  expect(Math.min(...boxes.map((box) => box.width))).toBeGreaterThanOrEqual(18_280);
  expect(Math.min(...boxes.map((box) => box.height))).toBeGreaterThanOrEqual(264);
});

test('best before is said in words and with the hourglass', () => {
  const { scene } = lay({ ...bodyWash, durability: { kind: 'best-before', date: '2028-05' } });
  expect(said(scene!, 'durability')).toBe('Best used before the end of 05/2028');
});

test.each([['galley', flat('120', '80')], ['galley', flat('70', '120')], ['versal', wrap('58', '90')], ['versal', flat('120', '70')],
  ['headband', wrap('67', '36')], ['headband', wrap('58', '90')], ['fillet', wrap('58', '90')], ['fillet', { shape: 'taper', topDiameterMm: '72', bottomDiameterMm: '62', labelHeightMm: '46', overlapMm: '5' }],
] as const)('%s can be set on %o', (template, container) => {
  const { misfits, scene } = lay({ ...bodyWash, template, container });
  expect(misfits).toEqual([]);
  expect(scene!.template).toBe(template);
});

test.each((['EU', 'UK', 'US', 'CA'] as const).flatMap((market) => (['headband', 'fillet'] as const).map((template) => [market, template] as const)))('%s in %s: every letter and margin holds', (market, template) => {
  const { scene, misfits, checks } = lay({ ...inMarket(market), template, container: wrap('84', '100') });
  expect(misfits).toEqual([]);
  expect(checks.filter((check) => check.state === 'stop')).toEqual([]);
  for (const item of textsOf(scene!)) {
    const face = plexMetrics.face(item.weight);
    const figures = /^[\d ]+M?$|^℮$/.test(item.text);
    expect(item.size * (figures ? face.capHeight : face.xHeight), item.text).toBeGreaterThanOrEqual(TEXT[market]);
  }
});

test('a front in capitals still says its words as they are written', () => {
  const { scene } = lay({ ...bodyWash, template: 'fillet', container: wrap('58', '90') });
  const name = textsOf(scene!, 'name');
  expect(name.map(({ text }) => text).join('')).toBe('JUNIPER & OAT');
  expect(name.map(({ says }) => says).join('')).toBe('Juniper & Oat');
});

test('threads meet in register where the wrap closes', () => {
  const { scene } = lay({ ...bodyWash, template: 'headband', container: wrap('58', '90') });
  const [ink, light] = scene!.items.filter((item) => item.kind === 'path' && item.element === 'rule');
  const starts = (item: typeof ink): number[] => (item?.kind === 'path' ? item.steps.flatMap((step) => (step[0] === 'M' ? [step[1]] : [])) : []);
  const round = 182_401;
  // Every light thread has another one exactly once around, to a micrometre.
  const all = starts(light);
  const inside = all.filter((x) => x - round >= Math.min(...all) - 1);
  expect(inside.length).toBeGreaterThan(3);
  for (const x of inside) expect(Math.min(...all.map((other) => Math.abs(x - other - round)))).toBeLessThanOrEqual(1);
  expect(Math.round(starts(ink).length / all.length)).toBe(3);
});
