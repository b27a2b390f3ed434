import type { Ink } from './scene.ts';

/** The printed black: K alone. */
export const BLACK: Ink = { name: 'Black', cmyk: [0, 0, 0, 100], screen: '#1a1614' };
/** Cut line: a plate of its own that every converter drops by name. */
export const DIE_LINE: Ink = { name: 'Dieline', cmyk: [0, 100, 0, 0], screen: '#e5007d', spot: 'Dieline' };

/** One colour scheme of the house: a strong ink, its tint and the light ink that is read on both. */
export interface Palette {
  readonly slug: string;
  readonly ink: Ink;
  readonly tint: Ink;
  readonly light: Ink;
}

/** House inks. No total is over 300 %; light on ink and on tint is read at 4.5 : 1 or more. */
export const PALETTES: readonly Palette[] = [
  { slug: 'juniper', ink: { name: 'Juniper', cmyk: [90, 45, 70, 45], screen: '#084438' }, tint: { name: 'Juniper tint', cmyk: [80, 32, 60, 24], screen: '#206759' }, light: { name: 'Oat', cmyk: [4, 8, 26, 0], screen: '#f4e0b5' } },
  { slug: 'mallow', ink: { name: 'Mallow', cmyk: [40, 90, 35, 40], screen: '#6c2248' }, tint: { name: 'Mallow tint', cmyk: [30, 76, 25, 24], screen: '#8e4467' }, light: { name: 'Petal', cmyk: [2, 14, 6, 0], screen: '#f8d5da' } },
  { slug: 'sloe', ink: { name: 'Sloe', cmyk: [75, 80, 30, 35], screen: '#402d54' }, tint: { name: 'Sloe tint', cmyk: [62, 66, 22, 20], screen: '#5e5078' }, light: { name: 'Marsh', cmyk: [10, 1, 11, 0], screen: '#ddebde' } },
  { slug: 'bark', ink: { name: 'Bark', cmyk: [40, 65, 80, 50], screen: '#613d23' }, tint: { name: 'Bark tint', cmyk: [32, 54, 66, 34], screen: '#7d5c42' }, light: { name: 'Oat', cmyk: [2, 4, 14, 0], screen: '#f9efd4' } },
  { slug: 'black', ink: { name: 'Black', cmyk: [0, 0, 0, 100], screen: '#1a1614' }, tint: { name: 'Slate', cmyk: [0, 0, 0, 78], screen: '#4e4b49' }, light: { name: 'Paper', cmyk: [0, 0, 0, 0], screen: '#ffffff' } },
];

/** The palette of a slug; the first one where there is none of that name. */
export function paletteOf(slug: string | undefined): Palette {
  return PALETTES.find((palette) => palette.slug === slug) ?? PALETTES[0]!;
}
