import { createHash } from 'node:crypto';
import { fileTypeFromBuffer } from 'file-type';
import sharp from 'sharp';
import { AppError } from '#server/http/app-error.ts';
import { safeFileName } from '#server/http/file-answer.ts';

/** A supplier's paper, checked by its content and fit to be kept. */
export interface Paper {
  readonly bytes: Buffer;
  readonly mediaType: 'application/pdf' | 'image/jpeg' | 'image/png' | 'image/webp';
  /** The name it came with, made harmless, ending set right. */
  readonly fileName: string;
  /** SHA-256 of the bytes kept, in hex. */
  readonly sha256: string;
}

/** 20 megapixels: a telephone's photo; more could exhaust memory when unpacked. */
const PIXEL_LIMIT = 20_000_000;
const SECONDS = 10;

const PHOTOS = { 'image/jpeg': 'jpg', 'image/png': 'png', 'image/webp': 'webp' } as const;
type PhotoType = keyof typeof PHOTOS;

/**
 * Reads an uploaded file by what it holds, not by what it is called: a PDF is kept as it is,
 * a photo is turned upright and written anew, which drops its place, time and device.
 * @throws AppError `invalid` for nothing, `unsupported-file` for any other kind or a broken one
 */
export async function readPaper(bytes: Buffer, fileName: string): Promise<Paper> {
  if (bytes.length === 0) throw new AppError('invalid', { issues: [{ pointer: '/file', message: 'This file is empty.' }] });
  const mime = (await fileTypeFromBuffer(bytes).catch(() => undefined))?.mime;
  if (mime === 'application/pdf') return readPdf(bytes, fileName);
  if (mime !== undefined && isPhoto(mime)) return readPhoto(bytes, mime, fileName);
  if (mime === 'image/heic' || mime === 'image/heif' || mime === 'image/avif') {
    throw unsupported('A photo in this form cannot be read here. Set the camera to JPEG, or send it as JPEG.');
  }
  throw unsupported('Only a PDF or a photo as JPEG, PNG or WebP is taken; this file holds something else.');
}

function readPdf(bytes: Buffer, fileName: string): Paper {
  // A PDF begins with its mark and ends with another; one cut off in transit lacks the second.
  const end = bytes.lastIndexOf('%%EOF');
  if (bytes.indexOf('%PDF-') !== 0 || end < 0 || end < bytes.length - 2048) throw unsupported('This PDF is not whole. Save it again and send it once more.');
  return keep(bytes, 'application/pdf', fileName, 'pdf');
}

async function readPhoto(bytes: Buffer, mediaType: PhotoType, fileName: string): Promise<Paper> {
  try {
    const photo = sharp(bytes, { limitInputPixels: PIXEL_LIMIT, failOn: 'error', sequentialRead: true }).timeout({ seconds: SECONDS }).rotate();
    const format = PHOTOS[mediaType];
    const written = await (format === 'png' ? photo.png() : format === 'webp' ? photo.webp({ quality: 90 }) : photo.jpeg({ quality: 90 })).toBuffer();
    return keep(written, mediaType, fileName, format);
  } catch (error) {
    const isTooMany = error instanceof Error && error.message.includes('pixel limit');
    throw isTooMany
      ? new AppError('too-large', { message: 'A photo can have at most 20 megapixels. Send a smaller one.' })
      : unsupported('This photo is broken and cannot be read. Send it again or take another.');
  }
}

function keep(bytes: Buffer, mediaType: Paper['mediaType'], fileName: string, ending: string): Paper {
  const stem = safeFileName(fileName).replace(/\.[a-z0-9]{1,8}$/i, '') || 'document';
  return { bytes, mediaType, fileName: `${stem}.${ending}`, sha256: createHash('sha256').update(bytes).digest('hex') };
}

function isPhoto(mime: string): mime is PhotoType {
  return Object.hasOwn(PHOTOS, mime);
}

function unsupported(message: string): AppError {
  return new AppError('unsupported-file', { message });
}
