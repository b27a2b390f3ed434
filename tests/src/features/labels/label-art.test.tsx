// @vitest-environment jsdom
import { cleanup, render } from '@testing-library/react';
import { afterEach, expect, test } from 'vitest';
import { cropToFront } from '#shared/artwork/crop-to-front.ts';
import { layOutLabel } from '#shared/artwork/layout.ts';
import { plexMetrics } from '#shared/artwork/plex-metrics.ts';
import { LabelArt, LabelThumbnail } from '#src/features/labels/label-art.tsx';
import { bodyWash } from '#tests/shared/artwork/samples.ts';

afterEach(cleanup);
const { scene } = layOutLabel(bodyWash, plexMetrics);

test('every character on screen stands where the scene has put it', () => {
  const { container } = render(<svg><LabelArt scene={scene!} /></svg>);
  const drawn = [...container.querySelectorAll('text')];
  const runs = scene!.items.filter((item) => item.kind === 'text');
  expect(drawn.map((text) => text.textContent)).toEqual(runs.map((run) => run.text));
  drawn.forEach((text, i) => {
    const run = runs[i]!;
    const places = text.getAttribute('x')!.split(' ').map(Number);
    expect(places).toEqual(run.offsets.map((offset) => (run.x + (offset * run.size) / 1000) / 1000));
    expect(Number(text.getAttribute('y'))).toBe(run.y / 1000);
    expect(Number(text.getAttribute('font-size'))).toBe(run.size / 1000);
  });
});

test('bars are drawn to the micrometre', () => {
  const { container } = render(<svg><LabelArt scene={scene!} /></svg>);
  const bars = scene!.items.find((item) => item.kind === 'boxes' && item.element === 'barcode');
  const boxes = bars!.kind === 'boxes' ? bars!.boxes : [];
  const path = container.querySelector('path[shape-rendering="crispEdges"]')!.getAttribute('d')!;
  expect(path).toBe(boxes.map((box) => `M${box.x / 1000} ${box.y / 1000}h${box.width / 1000}v${box.height / 1000}h${-box.width / 1000}z`).join(''));
});

test('a thumbnail shows the front alone, as large as its box allows', () => {
  const front = cropToFront(scene!);
  const { getByRole } = render(<LabelThumbnail front={front} width={148} height={188} name="Juniper & Oat Body Wash" />);
  const panel = scene!.panels.find(({ name }) => name === 'Front')!;
  const drawn = getByRole('img', { name: 'Label of Juniper & Oat Body Wash' });
  expect(drawn.getAttribute('viewBox')).toBe(`${panel.x / 1000} 0 ${panel.width / 1000} 90`);
  const [width, height] = [Number(drawn.getAttribute('width')), Number(drawn.getAttribute('height'))];
  expect(width <= 148 && height <= 188 && (width === 148 || height === 188)).toBe(true);
  const texts = [...drawn.querySelectorAll('text')].map((text) => text.textContent).join(' ');
  expect(texts).toContain('Juniper');
  expect(texts).not.toContain('Sodium');
});
