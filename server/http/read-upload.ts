import busboy from 'busboy';
import type { Request } from 'express';
import { AppError } from './app-error.ts';

/** 20 MB, the largest file taken. */
export const UPLOAD_LIMIT = 20 * 1024 * 1024;
/** Room for the boundaries and fields around the file. */
const ENVELOPE = 64 * 1024;

/** One uploaded file and the fields that came with it. */
export interface Upload {
  readonly fields: Readonly<Record<string, string>>;
  /** The name as sent: for the eye only, never for a path. */
  readonly fileName: string;
  readonly bytes: Buffer;
}

/**
 * Reads a multipart form with exactly one part named `file`, counting while it streams.
 * @throws AppError `too-large` past the limit, `invalid` for a broken or empty form
 */
export function readUpload(req: Request): Promise<Upload> {
  return new Promise((resolve, reject) => {
    if (Number(req.headers['content-length'] ?? 0) > UPLOAD_LIMIT + ENVELOPE) {
      req.resume();
      reject(new AppError('too-large', { message: 'A file can have at most 20 MB.' }));
      return;
    }
    const form = openForm(req);
    const fields = new Map<string, string>();
    const chunks: Buffer[] = [];
    let fileName: string | undefined;
    const fail = (error: AppError) => {
      req.unpipe(form);
      req.resume();
      chunks.length = 0;
      reject(error);
    };
    form.on('field', (name, value, info) => {
      if (info.nameTruncated || info.valueTruncated || fields.has(name)) fail(broken());
      else fields.set(name, value);
    });
    form.on('file', (name, stream, info) => {
      // Browsers write a quote and line ends of a name as %22, %0D and %0A (HTML standard, multipart/form-data).
      fileName = name === 'file' ? (info.filename ?? '').replaceAll(/%(?:22|0D|0A)/g, '') : undefined;
      stream.on('data', (chunk: Buffer) => chunks.push(chunk));
      stream.on('limit', () => fail(new AppError('too-large', { message: 'A file can have at most 20 MB.' })));
      stream.on('error', () => fail(broken()));
    });
    for (const limit of ['filesLimit', 'fieldsLimit', 'partsLimit'] as const) form.on(limit, () => fail(broken()));
    form.on('error', () => fail(broken()));
    req.on('aborted', () => fail(broken()));
    form.on('close', () => {
      if (fileName === undefined) fail(new AppError('invalid', { issues: [{ pointer: '/file', message: 'Choose a file.' }] }));
      else resolve({ fields: Object.fromEntries(fields), fileName, bytes: Buffer.concat(chunks) });
    });
    req.pipe(form);
  });
}

function openForm(req: Request) {
  try {
    return busboy({
      headers: req.headers,
      defParamCharset: 'utf8',
      // The reader speaks up when a file reaches its limit, so that lies one byte above ours.
      limits: { files: 1, fields: 20, parts: 21, fieldSize: 10_000, fieldNameSize: 100, fileSize: UPLOAD_LIMIT + 1, headerPairs: 100 },
    });
  } catch {
    // The content type is not multipart or lacks its boundary.
    req.resume();
    throw new AppError('invalid', { issues: [{ pointer: '/file', message: 'Choose a file.' }] });
  }
}

function broken(): AppError {
  return new AppError('invalid', { message: 'The upload broke off or is not a proper form. Send it again.' });
}
