import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, test, vi } from 'vitest';
import { demoId } from '#server/db/demo/demo-id.ts';
import { inHouse } from '#server/db/in-house.ts';
import { BRACKENMERE, BRAM, INES, OTTERBY } from '#server/local/demo-people.ts';
import { openTestApp, personWith, type Client, type TestApp } from '#tests/support/app.ts';

vi.setConfig({ testTimeout: 60_000 });

const WASH = demoId('product Juniper & Oat Body Wash');
const AT = `/products/${WASH}/evidence`;
const CLAIM = 'Leaves skin feeling soft';
const PDF = Buffer.from('%PDF-1.7\n%%EOF\n');

let stage: TestApp;
let ines: Client;
beforeAll(async () => {
  stage = await openTestApp();
  ines = await stage.as(INES);
}, 120_000);
afterAll(() => stage.close());
beforeEach(() => expect(stage.faults).toEqual([]));

const attach = (more: { readonly kind?: string; readonly claim?: string; readonly dated?: string } = {}, bytes = PDF, name = 'panel test.pdf') => {
  const request = ines.post(AT).field('kind', more.kind ?? 'test-report');
  if (more.claim !== undefined) request.field('claim', more.claim);
  if (more.dated !== undefined) request.field('dated', more.dated);
  return request.attach('file', bytes, name);
};
const listed = async (): Promise<{ id: string; claim: string; fileName: string }[]> => (await ines.get(AT)).body.items;

describe('evidence of claims', () => {
  test('a paper is kept with its claim, kind and day, and comes back whole', async () => {
    const answer = await attach({ claim: CLAIM, dated: '2026-05-04' });
    expect(answer.status).toBe(200);
    const [paper] = answer.body.items;
    expect(paper).toMatchObject({ claim: CLAIM, kind: 'test-report', fileName: 'panel test.pdf', mediaType: 'application/pdf', bytes: PDF.length, dated: '2026-05-04', addedBy: 'Ines Tarrow' });
    const file = await ines.get(`${AT}/${paper.id}`);
    expect([file.status, file.headers['content-type']]).toEqual([200, 'application/pdf']);
    expect(Buffer.from(file.body).equals(PDF)).toBe(true);
  });

  test('a paper without a claim is for the product at large; a claim is kept without the space around it', async () => {
    await attach({}, PDF, 'first.pdf');
    await attach({ claim: '  Hypoallergenic  ', kind: 'study' }, PDF, 'second.pdf');
    expect((await listed()).map(({ claim, fileName }) => [claim, fileName])).toEqual(expect.arrayContaining([['', 'first.pdf'], ['Hypoallergenic', 'second.pdf']]));
  });

  test('neither bytes nor keys of the store are told', async () => {
    await attach({ claim: CLAIM });
    expect(Object.keys((await ines.get(AT)).body.items[0]).sort()).toEqual(['addedAt', 'addedBy', 'bytes', 'claim', 'dated', 'fileName', 'id', 'kind', 'mediaType', 'sha256']);
  });

  test.each([
    ['a kind that is none', { kind: 'rumour' }, 422, '/kind'],
    ['a day that is none', { dated: '2026-02-30' }, 422, '/dated'],
    ['a claim too long for a label', { claim: 'x'.repeat(501) }, 422, '/claim'],
  ] as const)('%s is told at its place', async (_words, fields, status, pointer) => {
    const answer = await attach(fields);
    expect([answer.status, answer.body.issues[0].pointer]).toEqual([status, pointer]);
  });

  test('a file that is neither a PDF nor a photo is refused, and nothing is noted', async () => {
    const before = await listed();
    const answer = await attach({ claim: CLAIM }, Buffer.from('<script>'), 'study.pdf');
    expect(answer.body.code).toBe('unsupported-file');
    expect(await listed()).toEqual(before);
  });

  test('a paper is taken away once, with its bytes', async () => {
    const { body } = await attach({ claim: CLAIM }, PDF, 'wrong.pdf');
    const { id } = body.items.at(-1);
    const key = (await inHouse(stage.orm.em, BRACKENMERE.id, (em) => em.execute<{ storage_key: string }[]>('select storage_key from product_evidence where id = ?', [id])))[0]!.storage_key;
    expect(key).toMatch(new RegExp(`^houses/${BRACKENMERE.id}/evidence/[0-9a-f-]{36}$`));
    expect((await ines.delete(`${AT}/${id}`)).body.items.some((one: { id: string }) => one.id === id)).toBe(false);
    expect((await ines.delete(`${AT}/${id}`)).status).toBe(404);
    expect((await ines.get(`${AT}/${id}`)).status).toBe(404);
  });

  test('whoever only reads sees the papers and can neither add nor remove', async () => {
    const [paper] = await listed();
    const assessor = await stage.as(personWith('assessor'));
    expect((await assessor.get(AT)).body.items.length).toBeGreaterThan(0);
    expect((await assessor.get(`${AT}/${paper!.id}`)).status).toBe(200);
    expect((await assessor.post(AT).field('kind', 'other').attach('file', PDF, 'own.pdf')).status).toBe(403);
    expect((await assessor.delete(`${AT}/${paper!.id}`)).status).toBe(403);
  });

  test('another house finds neither the product nor its papers', async () => {
    const [paper] = await listed();
    const bram = await stage.as(BRAM);
    const own = (await bram.get('/products')).body.items[0].id as string;
    for (const path of [AT, `${AT}/${paper!.id}`, `/products/${own}/evidence/${paper!.id}`]) expect((await bram.get(path)).status, path).toBe(404);
    expect((await bram.delete(`/products/${own}/evidence/${paper!.id}`)).status).toBe(404);
    expect((await bram.get(`/products/${own}/evidence`)).body).toEqual({ items: [] });
    const insert = inHouse(stage.orm.em, OTTERBY.id, (em) =>
      em.execute(
        `insert into product_evidence (id, house_id, product_id, claim, kind, file_name, media_type, bytes, sha256, storage_key, added_at, added_by_id, added_by)
         values (?, ?, ?, '', 'other', 'x.pdf', 'application/pdf', 1, '', ?, now(), ?, '')`,
        [randomUUID(), OTTERBY.id, WASH, randomUUID(), BRAM.id],
      ),
    );
    await expect(insert, 'a row of Otterby cannot speak of a product of Brackenmere').rejects.toThrow('foreign key');
  });
});
