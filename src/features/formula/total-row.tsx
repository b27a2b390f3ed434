import { toDecimal } from '#shared/kernel/rational.ts';
import { Button } from '#src/ui/button.tsx';
import type { SuspectWords } from './slip-note.tsx';
import type { WeighedFormula } from './weigh.ts';

export interface TotalRowProps {
  readonly weighed: WeighedFormula;
  readonly makesUpName: string | null;
  readonly suspects: readonly SuspectWords[];
  readonly onTake: (suspect: SuspectWords) => void;
}

/** What the sum says, at once and in words. */
export function totalWords(weighed: WeighedFormula, makesUpName: string | null): string {
  const { over, batch, isOff, makesUp } = weighed;
  const target = batch ? `the batch of ${toDecimal(batch, 6)} g` : '100 %';
  const unit = batch ? 'g' : '%';
  if (over !== null && over.n !== 0n) {
    const gap = toDecimal({ n: over.n < 0n ? -over.n : over.n, d: over.d }, 6);
    if (over.n > 0n) return makesUp ? `${gap} ${unit} over ${target}: nothing is left for ${makesUpName ?? 'the make-up line'}` : `${gap} ${unit} over ${target}`;
    return isOff ? `${gap} ${unit} short of ${target}` : `${gap} ${unit} short of ${target}, within tolerance`;
  }
  if (makesUp) return `${makesUpName ?? 'one line'} makes up the rest`;
  return batch ? `adds up to ${target}` : 'of the lines as they are';
}

/** The total under the column, and whatever would put a wrong one right. */
export function TotalRow({ weighed, makesUpName, suspects, onTake }: TotalRowProps) {
  const percent = weighed.base.n > 0n ? toDecimal({ n: weighed.total.n * weighed.base.d * 100n, d: weighed.total.d * weighed.base.n }, 4) : '0';
  const offered = [...new Map(suspects.map((suspect) => [`${suspect.lineId} ${suspect.perhaps}`, suspect])).values()].slice(0, 4);
  return (
    <tfoot className={weighed.isOff ? 'off' : ''}>
      <tr>
        <th scope="row">
          Total <span className="state" role="status">{totalWords(weighed, makesUpName)}</span>
        </th>
        <td className="num" title={`${toDecimal(weighed.total)} g`}>{toDecimal(weighed.total, 4)}</td>
        <td className="num">{percent}</td>
      </tr>
      {weighed.isOff && offered.length > 0 ? (
        <tr className="slip-note">
          <td colSpan={3}>
            <p>
              <b>Perhaps a slip.</b> One figure would close the gap:
            </p>
            {offered.map((suspect) => (
              <Button small key={`${suspect.lineId} ${suspect.perhaps}`} onClick={() => onTake(suspect)}>
                {suspect.name}: {suspect.written}, take {suspect.perhaps} {suspect.unit}
              </Button>
            ))}
          </td>
        </tr>
      ) : null}
    </tfoot>
  );
}
