import { execFileSync } from 'node:child_process';
import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, expect, test } from 'vitest';
import { renderLabelInput } from '#server/artwork/render-label.ts';
import type { LabelInput } from '#shared/artwork/label-input.ts';
import type { Scene } from '#shared/artwork/scene.ts';
import { bodyWash, inMarket } from '#tests/shared/artwork/samples.ts';

// Outside tools: qpdf, poppler-utils, zbar-tools, ghostscript, mupdf-tools of the operating system.
const room = mkdtempSync(join(tmpdir(), 'label-'));
afterAll(() => rmSync(room, { recursive: true, force: true }));
const run = (tool: string, ...args: string[]): string => execFileSync(tool, args, { encoding: 'utf8', cwd: room, stdio: ['ignore', 'pipe', 'ignore'] });

async function pressFile(input: LabelInput, name: string): Promise<{ path: string; scene: Scene; bytes: Uint8Array }> {
  const rendered = await renderLabelInput(input, '2026-12-01');
  if (!('pdf' in rendered)) throw new Error(rendered.misfits.map((misfit) => misfit.message).join(' '));
  const path = join(room, `${name}.pdf`);
  writeFileSync(path, rendered.pdf);
  return { path, scene: rendered.scene, bytes: rendered.pdf };
}
const flatten = (text: string): string => text.replace(/\s+/g, ' ').trim();
const CASES: readonly (readonly [string, LabelInput])[] = [
  ['galley-eu', bodyWash], ['galley-us', inMarket('US')], ['galley-ca', { ...inMarket('CA'), container: { shape: 'cylinder', diameterMm: '70', labelHeightMm: '90', overlapMm: '5' } }],
  ['tub', { ...bodyWash, container: { shape: 'taper', topDiameterMm: '72', bottomDiameterMm: '62', labelHeightMm: '46', overlapMm: '5' } }],
  ['cone-us', { ...inMarket('US'), container: { shape: 'taper', topDiameterMm: '62', bottomDiameterMm: '74', labelHeightMm: '100', overlapMm: '5' } }],
  ['headband-jar', { ...bodyWash, template: 'headband', container: { shape: 'cylinder', diameterMm: '67', labelHeightMm: '36', overlapMm: '5' } }],
  ['fillet-wrap', { ...bodyWash, template: 'fillet', ink: 'mallow' }],
  ['ladder', { ...bodyWash, container: { shape: 'cylinder', diameterMm: '40', labelHeightMm: '160', overlapMm: '5' } }],
  ['versal', { ...bodyWash, ink: 'mallow', container: { shape: 'flat', widthMm: '80', heightMm: '120' } }],
  ['versal-us', { ...inMarket('US'), ink: 'black', container: { shape: 'flat', widthMm: '150', heightMm: '100' } }],
];

test.each(CASES)('%s is a sound one-page file whose trim is the container', async (name, input) => {
  const { path, scene, bytes } = await pressFile(input, name);
  expect(run('qpdf', '--check', path)).toContain('No syntax or stream encoding errors');
  expect(Buffer.from(bytes.subarray(0, 8)).toString()).toBe('%PDF-1.4');
  // On arcs every letter has a place of its own, and a stitched edge has hundreds of threads.
  const isBusy = input.container.shape === 'taper' || input.template === 'headband';
  expect(bytes.length).toBeLessThanOrEqual((isBusy ? 30 : 25) * 1024);
  const info = run('pdfinfo', '-box', path);
  expect(info).toMatch(/Pages:\s+1\n/);
  const box = (which: string): number[] => new RegExp(`${which}:\\s+(.+)`).exec(info)![1]!.trim().split(/\s+/).map(Number);
  const [trim, bleed] = [box('TrimBox'), box('BleedBox')];
  const micrometres = (points: number): number => Math.round((points * 25_400) / 72);
  // pdfinfo prints hundredths of a point: 3.5 µm.
  expect(Math.abs(micrometres(trim[2]! - trim[0]!) - scene.trim.width)).toBeLessThanOrEqual(4);
  expect(Math.abs(micrometres(trim[3]! - trim[1]!) - scene.trim.height)).toBeLessThanOrEqual(4);
  expect(Math.abs(micrometres(trim[0]! - bleed[0]!) - 3000)).toBeLessThanOrEqual(4);
  expect(readFileSync(path, 'latin1')).not.toContain('/ArtBox');
});

test.each(CASES)('%s embeds its type and says its words in order', async (name, input) => {
  const { path } = await pressFile(input, name);
  const fonts = run('pdffonts', path).trim().split('\n').slice(2);
  expect(fonts.length).toBeGreaterThan(1);
  for (const font of fonts) expect(font).toMatch(/^[A-Z]{6}\+IBMPlexSans-\w+\s+CID TrueType\s+Identity-H\s+yes yes yes/);
  const declaration = `${input.ingredients!.heading}: ${input.ingredients!.body}`;
  const raw = flatten(run('pdftotext', '-raw', path, '-'));
  expect(raw).toContain(flatten(declaration));
  expect(flatten(run('pdftotext', path, '-'))).toContain(flatten(declaration));
  const places = [input.brand, 'Juniper & Oat', input.ingredients!.body.slice(0, 20), input.batchCode].map((text) => raw.indexOf(flatten(text)));
  expect(places.every((place, i) => place >= 0 && (i === 0 || place > places[i - 1]!))).toBe(true);
});

test.each(CASES)('%s: the bars are read back at 300 dpi', async (name, input) => {
  const { path } = await pressFile(input, name);
  run('pdftoppm', '-r', '300', '-png', '-singlefile', path, name);
  expect(run('zbarimg', '-q', '--raw', `${name}.png`).trim().padStart(13, '0')).toBe(input.barcode!.digits.padStart(13, '0'));
});

test('process inks and the cut line alone, on their own plates', async () => {
  const { path } = await pressFile(bodyWash, 'plates');
  run('gs', '-q', '-dNOPAUSE', '-dBATCH', '-sDEVICE=tiffsep', '-r36', '-sOutputFile=plate.tif', path);
  const plates = readdirSync(room).flatMap((file) => /^plate\((.+)\)\.tif$/.exec(file)?.[1] ?? []).sort();
  expect(plates).toEqual(['Black', 'Cyan', 'Dieline', 'Magenta', 'Yellow']);
  const content = run('qpdf', '--qdf', '--object-streams=disable', path, '-');
  expect(content).not.toMatch(/\b(rg|RG|g|G)\n|DeviceRGB|DeviceGray|ICCBased/);
  expect(content.lastIndexOf('/Die CS')).toBeGreaterThan(content.lastIndexOf('TJ'));
});

test.each([CASES[0]!, CASES.find(([name]) => name === 'tub')!])('the glyphs of the press file stand where the scene has put them: %s', async (name, input) => {
  const { path, scene } = await pressFile(input, `places-${name}`);
  const trace = run('mutool', 'trace', path);
  const glyphs = [...trace.matchAll(/<g unicode="([^"]*)" glyph="[^"]*" x="([^"]*)" y="([^"]*)"/g)].map(([, char, x, y]) => ({ char, x: Number(x), y: Number(y) }));
  const origin = (15_000 * 72) / 25_400;
  let at = 0;
  for (const item of scene.items) {
    if (item.kind !== 'text') continue;
    item.offsets.forEach((offset, i) => {
      const glyph = glyphs[at]!;
      at += 1;
      const place = item.places?.[i] ?? { x: item.x + (offset * item.size) / 1000, y: item.y };
      const x = (place.x * 72) / 25_400 + origin;
      const y = ((scene.trim.height - place.y) * 72) / 25_400 + origin;
      // Hundredths of a point on arcs, finer on straight lines.
      const near = item.places ? 0.006 : 0.002;
      expect(Math.abs(glyph.x - x)).toBeLessThan(near);
      expect(Math.abs(glyph.y - y)).toBeLessThan(near);
    });
  }
  expect(at).toBeGreaterThan(300);
});

test('equal labels are equal files', async () => {
  const [first, second] = [await pressFile(bodyWash, 'one'), await pressFile({ ...bodyWash }, 'two')];
  expect(Buffer.from(first.bytes).equals(Buffer.from(second.bytes))).toBe(true);
  const other = await pressFile({ ...bodyWash, batchCode: 'BW-0413' }, 'three');
  expect(Buffer.from(first.bytes).equals(Buffer.from(other.bytes))).toBe(false);
});

test('PDF/X-1a says its standard and names a registered condition without a profile', async () => {
  const { path } = await pressFile(bodyWash, 'x1a');
  const text = run('qpdf', '--qdf', '--object-streams=disable', path, '-');
  for (const part of ['/GTS_PDFXVersion (PDF/X-1a:2003)', '/S /GTS_PDFX', '/OutputConditionIdentifier (FOGRA39)', '/RegistryName (http://www.color.org)', '/Trapped /False']) expect(text).toContain(part);
  expect(text).not.toContain('DestOutputProfile');
  expect(text).toMatch(/\/ID \[\s*<[0-9a-f]{32}>\s*<[0-9a-f]{32}>\s*\]/);
});

test('PDF/X-4 carries a CMYK output profile and its metadata', async () => {
  const { path, bytes } = await pressFile({ ...bodyWash, press: { standard: 'PDF/X-4', condition: 'Own press, film' } }, 'x4');
  expect(Buffer.from(bytes.subarray(0, 8)).toString()).toBe('%PDF-1.6');
  expect(run('qpdf', '--check', path)).toContain('No syntax or stream encoding errors');
  const text = readFileSync(path, 'latin1');
  for (const part of ['<pdfxid:GTS_PDFXVersion>PDF/X-4<', '/DestOutputProfile', '/OutputConditionIdentifier (Custom)', '(Own press, film)']) expect(text).toContain(part);
});

test('nothing is painted where something does not fit', async () => {
  const rendered = await renderLabelInput({ ...bodyWash, container: { shape: 'flat', widthMm: '20', heightMm: '20' } }, '2026-12-01');
  expect(rendered).not.toHaveProperty('pdf');
  expect('misfits' in rendered && rendered.misfits.length).toBeGreaterThan(0);
});
