import { createHash, randomBytes } from 'node:crypto';
import { mkdirSync } from 'node:fs';
import { mkdir, open, readFile, rename, rm, stat } from 'node:fs/promises';
import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import { join } from 'node:path';
import { close, listen, type LocalService } from './listen.ts';

export interface ObjectStorageOptions {
  readonly port: number;
  readonly folder: string;
  /** The one key that is let in. Signatures are not checked: it listens on loopback only. */
  readonly accessKeyId: string;
}

/** Largest object taken, in bytes: uploads end at 20 MB. */
const LARGEST_OBJECT = 64 * 1024 * 1024;
const BUCKET = /^[a-z0-9][a-z0-9.-]{1,61}[a-z0-9]$/;

/** An answer that is not the object itself. */
class Refusal extends Error {
  readonly status: number;
  readonly code: string;
  constructor(status: number, code: string, message: string) {
    super(message);
    this.status = status;
    this.code = code;
  }
}

/**
 * A small object storage on loopback that speaks as much of the S3 protocol
 * as the product uses: make a bucket; put, get, head and delete an object.
 * One object is one file, which appears whole or not at all.
 */
export async function startObjectStorage(options: ObjectStorageOptions): Promise<LocalService> {
  mkdirSync(options.folder, { recursive: true });
  const server = createServer((req, res) => {
    serve(options, req, res).catch((error: unknown) => refuse(res, error, req.method === 'HEAD'));
  });
  const { port } = await listen(server, options.port);
  return { url: `http://127.0.0.1:${String(port)}`, stop: () => close(server) };
}

async function serve(options: ObjectStorageOptions, req: IncomingMessage, res: ServerResponse): Promise<void> {
  const key = /Credential=([^/,\s]+)\//.exec(req.headers.authorization ?? '')?.[1];
  if (key !== options.accessKeyId) throw new Refusal(403, 'InvalidAccessKeyId', 'The access key is not known here.');
  // Read as it came: an address parser would let dots in a key climb out of its bucket.
  const path = (req.url ?? '/').split('?', 1)[0]?.slice(1) ?? '';
  const [bucket = '', ...rest] = path.split('/');
  const object = decodeURIComponent(rest.join('/'));
  if (!BUCKET.test(bucket)) throw new Refusal(400, 'InvalidBucketName', 'This is no name for a bucket.');
  const folder = join(options.folder, bucket);
  if (object === '') return serveBucket(folder, req, res);
  if (!(await isThere(folder))) throw new Refusal(404, 'NoSuchBucket', 'There is no such bucket.');
  // The key never becomes a path.
  const file = join(folder, createHash('sha256').update(object).digest('hex'));
  switch (req.method) {
    case 'PUT':
      return putObject(file, object, req, res);
    case 'GET':
    case 'HEAD':
      return getObject(file, req, res);
    case 'DELETE':
      await rm(file, { force: true });
      res.writeHead(204).end();
      return;
    default:
      throw new Refusal(405, 'MethodNotAllowed', 'This is not done here.');
  }
}

async function serveBucket(folder: string, req: IncomingMessage, res: ServerResponse): Promise<void> {
  if (req.method === 'PUT') {
    if (await isThere(folder)) throw new Refusal(409, 'BucketAlreadyOwnedByYou', 'The bucket is there already.');
    await mkdir(folder, { recursive: true });
    res.writeHead(200).end();
  } else if (req.method === 'HEAD') {
    res.writeHead((await isThere(folder)) ? 200 : 404).end();
  } else {
    throw new Refusal(405, 'MethodNotAllowed', 'This is not done here.');
  }
}

async function putObject(file: string, key: string, req: IncomingMessage, res: ServerResponse): Promise<void> {
  if (/aws-chunked/.test(req.headers['content-encoding'] ?? '')) throw new Refusal(501, 'NotImplemented', 'Send the body in one piece.');
  const body = await readBody(req);
  const declared = req.headers['content-length'];
  if (declared !== undefined && Number(declared) !== body.length) throw new Refusal(400, 'IncompleteBody', 'The body broke off.');
  const tag = createHash('md5').update(body).digest('hex');
  const head = JSON.stringify({ key, type: req.headers['content-type'] ?? 'application/octet-stream', tag });
  await writeWhole(file, Buffer.concat([Buffer.from(`${head}\n`), body]));
  res.writeHead(200, { ETag: `"${tag}"` }).end();
}

async function getObject(file: string, req: IncomingMessage, res: ServerResponse): Promise<void> {
  const whole = await readFile(file).catch((error: unknown) => {
    if (error instanceof Error && 'code' in error && error.code === 'ENOENT') throw new Refusal(404, 'NoSuchKey', 'There is no such object.');
    throw error;
  });
  const end = whole.indexOf(0x0a);
  const head = JSON.parse(whole.subarray(0, end).toString('utf8')) as { type: string; tag: string };
  const body = whole.subarray(end + 1);
  res.writeHead(200, { 'Content-Type': head.type, 'Content-Length': String(body.length), ETag: `"${head.tag}"` });
  res.end(req.method === 'HEAD' ? undefined : body);
}

async function readBody(req: IncomingMessage): Promise<Buffer> {
  const chunks: Buffer[] = [];
  let size = 0;
  for await (const chunk of req as AsyncIterable<Buffer>) {
    size += chunk.length;
    if (size > LARGEST_OBJECT) throw new Refusal(400, 'EntityTooLarge', 'The object is larger than 64 MB.');
    chunks.push(chunk);
  }
  return Buffer.concat(chunks);
}

async function writeWhole(file: string, bytes: Buffer): Promise<void> {
  const half = `${file}.${randomBytes(6).toString('hex')}.half`;
  try {
    const handle = await open(half, 'wx', 0o600);
    try {
      await handle.writeFile(bytes);
      await handle.sync();
    } finally {
      await handle.close();
    }
    await rename(half, file);
  } catch (error) {
    await rm(half, { force: true });
    throw error;
  }
}

async function isThere(path: string): Promise<boolean> {
  return stat(path).then(() => true, () => false);
}

function refuse(res: ServerResponse, error: unknown, isHead: boolean): void {
  const { status, code, message } = error instanceof Refusal ? error : isFull(error) ? new Refusal(503, 'ServiceUnavailable', 'The disk is full.') : new Refusal(500, 'InternalError', 'The object could not be served.');
  if (res.headersSent) {
    res.destroy();
    return;
  }
  // An unread body would be taken for the next request.
  res.writeHead(status, { 'Content-Type': 'application/xml', Connection: 'close' });
  res.end(isHead ? undefined : `<?xml version="1.0" encoding="UTF-8"?><Error><Code>${code}</Code><Message>${message}</Message></Error>`);
}

function isFull(error: unknown): boolean {
  return error instanceof Error && 'code' in error && (error.code === 'ENOSPC' || error.code === 'EDQUOT');
}
