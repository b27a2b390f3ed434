import { z } from 'zod';
import { DEMO_PEOPLE, NEWCOMER } from './demo-people.ts';
import { startIdentity } from './identity.ts';
import { startMailbox } from './mailbox.ts';
import { startObjectStorage } from './object-storage.ts';
import type { LocalService } from './listen.ts';

/** The stand-ins for services that a local start has not: started by the starter, which sends one message with what it wants. */
const wish = z.strictObject({
  mode: z.enum(['development', 'test'], { error: 'the built-in services are not for production' }),
  identity: z.strictObject({ port: z.int(), publicUrl: z.url().transform((url) => new URL(url)), clientId: z.string(), clientSecret: z.string() }).optional(),
  mail: z.strictObject({ port: z.int(), folder: z.string() }).optional(),
  storage: z.strictObject({ port: z.int(), folder: z.string(), accessKeyId: z.string() }).optional(),
});

const running: LocalService[] = [];

async function begin(message: unknown): Promise<void> {
  const wanted = wish.parse(message);
  const add = async (service: Promise<LocalService>): Promise<string> => {
    const started = await service;
    running.push(started);
    return started.url;
  };
  process.send?.({
    identity: wanted.identity && (await add(startIdentity({ ...wanted.identity, people: [...DEMO_PEOPLE, NEWCOMER] }))),
    mail: wanted.mail && (await add(startMailbox(wanted.mail))),
    storage: wanted.storage && (await add(startObjectStorage(wanted.storage))),
  });
}

async function end(): Promise<void> {
  await Promise.all(running.map((service) => service.stop()));
  process.exit(0);
}

process.once('message', (message) => {
  begin(message).catch((error: unknown) => {
    process.send?.({ failed: error instanceof z.ZodError ? z.prettifyError(error) : String(error instanceof Error ? error.message : error) });
    process.exitCode = 1;
    process.disconnect();
  });
});
process.on('SIGTERM', () => void end());
// The starter is gone: nobody is left to use these.
process.on('disconnect', () => void end());
