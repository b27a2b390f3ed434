import { inflateSync } from 'node:zlib';
import sharp from 'sharp';
import { describe, expect, test } from 'vitest';
import { readPicture } from '#server/artwork/pictures/read-picture.ts';
import { boundInk, inksOf } from '#server/artwork/pictures/inks-of-colours.ts';
import { readColour } from '#server/artwork/pictures/svg-colours.ts';

const svg = (inside: string, head = 'viewBox="0 0 100 50"'): Buffer => Buffer.from(`<?xml version="1.0"?><svg xmlns="http://www.w3.org/2000/svg" ${head}>${inside}</svg>`);
const drawing = async (inside: string, head?: string) => {
  const read = await readPicture(svg(inside, head));
  if (read.kind !== 'drawing') throw new Error('no drawing');
  return read;
};

describe('a drawing becomes plain paths', () => {
  test('a path keeps its proportions, its longer side 1000', async () => {
    const { width, height, shapes } = await drawing('<path d="M10 10H90V40z" fill="#084438"/>');
    expect([width, height]).toEqual([1000, 500]);
    expect(shapes).toHaveLength(1);
    expect(shapes[0]!.steps).toEqual([['M', 100, 100], ['L', 900, 100], ['L', 900, 400], ['Z']]);
  });

  test('groups pass on their colour and their transform; the nearest word wins', async () => {
    const { shapes } = await drawing('<g transform="translate(10 0) scale(2)" fill="#f00"><rect x="5" y="5" width="10" height="10"/><g transform="translate(0 5)"><rect width="1" height="1" style="fill:#00f"/></g></g>');
    expect(shapes.map(({ screen }) => screen)).toEqual(['#ff0000', '#0000ff']);
    expect(shapes[0]!.steps[0]).toEqual(['M', 200, 100]);
    expect(shapes[1]!.steps[0]).toEqual(['M', 100, 100]);
  });

  test('every basic shape is drawn (SVG 2, chapter 10), a circle by curves alone', async () => {
    const { shapes } = await drawing('<rect width="9" height="9" rx="2"/><circle cx="20" cy="20" r="5"/><ellipse cx="40" cy="20" rx="5" ry="2"/><polygon points="50,1 60,1 55,9"/><polyline points="1 1 2 2 3 1"/><line x1="1" y1="1" x2="9" y2="9" stroke="#000" stroke-width="2"/>');
    // A line has no inside to print, only its stroke; its fill is an empty shape.
    expect(shapes.length).toBeGreaterThanOrEqual(6);
    const circle = shapes[1]!.steps;
    expect(new Set(circle.map(([command]) => command))).toEqual(new Set(['M', 'C', 'Z']));
    for (const [command, ...figures] of circle) {
      if (command !== 'C') continue;
      const [x, y] = (figures as number[]).slice(-2) as [number, number];
      expect(Math.abs(Math.hypot(x - 200, y - 200) - 50)).toBeLessThan(0.1);
    }
  });

  test('a stroke grows with its transform, holes stay holes', async () => {
    const { shapes } = await drawing('<g transform="scale(3)"><path d="M0 0L10 0" fill="none" stroke="#000" stroke-width="2"/></g><path fill-rule="evenodd" d="M0 0h9v9h-9z M2 2h3v3h-3z"/>');
    expect(shapes[0]!.stroke).toBe(60);
    expect(shapes[1]!.evenOdd).toBe(true);
  });

  test('classes of drawing programs are read', async () => {
    const { shapes } = await drawing('<style>.a{fill:#206759;}.b,.c{fill:none;stroke:#000}</style><path class="a" d="M0 0h9v9z"/><path class="b" d="M0 0h9"/>');
    expect(shapes.map(({ screen, stroke }) => [screen, stroke !== undefined])).toEqual([['#206759', false], ['#000000', true]]);
  });

  test('black is black ink alone, white is the paper, a colour goes through the profile and is bounded', async () => {
    const inks = await inksOf(['#000000', '#ffffff', '#206759', '#000033']);
    expect(inks.get('#000000')).toEqual([0, 0, 0, 100]);
    expect(inks.get('#ffffff')).toEqual([0, 0, 0, 0]);
    const green = inks.get('#206759')!;
    expect(green[0]).toBeGreaterThan(green[1]);
    for (const ink of inks.values()) expect(ink.reduce((a, b) => a + b, 0)).toBeLessThanOrEqual(300);
  });

  test('ink over the press’s limit is taken from the colours, never from black', () => {
    expect(boundInk([100, 90, 90, 80])).toEqual([78, 70, 70, 80]);
    expect(boundInk([50, 50, 50, 50])).toEqual([50, 50, 50, 50]);
  });
});

// Source of the shapes: OWASP Cheat Sheet Series, File Upload and XML External Entity Prevention.
describe('a hostile or unfit drawing is refused in words', () => {
  test.each([
    ['a program', '<script>alert(1)</script><path d="M0 0h9v9z"/>', /program/],
    ['a program on a shape', '<path d="M0 0h9v9z" onload="alert(1)"/>', /program/],
    ['a web page', '<foreignObject><p>hi</p></foreignObject>', /web page/],
    ['a photo from elsewhere', '<image href="http://example.org/x.png"/>', /photo/],
    ['a photo inside', '<image href="data:image/png;base64,AAAA"/>', /photo/],
    ['live text', '<text>Juniper</text>', /outlines/],
    ['a shape from elsewhere', '<use href="other.svg#a"/>', /elsewhere|Expand/],
    ['styles from elsewhere', '<style>@import url(http://example.org/a.css)</style><path d="M0 0h9v9z"/>', /reach for other files/],
    ['a blend', '<linearGradient id="a"/><path fill="url(#a)" d="M0 0h9v9z"/>', /blend/],
    ['a reference in a fill', '<path fill="url(#a)" d="M0 0h9v9z"/>', /something else/],
    ['something see-through', '<path opacity=".5" d="M0 0h9v9z"/>', /see-through/],
    ['something that moves', '<path d="M0 0h9v9z"/><animate attributeName="x"/>', /moves/],
    ['a link', '<a href="javascript:alert(1)"><path d="M0 0h9v9z"/></a>', /link/],
    ['a path that is none', '<path d="M0 0 banana"/>', /path/],
    ['nothing at all', '', /nothing in it/],
    ['groups within groups', `${'<g>'.repeat(60)}<path d="M0 0h9v9z"/>${'</g>'.repeat(60)}`, /deeper/],
    ['far too many points', `<path d="M0 0${'l1 1'.repeat(21_000)}"/>`, /20,000/],
  ])('%s', async (_, inside, why) => {
    await expect(readPicture(svg(inside))).rejects.toThrow(why);
  });

  test.each([
    ['an entity bomb', '<?xml version="1.0"?><!DOCTYPE svg [<!ENTITY a "ha"><!ENTITY b "&a;&a;&a;&a;">]><svg viewBox="0 0 1 1"><desc>&b;</desc><path d="M0 0h1v1z"/></svg>', /entities/],
    ['a file of the machine', '<!DOCTYPE svg [<!ENTITY x SYSTEM "file:///etc/passwd">]><svg viewBox="0 0 1 1"><desc>&x;</desc></svg>', /entities/],
    ['a drawing cut off', '<svg viewBox="0 0 1 1"><path d="M0 0h1v1z"', /not whole/],
    ['another kind of XML', '<html><body/></html>', /no drawing/],
    ['a drawing without a size', '<svg xmlns="http://www.w3.org/2000/svg"><path d="M0 0h1v1z"/></svg>', /how large/],
  ])('%s', async (_, text, why) => {
    await expect(readPicture(Buffer.from(text))).rejects.toThrow(why);
  });

  test('a drawing over 2 MB', async () => {
    await expect(readPicture(svg(`<desc>${'x'.repeat(2 * 1024 * 1024)}</desc><path d="M0 0h1v1z"/>`))).rejects.toThrow(/2 MB/);
  });

  test('colours are read as drawings write them, others not guessed at', () => {
    expect(['#ABC', 'rgb(255, 0, 0)', 'rgb(100%,0%,0%)', 'Teal', 'none', 'transparent'].map(readColour)).toEqual(['#aabbcc', '#ff0000', '#ff0000', '#008080', 'none', 'none']);
    expect(['rgb(300,0,0)', 'papayawhip?', 'hsl(1,2%,3%)', ''].map(readColour)).toEqual([null, null, null, null]);
  });
});

describe('a photo becomes process inks', () => {
  const photo = (options: object = {}) => sharp({ create: { width: 40, height: 20, channels: 3, background: { r: 20, g: 20, b: 60 }, ...options } });

  test('its plates are C, M, Y, K bytes, ink bounded, its notes dropped', async () => {
    const bytes = await photo().withExif({ IFD0: { Copyright: 'someone', Model: 'Camera' } }).jpeg().toBuffer();
    const read = await readPicture(bytes);
    if (read.kind !== 'photo') throw new Error('no photo');
    expect([read.width, read.height]).toEqual([40, 20]);
    const plates = inflateSync(read.plates);
    expect(plates.length).toBe(40 * 20 * 4);
    for (let at = 0; at < plates.length; at += 4) expect(plates[at]! + plates[at + 1]! + plates[at + 2]! + plates[at + 3]!).toBeLessThanOrEqual(765);
    expect((await sharp(read.preview).metadata()).exif).toBeUndefined();
  });

  test('what is see-through lies on white', async () => {
    const bytes = await sharp({ create: { width: 4, height: 4, channels: 4, background: { r: 0, g: 0, b: 0, alpha: 0 } } }).png().toBuffer();
    const read = await readPicture(bytes);
    if (read.kind !== 'photo') throw new Error('no photo');
    expect([...inflateSync(read.plates).subarray(0, 4)]).toEqual([0, 0, 0, 0]);
  });

  test('a CMYK JPEG is read by its own inks', async () => {
    const bytes = await photo().toColourspace('cmyk').withIccProfile('cmyk').jpeg().toBuffer();
    expect((await sharp(bytes).metadata()).space).toBe('cmyk');
    const read = await readPicture(bytes);
    expect(read.kind).toBe('photo');
  });

  test('one turned by the camera stands upright', async () => {
    const bytes = await photo().withMetadata({ orientation: 6 }).jpeg().toBuffer();
    const read = await readPicture(bytes);
    expect([read.width, read.height]).toEqual([20, 40]);
  });

  test('a picture of 400 megapixels is refused before it is unpacked', async () => {
    // A PNG whose head says 20,000 × 20,000, with almost nothing behind it.
    const bytes = await sharp({ create: { width: 20_000, height: 20_000, channels: 3, background: '#fff' }, limitInputPixels: false }).png({ compressionLevel: 9 }).toBuffer();
    const from = performance.now();
    await expect(readPicture(bytes)).rejects.toThrow(/20 megapixels/);
    expect(performance.now() - from).toBeLessThan(2000);
  }, 60_000);

  test('a moving picture is refused', async () => {
    const still = await photo().png().toBuffer();
    const chunk = Buffer.from('000000086163544c0000000200000000f38d9370', 'hex');
    const at = still.indexOf('IDAT', 0, 'latin1') - 4;
    await expect(readPicture(Buffer.concat([still.subarray(0, at), chunk, still.subarray(at)]))).rejects.toThrow(/moves/);
  });

  test('an empty file is refused at its field', async () => {
    await expect(readPicture(Buffer.alloc(0))).rejects.toMatchObject({ details: { issues: [{ pointer: '/file', message: 'This file is empty.' }] } });
  });

  test.each([['a cut-off photo', Buffer.from('89504e470d0a1a0a0000000d49484452', 'hex'), /broken/], ['a GIF', Buffer.from('R0lGODlhAQABAAAAACwAAAAAAQABAAA=', 'base64'), /PNG, a JPEG or an SVG/], ['a PDF', Buffer.from('%PDF-1.7\n%%EOF\n'), /Only PNG/]])('%s is refused in words', async (_, bytes, why) => {
    await expect(readPicture(bytes)).rejects.toThrow(why);
  });
});
