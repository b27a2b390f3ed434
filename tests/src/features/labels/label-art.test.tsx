// @vitest-environment jsdom
import { cleanup, render } from '@testing-library/react';
import { afterEach, expect, test } from 'vitest';
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

test('a thumbnail shows the front alone', () => {
  const { getByRole } = render(<LabelThumbnail scene={scene!} height={90} name="Juniper & Oat Body Wash" />);
  const front = scene!.panels.find((panel) => panel.name === 'Front')!;
  expect(getByRole('img', { name: 'Label of Juniper & Oat Body Wash' }).getAttribute('viewBox')).toBe(`${front.x / 1000} 0 ${front.width / 1000} 90`);
});
