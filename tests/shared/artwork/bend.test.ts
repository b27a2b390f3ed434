import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readContainer, type Sheet } from '#shared/artwork/container.ts';
import type { ContainerSettings } from '#shared/artwork/label-input.ts';
import { layOutLabel } from '#shared/artwork/layout.ts';
import { plexMetrics } from '#shared/artwork/plex-metrics.ts';
import type { Scene } from '#shared/artwork/scene.ts';
import { unrollTaper, type Taper } from '#shared/artwork/taper.ts';
import { bodyWash, inMarket } from './samples.ts';

const cone = (topDiameterMm: string, bottomDiameterMm: string, labelHeightMm: string, overlapMm = '5'): ContainerSettings => ({ shape: 'taper', topDiameterMm, bottomDiameterMm, labelHeightMm, overlapMm });
const sheetOf = (container: ContainerSettings): Sheet => {
  const sheet = readContainer(container);
  if ('faults' in sheet) throw new Error(sheet.faults[0]!.message);
  return sheet;
};

describe('the unrolled cone', () => {
  // Plane geometry, worked by hand: R = s·D/(D − d), angle = π(D − d)/s, box 2R·sin(angle/2) × R − r·cos(angle/2).
  test('58 to 50 mm over 100 mm opens by 14.4 degrees from radii of 725 and 625 mm', () => {
    const { wide, narrow, angle, width, height } = unrollTaper({ top: 58_000, bottom: 50_000, slant: 100_000, overlap: 0 });
    expect([wide, narrow]).toEqual([725_000, 625_000]);
    expect(((angle * 180) / Math.PI).toFixed(6)).toBe('14.400000');
    expect([width, height]).toEqual([181_733, 104_928]);
  });

  test('a tub of 72 to 62 mm, 46 mm along the wall, overlap 5 mm: its trim is the box around the sector', () => {
    const { scene } = layOutLabel({ ...bodyWash, container: cone('72', '62', '46') }, plexMetrics);
    expect(scene!.trim).toEqual({ width: 226_529, height: 63_196 });
  });

  test('the sector has the area of the wall', () => {
    fc.assert(
      fc.property(fc.integer({ min: 20_000, max: 90_000 }), fc.integer({ min: 400, max: 15_000 }), fc.integer({ min: 30_000, max: 120_000 }), (small, more, slant) => {
        const { wide, narrow, angle } = unrollTaper({ top: small + more, bottom: small, slant, overlap: 0 });
        const sector = (angle * (wide ** 2 - narrow ** 2)) / 2;
        const wall = (Math.PI * slant * (2 * small + more)) / 2;
        expect(Math.abs(sector / wall - 1)).toBeLessThan(1e-9);
      }),
    );
  });

  test('a wall that hardly narrows is set as a cylinder', () => {
    expect(sheetOf(cone('58', '57.8', '90')).taper).toBeUndefined();
    expect(sheetOf(cone('58', '57.7', '90')).taper).toBeDefined();
  });

  test('a wall that would unroll past a half circle is refused in words', () => {
    expect(readContainer(cone('90', '20', '40'))).toEqual({ faults: [{ field: 'labelHeightMm', message: expect.stringContaining('more than a half circle') as unknown }] });
    expect(readContainer(cone('0', '62', '46'))).toEqual({ faults: [{ field: 'topDiameterMm', message: 'The upper diameter is 0 mm. Labels are set from 10 to 400 mm.' }] });
  });
});

/** Distance from the apex and direction of a point of the sheet: the way back from the bent scene. */
function polarOf(taper: Taper, x: number, y: number): { radius: number; direction: number } {
  const dx = x - taper.wide * Math.sin(taper.angle / 2);
  const dy = taper.isWideAbove ? taper.wide - y : y + taper.narrow * Math.cos(taper.angle / 2);
  return { radius: Math.hypot(dx, dy), direction: Math.atan2(dx, dy) };
}
function pointsOf(scene: Scene): { element: string; x: number; y: number }[] {
  return scene.items.filter((item) => item.element !== 'rule' && item.element !== 'ground').flatMap((item) => {
    if (item.kind === 'text') return item.places!.map(({ x, y }) => ({ element: item.element, x, y }));
    if (item.kind === 'boxes' || item.kind === 'picture') throw new Error('no straight box is left on a cone');
    return item.steps.flatMap(([, ...figures]) => Array.from({ length: figures.length / 2 }, (_, i) => ({ element: item.element, x: figures[2 * i] as number, y: figures[2 * i + 1] as number })));
  });
}

const CONES = [cone('72', '62', '46'), cone('58', '50', '100'), cone('56', '70', '95'), cone('104', '90', '76')];
describe.each(CONES)('on %o', (container) => {
  const sheet = sheetOf(container);
  const taper = sheet.taper!;

  test.each(['EU', 'UK', 'US', 'CA'] as const)('%s: whatever fits keeps the margins of the sector', (market) => {
    const { scene, misfits } = layOutLabel({ ...inMarket(market), container }, plexMetrics);
    // Where something does not fit it says so, as on every other sheet.
    if (misfits.length > 0) return expect(misfits.every(({ message }) => message.length > 20)).toBe(true);
    const points = pointsOf(scene!);
    expect(points.length).toBeGreaterThan(300);
    for (const { element, x, y } of points) {
      const { radius, direction } = polarOf(taper, x, y);
      expect(radius - taper.narrow, element).toBeGreaterThan(1000);
      expect(taper.wide - radius, element).toBeGreaterThan(1000);
      expect((taper.angle / 2 - Math.abs(direction)) * taper.narrow, element).toBeGreaterThan(2000);
    }
  });

  test('letters of a line stand on one arc, as far from each other as the type sets them', () => {
    const { scene } = layOutLabel({ ...bodyWash, container }, plexMetrics);
    const lines = scene!.items.flatMap((item) => (item.kind === 'text' && item.element === 'directions' ? [item] : []));
    expect(lines.length).toBeGreaterThan(0);
    for (const line of lines) {
      const face = plexMetrics.face(line.weight);
      const middles = line.places!.map(({ x, y, degrees }, i) => {
        const half = (face.advance(line.text[i]!) * line.size) / 2000;
        return polarOf(taper, x + half * Math.cos((degrees * Math.PI) / 180), y + half * Math.sin((degrees * Math.PI) / 180));
      });
      middles.forEach(({ radius, direction }, i) => {
        expect(Math.abs(radius - middles[0]!.radius)).toBeLessThan(3);
        if (i === 0) return;
        const [a, b] = [i - 1, i].map((at) => (line.offsets[at]! + face.advance(line.text[at]!) / 2) * (line.size / 1000)) as [number, number];
        expect(Math.abs((direction - middles[i - 1]!.direction) * radius - (b - a))).toBeLessThan(4);
      });
    }
  });

  test('the bars stay straight and keep their module', () => {
    const { scene } = layOutLabel({ ...bodyWash, container }, plexMetrics);
    const bars = scene!.items.find((item) => item.kind === 'path' && item.element === 'barcode');
    const steps = bars?.kind === 'path' ? bars.steps : [];
    const corners = steps.flatMap((step) => (step[0] === 'Z' ? [] : [[step[1], step[2]] as const]));
    const widths = Array.from({ length: corners.length / 4 }, (_, i) => {
      const sides = [0, 1].map((side) => Math.hypot(corners[4 * i + side + 1]![0] - corners[4 * i + side]![0], corners[4 * i + side + 1]![1] - corners[4 * i + side]![1]));
      return Math.min(...sides);
    });
    const module = Math.min(...widths);
    expect(widths).toHaveLength(30);
    for (const width of widths) expect(Math.abs(width / module - Math.round(width / module)) * module).toBeLessThan(8);
  });
});

test('a label on a cone says the same words as on a cylinder', () => {
  const words = (container: ContainerSettings) => layOutLabel({ ...bodyWash, container }, plexMetrics).scene!.items.flatMap((item) => (item.kind === 'text' && item.element === 'ingredients' ? item.text : [])).join('').replace(/\s+/g, ' ');
  expect(words(cone('58', '50', '100'))).toBe(words({ shape: 'cylinder', diameterMm: '58', labelHeightMm: '100', overlapMm: '5' }));
});
