import { describe, expect, test } from 'vitest';
import type { AddedElement, ByHand, FreedElement, HandFrame, HandStyle } from '#shared/contracts/by-hand.ts';
import { FREE_ELEMENTS } from '#shared/contracts/free-elements.ts';
import { freeElement, handBoxes } from '#shared/artwork/hand/elements.ts';
import type { LabelInput } from '#shared/artwork/label-input.ts';
import { layOutLabel } from '#shared/artwork/layout.ts';
import { plexMetrics } from '#shared/artwork/plex-metrics.ts';
import { textBox, type Item, type Scene, type Text } from '#shared/artwork/scene.ts';
import { bodyWash, inMarket, listOf } from '../samples.ts';

const lay = (byHand: Partial<ByHand>, input: LabelInput = bodyWash) => layOutLabel({ ...input, byHand: { freed: [], added: [], ...byHand } }, plexMetrics);
const template = layOutLabel(bodyWash, plexMetrics).scene!;
const textsOf = (scene: Scene, element: string): Text[] => scene.items.filter((item): item is Text => item.kind === 'text' && item.element === element);
const said = (scene: Scene, element: string): string => textsOf(scene, element).map((item) => item.says ?? item.text).join('').replace(/\s+/g, ' ').trim();
/** Headings hang apart in this template and stay behind, except the list's own. */
const isHeading = (item: Item): boolean => item.kind === 'text' && item.weight === 600 && item.ink === 'ink' && !['brand', 'name', 'function', 'net content'].includes(item.element);
const body = (scene: Scene, element: string): string => textsOf(scene, element).filter((item) => !isHeading(item)).map((item) => item.says ?? item.text).join('').replace(/\s+/g, ' ').trim();
const bodyBox = (scene: Scene, element: FreedElement['element']) => handBoxes({ items: scene.items.filter((item) => !isHeading(item)) }, plexMetrics).get(element)!;
const free = (element: FreedElement['element'], change: { frame?: Partial<HandFrame>; style?: HandStyle } = {}, scene = template): FreedElement => {
  const freed = freeElement(scene, element, plexMetrics)!;
  return { ...freed, frame: { ...freed.frame, ...change.frame }, style: { ...freed.style, ...change.style } };
};
const wide: LabelInput = { ...bodyWash, container: { shape: 'flat', widthMm: '200', heightMm: '200' } };
const own = (added: AddedElement): AddedElement => added;

describe('an element set free', () => {
  test.each(FREE_ELEMENTS)('stands where the template had set it: %s', (element) => {
    const freed = freeElement(template, element, plexMetrics);
    if (!freed) throw new Error(`the sample has no ${element}`);
    const { scene, misfits } = lay({ freed: [freed] });
    expect(misfits).toEqual([]);
    const before = bodyBox(template, element);
    const after = bodyBox(scene!, element);
    // Left edges follow each letter's own bearing: less than a tenth of small type's em.
    for (const side of ['x', 'y', 'width', 'height'] as const) expect(Math.abs(after[side] - before[side]), side).toBeLessThanOrEqual(250);
    expect(body(scene!, element)).toBe(body(template, element));
  });

  test('leaves everything else where it was', () => {
    const { scene } = lay({ freed: [free('name', { frame: { x: 70_000, y: 40_000, width: 50_000 } })] });
    const others = (one: Scene) => one.items.filter((item) => item.element !== 'name');
    expect(others(scene!)).toEqual(others(template));
  });

  test('is never set under the least letter height of its market', () => {
    for (const market of ['EU', 'US'] as const) {
      const input = inMarket(market);
      const base = layOutLabel(input, plexMetrics).scene!;
      const { scene } = lay({ freed: [free('ingredients', { style: { size: 500 } }, base)] }, input);
      // EU: the house floor of 1.2 mm. US: 1/16 inch, 21 CFR 701.3(b).
      const least = market === 'EU' ? 1_200_000 : 1_587_500;
      for (const item of textsOf(scene!, 'ingredients')) expect(item.size * plexMetrics.face(item.weight).xHeight).toBeGreaterThanOrEqual(least);
    }
  });

  test('in a frame too small says by how much, and prints every word all the same', () => {
    const { scene, misfits } = lay({ freed: [free('ingredients', { frame: { width: 30_000, height: 5000 } })] });
    expect(misfits.find((misfit) => misfit.element === 'ingredients' && misfit.direction === 'height')?.message).toMatch(/lacks [\d.]+ mm of height/);
    expect(said(scene!, 'ingredients')).toBe(said(template, 'ingredients'));
  });

  test('fills its frame where no size is asked, and grows with it', () => {
    const size = (height: number) => textsOf(lay({ freed: [{ element: 'name', frame: { x: 5000, y: 100_000, width: 150_000, height }, style: {} }] }, wide).scene!, 'name')[0]!.size;
    expect(size(30_000)).toBeGreaterThan(size(8000));
    const { scene } = lay({ freed: [{ element: 'name', frame: { x: 5000, y: 100_000, width: 150_000, height: 30_000 }, style: {} }] }, wide);
    const box = handBoxes(scene!, plexMetrics).get('name')!;
    expect(box.height).toBeLessThanOrEqual(30_000);
  });

  test('is aligned left, in the middle and right of its frame', () => {
    const frame = { x: 10_000, y: 120_000, width: 120_000, height: 20_000 };
    const at = (align: 'left' | 'centre' | 'right') => {
      const item = textsOf(lay({ freed: [{ element: 'brand', frame, style: { size: 4000, align } }] }, wide).scene!, 'brand')[0]!;
      return { left: item.x, right: item.x + Math.ceil((item.advance * item.size) / 1000) };
    };
    expect(Math.abs(at('left').left - frame.x)).toBeLessThan(500);
    expect(Math.abs(at('right').right - (frame.x + frame.width))).toBeLessThan(500);
    const middle = at('centre');
    expect(Math.abs((middle.left + middle.right) / 2 - (frame.x + frame.width / 2))).toBeLessThan(500);
  });

  test('in capitals still says its words as they are written', () => {
    const { scene } = lay({ freed: [free('directions', { style: { capitals: true, size: 2300 }, frame: { height: 40_000 } })] });
    expect(textsOf(scene!, 'directions').map(({ text }) => text).join('')).toMatch(/^[^a-z]+$/);
    expect(said(scene!, 'directions')).toBe(body(template, 'directions'));
  });

  test('tracked letters stand further apart and lines keep the measure', () => {
    const frame = { x: 10_000, y: 120_000, width: 60_000, height: 60_000 };
    const lines = (tracking: number) => textsOf(lay({ freed: [{ element: 'ingredients', frame, style: { size: 2400, tracking } }] }, wide).scene!, 'ingredients');
    const [plain, tracked] = [lines(0), lines(120)];
    expect(tracked[0]!.offsets[3]! - plain[0]!.offsets[3]!).toBe(360);
    for (const item of tracked) {
      const face = plexMetrics.face(item.weight);
      const tail = item.text.endsWith(' ') ? Math.ceil(((face.advance(' ') + 240) * item.size) / 1000) : Math.ceil((120 * item.size) / 1000);
      expect(item.x + textBox(item, face.capHeight).width - tail).toBeLessThanOrEqual(frame.x + frame.width + 100);
    }
  });

  test('an ingredient list in columns keeps its order and breaks no bound words', () => {
    const input = { ...wide, ingredients: { heading: 'Ingredients', body: `${listOf(30)}, CI 77891` } };
    const frame = { x: 10_000, y: 100_000, width: 120_000, height: 60_000 };
    const { scene, misfits } = lay({ freed: [{ element: 'ingredients', frame, style: { columns: 3, size: 2400 } }] }, input);
    expect(misfits.filter(({ element, direction }) => element === 'ingredients' && direction !== 'place')).toEqual([]);
    const texts = textsOf(scene!, 'ingredients');
    expect(new Set(texts.map((item) => Math.floor((item.x - frame.x + 1000) / 40_000))).size).toBe(3);
    expect(said(scene!, 'ingredients')).toBe(`Ingredients: ${listOf(30)}, CI 77891`);
    expect(texts.every(({ text }) => !/\bCI\s*$/.test(text))).toBe(true);
  });

  test('gives its room back where the template was too small for it', () => {
    const crowded: LabelInput = { ...bodyWash, container: { shape: 'flat', widthMm: '60', heightMm: '60' }, ingredients: { heading: 'Ingredients', body: listOf(30) } };
    expect(layOutLabel(crowded, plexMetrics).misfits.length).toBeGreaterThan(0);
    const { misfits } = lay({ freed: [{ element: 'ingredients', frame: { x: 2000, y: 2000, width: 56_000, height: 56_000 }, style: {} }] }, crowded);
    expect(misfits.filter(({ direction }) => direction !== 'place')).toEqual([]);
  });
});

describe('what a hand must not do', () => {
  test('a thing laid over another is told with both names', () => {
    const target = handBoxes(template, plexMetrics).get('ingredients')!;
    const { misfits } = lay({ freed: [free('directions', { frame: { x: target.x, y: target.y } })] });
    expect(misfits.map(({ message }) => message).join(' ')).toMatch(/mm over the directions|mm over the ingredient list/);
  });

  test('a thing beyond the safe margin or in the overlap is told', () => {
    expect(lay({ freed: [free('brand', { frame: { y: 200 } })] }).misfits.map(({ message }) => message)).toContainEqual(expect.stringMatching(/^The brand comes 1\.8 mm too near the edge/));
    expect(lay({ freed: [free('net content', { frame: { x: 1000 } })] }).misfits.map(({ message }) => message)).toContainEqual(expect.stringMatching(/too near the overlap/));
  });

  test('net content that leaves the lowest 30 % of a US panel is told (21 CFR 701.13(f))', () => {
    const input = inMarket('US');
    const base = layOutLabel(input, plexMetrics).scene!;
    const { misfits } = lay({ freed: [free('net content', { frame: { y: 20_000 } }, base)] }, input);
    expect(misfits.map(({ message }) => message)).toContainEqual(expect.stringMatching(/lowest 30 % of the panel/));
  });

  test('a drawing in the clear room of the bars is told, one beside it is not', () => {
    const drawn = template.items.find((item) => item.element === 'barcode' && item.kind === 'boxes')!;
    const bars = handBoxes({ items: [drawn] }, plexMetrics).get('barcode')!;
    const rule = (x: number) => own({ id: 'r', kind: 'rule', frame: { x, y: bars.y, width: 300, height: 5000 }, style: {} });
    const told = (x: number) => lay({ added: [rule(x)] }).misfits.some(({ message }) => /clear room of the bars/.test(message));
    expect(told(bars.x - 1000)).toBe(true);
    expect(told(bars.x + bars.width + 9000)).toBe(false);
  });

  test('dark type over a dark box is told, light type is not', () => {
    const frame = { x: 20_000, y: 150_000, width: 60_000, height: 20_000 };
    const box = own({ id: 'b', kind: 'box', frame, style: { ink: 'ink' } });
    const words = (ink: 'black' | 'light') => own({ id: 't', kind: 'text', text: 'Made by hand', frame: { x: 25_000, y: 155_000, width: 50_000, height: 5000 }, style: { ink, size: 4000 } });
    expect(lay({ added: [box, words('black')] }, wide).misfits.map(({ message }) => message)).toContainEqual(expect.stringMatching(/dark ink on a dark ground/));
    expect(lay({ added: [box, words('light')] }, wide).misfits.filter(({ element, message }) => element === 'own text' && /dark/.test(message))).toEqual([]);
  });

  test('a letter that the type lacks is reported and never boxed', () => {
    const { misfits } = lay({ added: [own({ id: 't', kind: 'text', text: 'Ø ł ö Ω 水', frame: { x: 20_000, y: 150_000, width: 60_000, height: 8000 }, style: { size: 4000 } })] }, wide);
    const message = misfits.find(({ direction }) => direction === 'character')!.message;
    expect(message).toContain('“水”');
    for (const letter of ['Ø', 'ł', 'ö']) expect(message).not.toContain(letter);
  });

  test('a QR code whose modules are too fine is told with the figure', () => {
    const code = (side: number) => own({ id: 'q', kind: 'code', text: 'https://brackenmere.example/juniper', frame: { x: 20_000, y: 150_000, width: side, height: side }, style: {} });
    expect(lay({ added: [code(6000)] }, wide).misfits.map(({ message }) => message)).toContainEqual(expect.stringMatching(/modules would be/));
    expect(lay({ added: [code(16_000)] }, wide).misfits.filter(({ message }) => /modules/.test(message))).toEqual([]);
  });
});

test('on a cone things moved by hand are bent with the rest', () => {
  const cone: LabelInput = { ...bodyWash, container: { shape: 'taper', topDiameterMm: '70', bottomDiameterMm: '60', labelHeightMm: '80', overlapMm: '5' } };
  const base = layOutLabel(cone, plexMetrics);
  const { scene } = lay({ freed: [free('name', {}, base.straight!)] }, cone);
  expect(textsOf(scene!, 'name').every((item) => (item.places?.length ?? 0) === Array.from(item.text).length)).toBe(true);
});

test('every figure of a scene changed by hand is a whole micrometre', () => {
  const { scene } = lay({ freed: FREE_ELEMENTS.map((element) => free(element, { style: { align: 'centre', tracking: 7 } })), added: [own({ id: 'o', kind: 'oval', frame: { x: 11, y: 13, width: 977, height: 1313 }, style: {}, stroke: 200 })] });
  for (const item of scene!.items) {
    const figures = item.kind === 'text' ? [item.x, item.y, item.size] : item.kind === 'boxes' ? item.boxes.flatMap((box) => [box.x, box.y, box.width, box.height]) : item.kind === 'picture' ? Object.values(item.box) : item.steps.flatMap(([, ...rest]) => rest as number[]);
    for (const figure of figures) expect(Number.isInteger(figure)).toBe(true);
  }
});
