import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import { toDecimal } from '#shared/kernel/rational.ts';
import { findSuspects, gapOf } from './slips.ts';
import type { Finding } from './types.ts';
import type { WeighedLines } from './weigh-lines.ts';

/** `sum-mismatch`: the lines do not add up to the batch. */
export function judgeSum(document: FormulaDocument, weighed: WeighedLines, citation: string): Finding[] {
  const gap = gapOf(document, weighed);
  if (!gap && weighed.total > 0n) return [];
  const grams = (figure: bigint): string => toDecimal({ n: figure, d: weighed.den });
  const base = { kind: 'sum-mismatch', severity: 'stop', rule: 'formula-adds-up', subject: document.product.name, citation } as const;
  if (!gap) {
    return [{ ...base, measured: '0', unit: 'g', message: 'The formula weighs nothing, so no share can be worked out.', remedy: 'Give at least one line an amount over 0.' }];
  }
  const suspects = findSuspects(document, weighed);
  const hint = suspects.length > 0 ? ' A slip of the hand may explain it: see the amounts below.' : '';
  const withSuspects = { ...base, ...(suspects.length > 0 && { suspects }) };
  if (gap.kind === 'made-up') {
    const others = grams(weighed.batch - weighed.madeUp!);
    return [{
      ...withSuspects,
      measured: others,
      limit: grams(weighed.batch),
      unit: 'g',
      message: `The other lines already weigh ${others} g, more than the batch of ${grams(weighed.batch)} g, so nothing is left to make it up. It counts as 0.${hint}`,
      remedy: 'Lower the other amounts or raise the batch size.',
      arithmetic: [
        { step: 'Batch', figure: `${grams(weighed.batch)} g` },
        { step: 'All other lines', figure: `${others} g` },
        { step: 'Left to make up the batch', figure: `${grams(weighed.madeUp!)} g` },
      ],
    }];
  }
  const unit = gap.kind === 'percent' ? '%' : 'g';
  const measured = toDecimal(gap.measured);
  const limit = toDecimal(gap.target);
  const off = toDecimal({ n: gap.measured.n * gap.target.d - gap.target.n * gap.measured.d, d: gap.measured.d * gap.target.d });
  return [{
    ...withSuspects,
    measured,
    limit,
    unit,
    message: `The lines add up to ${measured} ${unit}, but ${gap.kind === 'percent' ? 'shares have to add up to 100 %' : `the batch is ${limit} g`}.${hint} All shares are worked out over the actual sum.`,
    remedy: gap.kind === 'percent' ? 'Correct a share so that the lines add up to 100 %.' : 'Correct an amount or the batch size so that both agree.',
    arithmetic: [
      { step: 'Sum of the lines', figure: `${measured} ${unit}` },
      { step: gap.kind === 'percent' ? 'Expected' : 'Batch', figure: `${limit} ${unit}` },
      { step: 'Difference', figure: `${off} ${unit}` },
      { step: 'Allowed difference', figure: `${toDecimal(gap.tolerance)} ${unit}` },
    ],
  }];
}

