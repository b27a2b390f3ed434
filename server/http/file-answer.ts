import type { Response } from 'express';

/** Bytes to hand out in place of JSON. */
export class FileAnswer {
  readonly bytes: Uint8Array;
  readonly mediaType: string;
  /** As a person would name the file; encoded on the way out. */
  readonly fileName: string;
  /** Shown on a screen of ours; it is not taken away. */
  readonly isPreview: boolean;

  constructor(file: { readonly bytes: Uint8Array; readonly mediaType: string; readonly fileName: string; readonly isPreview?: boolean }) {
    this.bytes = file.bytes;
    this.mediaType = file.mediaType;
    this.fileName = file.fileName;
    this.isPreview = file.isPreview ?? false;
  }
}

/** Always a download with its own sandbox: nothing that someone uploaded runs under our origin. */
export function sendFile(res: Response, file: FileAnswer): void {
  res.set({
    'Content-Type': file.mediaType,
    'Content-Disposition': attachment(file.fileName),
    'Content-Security-Policy': "default-src 'none'; sandbox",
    'X-Content-Type-Options': 'nosniff',
  });
  res.send(Buffer.from(file.bytes.buffer, file.bytes.byteOffset, file.bytes.byteLength));
}

/** `attachment` with the name in plain letters and, beside it, in full (RFC 6266, RFC 8187). */
export function attachment(fileName: string): string {
  const name = safeFileName(fileName);
  const plain = name.normalize('NFKD').replaceAll(/[^\x20-\x7e]/g, '').replaceAll(/["\\%;]/g, '_').trim() || 'file';
  const full = encodeURIComponent(name).replaceAll(/['()*]/g, (letter) => `%${letter.charCodeAt(0).toString(16).toUpperCase()}`);
  return `attachment; filename="${plain}"; filename*=UTF-8''${full}`;
}

/** The last part of a path with what file systems and headers cannot bear taken out; at most 120 characters, ending kept. */
export function safeFileName(raw: string): string {
  const last = raw.split(/[/\\]/).at(-1) ?? '';
  const clean = last
    .replaceAll(/[\p{C}<>:"|?*]/gu, '')
    .replaceAll(/\s+/g, ' ')
    .replace(/^[. ]+/, '')
    .trim();
  const letters = Array.from(clean);
  if (letters.length <= 120) return clean || 'file';
  const ending = /\.[a-z0-9]{1,8}$/i.exec(clean)?.[0] ?? '';
  return letters.slice(0, 120 - ending.length).join('') + ending;
}
