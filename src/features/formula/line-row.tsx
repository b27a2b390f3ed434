import { memo, type KeyboardEvent, type PointerEvent } from 'react';
import { toDecimal } from '#shared/kernel/rational.ts';
import { GripMenu, type MenuEntry } from '#src/ui/menu.tsx';
import { Icon } from '#src/ui/icon.tsx';
import { AmountField } from './amount-field.tsx';
import type { WeighedLine } from './weigh.ts';

export interface LineRowProps {
  readonly weighed: WeighedLine;
  readonly name: string;
  readonly isLit: boolean;
  readonly isDragged: boolean;
  readonly isDoubtful: boolean;
  /** What the lit ingredient gets from here: `gives 1.5 %`. */
  readonly gives: string;
  readonly isReadOnly: boolean;
  readonly menu: () => readonly MenuEntry[];
  /** Changes where the menu's words would. */
  readonly menuKey: string;
  readonly onLight: (line: number | null) => void;
  readonly onGrams: (lineId: string, text: string) => void;
  readonly onPercent: (lineId: string, text: string) => void;
  readonly onSettle: () => void;
  readonly onWalk: (event: KeyboardEvent<HTMLInputElement>) => void;
  readonly onRowKey: (event: KeyboardEvent, lineId: string) => void;
  readonly onGrab: (event: PointerEvent, lineId: string) => void;
}

/** Four figures for the eye; the exact one stands in the title and returns as soon as the field has the focus. */
function shorten(text: string): string {
  if (text === '' || text.length <= 7) return text;
  return String(Number(Number(text).toPrecision(6)));
}

/** Rows that look the same are not drawn again: forty of them stand beside the one that is typed in. */
function looksSame(before: LineRowProps, after: LineRowProps): boolean {
  const keys = (Object.keys(after) as (keyof LineRowProps)[]).filter((key) => key !== 'menu' && key !== 'weighed');
  const [a, b] = [before.weighed, after.weighed];
  return a.line === b.line && a.index === b.index && a.grams === b.grams && a.share === b.share && keys.every((key) => before[key] === after[key]);
}

/** One material in the grid: its name, grams and percent side by side. */
export const LineRow = memo(function LineRow(props: LineRowProps) {
  const { weighed, name, isLit, isDragged, isDoubtful, gives, isReadOnly, menu } = props;
  const { line, index } = weighed;
  const makesUp = line.unit === 'qs';
  const isZero = !makesUp && line.amount !== '' && weighed.mass.n === 0n;
  return (
    <tr
      data-row={line.id}
      className={`line ${isLit ? 'lit' : ''} ${isDoubtful ? 'doubtful' : ''} ${isDragged ? 'dragged' : ''}`}
      onPointerEnter={() => props.onLight(index)}
      onPointerLeave={() => props.onLight(null)}
      onFocus={() => props.onLight(index)}
      onBlur={() => props.onLight(null)}
      onKeyDown={(event) => props.onRowKey(event, line.id)}
    >
      <th scope="row">
        {isReadOnly ? null : (
          // The wrapper starts a drag by pointer, before the button inside, which opens the same moves as words, keeps the press to itself.
          <span className="handle" onPointerDownCapture={(event) => props.onGrab(event, line.id)}>
            <GripMenu className="handle-button" label={`${name}: move, note, remove`} trigger={<Icon name="grip" />} entries={menu()} />
          </span>
        )}
        <span className="material" title={name}>
          {name}
          {makesUp ? <span className="make">makes up the batch</span> : null}
          {line.note ? <span className="make note">{line.note}</span> : null}
        </span>
        {gives ? <span className="gives">{gives}</span> : null}
      </th>
      <td className="num">
        {makesUp ? (
          <span className="made-up" title={`${toDecimal(weighed.mass)} g`}>{shorten(weighed.grams)}</span>
        ) : (
          <AmountField
            lineId={line.id}
            column="g"
            label={`${name}, grams`}
            value={weighed.grams}
            isReadOnly={isReadOnly}
            caution={isZero ? '0 g: nothing of it is in the batch.' : undefined}
            onWrite={(text) => props.onGrams(line.id, text)}
            onSettle={props.onSettle}
            onWalk={props.onWalk}
          />
        )}
      </td>
      <td className="num">
        {makesUp ? (
          <span className="made-up" title={`${toDecimal(weighed.percent)} %`}>{shorten(weighed.share)}</span>
        ) : (
          <AmountField
            lineId={line.id}
            column="%"
            label={`${name}, percent`}
            value={shorten(weighed.share)}
            exact={toDecimal(weighed.percent)}
            isReadOnly={isReadOnly}
            onWrite={(text) => props.onPercent(line.id, text)}
            onSettle={props.onSettle}
            onWalk={props.onWalk}
          />
        )}
      </td>
    </tr>
  );
}, looksSame);
