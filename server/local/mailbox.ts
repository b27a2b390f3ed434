import { randomBytes } from 'node:crypto';
import { mkdirSync } from 'node:fs';
import { open, rename } from 'node:fs/promises';
import { join } from 'node:path';
import { SMTPServer } from 'smtp-server';
import type { LocalService } from './listen.ts';

const LARGEST_MESSAGE = 25 * 1024 * 1024;

/**
 * A mail server on loopback that delivers to nobody: each message is kept
 * whole as one `.eml` file, named so that the folder sorts by arrival.
 */
export async function startMailbox(options: { readonly port: number; readonly folder: string }): Promise<LocalService> {
  mkdirSync(options.folder, { recursive: true });
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    size: LARGEST_MESSAGE,
    logger: false,
    onData(stream, _session, done) {
      const chunks: Buffer[] = [];
      stream.on('data', (chunk: Buffer) => {
        if (!stream.sizeExceeded) chunks.push(chunk);
      });
      stream.on('end', () => {
        if (stream.sizeExceeded) done(Object.assign(new Error('The message is larger than 25 MB.'), { responseCode: 552 }));
        else keep(options.folder, Buffer.concat(chunks)).then(() => done(), () => done(Object.assign(new Error('The message could not be kept.'), { responseCode: 452 })));
      });
    },
  });
  server.on('error', () => {});
  const listening = server.listen(options.port, '127.0.0.1');
  await new Promise<void>((resolve, reject) => {
    listening.once('listening', () => resolve());
    listening.once('error', reject);
  });
  const address = listening.address();
  if (address === null || typeof address === 'string') throw new Error('the mailbox has no port');
  return { url: `smtp://127.0.0.1:${String(address.port)}`, stop: () => new Promise((resolve) => server.close(() => resolve())) };
}

/** Whole or not at all: written under another name first. */
async function keep(folder: string, message: Buffer): Promise<void> {
  const name = `${new Date().toISOString().replace(/[:.]/g, '')}-${randomBytes(4).toString('hex')}.eml`;
  const half = join(folder, `${name}.half`);
  const file = await open(half, 'wx', 0o600);
  try {
    await file.writeFile(message);
    await file.sync();
  } finally {
    await file.close();
  }
  await rename(half, join(folder, name));
}
