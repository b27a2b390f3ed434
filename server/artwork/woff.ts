import { inflateSync } from 'node:zlib';

/**
 * A WOFF 1 file as the plain sfnt font inside it. The tables of a WOFF are those of the font,
 * deflated one by one; pdf-lib embeds font bytes as they are, so it must be given the font.
 * @throws RangeError when the bytes are not a WOFF 1 file.
 */
export function unwrapWoff(woff: Uint8Array): Uint8Array {
  const source = Buffer.from(woff.buffer, woff.byteOffset, woff.byteLength);
  if (source.length < 44 || source.toString('latin1', 0, 4) !== 'wOFF') throw new RangeError('not a WOFF font file');
  const count = source.readUInt16BE(12);
  const tables = Array.from({ length: count }, (_, index) => {
    const at = 44 + index * 20;
    const packed = source.subarray(source.readUInt32BE(at + 4), source.readUInt32BE(at + 4) + source.readUInt32BE(at + 8));
    const length = source.readUInt32BE(at + 12);
    return {
      tag: source.toString('latin1', at, at + 4),
      checksum: source.readUInt32BE(at + 16),
      data: packed.length < length ? inflateSync(packed) : packed,
    };
  }).sort((a, b) => (a.tag < b.tag ? -1 : 1));
  return joinTables(source.readUInt32BE(4), tables);
}

interface Table {
  readonly tag: string;
  readonly checksum: number;
  readonly data: Uint8Array;
}

function joinTables(flavour: number, tables: readonly Table[]): Uint8Array {
  const head = 12 + 16 * tables.length;
  const size = tables.reduce((total, table) => total + padded(table.data.length), head);
  const out = Buffer.alloc(size);
  const power = 2 ** Math.floor(Math.log2(tables.length));
  out.writeUInt32BE(flavour, 0);
  out.writeUInt16BE(tables.length, 4);
  out.writeUInt16BE(power * 16, 6);
  out.writeUInt16BE(Math.log2(power), 8);
  out.writeUInt16BE(tables.length * 16 - power * 16, 10);
  let at = head;
  tables.forEach((table, index) => {
    const entry = 12 + 16 * index;
    out.write(table.tag, entry, 'latin1');
    out.writeUInt32BE(table.checksum, entry + 4);
    out.writeUInt32BE(at, entry + 8);
    out.writeUInt32BE(table.data.length, entry + 12);
    out.set(table.data, at);
    at += padded(table.data.length);
  });
  return out;
}

function padded(length: number): number {
  return Math.ceil(length / 4) * 4;
}
