import { inflateSync } from 'node:zlib';

/** The tables of a WOFF 1 file by tag: those of the font inside it, deflated one by one. */
export interface Unwrapped {
  readonly flavour: number;
  readonly tables: ReadonlyMap<string, Uint8Array>;
}

/** @throws RangeError when the bytes are not a WOFF 1 file. */
export function unwrapWoff(woff: Uint8Array): Unwrapped {
  const source = Buffer.from(woff.buffer, woff.byteOffset, woff.byteLength);
  if (source.length < 44 || source.toString('latin1', 0, 4) !== 'wOFF') throw new RangeError('not a WOFF font file');
  const tables = new Map<string, Uint8Array>();
  for (let index = 0; index < source.readUInt16BE(12); index += 1) {
    const at = 44 + index * 20;
    const packed = source.subarray(source.readUInt32BE(at + 4), source.readUInt32BE(at + 4) + source.readUInt32BE(at + 8));
    tables.set(source.toString('latin1', at, at + 4), packed.length < source.readUInt32BE(at + 12) ? inflateSync(packed) : packed);
  }
  return { flavour: source.readUInt32BE(4), tables };
}

/** Joins tables into a plain font file: pdf-lib embeds font bytes as they are, so it must be given one. */
export function joinFont({ flavour, tables }: Unwrapped): Uint8Array {
  const sorted = [...tables].sort(([a], [b]) => (a < b ? -1 : 1));
  const head = 12 + 16 * sorted.length;
  const out = Buffer.alloc(sorted.reduce((total, [, data]) => total + padded(data.length), head));
  const power = 2 ** Math.floor(Math.log2(sorted.length));
  out.writeUInt32BE(flavour, 0);
  out.writeUInt16BE(sorted.length, 4);
  out.writeUInt16BE(power * 16, 6);
  out.writeUInt16BE(Math.log2(power), 8);
  out.writeUInt16BE(sorted.length * 16 - power * 16, 10);
  let at = head;
  sorted.forEach(([tag, data], index) => {
    const entry = 12 + 16 * index;
    out.write(tag, entry, 'latin1');
    out.set(data, at);
    out.writeUInt32BE(checksum(out.subarray(at, at + padded(data.length))), entry + 4);
    out.writeUInt32BE(at, entry + 8);
    out.writeUInt32BE(data.length, entry + 12);
    at += padded(data.length);
  });
  return out;
}

function checksum(words: Buffer): number {
  let sum = 0;
  for (let at = 0; at < words.length; at += 4) sum = (sum + words.readUInt32BE(at)) >>> 0;
  return sum;
}

function padded(length: number): number {
  return Math.ceil(length / 4) * 4;
}
