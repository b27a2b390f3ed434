import { deflateSync } from 'node:zlib';
import sharp from 'sharp';

/** Tags that only record how a profile was measured; the conversion does not need them. */
const MEASUREMENT = new Set(['targ', 'DevD', 'CIED', 'clrt']);

export interface OutputProfile {
  /** Deflated once: the same bytes go into every file. */
  readonly deflated: Uint8Array;
  readonly length: number;
  /** What the profile calls itself, for the intent's information. */
  readonly description: string;
}

let kept: Promise<OutputProfile> | undefined;

/**
 * A CMYK output profile in the public domain, as libvips carries it (its own copyright tag says
 * so), without its measurement data. A conversion profile is no promise of a press condition.
 */
export function outputProfile(): Promise<OutputProfile> {
  kept ??= readProfile();
  return kept;
}

async function readProfile(): Promise<OutputProfile> {
  const pixel = sharp({ create: { width: 1, height: 1, channels: 3, background: '#808080' } });
  const image = await pixel.toColourspace('cmyk').withIccProfile('cmyk').tiff().toBuffer();
  const { icc } = await sharp(image).metadata();
  if (!icc) throw new RangeError('the image library gives no CMYK profile');
  const lean = dropMeasurement(icc);
  return { deflated: deflateSync(lean, { level: 9 }), length: lean.length, description: 'generic CMYK, no named press' };
}

/** Rewrites a profile with fewer tags: 128 bytes of header, then the tag table, then the data on multiples of four. */
function dropMeasurement(icc: Buffer): Buffer {
  const count = icc.readUInt32BE(128);
  const tags = Array.from({ length: count }, (_, i) => {
    const at = 132 + 12 * i;
    return { signature: icc.toString('latin1', at, at + 4), from: icc.readUInt32BE(at + 4), size: icc.readUInt32BE(at + 8) };
  }).filter((tag) => !MEASUREMENT.has(tag.signature));
  const head = 132 + 12 * tags.length;
  const places = new Map<number, number>();
  let at = head + ((4 - (head % 4)) % 4);
  for (const tag of tags) {
    if (places.has(tag.from)) continue;
    places.set(tag.from, at);
    at += tag.size + ((4 - (tag.size % 4)) % 4);
  }
  const out = Buffer.alloc(at);
  icc.copy(out, 0, 0, 128);
  out.writeUInt32BE(at, 0);
  out.writeUInt32BE(tags.length, 128);
  // The date of making is no fact of the colours: fixed, so that equal labels are equal files.
  out.fill(0, 84, 100);
  tags.forEach((tag, i) => {
    const entry = 132 + 12 * i;
    out.write(tag.signature, entry, 'latin1');
    out.writeUInt32BE(places.get(tag.from)!, entry + 4);
    out.writeUInt32BE(tag.size, entry + 8);
    icc.copy(out, places.get(tag.from)!, tag.from, tag.from + tag.size);
  });
  return out;
}
