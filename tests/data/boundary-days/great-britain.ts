import type { Boundary } from './boundary.ts';

/*
 * What Great Britain's own instruments prohibit and limit. Their articles were read at
 * legislation.gov.uk, their schedules as trade pages tell them. "May be sold to the end of" a day
 * binds on the next; so does "placed on or before". Numbers typed out here, not read out of the tables.
 */

type Dates = Pick<Boundary, 'placed' | 'available'>;
const banned = (list: readonly string[], dates: Dates): Boundary[] =>
  list.map((line) => {
    const [rule, cas] = line.split(' ') as [string, string];
    return { market: 'UK', rule: `uk/${rule}`, says: 'prohibited', given: [{ name: 'known by its number', cas: [cas], percent: '1' }], asked: {}, ...dates };
  });
const bannedByName = (list: readonly (readonly [string, string])[], dates: Dates): Boundary[] =>
  list.map(([rule, name]) => ({ market: 'UK', rule: `uk/${rule}`, says: 'prohibited', given: [{ name, percent: '1' }], asked: {}, ...dates }));

/** SI 2022/659: classified substances from 15 October 2022, on the shelf to 15 December 2022; Deoxyarbutin two and three months later. */
const SI_2022_659 = [
  'annex-ii/1646 7440-48-4', 'annex-ii/1647 108-62-3', 'annex-ii/1648 115-09-3', 'annex-ii/1649 189-55-9', 'annex-ii/1650 189-64-0', 'annex-ii/1651 97925-95-6',
  'si-2022-659/eu-1652 71850-09-4', 'si-2022-659/eu-1654 693-98-1', 'si-2022-659/eu-1666 80-54-6', 'si-2022-659/eu-1668 3121-61-7', 'si-2022-659/eu-1669 70161-44-3', 'si-2022-659/eu-1670 13463-41-7',
];
/** SI 2024/1334, entries 1680 to 1730: placed to 20 April 2025, on the shelf to 20 October 2025. */
const SI_2024_1334_A = [
  'annex-ii/1680 116-14-3', 'annex-ii/1681 119-47-1', 'annex-ii/1682 688046-61-9', 'annex-ii/1683 1101132-67-5', 'annex-ii/1691 108-10-1', 'annex-ii/1704 119-61-9',
  'annex-ii/1706 58-55-9', 'annex-ii/1712 15625-89-5', 'annex-ii/1722 84696-25-3', 'annex-ii/1730 108-78-1',
  'si-2024-1334/eu-1686 1453-58-3', 'si-2024-1334/eu-1687 1228284-64-7', 'si-2024-1334/eu-1688 874967-67-6', 'si-2024-1334/eu-1694 13684-56-5', 'si-2024-1334/eu-1696 2781-10-4',
  'si-2024-1334/eu-1697 1067-33-0', 'si-2024-1334/eu-1698 7446-07-3', 'si-2024-1334/eu-1699 13701-59-2', 'si-2024-1334/eu-1704 2797-51-5', 'si-2024-1334/eu-1712 239110-15-7',
  'si-2024-1334/eu-1717 98-82-8', 'si-2024-1334/eu-1722 135410-20-7', 'si-2024-1334/eu-1723 40487-42-1',
];
/** SI 2024/1334, entries 1731 to 1743: placed to 2 September 2025, on the shelf to 2 March 2026. */
const SI_2024_1334_B = ['annex-ii/1740 99-97-8', 'si-2024-1334/eu-1735 577705-90-9', 'si-2024-1334/eu-1736 75768-65-9', 'si-2024-1334/eu-1747 59-89-2'];
const SI_2024_1334_B_NAMES = [
  ['si-2024-1334/eu-1737', "reaction mass of 4,4'-[2,2,2-trifluoro-1-(trifluoromethyl)ethylidene]diphenol and benzyl(diethylamino)diphenylphosphonium 4-[1,1,1,3,3,3-hexafluoro-2-(4-hydroxyphenyl)propan-2-yl]phenolate (1:1)"],
  ['si-2024-1334/eu-1738', "reaction mass of 4,4'-[2,2,2-trifluoro-1-(trifluoromethyl)ethylidene]diphenol and benzyltriphenylphosphonium, salt with 4,4'-[2,2,2-trifluoro-1-(trifluoromethyl)ethylidene]diphenol (1:1)"],
  ['si-2024-1334/eu-1742', 'reaction mass of 1-(2,3-epoxypropoxy)-2,2-bis ((2,3-epoxypropoxy)methyl) butane and 1-(2,3-epoxypropoxy)-2-((2,3-epoxypropoxy)methyl)-2-hydroxymethyl butane'],
] as const;
const NAMED = [
  ['annex-ii/1681', 'Methylene Di-t-Butylcresol'], ['annex-ii/1691', 'MIBK'], ['annex-ii/1704', 'Benzophenone'], ['annex-ii/1706', 'Theophylline'],
  ['annex-ii/1712', 'Trimethylolpropane Triacrylate'], ['annex-ii/1730', 'Melamine'],
] as const;
const DEOXYARBUTIN: Dates = { placed: '2022-12-15', available: '2023-03-16' };
const EARLY_2025: Dates = { placed: '2025-04-21', available: '2025-10-21' };
const LATE_2025: Dates = { placed: '2025-09-03', available: '2026-03-03' };

export const PROHIBITED_GB: readonly Boundary[] = [
  ...banned(['annex-ii/1645 53936-56-4'], DEOXYARBUTIN),
  ...banned(SI_2022_659, { placed: '2022-10-15', available: '2022-12-16' }),
  ...bannedByName([['si-2022-659/eu-1666', 'Butylphenyl Methylpropional'], ['si-2022-659/eu-1670', 'Zinc Pyrithione'], ['si-2022-659/eu-1669', 'Sodium Hydroxymethylglycinate'], ['si-2022-659/eu-1668', 'Methoxyethyl Acrylate']], { placed: '2022-10-15', available: '2022-12-16' }),
  ...banned(SI_2024_1334_A, EARLY_2025),
  ...bannedByName(NAMED, EARLY_2025),
  ...banned(SI_2024_1334_B, LATE_2025),
  ...bannedByName([...SI_2024_1334_B_NAMES, ['annex-ii/1740', 'Dimethyltolylamine']], LATE_2025),
  // The Regulations of 2026: from 15 July 2026, stock to the end of 14 January 2027.
  ...bannedByName([['annex-ii/4-mbc', '4-Methylbenzylidene Camphor']], { placed: '2026-07-15', available: '2027-01-15' }),
];

type Line = readonly [rule: string, name: string, percent: string, category: string, more?: Partial<Boundary>];
const limits = (dates: Dates, lines: readonly Line[]): Boundary[] =>
  lines.map(([rule, name, percent, category, more]) => ({ market: 'UK', rule, says: 'limit-exceeded', given: [{ name, percent }], asked: { category }, ...dates, ...more }));
const forbidden = { says: 'not-for-this-use' } as const;
const spray = { asked: { category: 'body-lotion', flags: { spray: true } } } as const;

export const RESTRICTED_GB: readonly Boundary[] = [
  // SI 2023/836: stock of before 6 July 2024 may stay until 6 July 2026.
  ...limits({ placed: '2024-07-06', available: '2026-07-07' }, [
    ['uk/annex-iii/323/a', 'Methyl N-Methylanthranilate', '0.1000001', 'face-cream'],
    ['uk/annex-iii/323/b', 'Methyl N-Methylanthranilate', '0.2000001', 'body-wash'],
    ['uk/annex-iii/323/a', 'Methyl N-Methylanthranilate', '0.01', 'sunscreen-lotion', forbidden],
  ]),
  // SI 2024/455: placed on or before 24 February 2025, sold to the end of 24 June 2025.
  ...limits({ placed: '2025-02-25', available: '2025-06-25' }, [
    ['uk/annex-iii/322/a', 'BHT', '0.1000001', 'toothpaste'],
    ['uk/annex-iii/322/b', 'BHT', '0.0010001', 'mouthwash'],
    ['uk/annex-iii/322/c', 'BHT', '0.0010001', 'mouth-spray'],
    ['uk/annex-iii/322/d', 'BHT', '0.8000001', 'face-cream'],
  ]),
  // SI 2024/1334: placed to 20 June 2025, on the shelf to 1 November 2025.
  ...limits({ placed: '2025-06-21', available: '2025-11-02' }, [
    ['uk/si-2024-1334/kojic-acid', 'Kojic Acid', '1.0000001', 'face-cream'],
    ['uk/si-2024-1334/kojic-acid', 'Kojic Acid', '1.0000001', 'hand-cream'],
    ['uk/si-2024-1334/kojic-acid', 'Kojic Acid', '0.1', 'body-lotion', forbidden],
  ]),
  // SI 2022/659: what is left of 2 % in these products, then 0.5 %.
  ...limits({ placed: '2022-12-15', available: '2023-03-16' }, [
    ['eu/annex-iii/98/c', 'Salicylic Acid', '0.5000001', 'body-lotion', { given: [{ name: 'Salicylic Acid', percent: '0.5000001', purpose: 'other' }] }],
    ['eu/annex-iii/98/b', 'Salicylic Acid', '2.0000001', 'body-lotion', { given: [{ name: 'Salicylic Acid', percent: '2.0000001', purpose: 'other' }], ends: true }],
  ]),
  // SI 2025/413: in force 30 September 2025, stock to the end of 31 March 2026.
  ...limits({ placed: '2025-09-30', available: '2026-04-01' }, [
    ['uk/annex-iii/324/a', 'Methyl Salicylate', '0.0600001', 'face-cream'],
    ['uk/annex-iii/324/b', 'Methyl Salicylate', '0.0500001', 'foundation'],
    ['uk/annex-iii/324/c', 'Methyl Salicylate', '0.0020001', 'mascara'],
    ['uk/annex-iii/324/d', 'Methyl Salicylate', '0.0090001', 'hair-spray'],
    ['uk/annex-iii/324/e', 'Methyl Salicylate', '0.0030001', 'deodorant-spray'],
    ['uk/annex-iii/324/f', 'Methyl Salicylate', '0.0400001', 'body-lotion', spray],
    ['uk/annex-iii/324/g', 'Methyl Salicylate', '0.0600001', 'body-wash'],
    ['uk/annex-iii/324/h', 'Methyl Salicylate', '0.6000001', 'hand-wash'],
    ['uk/annex-iii/324/i', 'Methyl Salicylate', '0.6000001', 'eau-de-toilette'],
    ['uk/annex-iii/324/j', 'Methyl Salicylate', '0.0300001', 'lipstick'],
    ['uk/annex-iii/324/k', 'Methyl Salicylate', '2.5000001', 'toothpaste'],
    ['uk/annex-iii/324/l', 'Methyl Salicylate', '0.1000001', 'mouthwash', { asked: { category: 'mouthwash', facts: { fromAge: '7' } } }],
    ['uk/annex-iii/324/m', 'Methyl Salicylate', '0.4000001', 'mouthwash'],
    ['uk/annex-iii/324/n', 'Methyl Salicylate', '0.6500001', 'mouth-spray'],
    ['uk/annex-iii/324/o', 'Methyl Salicylate', '0.0200001', 'baby-lotion'],
    ['uk/annex-iii/324', 'Methyl Salicylate', '0.001', 'baby-lotion', { says: { notChecked: 'younger ones was not read' } }],
  ]),
];
