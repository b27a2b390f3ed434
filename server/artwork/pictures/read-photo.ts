import { deflateSync } from 'node:zlib';
import sharp from 'sharp';
import { AppError } from '#server/http/app-error.ts';
import { boundInk, MOST_INK } from './inks-of-colours.ts';

export interface Photo {
  readonly width: number;
  readonly height: number;
  /** For screens: sRGB, nothing of the camera's notes left. */
  readonly preview: Buffer;
  /** For the press: rows of C, M, Y, K bytes, deflated. */
  readonly plates: Buffer;
}

/** 20 megapixels, as for every photo taken here. */
const PIXEL_LIMIT = 20_000_000;
const SECONDS = 10;
const MOST_BYTE_SUM = Math.floor((MOST_INK * 255) / 100);

/**
 * Reads a PNG or JPEG for the press: turned upright, laid on white where it is see-through,
 * turned into process inks through the press file's profile, ink bounded.
 * @throws AppError `unsupported-file`, `too-large`
 */
export async function readPhoto(bytes: Buffer): Promise<Photo> {
  if (isAnimated(bytes)) throw new AppError('unsupported-file', { message: 'This picture moves. Send one still picture as PNG or JPEG.' });
  try {
    const open = () => sharp(bytes, { limitInputPixels: PIXEL_LIMIT, failOn: 'error' }).timeout({ seconds: SECONDS }).rotate();
    const preview = await open().toColourspace('srgb').png({ compressionLevel: 9 }).toBuffer({ resolveWithObject: true });
    const { data, info } = await open().flatten({ background: '#ffffff' }).toColourspace('cmyk').raw().toBuffer({ resolveWithObject: true });
    if (info.channels !== 4) throw new Error('the image library gave no process inks');
    boundAll(data);
    return { width: info.width, height: info.height, preview: preview.data, plates: deflateSync(data, { level: 9 }) };
  } catch (error) {
    if (error instanceof AppError) throw error;
    throw error instanceof Error && error.message.includes('pixel limit')
      ? new AppError('too-large', { message: 'A picture can have at most 20 megapixels. Send it smaller: 300 pixels to the inch at its printed size are enough.' })
      : new AppError('unsupported-file', { message: 'This picture is broken and cannot be read. Save it anew as PNG or JPEG.' });
  }
}

/** An APNG says so in a chunk before its data (PNG specification, third edition, acTL). */
function isAnimated(bytes: Buffer): boolean {
  const at = bytes.indexOf('acTL', 0, 'latin1');
  const data = bytes.indexOf('IDAT', 0, 'latin1');
  return bytes.subarray(1, 4).toString('latin1') === 'PNG' && at > 0 && data > at;
}

/** Bounds every pixel whose inks add up to more than the press holds. */
function boundAll(data: Buffer): void {
  for (let at = 0; at < data.length; at += 4) {
    const [c, m, y, k] = [data[at]!, data[at + 1]!, data[at + 2]!, data[at + 3]!];
    if (c + m + y + k <= MOST_BYTE_SUM) continue;
    const [bc, bm, by] = boundInk([c, m, y, k], MOST_BYTE_SUM);
    data[at] = bc;
    data[at + 1] = bm;
    data[at + 2] = by;
  }
}
