import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { readingDocumentSchema } from '#shared/contracts/reading-document.ts';

const ROOT = join(import.meta.dirname, '../..');
const EU = ['--market', 'EU', '--category', 'body-wash'];

function read(input: string | Buffer, words: readonly string[] = EU): { status: number | null; out: string; err: string } {
  const done = spawnSync(process.execPath, [join(ROOT, 'server/cli/run.mjs'), 'read', '-', ...words], { input, encoding: 'utf8' });
  return { status: done.status, out: done.stdout, err: done.stderr };
}
const entries = (out: string) => readingDocumentSchema.parse(JSON.parse(out)).entries.map(({ inci, match }) => `${match} ${inci}`);

describe('read', () => {
  test('answers a lawful list with 0 and a reading document', () => {
    const { status, out, err } = read('\uFEFFIngredients: Aqua/Water/Eau, 1,2-Hexanediol, PHENOXYETHANOL, Parfum (and) Limonene [+/- CI 77891]');
    expect([status, err]).toEqual([0, '']);
    expect(entries(out)).toEqual(['synonym Aqua', 'exact 1,2-Hexanediol', 'exact Phenoxyethanol', 'exact Parfum', 'exact Limonene', 'exact CI 77891']);
  }, 60_000);

  test('answers a prohibited substance with 1', () => {
    expect(read('Aqua, Butylphenyl Methylpropional').status).toBe(1);
  }, 60_000);

  test.each<[string, string | Buffer, string]>([
    ['an empty text', '', 'holds no ingredient names'],
    ['marks alone', ' ,;.•\n', 'holds no ingredient names'],
    ['bytes that are no text', Buffer.from([0x89, 0x50, 0x4e, 0x47, 0xff, 0xfe, 0x00]), 'UTF-8'],
    ['control characters', 'Aqua\u0000, Glycerin', 'not a text'],
    ['ten thousand names', Array.from({ length: 10_000 }, (_, index) => `Unknown name ${index}`).join(', '), 'more than'],
    ['a million letters', 'a'.repeat(1_000_000), 'longer than'],
  ])('refuses %s with 2 and nothing on standard output', (_, input, words) => {
    const begun = Date.now();
    const { status, out, err } = read(input);
    expect([status, out]).toEqual([2, '']);
    expect(err).toContain(words);
    expect(Date.now() - begun).toBeLessThan(15_000);
  }, 60_000);

  test.each<[string, string[]]>([
    ['no market', ['--category', 'body-wash']],
    ['no category', ['--market', 'EU']],
    ['two markets', ['--market', 'EU', '--market', 'UK', '--category', 'body-wash']],
    ['an unknown category', ['--market', 'EU', '--category', 'soup']],
    ['an unknown market', ['--market', 'FR', '--category', 'body-wash']],
  ])('refuses %s with 2', (_, words) => {
    expect(read('Aqua', words)).toMatchObject({ status: 2, out: '' });
  }, 60_000);

  test('says of a day beyond the tables that nothing is guessed', () => {
    const { status, err, out } = read('Aqua, Glycerin', [...EU, '--placed', '2040-01-01', '--available', '2040-01-01']);
    expect(status).toBe(0);
    expect(err).toContain('what will bind on 2040-01-01 is not guessed');
    expect(readingDocumentSchema.parse(JSON.parse(out)).findings.map(({ kind }) => kind)).toEqual(['date-not-covered']);
  }, 60_000);
});
