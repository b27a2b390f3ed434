import { assess } from '#shared/engine/assess.ts';
import { presentResult } from '#shared/engine/present-result.ts';
import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import { dictionary, law, TODAY } from '#tests/support/engine.ts';
import { FURTHER } from '#tests/shared/rules/claims/claims-further.ts';
import { HELD_OUT } from '#tests/shared/rules/claims/claims-held-out.ts';
import { NEAR_THE_LINE } from '#tests/shared/rules/claims/claims-near-the-line.ts';
import { CLAIMS } from '#tests/shared/rules/claims/claims-table.ts';
import { precision, recall, scoreClaims, type Score } from '#tests/shared/rules/claims/score-claims.ts';
import { largeFormula } from './engine.bench.ts';
import { median, ms, time, type Row } from './report.ts';

const PRECISION = 94;
const RECALL = 93;
/** Innocent claims found fault with, of a hundred, counted market by market. */
const FALSE_ALARMS = 5;

function rowsOf(name: string, score: Score): Row[] {
  const { claims, innocent, falseAlarms, innocentPlaces } = score;
  const alarms = (100 * falseAlarms) / innocentPlaces;
  return [
    { name: `claims, ${name}: precision`, measured: `${precision(score).toFixed(1)} % of ${claims} claims`, promise: `at least ${PRECISION} %`, isKept: precision(score) >= PRECISION },
    { name: `claims, ${name}: recall`, measured: `${recall(score).toFixed(1)} %`, promise: `at least ${RECALL} %`, isKept: recall(score) >= RECALL },
    { name: `claims, ${name}: false alarms`, measured: `${falseAlarms} of ${innocentPlaces} (${innocent} innocent claims)`, promise: `under ${FALSE_ALARMS} %`, isKept: alarms < FALSE_ALARMS },
  ];
}

/** Ten claims on the largest formula, against the same formula without. */
async function cost(): Promise<Row> {
  const bare = largeFormula();
  const texts = ['Paraben-free', 'Silicone-free', 'Vegan', 'Fragrance-free', 'With shea butter', 'Hypoallergenic', 'Softens dry skin', '24h moisture', 'SPF 30', 'Not tested on animals'];
  const claimed: FormulaDocument = { ...bare, product: { ...bare.product, name: 'Oat & Rose Cream', claims: texts.map((text) => ({ text, lang: 'en' })) } };
  const options = { law, dictionary, today: TODAY };
  const run = async (document: FormulaDocument): Promise<number> => median(await time(() => presentResult(assess(document, options)), { warm: 200, runs: 200 }));
  const [without, withClaims] = [await run(bare), await run(claimed)];
  return { name: 'ten claims on 40 materials of 8 substances', measured: `${ms(withClaims)}, without ${ms(without)}`, promise: 'at most 0.2 ms more', isKept: withClaims - without <= 0.2 };
}

/** How right the reading of claims is, on the tables it was fitted to and on the one held out, and what it costs. */
export async function runClaimsBench(): Promise<Row[]> {
  return [...rowsOf('worked tables', scoreClaims([...CLAIMS, ...NEAR_THE_LINE, ...FURTHER])), ...rowsOf('held out', scoreClaims(HELD_OUT)), await cost()];
}
