/** Tables that only tell screens of few pixels how to round: a press has no use for them. */
const HINTING = new Set(['cvt ', 'fpgm', 'prep', 'gasp']);
const HAS_INSTRUCTIONS = 0x0100;
const MORE_COMPONENTS = 0x0020;

/**
 * The tables of a TrueType font without its hinting: the programs are dropped and each glyph
 * loses its instructions, which would call them. Outlines and widths are untouched.
 */
export function stripHinting(tables: ReadonlyMap<string, Uint8Array>): Map<string, Uint8Array> {
  const glyf = bufferOf(tables.get('glyf'));
  const loca = bufferOf(tables.get('loca'));
  const head = Buffer.from(bufferOf(tables.get('head')));
  const isLong = head.readInt16BE(50) === 1;
  const count = loca.length / (isLong ? 4 : 2) - 1;
  const at = (index: number): number => (isLong ? loca.readUInt32BE(index * 4) : loca.readUInt16BE(index * 2) * 2);
  const glyphs = Array.from({ length: count }, (_, index) => withoutInstructions(glyf.subarray(at(index), at(index + 1))));
  const offsets = Buffer.alloc((count + 1) * 4);
  let offset = 0;
  glyphs.forEach((glyph, index) => {
    offsets.writeUInt32BE(offset, index * 4);
    offset += glyph.length;
  });
  offsets.writeUInt32BE(offset, count * 4);
  head.writeInt16BE(1, 50);
  const kept = new Map([...tables].filter(([tag]) => !HINTING.has(tag)));
  return kept.set('glyf', Buffer.concat(glyphs)).set('loca', offsets).set('head', head);
}

function bufferOf(bytes: Uint8Array | undefined): Buffer {
  if (!bytes) throw new RangeError('not a TrueType font');
  return Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength);
}

function withoutInstructions(glyph: Buffer): Buffer {
  if (glyph.length === 0) return glyph;
  const contours = glyph.readInt16BE(0);
  return padded(contours >= 0 ? simple(glyph, contours) : composite(glyph));
}

function simple(glyph: Buffer, contours: number): Buffer {
  const at = 10 + contours * 2;
  const length = glyph.readUInt16BE(at);
  return Buffer.concat([glyph.subarray(0, at), Buffer.from([0, 0]), glyph.subarray(at + 2 + length)]);
}

/** Walks the components to the last one; its flag and what follows it go. */
function composite(glyph: Buffer): Buffer {
  const out = Buffer.from(glyph);
  let at = 10;
  let flags: number;
  do {
    flags = out.readUInt16BE(at);
    out.writeUInt16BE(flags & ~HAS_INSTRUCTIONS, at);
    const words = flags & 0x0001 ? 4 : 2;
    const scale = flags & 0x0080 ? 8 : flags & 0x0040 ? 4 : flags & 0x0008 ? 2 : 0;
    at += 4 + words + scale;
  } while (flags & MORE_COMPONENTS);
  return out.subarray(0, at);
}

function padded(glyph: Buffer): Buffer {
  const rest = glyph.length % 4;
  return rest === 0 ? glyph : Buffer.concat([glyph, Buffer.alloc(4 - rest)]);
}
