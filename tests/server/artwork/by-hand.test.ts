import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, expect, test } from 'vitest';
import { renderLabelInput } from '#server/artwork/render-label.ts';
import type { ByHand } from '#shared/contracts/by-hand.ts';
import type { LabelInput } from '#shared/artwork/label-input.ts';
import { bodyWash } from '#tests/shared/artwork/samples.ts';

// Outside tools: qpdf, poppler-utils, zbar-tools of the operating system.
const room = mkdtempSync(join(tmpdir(), 'hand-'));
afterAll(() => rmSync(room, { recursive: true, force: true }));
const run = (tool: string, ...args: string[]): string => execFileSync(tool, args, { encoding: 'utf8', cwd: room, stdio: ['ignore', 'pipe', 'ignore'] });

const ADDRESS = 'https://brackenmere.example/juniper?from=größe';
const byHand: ByHand = {
  freed: [{ element: 'directions', frame: { x: 12_000, y: 95_000, width: 60_000, height: 20_000 }, style: { capitals: true, tracking: 40, align: 'centre', size: 2600 } }],
  added: [
    { id: 'words', kind: 'text', text: 'Stirred by hand in Exampleport', frame: { x: 150_000, y: 88_000, width: 70_000, height: 6000 }, style: { size: 4000, align: 'right', weight: 600 } },
    { id: 'code', kind: 'code', text: ADDRESS, frame: { x: 150_000, y: 98_000, width: 26_000, height: 26_000 }, style: {} },
    { id: 'oval', kind: 'oval', stroke: 300, frame: { x: 185_000, y: 100_000, width: 20_000, height: 20_000 }, style: { ink: 'ink' } },
  ],
};
const input: LabelInput = { ...bodyWash, container: { shape: 'cylinder', diameterMm: '70', labelHeightMm: '180', overlapMm: '5' }, byHand };

test('a label composed by hand is a sound press file: both codes read back, the words stand as text', async () => {
  const rendered = await renderLabelInput(input, '2026-12-01');
  if (!('pdf' in rendered)) throw new Error(rendered.misfits.map(({ message }) => message).join(' '));
  const path = join(room, 'hand.pdf');
  writeFileSync(path, rendered.pdf);
  expect(run('qpdf', '--check', path)).toContain('No syntax or stream encoding errors');
  run('pdftoppm', '-r', '300', '-png', '-singlefile', path, 'hand');
  const read = run('zbarimg', '-q', '--raw', 'hand.png').trim().split('\n').map((line) => line.trim());
  expect(read).toContain('https://brackenmere.example/juniper?from=gr%C3%B6%C3%9Fe');
  expect(read.map((digits) => digits.padStart(13, '0'))).toContain(input.barcode!.digits);
  const words = run('pdftotext', '-raw', path, '-').replace(/\s+/g, ' ');
  expect(words).toContain('Stirred by hand in Exampleport');
  // Capitals are only a dress: what is read out stays as written.
  expect(words).toContain(input.directions);
});
