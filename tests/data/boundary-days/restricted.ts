import type { Asked, Given } from '#tests/shared/rules/judging.ts';
import type { Boundary } from './boundary.ts';

/*
 * Every dated provision of Annex III to Regulation (EC) No 1223/2009. Days and limits are those of
 * the official export of 18 June 2026 and of the footnotes in the consolidated text of 18 May 2026,
 * typed out here, not read out of the tables. Each substance is given at a share just above the limit that begins or ends.
 */
type Dates = Pick<Boundary, 'placed' | 'available'>;
type Line = readonly [rule: string, name: string, percent: string, category: string, more?: Partial<Boundary> & { readonly with?: Asked }];

const DYE = 'hair-dye-oxidative';
const RINSE = 'hair-dye-non-oxidative';

function limits(market: Boundary['market'], dates: Dates, lines: readonly Line[], prefix = 'eu/annex-iii/'): Boundary[] {
  return lines.map(([rule, name, percent, category, { with: asked, ...more } = {}]) => {
    const given: Given = { name, percent };
    return { market, rule: prefix + rule, says: 'limit-exceeded', given: [given], asked: { category, ...asked }, ...dates, ...more };
  });
}

/** Footnote 46: not placed from 1 January 2027, not made available from 1 July 2028. */
const FOOTNOTE_46: Dates = { placed: '2027-01-01', available: '2028-07-01' };
/** Footnote 47, for geranial and neral: the second day is 1 August 2028. */
const FOOTNOTE_47: Dates = { placed: '2027-01-01', available: '2028-08-01' };
/** Footnotes 43 and 44: not placed from 1 February 2025, not made available from 1 November 2025. */
const FOOTNOTE_44: Dates = { placed: '2025-02-01', available: '2025-11-01' };
/** Entries 325 and 326: not placed from 1 July 2023, not made available from 1 January 2024. */
const FOOTNOTE_34: Dates = { placed: '2023-07-01', available: '2024-01-01' };
/** Regulation (EU) 2026/78 applies from 1 May 2026. */
const ACT_2026_78: Dates = { available: '2026-05-01' };
const forbidden = { says: 'not-for-this-use' } as const;
const nano = (name: string, percent: string): Partial<Boundary> => ({ given: [{ name, percent, nano: true }] });

const CITRAL: readonly Line[] = [
  ['70/a', 'Citral', '0.1100001', 'lipstick'],
  ['70/b', 'Citral', '0.0320001', 'deodorant-stick'],
  ['70/c', 'Citral', '0.6500001', 'foundation'],
  ['70/d', 'Citral', '0.6000001', 'eau-de-toilette'],
  ['70/e', 'Citral', '0.1500001', 'body-lotion'],
  ['70/f', 'Citral', '0.3500001', 'toothpaste'],
  ['70/g', 'Citral', '1.2000001', 'hair-oil'],
  ['70/h', 'Citral', '1.2000001', 'shampoo'],
  ['70/i', 'Citral', '0.0630001', 'intimate-wipes'],
];
const GERANIAL: readonly Line[] = CITRAL.map(([rule, , percent, category]) => [rule, 'Geranial', percent, category]);

/** Zinc sulfate, ZnSO4: 65.38 of 161.436 is zinc; 2.5 % is 1.01245… %, 1.8 % is 0.72898… %, 0.25 % is 0.10124… %. */
const ZINC: readonly Line[] = [
  ['24/a', 'Zinc Sulfate', '2.5', 'toothpaste'],
  ['24/b', 'Zinc Sulfate', '1.8', 'toothpaste', { with: { facts: { fromAge: '0' } } }],
  ['24/c', 'Zinc Sulfate', '0.25', 'mouthwash'],
  ['24/d', 'Zinc Sulfate', '2.5', 'face-cream'],
];

const SALICYLATE: readonly Line[] = [
  ['75/a', 'Benzyl Salicylate', '4.0000001', 'eau-de-toilette'],
  ['75/b', 'Benzyl Salicylate', '0.5000001', 'shampoo'],
  ['75/c', 'Benzyl Salicylate', '1.3000001', 'shower-gel'],
  ['75/d', 'Benzyl Salicylate', '0.5000001', 'face-cream'],
  ['75/e', 'Benzyl Salicylate', '0.5000001', 'hair-spray'],
  ['75/f', 'Benzyl Salicylate', '0.7000001', 'body-lotion'],
  ['75/g', 'Benzyl Salicylate', '0.2000001', 'foundation'],
  ['75/h', 'Benzyl Salicylate', '0.0040001', 'toothpaste'],
  ['75/i', 'Benzyl Salicylate', '0.9100001', 'deodorant-spray'],
];

/** Aluminium chloride, AlCl3: 26.982 of 133.332 is aluminium, a little over a fifth; alumina, Al2O3: 53.964 of 101.961. */
const ALUMINIUM: readonly Line[] = [
  ['381/a', 'Aluminum Chloride', '40', 'deodorant-stick'],
  ['381/b', 'Aluminum Chloride', '17', 'antiperspirant-spray'],
  ['381/c', 'Aluminum Chloride', '16', 'toothpaste'],
  ['381/d', 'Alumina', '28', 'lipstick'],
  ['381/e', 'Aluminum Chloride', '4.5', 'body-wash'],
  ['381/f', 'Aluminum Chloride', '20', 'soap-bar'],
  ['381/g', 'Aluminum Chloride', '36', 'shampoo'],
  ['381/h', 'Aluminum Chloride', '0.8', 'hair-mist'],
  ['381/i', 'Aluminum Chloride', '34', 'hair-oil'],
  ['381/j', 'Alumina', '44', 'foundation'],
  ['381/k', 'Alumina', '30', 'eyeliner'],
  ['381/l', 'Alumina', '82', 'eye-shadow'],
  ['381/m', 'Aluminum Chloride', '18', 'nail-polish'],
  ['381/n', 'Aluminum Chloride', '16', 'mascara'],
  ['381/o', 'Alumina', '21', 'face-cream'],
  ['381/p', 'Aluminum Chloride', '4.5', 'hand-cream'],
  ['381/q', 'Aluminum Chloride', '19', 'body-lotion'],
  ['381/r', 'Aluminum Chloride', '10', 'talc-powder'],
  ['381/r', 'Aluminum Chloride', '1', 'talc-powder', { says: { words: 'Keep powder away from children' } }],
  ['381/q', 'Aluminum Chloride', '0.1', 'sunscreen-spray', forbidden],
];

const HAIR_DYES_2026: readonly Line[] = [
  ['383/a', 'HC Blue No. 18', '0.3500001', DYE],
  ['383/b', 'HC Blue No. 18', '0.3500001', RINSE],
  ['384', 'Hydroxypropyl-p-phenylenediamine', '2.0000001', DYE],
  ['385/a', 'HC Yellow No. 16', '1.0000001', DYE],
  ['385/b', 'HC Yellow No. 16', '1.5000001', RINSE],
  ['386/a', 'HC Red No. 18', '1.5000001', DYE],
  ['386/b', 'HC Red No. 18', '0.5000001', RINSE],
];

/** As from 3 June 2021, in the Union and as taken over in Great Britain. */
const HAIR_DYES_2020: readonly Line[] = [
  // 2 × 318.246 / 281.788 = 2.25876…, 2 × 303.231 / 266.773 = 2.27332…
  ['315', 'Dimethylpiperazinium Aminopyrazolopyridine HCl', '2.2588', DYE],
  ['316', 'Methylimidazoliumpropyl p-Phenylenediamine HCl', '2.2734', DYE],
  ['317', 'HC Orange No. 6', '0.5000001', RINSE],
  ['318', 'Acid Orange 7', '0.5000001', RINSE],
  ['319/a', 'Tetrabromophenol Blue', '0.2000001', DYE],
  ['319/b', 'Tetrabromophenol Blue', '0.2000001', RINSE],
  ['320', 'Indigofera Tinctoria Leaf', '25.0000001', RINSE],
];
/** As from 3 December 2021. */
const DYE_WORDS: Partial<Boundary> = { says: { words: 'Hair colourants can cause severe allergic reactions.' } };
const HAIR_DYE_WORDS: readonly Line[] = [
  ['315', 'Dimethylpiperazinium Aminopyrazolopyridine HCl', '1', DYE, DYE_WORDS],
  ['316', 'Methylimidazoliumpropyl p-Phenylenediamine HCl', '1', DYE, DYE_WORDS],
  ['319/a', 'Tetrabromophenol Blue', '0.1', DYE, DYE_WORDS],
];

const VETIVER: readonly Line[] = [
  ['382/a', 'Vetiveryl Acetate', '0.9000001', 'eau-de-toilette'],
  ['382/b', 'Vetiveryl Acetate', '0.0500001', 'deodorant-stick'],
  ['382/c', 'Vetiveryl Acetate', '0.0500001', 'foundation'],
  ['382/d', 'Vetiveryl Acetate', '0.1000001', 'face-cream'],
  ['382/e', 'Vetiveryl Acetate', '0.2000001', 'body-wash'],
];

/** Regulation (EU) 2024/996. */
const ACT_2024_996: readonly Line[] = [
  ['373', 'Genistein', '0.0070001', 'face-cream'],
  ['374', 'Daidzein', '0.0200001', 'face-cream'],
  ['375', 'Kojic Acid', '1.0000001', 'face-cream'],
  ['375', 'Kojic Acid', '0.1', 'shampoo', forbidden],
  ['377/a', 'Alpha-Arbutin', '2.0000001', 'face-cream'],
  ['377/b', 'Alpha-Arbutin', '0.5000001', 'body-lotion'],
  ['378', 'Arbutin', '7.0000001', 'face-cream'],
];

const HEXYL: readonly Line[] = [
  ['380/a', 'Hexyl Salicylate', '2.0000001', 'eau-de-toilette'],
  ['380/b', 'Hexyl Salicylate', '0.5000001', 'body-wash'],
  ['380/c', 'Hexyl Salicylate', '0.3000001', 'face-cream'],
  ['380/d', 'Hexyl Salicylate', '0.0010001', 'toothpaste'],
  ['380/e', 'Hexyl Salicylate', '0.0010001', 'mouthwash'],
  ['380/f', 'Hexyl Salicylate', '0.1000001', 'baby-lotion'],
  ['380', 'Hexyl Salicylate', '0.0001', 'mouthwash', { ...forbidden, with: { flags: { under3: true } } }],
];
const silver = (percent: string): Partial<Boundary> => ({ given: [{ name: 'Silver', percent, purpose: 'other' }] });
const SILVER: readonly Line[] = [
  ['379/a', 'Silver', '0.0500001', 'toothpaste', silver('0.0500001')],
  ['379/b', 'Silver', '0.0500001', 'mouthwash', silver('0.0500001')],
  ['379', 'Silver', '0.01', 'face-cream', { ...silver('0.01'), ...forbidden }],
];

export const RESTRICTED: readonly Boundary[] = [
  ...limits('EU', FOOTNOTE_46, ZINC),
  ...limits('EU', FOOTNOTE_46, [['24', 'Zinc Sulfate', '2.5', 'face-cream', { ends: true }]]),
  ...limits('EU', FOOTNOTE_46, CITRAL),
  ...limits('EU', FOOTNOTE_47, GERANIAL),
  ...limits('EU', FOOTNOTE_46, SALICYLATE),
  ...limits('EU', FOOTNOTE_46, ALUMINIUM),
  ...limits('EU', FOOTNOTE_46, VETIVER),
  ...limits('EU', FOOTNOTE_46, HAIR_DYES_2026),
  ...(['EU', 'UK'] as const).flatMap((market) => [...limits(market, { available: '2021-06-03' }, HAIR_DYES_2020), ...limits(market, { available: '2021-12-03' }, HAIR_DYE_WORDS)]),
  // That entry 321 binds from 1 October 2021 is from memory.
  ...limits('EU', { available: '2021-10-01' }, [
    ['321/a', 'Titanium Dioxide', '25.0000001', 'face-powder', { with: { facts: { loosePowder: true } } }],
    ['321/b', 'Titanium Dioxide', '1.4000001', 'hair-spray'],
    ['321/c', 'Titanium Dioxide', '1', 'body-mist', forbidden],
  ]),
  // Entry 322: not placed from 26 January 2022, not made available from 22 April 2022.
  ...limits('EU', { placed: '2022-01-26', available: '2022-04-22' }, [
    ['322/a', 'Dihydroxyacetone', '6.2500001', RINSE],
    ['322/b', 'Dihydroxyacetone', '10.0000001', 'self-tan'],
    ['322', 'Dihydroxyacetone', '1', 'face-cream', forbidden],
  ]),
  ...limits('EU', FOOTNOTE_34, [
    ['325/a', 'BHT', '0.0010001', 'mouthwash'],
    ['325/b', 'BHT', '0.1000001', 'toothpaste'],
    ['325/c', 'BHT', '0.8000001', 'face-cream'],
    ['326', 'Acid Yellow 3', '0.5000001', RINSE],
  ]),
  // Footnote 40, with entry 130: placed until 31 July 2026, made available until 31 July 2028.
  ...limits('EU', { placed: '2026-08-01', available: '2028-08-01' }, [['371', 'Pinene', '0.1', 'face-cream', { says: { notChecked: '10 mmol/L' } }]]),
  ...limits('EU', FOOTNOTE_44, [
    ['372/a', 'Hydroxyapatite', '10.0000001', 'toothpaste', nano('Hydroxyapatite', '10.0000001')],
    ['372/b', 'Hydroxyapatite', '0.4650001', 'mouthwash', nano('Hydroxyapatite', '0.4650001')],
    ['372', 'Hydroxyapatite', '0.1', 'face-cream', { ...nano('Hydroxyapatite', '0.1'), ...forbidden }],
  ]),
  ...limits('EU', FOOTNOTE_44, ACT_2024_996),
  // Footnote 45, vitamin A: not placed from 1 November 2025, not made available from 1 May 2027.
  ...limits('EU', { placed: '2025-11-01', available: '2027-05-01' }, [
    ['376/a', 'Retinol', '0.0500001', 'body-lotion'],
    ['376/b', 'Retinol', '0.3000001', 'face-cream'],
    ['376', 'Retinol', '0.01', 'face-cream', { says: { words: 'Contains Vitamin A. Consider your daily intake before use' } }],
  ]),
  ...limits('EU', ACT_2026_78, [...SILVER, ...HEXYL]),
];
