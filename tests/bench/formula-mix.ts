import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { parseEntries } from '#shared/dictionary/parse-entries.ts';

const TABLES = join(import.meta.dirname, '../../data/dictionary');
const CATEGORIES = ['body-wash', 'shampoo', 'face-cream', 'body-lotion', 'hand-cream', 'face-serum', 'face-oil', 'hair-conditioner-rinse-off', 'lip-balm', 'deodorant-stick', 'face-toner', 'soap-bar', 'body-butter', 'hair-mask', 'baby-lotion', 'shaving-cream', 'eau-de-toilette', 'bath-oil', 'face-cleanser', 'foot-cream'];
const MARKETS = ['EU', 'UK', 'US', 'CA'];
const CLAIMS = ['Leaves skin feeling soft', 'Free from parabens', 'Fragrance-free', 'Vegan', 'With oat and juniper', 'Dermatologically tested', 'Repairs eczema', 'With 2 % glycerin', 'Silicone-free', 'Moisturises for 24 hours'];
/** Allergens and others that perfumes and oils are made of. */
const SCENTS = ['Linalool', 'Limonene', 'Citronellol', 'Geraniol', 'Coumarin', 'Citral', 'Eugenol', 'Benzyl Alcohol', 'Benzyl Salicylate', 'Hexyl Cinnamal', 'Linalyl Acetate', 'Camphor', 'Farnesol', 'Benzyl Benzoate', 'Cinnamal', 'Menthol', 'Vanillin', 'Terpineol'];
/** Shelves of a small house: which table of names, how many materials, and the usual grams a kilogram. */
const SHELVES = [
  ['waters-solvents', 8, 300], ['humectants', 12, 40], ['surfactants', 24, 80], ['oils-butters-waxes', 40, 60], ['esters-emollients', 22, 40], ['emulsifiers', 18, 30], ['thickeners-polymers', 20, 6], ['preservatives', 20, 8],
  ['antioxidants-chelators', 10, 2], ['acids-bases', 12, 3], ['actives', 30, 15], ['extracts', 40, 10], ['colourants', 16, 1], ['uv-filters', 8, 30], ['conditioners-cationics', 10, 20], ['silicones', 8, 15], ['powders-flours', 14, 30], ['clays-minerals', 10, 20],
] as const;

type Draw = (below: number) => number;

/** The same figures for the same seed, on every machine. */
function drawFrom(seed: number): Draw {
  let state = seed >>> 0;
  return (below) => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return Math.floor((state / 2 ** 32) * below);
  };
}

interface Shelved {
  readonly usual: number;
  readonly material: { readonly id: string; readonly tradeName: string; readonly declareAs?: string; readonly composition: object[]; readonly constituents?: object[] };
}

/** The shelf that a house's formulas draw on: blends, solutions and pure materials; one in five with its supplier's ranges. */
function fillShelf(draw: Draw): Shelved[] {
  const shelf = SHELVES.flatMap(([table, count, usual]) => {
    const names = parseEntries(readFileSync(join(TABLES, `${table}.csv`), 'utf8')).filter(({ supersededBy }) => supersededBy === undefined).map(({ inci }) => inci);
    return Array.from({ length: count }, (_, index): Shelved => {
      const own = [...new Set(Array.from({ length: [1, 1, 1, 2, 3, 5][draw(6)]! }, () => names[draw(names.length)]!))];
      return { usual, material: { id: `${table}-${index}`, tradeName: `${table} ${index}`, composition: compose(own, draw) } };
    });
  });
  const perfumes = Array.from({ length: 14 }, (_, index): Shelved => {
    const inside = [...new Set(Array.from({ length: 4 + draw(9) }, () => SCENTS[draw(SCENTS.length)]!))];
    const constituents = inside.map((name) => ({ name, ...(draw(2) === 0 ? { min: `${draw(3)}`, max: `${4 + draw(5)}` } : { percent: `${1 + draw(7)}.${draw(10)}` }) }));
    return { usual: 6, material: { id: `perfume-${index}`, tradeName: `Perfume ${index}`, declareAs: 'parfum', composition: [], constituents } };
  });
  return [...shelf, ...perfumes];
}

function compose(names: readonly string[], draw: Draw): object[] {
  const isDilute = draw(3) === 0 && !names.includes('Aqua');
  const all = isDilute ? ['Aqua', ...names] : names;
  let left = 1000;
  const shares = all.map((_, index) => {
    const share = index === all.length - 1 ? left : Math.max(1, Math.floor((left * (35 + draw(50))) / 100));
    left -= share;
    return share;
  });
  const hasRanges = all.length > 1 && draw(5) === 0;
  const tenths = (value: number): string => `${Math.floor(value / 10)}.${value % 10}`;
  return all.map((inci, index) => {
    const share = shares[index]!;
    return hasRanges ? { inci, min: tenths(Math.floor(share * 0.9)), max: tenths(Math.min(1000, Math.ceil(share * 1.1))) } : { inci, percent: tenths(share) };
  });
}

/**
 * Different formulas as a house has them, for measurements: 5 to 40 materials off one shelf, in one
 * to four markets, with claims, particulars and a label on many. The seed fixes every figure.
 */
export function formulaMix(count: number, seed = 20261201): object[] {
  const draw = drawFrom(seed);
  const shelf = fillShelf(draw);
  return Array.from({ length: count }, (_, index) => makeFormula(index, shelf, draw));
}

function makeFormula(index: number, shelf: readonly Shelved[], draw: Draw): object {
  const some = <T>(list: readonly T[], many: number): T[] => [...new Set(Array.from({ length: many }, () => list[draw(list.length)]!))];
  const chosen = some(shelf, 5 + draw(36));
  const markets = some(MARKETS, 1 + draw(4));
  const materials = [{ id: 'water', tradeName: 'Purified water', composition: [{ inci: 'Aqua', percent: '100' }] }, ...chosen.map(({ material }) => material)];
  const product = {
    name: `Mixed formula ${index}`, brand: 'Brackenmere Bathhouse', category: CATEGORIES[draw(CATEGORIES.length)]!, markets,
    placedOnMarket: `202${4 + draw(5)}-0${1 + draw(9)}-15`,
    ...(draw(5) < 3 ? { claims: some(CLAIMS, 1 + draw(3)).map((text) => ({ text, lang: 'en' })) } : {}),
    ...(draw(5) < 3 ? { netContent: { value: `${50 + draw(10) * 25}`, unit: 'ml' }, durability: { kind: 'pao', months: 12 }, particulars: { responsiblePerson: Object.fromEntries(markets.map((market) => [market, { name: 'Brackenmere Bathhouse', address: '4 Sluice Row, 0000 Exampleport' }])), batchCode: `B-${index}`, function: 'Cosmetic product', warnings: [] } } : {}),
  };
  const lines = chosen.map(({ material, usual }) => ({ material: material.id, phase: 'A', amount: `${Math.max(1, Math.floor((usual * (50 + draw(100))) / 250))}.${draw(10)}${draw(10)}`, unit: 'g' }));
  return {
    document: 'formula/1', product, materials,
    formula: { batchSize: { value: '1000', unit: 'g' }, lines: [{ material: 'water', phase: 'A', unit: 'qs' }, ...lines] },
    ...(draw(5) < 2 ? { label: { container: { shape: 'cylinder', diameterMm: '58', labelHeightMm: '90', overlapMm: '5' }, bleedMm: '3', languages: ['en'], market: markets[0]! } } : {}),
  };
}
