import fc from 'fast-check';
import { expect, test } from 'vitest';
import { readContainer } from '#shared/artwork/container.ts';
import { CONTAINERS } from '#shared/artwork/containers.ts';

test('a wrap is π times diameter and stock, plus its overlap', () => {
  // π · (58 + 0.06) + 5 = 187.4008…; π · (58 + 0.1) + 3.5 = 186.0265… mm
  expect(readContainer({ shape: 'cylinder', diameterMm: '58', labelHeightMm: '90', overlapMm: '5' })).toMatchObject({ width: 187401, height: 90000, overlap: 5000, diameter: 58000, round: 182401 });
  expect(readContainer({ shape: 'cylinder', diameterMm: '58', labelHeightMm: '90', overlapMm: '3.5', stockMm: '0.1' })).toMatchObject({ width: 186027 });
});

test('a flat label is as wide and high as it says', () => {
  expect(readContainer({ shape: 'flat', widthMm: '60.5', heightMm: '90.125' })).toMatchObject({ width: 60500, height: 90125, overlap: 0 });
});

test('the width of any wrap agrees with floating arithmetic to a micrometre', () => {
  fc.assert(
    fc.property(fc.integer({ min: 1000, max: 20000 }), fc.integer({ min: 0, max: 3000 }), (diameter, overlap) => {
      const sheet = readContainer({ shape: 'cylinder', diameterMm: `${diameter / 100}`, labelHeightMm: '90', overlapMm: `${overlap / 100}` });
      const width = 'faults' in sheet ? 0 : sheet.width;
      expect(Math.abs(width - (Math.PI * (diameter / 100 + 0.06) + overlap / 100) * 1000)).toBeLessThan(0.5001);
    }),
  );
});

test.each([
  [{ shape: 'cylinder', diameterMm: '0', labelHeightMm: '90' }, 'diameterMm', 'The diameter is 0 mm. Labels are set from 10 to 400 mm.'],
  [{ shape: 'cylinder', diameterMm: 'wide', labelHeightMm: '90' }, 'diameterMm', 'The diameter is not a number of millimetres.'],
  [{ shape: 'flat', widthMm: '60', heightMm: '9000' }, 'heightMm', 'The height is 9000 mm. Labels are set from 10 to 500 mm.'],
  [{ shape: 'flat', widthMm: '-60', heightMm: '90' }, 'widthMm', 'The width is -60 mm. Labels are set from 10 to 1000 mm.'],
] as const)('measures that cannot be are refused in words: %o', (container, field, message) => {
  expect(readContainer(container)).toEqual({ faults: [{ field, message }] });
});

test('every usual container can be set', () => {
  for (const { shape, diameterMm = '', topDiameterMm = '', bottomDiameterMm = '', labelHeightMm = '', widthMm = '', heightMm = '' } of CONTAINERS) {
    const sheet = readContainer(shape === 'flat' ? { shape, widthMm, heightMm } : shape === 'taper' ? { shape, topDiameterMm, bottomDiameterMm, labelHeightMm } : { shape, diameterMm, labelHeightMm });
    expect(sheet).not.toHaveProperty('faults');
  }
});
