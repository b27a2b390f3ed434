import { toDecimal } from '#shared/kernel/rational.ts';
import { Button } from '#src/ui/button.tsx';
import { slipOfPasted, type WeighedLine } from './weigh.ts';

/** A question about a pasted line whose two figures disagree; grams count until it is answered. */
export function PastedSlip({ weighed, batchWords, onKeep, onTake }: { weighed: WeighedLine; batchWords: string; onKeep: () => void; onTake: (percent: string) => void }) {
  const pasted = weighed.line.pastedPercent ?? '';
  const slip = slipOfPasted(weighed);
  const point = slip === 'point-right' ? ' The point may stand one place too far right.' : slip === 'point-left' ? ' The point may stand one place too far left.' : '';
  return (
    <tr className="slip-note">
      <td colSpan={3}>
        <p>
          <b>Perhaps a slip.</b> The pasted sheet says {pasted} % here; {weighed.grams} g{batchWords} is {toDecimal(weighed.percent, 4)} %.{point} Grams count until you say.
        </p>
        <Button small onClick={onKeep}>Keep {weighed.grams} g</Button>
        <Button small onClick={() => onTake(pasted)}>Take {pasted} %</Button>
      </td>
    </tr>
  );
}

export interface SuspectWords {
  readonly lineId: string;
  readonly name: string;
  readonly written: string;
  readonly perhaps: string;
  readonly slip: 'digits-exchanged' | 'point-shifted';
  readonly unit: string;
}

/** A figure that would close the batch's gap, offered where it stands. */
export function SuspectSlip({ suspect, onTake }: { suspect: SuspectWords; onTake: () => void }) {
  const how = suspect.slip === 'digits-exchanged' ? 'two digits may be exchanged' : 'the point may stand one place off';
  return (
    <tr className="slip-note">
      <td colSpan={3}>
        <p>
          <b>Perhaps a slip.</b> {suspect.written} {suspect.unit} does not fit the batch; {suspect.perhaps} {suspect.unit} would ({how}).
        </p>
        <Button small onClick={onTake}>Take {suspect.perhaps} {suspect.unit}</Button>
      </td>
    </tr>
  );
}
