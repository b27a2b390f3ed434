import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import type { LocalService } from '#server/local/listen.ts';
import { startObjectStorage } from '#server/local/object-storage.ts';
import { createObjectStore, type ObjectStore } from '#server/storage/object-store.ts';

const folder = mkdtempSync(join(tmpdir(), 'colophon-files-'));
let service: LocalService;
let store: ObjectStore;
const open = (accessKeyId: string, bucket = 'papers') => createObjectStore({ endpoint: new URL(service.url), region: 'local', bucket, accessKeyId, secretAccessKey: 'word' });

beforeAll(async () => {
  service = await startObjectStorage({ port: 0, folder, accessKeyId: 'key' });
  store = open('key');
  await store.prepare();
});
afterAll(async () => {
  await service.stop();
  rmSync(folder, { recursive: true, force: true });
});

test('what is put comes back byte for byte with its type', async () => {
  const bytes = Buffer.from(Array.from({ length: 70_000 }, (_each, at) => at % 256));
  await store.putObject('house/one/paper 1.pdf', bytes, 'application/pdf');
  expect(await store.getObject('house/one/paper 1.pdf')).toEqual({ bytes, contentType: 'application/pdf' });
});

test('an empty object is an object', async () => {
  await store.putObject('empty', Buffer.alloc(0), 'text/plain');
  expect((await store.getObject('empty'))?.bytes).toHaveLength(0);
});

test('the later of two objects under one key stands', async () => {
  await store.putObject('twice', Buffer.from('first'), 'text/plain');
  await store.putObject('twice', Buffer.from('second'), 'text/plain');
  expect((await store.getObject('twice'))?.bytes.toString()).toBe('second');
});

test('what was never put, or was deleted, is not there', async () => {
  expect(await store.getObject('never')).toBeUndefined();
  await store.putObject('gone', Buffer.from('x'), 'text/plain');
  await store.deleteObject('gone');
  await store.deleteObject('gone');
  expect(await store.getObject('gone')).toBeUndefined();
});

test.each(['../../outside', '..', '/etc/outside', 'a/../../b', 'a\u0000b', 'ü/π'])('the key %j stays inside its bucket', async (key) => {
  await store.putObject(key, Buffer.from(key), 'text/plain');
  expect((await store.getObject(key))?.bytes.toString()).toBe(key);
  expect(readdirSync(folder)).toEqual(['papers']);
});

test('preparing a bucket that is there changes nothing', async () => {
  await store.putObject('kept', Buffer.from('x'), 'text/plain');
  await store.prepare();
  expect((await store.getObject('kept'))?.bytes.toString()).toBe('x');
});

test('another access key is refused', async () => {
  await expect(open('other').putObject('x', Buffer.from('x'), 'text/plain')).rejects.toMatchObject({ name: 'InvalidAccessKeyId' });
});

test('files outlive a restart', async () => {
  await store.putObject('lasting', Buffer.from('still here'), 'text/plain');
  const second = await startObjectStorage({ port: 0, folder, accessKeyId: 'key' });
  const again = createObjectStore({ endpoint: new URL(second.url), region: 'local', bucket: 'papers', accessKeyId: 'key', secretAccessKey: 'word' });
  expect((await again.getObject('lasting'))?.bytes.toString()).toBe('still here');
  await second.stop();
});

test('no half-written file is left behind', () => {
  expect(readdirSync(join(folder, 'papers')).filter((name) => name.endsWith('.half'))).toEqual([]);
});

test('a storage that is away is said to be away', async () => {
  const gone = await startObjectStorage({ port: 0, folder, accessKeyId: 'key' });
  const away = createObjectStore({ endpoint: new URL(gone.url), region: 'local', bucket: 'papers', accessKeyId: 'key', secretAccessKey: 'word' });
  await gone.stop();
  await expect(away.getObject('x')).rejects.toMatchObject({ code: 'unavailable' });
});
