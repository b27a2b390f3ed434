import { deflateSync } from 'node:zlib';
import { createHash } from 'node:crypto';
import sharp from 'sharp';
import { afterAll, beforeAll, beforeEach, describe, expect, test, vi } from 'vitest';
import { INES } from '#server/local/demo-people.ts';
import { demoMaterialId } from '#server/db/demo/draft-parts.ts';
import type { MaterialFields } from '#shared/contracts/materials.contract.ts';
import { openTestApp, type Client, type TestApp } from '#tests/support/app.ts';

vi.setConfig({ testTimeout: 60_000 });

let stage: TestApp;
let ines: Client;
beforeAll(async () => {
  stage = await openTestApp();
  ines = await stage.as(INES);
}, 120_000);
afterAll(() => stage.close());
beforeEach(() => expect(stage.faults).toEqual([]));

const fields = (more: Partial<MaterialFields> = {}): MaterialFields => ({
  tradeName: 'Fen clay',
  supplier: 'Saltgarth Minerals',
  declareAs: 'ingredients',
  composition: [{ inci: 'Kaolin', percent: '100' }],
  constituents: [],
  pricePerKg: '2.7',
  currency: 'EUR',
  notes: '',
  handling: {},
  ...more,
});
const add = async (more: Partial<MaterialFields> = {}) => {
  const answer = await ines.post('/materials', fields(more));
  expect(answer.status).toBe(200);
  return answer.body as MaterialFields & { id: string; version: number };
};

test('a material is kept as it was written, to the last digit', async () => {
  const { id } = await add({ pricePerKg: '12.345678901234567890123456', composition: [{ inci: 'Kaolin', min: '99.0', typical: '99.50', max: '100' }, { inci: 'Aqua', min: '0', max: '1' }] });
  const { body } = await ines.get(`/materials/${id}`);
  expect(body).toMatchObject({ version: 1, savedBy: 'Ines Tarrow', archived: false, usedIn: [], documents: [], pricePerKg: '12.345678901234567890123456' });
  expect(body.composition[0]).toEqual({ inci: 'Kaolin', min: '99.0', typical: '99.50', max: '100' });
});

test('what its certificates say is kept with the material, and taken back when it is left out', async () => {
  const { id, version } = await add({ tradeName: 'Pressed nut oil', facts: { peanutProteinPpm: '0.4', certificateSeen: true } });
  expect((await ines.get(`/materials/${id}`)).body.facts).toEqual({ peanutProteinPpm: '0.4', certificateSeen: true });
  const answer = await ines.put(`/materials/${id}`, { ...fields({ tradeName: 'Pressed nut oil' }), version });
  expect([answer.status, answer.body.facts]).toEqual([200, {}]);
  expect((await ines.post('/materials', { ...fields(), facts: { peanutProteinPpm: 0.4 } })).status).toBe(422);
});

test('the list finds by trade name, supplier and INCI name, accents and case aside', async () => {
  await add({ tradeName: 'Crème base', supplier: 'Thrussel and Vane', composition: [{ inci: 'Cetearyl Alcohol', percent: '100' }] });
  const found = async (find: string) => (await ines.get(`/materials?find=${encodeURIComponent(find)}`)).body.items.map((item: { tradeName: string }) => item.tradeName);
  expect(await found('CREME')).toEqual(['Crème base']);
  expect(await found('cetearyl thrussel')).toContain('Crème base');
  expect(await found('phenoxyethanol')).toEqual(['Preservative blend']);
  // Signs are looked for as they stand: two trade names hold a per cent sign.
  expect(await found('%')).toEqual(['Amphoteric surfactant, 38 % solids', 'Mild glucoside, 52 % active']);
  for (const pattern of ['_', '\\', "' or 1=1 --", '.*']) expect(await found(pattern)).toEqual([]);
});

test('figures that cannot be are told at their place', async () => {
  const answer = await ines.post('/materials', fields({ composition: [{ inci: 'Kaolin', min: '60', max: '50' }, { inci: 'Aqua', percent: '100' }] }));
  expect([answer.status, answer.body.issues.map(({ pointer }: { pointer: string }) => pointer)]).toEqual([422, ['/composition/0/max', '/composition']]);
  const words = await ines.post('/materials', { ...fields(), pricePerKg: 2.7, composition: [{ inci: 'Kaolin', percent: '101' }], surprise: 1 });
  expect(words.body.issues.map(({ pointer }: { pointer: string }) => pointer).sort()).toEqual(['/composition/0/percent', '/pricePerKg', '/surprise']);
});

test('E-02 a material holds 200 parts, not 201, and names of 255 letters, not 256', async () => {
  const parts = (count: number) => Array.from({ length: count }, (_, index) => ({ inci: `Part ${index}`, percent: '0.1' }));
  await add({ composition: parts(200) });
  expect((await ines.post('/materials', fields({ composition: parts(201) }))).body.issues[0].pointer).toBe('/composition');
  await add({ tradeName: 'x'.repeat(255) });
  expect((await ines.post('/materials', fields({ tradeName: 'x'.repeat(256) }))).body.issues[0].pointer).toBe('/tradeName');
});

test('I-01 a second save of one version is answered with what stands', async () => {
  const { id } = await add();
  expect((await ines.put(`/materials/${id}`, { ...fields({ notes: 'hers' }), version: 1 })).body).toMatchObject({ version: 2, notes: 'hers' });
  expect((await ines.put(`/materials/${id}`, { ...fields({ notes: 'mine' }), version: 1 })).body).toMatchObject({ code: 'stale', current: { version: 2, notes: 'hers' } });
});

test('a material in use is not put away, one out of use is', async () => {
  const used = await ines.post(`/materials/${demoMaterialId('lavender')}/archive`, { archived: true, version: 1 });
  expect([used.status, used.body.code]).toEqual([409, 'in-use']);
  expect(used.body.detail).toContain('Juniper & Oat Body Wash');
  const { id } = await add({ tradeName: 'Out of use' });
  expect((await ines.post(`/materials/${id}/archive`, { archived: true, version: 1 })).body).toMatchObject({ archived: true, version: 2 });
  expect((await ines.get('/materials?find=out%20of%20use')).body.total).toBe(0);
});

describe('F-01 papers', () => {
  const PDF = Buffer.from('%PDF-1.7\n1 0 obj\n<<>>\nendobj\ntrailer\n<<>>\n%%EOF\n');
  let id: string;
  beforeAll(async () => {
    ({ id } = await add({ tradeName: 'With papers' }));
  });
  const send = (bytes: Buffer, name = 'sheet.pdf', kind = 'safety-data-sheet') => ines.post(`/materials/${id}/documents`).field('kind', kind).attach('file', bytes, name);
  const photo = () => sharp({ create: { width: 40, height: 20, channels: 3, background: '#864' } });

  test('a PDF is kept as it is and comes back as a download', async () => {
    const answer = await send(PDF, '../../Sicherheits "Blatt".exe');
    expect(answer.status).toBe(200);
    const [paper] = answer.body.documents.slice(-1);
    expect(paper).toMatchObject({ kind: 'safety-data-sheet', fileName: 'Sicherheits Blatt.pdf', mediaType: 'application/pdf', bytes: PDF.length, sha256: createHash('sha256').update(PDF).digest('hex'), dated: null, addedBy: 'Ines Tarrow' });
    const back = await ines.get(`/materials/${id}/documents/${paper.id}`);
    expect(Buffer.compare(back.body as Buffer, PDF)).toBe(0);
    expect(back.headers).toMatchObject({ 'content-type': 'application/pdf', 'x-content-type-options': 'nosniff', 'content-security-policy': "default-src 'none'; sandbox", 'cache-control': 'no-store' });
    expect(back.headers['content-disposition']).toBe(`attachment; filename="Sicherheits Blatt.pdf"; filename*=UTF-8''Sicherheits%20Blatt.pdf`);
    expect([...stage.stored.keys()].at(-1)).toMatch(/^houses\/[0-9a-f-]{36}\/materials\/[0-9a-f-]{36}$/);
    expect((await ines.delete(`/materials/${id}/documents/${paper.id}`)).body.documents).toEqual([]);
    expect(stage.stored.size).toBe(0);
    expect((await ines.get(`/materials/${id}/documents/${paper.id}`)).status).toBe(404);
  });

  test('a photo is turned upright and loses its place, time and device', async () => {
    const bytes = await photo().withExif({ IFD0: { Make: 'Secret camera' }, IFD3: { GPSLatitude: '51/1 30/1 0/1' } }).withMetadata({ orientation: 6 }).jpeg().toBuffer();
    expect(bytes.includes('Secret camera')).toBe(true);
    const answer = await send(bytes, 'IMG_1.JPG', 'certificate-of-analysis');
    expect(answer.body.documents.at(-1)).toMatchObject({ mediaType: 'image/jpeg', fileName: 'IMG_1.jpg' });
    const kept = [...stage.stored.values()].at(-1)!.bytes;
    const { width, height, exif } = await sharp(kept).metadata();
    expect([width, height, exif, kept.includes('Secret camera')]).toEqual([20, 40, undefined, false]);
  });

  /** A PNG that says it has this many pixels; its data end at once (PNG specification, clause 11.2.2). */
  function bomb(width: number, height: number): Buffer {
    const chunk = (type: string, data: Buffer) => {
      const body = Buffer.concat([Buffer.from(type), data]);
      const length = Buffer.alloc(4);
      length.writeUInt32BE(data.length);
      const check = Buffer.alloc(4);
      check.writeUInt32BE(crc32(body));
      return Buffer.concat([length, body, check]);
    };
    const head = Buffer.alloc(13);
    head.writeUInt32BE(width, 0);
    head.writeUInt32BE(height, 4);
    head.set([8, 2, 0, 0, 0], 8);
    return Buffer.concat([Buffer.from([137, 80, 78, 71, 13, 10, 26, 10]), chunk('IHDR', head), chunk('IDAT', deflateSync(Buffer.alloc(64))), chunk('IEND', Buffer.alloc(0))]);
  }
  function crc32(bytes: Buffer): number {
    let crc = 0xffffffff;
    for (const byte of bytes) {
      crc ^= byte;
      for (let bit = 0; bit < 8; bit += 1) crc = crc & 1 ? (crc >>> 1) ^ 0xedb88320 : crc >>> 1;
    }
    return (crc ^ 0xffffffff) >>> 0;
  }

  test.each([
    ['nothing', () => Buffer.alloc(0), 'invalid'],
    ['a page of HTML called PDF', () => Buffer.from('<html><script>alert(1)</script>'), 'unsupported-file'],
    ['a drawing in SVG', () => Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>'), 'unsupported-file'],
    ['a program', () => Buffer.from('MZ\u0090\u0000rest of a program'), 'unsupported-file'],
    ['a PDF behind other bytes', () => Buffer.concat([Buffer.from('GIF89a'), PDF]), 'unsupported-file'],
    ['a PDF cut off', () => PDF.subarray(0, PDF.length - 10), 'unsupported-file'],
    ['a zip archive', () => Buffer.from('504b0506000000000000000000000000000000000000', 'hex'), 'unsupported-file'],
    ['a photo cut off', async () => (await photo().png().toBuffer()).subarray(0, 60), 'unsupported-file'],
    ['20 megapixels and a row', () => bomb(5000, 4001), 'too-large'],
    ['a pixel bomb', () => bomb(100_000, 100_000), 'too-large'],
    ['a photo in HEIC', () => Buffer.from('000000186674797068656963000000006d69663168656963', 'hex'), 'unsupported-file'],
  ])('%s is refused', async (_what, make, code) => {
    const before = stage.stored.size;
    const answer = await send(await make());
    expect([answer.body.code, stage.stored.size]).toEqual([code, before]);
  });

  test('E-02 20 MB are taken and one byte more is not', async () => {
    const sized = (bytes: number) => Buffer.concat([Buffer.from('%PDF-1.7\n'), Buffer.alloc(bytes - 9 - 6, 0x20), Buffer.from('%%EOF\n')]);
    expect((await send(sized(20 * 1024 * 1024))).status).toBe(200);
    expect((await send(sized(20 * 1024 * 1024 + 1))).body.code).toBe('too-large');
    expect((await send(sized(21 * 1024 * 1024))).body.code).toBe('too-large');
  });

  test('a form without a file, with another field or a day that is none is refused', async () => {
    const form = () => ines.post(`/materials/${id}/documents`);
    expect((await form().field('kind', 'other')).body.issues).toEqual([{ pointer: '/file', message: 'Choose a file.' }]);
    expect((await send(PDF, 'a.pdf', 'novel')).body.issues[0].pointer).toBe('/kind');
    expect((await send(PDF).field('surprise', '1')).body.issues[0].pointer).toBe('/surprise');
    expect((await send(PDF).field('dated', '2026-02-30')).body.issues[0].pointer).toBe('/dated');
    expect((await form().field('kind', 'other').attach('file', PDF, 'a.pdf').attach('file', PDF, 'b.pdf')).status).toBe(422);
    const cut = form().set('Content-Type', 'multipart/form-data; boundary=x').send(Buffer.from('--x\r\nContent-Disposition: form-data; name="file"; filename="a.pdf"\r\n\r\n%PDF'));
    expect((await cut).status).toBe(422);
  });
});
