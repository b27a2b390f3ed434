import { fileTypeFromBuffer } from 'file-type';
import { AppError } from '#server/http/app-error.ts';
import { readPhoto, type Photo } from './read-photo.ts';
import { readSvg, type Drawing } from './read-svg.ts';

export type ReadPicture = ({ readonly kind: 'photo' } & Photo) | ({ readonly kind: 'drawing' } & Drawing);

/**
 * Reads a picture for labels by what it holds: PNG, JPEG or SVG.
 * @throws AppError `invalid` for nothing, `unsupported-file`, `too-large`
 */
export async function readPicture(bytes: Buffer): Promise<ReadPicture> {
  if (bytes.length === 0) throw new AppError('invalid', { issues: [{ pointer: '/file', message: 'This file is empty.' }] });
  const mime = (await fileTypeFromBuffer(bytes).catch(() => undefined))?.mime;
  if (mime === 'image/png' || mime === 'image/jpeg' || mime === 'image/apng') return { kind: 'photo', ...(await readPhoto(bytes)) };
  const beginning = bytes.subarray(0, 4096).toString('utf8').replace(/^\uFEFF/, '').trimStart();
  if (beginning.startsWith('<')) return { kind: 'drawing', ...(await readSvg(bytes)) };
  if (mime === 'image/gif' || mime === 'image/webp') throw new AppError('unsupported-file', { message: 'This kind of picture is made for screens. Send a PNG, a JPEG or an SVG.' });
  throw new AppError('unsupported-file', { message: 'Only PNG, JPEG and SVG are taken; this file holds something else.' });
}
