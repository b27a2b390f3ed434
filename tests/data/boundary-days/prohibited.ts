import type { Boundary } from './boundary.ts';

/*
 * Annex II to Regulation (EC) No 1223/2009: entries that came with a date, by the act that brought
 * them, as the official export of 18 June 2026 names it, and one number of each. Typed out here,
 * not read out of the tables.
 */

/** Regulation (EU) 2021/1902: applies from 2022-03-01. */
const BY_2021_1902 = [
  '1658 409-21-2', '1659 1067-53-4', '1660 3648-18-8', '1661 191-30-0', '1662 125225-28-7', '1663 143-24-8',
  '1664 76738-62-0', '1665 3296-90-0', '1666 80-54-6', '1667 27554-26-3', '1668 3121-61-7', '1669 70161-44-3',
  '1670 13463-41-7', '1671 61213-25-0', '1672 907204-31-3', '1673 924-42-5', '1674 494793-67-8', '1675 140923-17-7',
  '1676 3542-36-7', '1677 104206-82-8', '1678 10004-44-1', '1679 72963-72-5',
];

/** Regulation (EU) 2023/1490: applies from 2023-12-01. */
const BY_2023_1490 = [
  '1695 12124-97-9', '1696 2781-10-4', '1697 1067-33-0', '1698 7446-07-3', '1699 13701-59-2', '1700 36483-57-5',
  '1701 732-26-3', '1702 80-09-1', '1703 119-61-9', '1704 2797-51-5', '1705 375-85-9', '1706 283159-90-0',
  '1708 2156592-54-8', '1710 58-55-9', '1711 108-78-1', '1712 239110-15-7', '1713 874819-71-3', '1714 1255734-28-1',
  '1715 881685-58-1', '1716 84696-25-3', '1717 98-82-8', '1718 15625-89-5', '1719 7216-95-7', '1720 67-43-6',
  '1721 140-01-2', '1722 135410-20-7', '1723 40487-42-1', '1724 25057-89-0',
];

/** Regulation (EU) 2025/877: applies from 2025-09-01. */
const BY_2025_877 = [
  '1731 75980-60-8', '1732 79-94-7', '1733 118712-89-3', '1734 210880-92-5', '1735 577705-90-9', '1736 75768-65-9',
  '1739 18755-43-6', '1740 78-04-6', '1741 818-08-6', '1743 1478-61-1', '1744 1861-40-1', '1745 99-97-8',
  '1746 68953-84-4', '1747 59-89-2', '1748 119446-68-3', '1749 822-36-6', '1750 91-97-4', '1751 173159-57-4',
];

/** Regulation (EU) 2026/78: applies from 2026-05-01. */
const BY_2026_78 = [
  '1754 127-06-0', '1755 119344-86-4', '1756 26761-45-5', '1757 177406-68-7', '1758 2386-87-0', '1759 52556-42-0',
  '1760 89-61-2', '1761 67306-00-7', '1762 110-26-9', '1763 3006-82-4', '1764 121-43-7', '1765 87392-12-9',
  '1766 175013-18-0',
];

/** Entries whose number is missing or cut off in the export: probed by name. */
const BY_NAME: readonly (readonly [string, string, string])[] = [
  ['1680', 'Bis(α,α-dimethylbenzyl) peroxide', '2022-03-01'],
  ['1707', '6-[C12-18-alkyl-(branched, unsaturated)-2,5-dioxopyrrolidin-1-yl]hexanoic acid, sodium and tris(2-hydroxyethyl)ammonium salts', '2023-12-01'],
  ['1709', '6-[C12-18-alkyl-(branched, unsaturated)-2,5-dioxopyrrolidin-1-yl]hexanoic acid', '2023-12-01'],
  ['1737', "reaction mass of 4,4'-[2,2,2-trifluoro-1-(trifluoromethyl)ethylidene]diphenol and benzyl(diethylamino)diphenylphosphonium 4-[1,1,1,3,3,3-hexafluoro-2-(4-hydroxyphenyl)propan-2-yl]phenolate (1:1)", '2025-09-01'],
  ['1738', "reaction mass of 4,4'-[2,2,2-trifluoro-1-(trifluoromethyl)ethylidene]diphenol and benzyltriphenylphosphonium, salt with 4,4'-[2,2,2-trifluoro-1-(trifluoromethyl)ethylidene]diphenol (1:1)", '2025-09-01'],
  ['1742', 'reaction mass of 1-(2,3-epoxypropoxy)-2,2-bis ((2,3-epoxypropoxy)methyl) butane and 1-(2,3-epoxypropoxy)-2-((2,3-epoxypropoxy)methyl)-2-hydroxymethyl butane', '2025-09-01'],
  ['1752', 'Multi-walled Carbon Tubes (synthetic graphite in tubular shape) with a geometric tube diameter range ≥ 30 nm to < 3 μm and a length ≥ 5 μm and aspect ratio > 3:1, including Multi-Walled Carbon Nanotubes, MWC(N)T', '2026-05-01'],
  ['1753', 'reaction mass of 1,3-dioxan-5-ol and 1,3-dioxolan-4-ylmethanol', '2026-05-01'],
];

const byNumber = (list: readonly string[], available: string): Boundary[] =>
  list.map((line) => {
    const [entry, cas] = line.split(' ') as [string, string];
    return { market: 'EU', rule: `eu/annex-ii/${entry}`, says: 'prohibited', given: [{ name: 'known by its number', cas: [cas], percent: '1' }], asked: {}, available };
  });
const byName = ([entry, name, available]: (typeof BY_NAME)[number]): Boundary => ({ market: 'EU', rule: `eu/annex-ii/${entry}`, says: 'prohibited', given: [{ name, percent: '1' }], asked: {}, available });

const banned = (market: Boundary['market'], rule: string, name: string, dates: Pick<Boundary, 'placed' | 'available'>, nano = false): Boundary => ({ market, rule, says: 'prohibited', given: [{ name, percent: '1', nano }], asked: {}, ...dates });

/** Regulation (EU) 2017/1410, footnote 6: not placed from 23 August 2019, not made available from 23 August 2021; in Great Britain as it was taken over. */
const FOOTNOTE_6 = { placed: '2019-08-23', available: '2021-08-23' };
/** Regulation (EU) 2024/858, footnote 11: not placed from 1 February 2025, not made available from 1 November 2025. */
const FOOTNOTE_11 = { placed: '2025-02-01', available: '2025-11-01' };

/** Every dated entry of Annex II. */
export const PROHIBITED: readonly Boundary[] = [
  ...(['EU', 'UK'] as const).flatMap((market) => [
    banned(market, 'eu/annex-ii/1380', 'Hydroxyisohexyl 3-Cyclohexene Carboxaldehyde', FOOTNOTE_6),
    banned(market, 'eu/annex-ii/1381', 'Atranol', FOOTNOTE_6),
    banned(market, 'eu/annex-ii/1382', 'Chloroatranol', FOOTNOTE_6),
  ]),
  ...byNumber(BY_2021_1902, '2022-03-01'),
  ...byNumber(BY_2023_1490, '2023-12-01'),
  ...byNumber(BY_2025_877, '2025-09-01'),
  ...byNumber(BY_2026_78, '2026-05-01'),
  ...BY_NAME.map(byName),
  banned('EU', 'eu/annex-ii/1725', 'Styrene/Acrylates Copolymer', FOOTNOTE_11, true),
  banned('EU', 'eu/annex-ii/1726', 'Copper', FOOTNOTE_11, true),
  banned('EU', 'eu/annex-ii/1727', 'Silver', { available: '2026-05-01' }, true),
  banned('EU', 'eu/annex-ii/1728', 'Gold', FOOTNOTE_11, true),
  banned('EU', 'eu/annex-ii/1729', 'Platinum', FOOTNOTE_11, true),
  // Footnote 12: not placed from 1 May 2025, not made available from 1 May 2026.
  banned('EU', 'eu/annex-ii/1730', '4-Methylbenzylidene Camphor', { placed: '2025-05-01', available: '2026-05-01' }),
  // Footnote 13: not placed from 1 January 2027, not made available from 1 July 2028.
  banned('EU', 'eu/annex-ii/1767', 'Triphenyl Phosphate', { placed: '2027-01-01', available: '2028-07-01' }),
];
