import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import type { Picture } from '#shared/contracts/pictures.contract.ts';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import { BRAM, INES, PIET } from '#server/local/demo-people.ts';
import { openTestApp, type Client, type TestApp } from '#tests/support/app.ts';

vi.setConfig({ testTimeout: 60_000 });
let stage: TestApp;
let piet: Client;
const room = mkdtempSync(join(tmpdir(), 'pictures-'));
beforeAll(async () => {
  stage = await openTestApp();
  piet = await stage.as(PIET);
}, 120_000);
afterAll(async () => {
  rmSync(room, { recursive: true, force: true });
  await stage.close();
});

const LOGO = Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 100 50"><path d="M0 0h100v50z" fill="#084438"/></svg>');
const send = async (bytes: Buffer, name: string): Promise<Picture> => (await piet.post('/pictures').attach('file', bytes, name).expect(200)).body as Picture;
const photo = () => sharp({ create: { width: 600, height: 300, channels: 3, background: { r: 120, g: 40, b: 60 } } }).jpeg().toBuffer();

test('a drawing is kept as its shapes alone: nothing of the file lies in the store', async () => {
  const before = stage.stored.size;
  const picture = await send(LOGO, 'Sprig.svg');
  expect(picture).toMatchObject({ name: 'Sprig', kind: 'drawing', width: 1000, height: 500 });
  expect(stage.stored.size).toBe(before);
  await piet.get(`/pictures/${picture.id}/preview`).expect(404);
});

test('a photo shows a preview, and its taking is no entry of the trail', async () => {
  const picture = await send(await photo(), 'Bath.jpg');
  const answer = await piet.get(`/pictures/${picture.id}/preview`).expect(200);
  expect(answer.headers['content-type']).toBe('image/png');
  const { items } = (await piet.get('/trail').expect(200)).body as { items: { act: string; subjectKind: string }[] };
  expect(items[0]).toMatchObject({ act: 'added', subjectKind: 'picture' });
});

test('another house sees and removes nothing of it', async () => {
  const picture = await send(LOGO, 'Private.svg');
  const bram = await stage.as(BRAM);
  expect(((await bram.get('/pictures').expect(200)).body as { items: Picture[] }).items).toEqual([]);
  await bram.get(`/pictures/${picture.id}/preview`).expect(404);
  await bram.delete(`/pictures/${picture.id}`).expect(404);
});

test('on a label both are painted into the press file, in process inks; a picture in use is not removed', async () => {
  const [logo, bath] = [await send(LOGO, 'Mark.svg'), await send(await photo(), 'Tub.jpg')];
  const ines = await stage.as(INES);
  const { items } = (await ines.get('/products?find=juniper').expect(200)).body as { items: { id: string }[] };
  const { product } = (await ines.get(`/products/${items[0]!.id}`).expect(200)).body as { product: { id: string; version: number; draft: ProductDraft } };
  const draft: ProductDraft = {
    ...product.draft,
    label: {
      ...product.draft.label, container: { shape: 'cylinder', diameterMm: '70', labelHeightMm: '180', overlapMm: '5' },
      byHand: {
        freed: [],
        added: [
          { id: 'a', kind: 'picture', picture: logo.id, frame: { x: 150_000, y: 100_000, width: 20_000, height: 10_000 }, style: {} },
          { id: 'b', kind: 'picture', picture: bath.id, frame: { x: 180_000, y: 100_000, width: 20_000, height: 10_000 }, style: {} },
        ],
      },
    },
  };
  await ines.put(`/products/${product.id}`, { version: product.version, draft }).expect(200);
  const answer = await ines.get(`/products/${product.id}/label.pdf`).buffer(true).parse((res, done) => {
    const parts: Buffer[] = [];
    res.on('data', (part: Buffer) => parts.push(part));
    res.on('end', () => done(null, Buffer.concat(parts)));
  }).expect(200);
  const path = join(room, 'label.pdf');
  writeFileSync(path, answer.body as Buffer);
  // Outside tools: qpdf and poppler-utils of the operating system.
  expect(execFileSync('qpdf', ['--check', path], { encoding: 'utf8' })).toContain('No syntax or stream encoding errors');
  const images = execFileSync('pdfimages', ['-list', path], { encoding: 'utf8' }).trim().split('\n').slice(2);
  expect(images).toHaveLength(1);
  // Width, height, colour, components, bits and the pixels to the inch at its printed size.
  expect(images[0]!.trim().split(/\s+/).slice(3, 8)).toEqual(['600', '300', 'cmyk', '4', '8']);
  expect(images[0]).toMatch(/\s762\s+762\s/);
  const refused = await piet.delete(`/pictures/${bath.id}`).expect(409);
  expect((refused.body as { detail: string }).detail).toContain('Juniper & Oat Body Wash');
});

test('a picture that no label shows is removed with its bytes', async () => {
  const before = stage.stored.size;
  const picture = await send(await photo(), 'Gone.jpg');
  expect(stage.stored.size).toBe(before + 2);
  await piet.delete(`/pictures/${picture.id}`).expect(200);
  expect(stage.stored.size).toBe(before);
});

test('what is no picture is refused in words', async () => {
  const answer = await piet.post('/pictures').attach('file', Buffer.from('%PDF-1.7\n%%EOF\n'), 'a.png');
  expect(answer.status).toBe(415);
});
