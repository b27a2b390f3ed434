import type { Market } from '#shared/law/types.ts';
import type { FindingKind } from '#shared/engine/types.ts';
import type { FormulaKey } from './claims-formulas.ts';

export const MARKETS = ['EU', 'UK', 'US', 'CA'] as const satisfies readonly Market[];

/** One claim with what is expected of it in each market. */
export interface ClaimCase {
  readonly text: string;
  readonly lang: string;
  readonly formula: FormulaKey;
  readonly expected: Readonly<Record<Market, readonly FindingKind[]>>;
}

const KINDS: Readonly<Record<string, FindingKind>> = { m: 'claim-medicinal', x: 'claim-contradicted', e: 'claim-evidence' };

/**
 * Reads lines of `verdicts | formula | claim | language`. Verdicts: one for all markets, two for
 * EU and UK, US and CA, or four; each `-` for none or letters of `m`, `x`, `e` together.
 * @throws Error where a line is not of that form, so that no claim is left out unseen.
 */
export function readTable(text: string): ClaimCase[] {
  return text.split('\n').filter((line) => line.trim() !== '' && !line.startsWith('#')).map((line) => {
    const [verdicts = '', formula = '', claim = '', lang = 'en'] = line.split(' | ').map((cell) => cell.trim());
    const given = verdicts.split(' ');
    const four = given.length === 1 ? [0, 0, 0, 0] : given.length === 2 ? [0, 0, 1, 1] : [0, 1, 2, 3];
    if (![1, 2, 4].includes(given.length) || given.some((one) => !/^(-|[mxe]+)$/.test(one)) || claim === '') throw new Error(`not a line of the table: ${line}`);
    const kinds = (at: number): readonly FindingKind[] => [...given[four[at]!]!].flatMap((letter) => KINDS[letter] ?? []);
    return { text: claim, lang, formula: formula as FormulaKey, expected: { EU: kinds(0), UK: kinds(1), US: kinds(2), CA: kinds(3) } };
  });
}
