import type { Asked, Given } from '#tests/shared/rules/judging.ts';
import type { Boundary } from './boundary.ts';

/*
 * Every dated provision of Annexes IV to VI to Regulation (EC) No 1223/2009 and the warning on
 * formaldehyde. Days and limits as in the official exports and the footnotes of the consolidated
 * text of 18 May 2026, typed out here, not read out of the tables. Limits that ended are from memory.
 */
type Dates = Pick<Boundary, 'placed' | 'available'>;
type Line = readonly [rule: string, given: Given, asked: Asked, more?: Partial<Boundary>];

const lines = (market: Boundary['market'], dates: Dates, list: readonly Line[], prefix = 'eu/'): Boundary[] =>
  list.map(([rule, given, asked, more = {}]) => ({ market, rule: prefix + rule, says: 'limit-exceeded', given: [given], asked, ...dates, ...more }));
const forbidden = { says: 'not-for-this-use' } as const;

/** Regulation (EU) 2026/78 applies from 1 May 2026. */
const ACT_2026_78: Dates = { available: '2026-05-01' };
/** Annex V, footnote 22: placed until 31 December 2024, made available until 31 October 2025. */
const FOOTNOTE_22: Dates = { placed: '2025-01-01', available: '2025-11-01' };
/** Annex VI, footnote 8: not placed from 1 January 2025, not made available from 1 July 2025. */
const HOMOSALATE: Dates = { placed: '2025-01-01', available: '2025-07-01' };
/** Regulation (EU) 2022/1176: placed until 28 January 2023, made available until 28 July 2023. */
const ACT_2022_1176: Dates = { placed: '2023-01-29', available: '2023-07-29' };

const silver = (percent: string): Given => ({ name: 'CI 77820', percent, purpose: 'colourant' });
const preservative = (name: string, percent: string): Given => ({ name, percent, purpose: 'preservative' });
const filter = (name: string, percent: string): Given => ({ name, percent, purpose: 'uv-filter' });
const releaser = preservative('DMDM Hydantoin', '0.3');
/** Between the two thresholds, 0.001 % and 0.05 %, and above both. */
const released = (percent: string): Asked => ({ facts: { releasedFormaldehyde: percent } });
const says = (words: string): Partial<Boundary> => ({ says: { words } });

export const LISTED: readonly Boundary[] = [
  ...lines('EU', ACT_2026_78, [
    ['annex-iv/142/a', silver('0.2000001'), { category: 'lipstick' }],
    ['annex-iv/142/b', silver('0.2000001'), { category: 'eye-shadow' }],
    ['annex-iv/142', silver('0.1'), { category: 'face-cream' }, forbidden],
    ['annex-v/7', preservative('O-Phenylphenol', '0.1'), { category: 'body-mist' }, forbidden],
    ['annex-v/7', preservative('O-Phenylphenol', '0.1'), { category: 'mouthwash' }, forbidden],
  ]),
  ...lines('EU', FOOTNOTE_22, [
    ['annex-v/23', preservative('Triclocarban', '0.1'), { category: 'mouthwash' }, forbidden],
    ['annex-v/23', preservative('Triclocarban', '0.1'), { category: 'toothpaste', facts: { fromAge: '5' } }, forbidden],
    ['annex-v/23', preservative('Triclocarban', '0.1'), { category: 'toothpaste', facts: { fromAge: '6' } }, says('Not to be used for children under 6 years of age')],
    ['annex-v/25/b', preservative('Triclosan', '0.2000001'), { category: 'mouthwash' }, { ends: true }],
    ['annex-v/25', preservative('Triclosan', '0.1'), { category: 'toothpaste', facts: { fromAge: '2' } }, forbidden],
    ['annex-v/25', preservative('Triclosan', '0.1'), { category: 'toothpaste', facts: { fromAge: '3' } }, says('Not to be used for children under 3 years of age')],
  ]),
  // Regulation (EU) 2026/909 is in force from 18 May 2026.
  ...lines('EU', { available: '2026-05-18' }, [
    ['annex-v/61/a', preservative('Ammonium Silver Zinc Aluminum Silicate', '1.0000001'), { category: 'deodorant-spray' }],
    ['annex-v/61/b', preservative('Ammonium Silver Zinc Aluminum Silicate', '1.0000001'), { category: 'powder-foundation' }],
  ]),
  ...lines('EU', HOMOSALATE, [
    ['annex-vi/3', filter('Homosalate', '7.3400001'), { category: 'face-sunscreen' }, { limit: '7.34' }],
    ['annex-vi/3', filter('Homosalate', '5'), { category: 'body-lotion' }, forbidden],
    ['annex-vi/3', filter('Homosalate', '10.0000001'), { category: 'face-sunscreen' }, { limit: '10', ends: true }],
  ]),
  ...lines('EU', ACT_2022_1176, [
    ['annex-vi/4/a', filter('Benzophenone-3', '6.0000001'), { category: 'face-sunscreen' }],
    ['annex-vi/4/b', filter('Benzophenone-3', '2.2000001'), { category: 'sunscreen-lotion' }],
    ['annex-vi/4/c', filter('Benzophenone-3', '0.5000001'), { category: 'shampoo' }],
    ['annex-vi/4', filter('Benzophenone-3', '6.0000001'), { category: 'sunscreen-lotion' }, { limit: '6', ends: true }],
    ['annex-vi/10/a', filter('Octocrylene', '9.0000001'), { category: 'sunscreen-aerosol' }],
    ['annex-vi/10/b', filter('Octocrylene', '10.0000001'), { category: 'sunscreen-lotion' }],
    ['annex-vi/10', filter('Octocrylene', '10.0000001'), { category: 'sunscreen-lotion' }, { limit: '10', ends: true }],
  ]),
  // 4-Methylbenzylidene camphor leaves Annex VI on the days on which it joins Annex II.
  ...lines('EU', { placed: '2025-05-01', available: '2026-05-01' }, [['annex-vi/18', filter('4-Methylbenzylidene Camphor', '4.0000001'), { category: 'sunscreen-lotion' }, { ends: true }]]),
  ...lines('UK', { placed: '2026-07-15', available: '2027-01-15' }, [['annex-vi/18', filter('4-Methylbenzylidene Camphor', '4.0000001'), { category: 'sunscreen-lotion' }, { ends: true }]], 'uk/'),
  // Annex VI, footnote 10: not placed from 1 January 2027, not made available from 1 July 2028.
  ...lines('EU', { placed: '2027-01-01', available: '2028-07-01' }, [['annex-vi/28', filter('Diethylamino Hydroxybenzoyl Hexyl Benzoate', '5'), { category: 'sunscreen-lotion' }, { says: { notChecked: '10 ppm' } }]]),
  // Regulation (EU) 2022/1181: placed until 31 July 2024, made available until 31 July 2026.
  ...lines('EU', { placed: '2024-08-01', available: '2026-08-01' }, [
    ['annex-v/preamble-2/releases', releaser, released('0.0010001'), says('releases formaldehyde')],
    ['annex-v/preamble-2/contains', releaser, released('0.0500001'), { ...says('contains formaldehyde'), ends: true }],
  ]),
  // The Cosmetic Products (Restriction of Chemical Substances) Regulations 2026: from 15 July 2026, stock to the end of 14 January 2027.
  ...lines('UK', { placed: '2026-07-15', available: '2027-01-15' }, [
    ['annex-v/preamble-2/releases', releaser, released('0.0010001'), says('releases formaldehyde')],
    ['annex-v/preamble-2/contains', releaser, released('0.0500001'), { ...says('contains formaldehyde'), ends: true }],
  ], 'uk/'),
];
