import sharp from 'sharp';
import type { Cmyk } from '#shared/artwork/scene.ts';

/** Most ink in one place that a press of labels takes up, in percent of one ink's solid. Common practice, no source. */
export const MOST_INK = 300;

/** Takes colours back where they add up to more than the press holds; black keeps the drawing. */
export function boundInk([c, m, y, k]: readonly [number, number, number, number], most = MOST_INK): [number, number, number, number] {
  const colours = c + m + y;
  const room = Math.max(0, most - k);
  if (colours <= room) return [c, m, y, k];
  const part = (ink: number): number => Math.floor((ink * room) / colours);
  return [part(c), part(m), part(y), k];
}

/**
 * Screen colours as process inks through the CMYK profile that goes into the press file.
 * Black and white are what they are: pure black is set in black alone, white is the paper.
 */
export async function inksOf(colours: readonly string[]): Promise<ReadonlyMap<string, Cmyk>> {
  const unique = [...new Set(colours)];
  if (unique.length === 0) return new Map();
  const pixels = Buffer.from(unique.flatMap((colour) => [1, 3, 5].map((at) => Number.parseInt(colour.slice(at, at + 2), 16))));
  const { data } = await sharp(pixels, { raw: { width: unique.length, height: 1, channels: 3 } }).toColourspace('cmyk').raw().toBuffer({ resolveWithObject: true });
  return new Map(unique.map((colour, i): [string, Cmyk] => {
    if (colour === '#000000') return [colour, [0, 0, 0, 100]];
    if (colour === '#ffffff') return [colour, [0, 0, 0, 0]];
    const inks = [0, 1, 2, 3].map((at) => Math.round((data[4 * i + at]! * 100) / 255)) as [number, number, number, number];
    return [colour, boundInk(inks)];
  }));
}
