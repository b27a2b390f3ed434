import { toDecimal } from '#shared/kernel/rational.ts';
import type { Judgement, JudgedPart } from './judge-composition.ts';
import { asNumber } from './scale.ts';

/** Hatching of a range: in ink where it decides nothing, in amber where a decision rests on it. */
export function Hatches() {
  return (
    <svg width="0" height="0" className="absolute" aria-hidden="true">
      <defs>
        <pattern id="hatch-range" width="4" height="4" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <rect width="4" height="4" fill="var(--paper)" />
          <path d="M0 0V4" stroke="var(--ink-2)" strokeWidth="1.4" />
        </pattern>
        <pattern id="hatch-stop" width="4" height="4" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <rect width="4" height="4" fill="var(--stop-wash)" />
          <path d="M0 0V4" stroke="var(--stop)" strokeWidth="1.4" />
        </pattern>
      </defs>
    </svg>
  );
}

/** The graduated scale over the bars. */
export function Axis({ end, step }: { end: number; step: number }) {
  const ticks = Array.from({ length: Math.floor((end / step) * 5 + 1e-6) + 1 }, (_, index) => index);
  return (
    <svg className="axis" aria-hidden="true">
      {ticks.map((index) => {
        const value = (index * step) / 5;
        const x = `${(value / end) * 100}%`;
        const isMain = index % 5 === 0;
        return (
          <g key={index}>
            <line x1={x} x2={x} y1={isMain ? 14 : 20} y2="24" stroke="var(--edge)" />
            {isMain ? <text x={x} y="11" textAnchor={index === 0 ? 'start' : value > end * 0.93 ? 'end' : 'middle'} fontSize="12" fill="var(--ink-2)">{Number(value.toFixed(3))}{value === 0 ? '' : index === ticks.length - 1 || value === 100 ? ' %' : ''}</text> : null}
          </g>
        );
      })}
      <line x1="0" x2="100%" y1="23.5" y2="23.5" stroke="var(--edge)" />
    </svg>
  );
}

/** One step of the staircase: the bar begins where the one before it ends. */
export function Step({ part, end, isFirst, isLast }: { part: JudgedPart; end: number; isFirst: boolean; isLast: boolean }) {
  const x = (value: number) => `${Math.min(100, (value / end) * 100)}%`;
  const from = asNumber(part.from);
  const [least, typical, most] = [part.least, part.typical, part.most].map(asNumber) as [number, number, number];
  const to = from + typical;
  return (
    <svg aria-hidden="true">
      <line x1={x(100)} x2={x(100)} y1="0" y2="100%" stroke="var(--bottle)" strokeWidth="1.5" />
      {isFirst ? null : <line x1={x(from)} x2={x(from)} y1="0" y2="15" stroke="var(--edge)" strokeDasharray="2 2" />}
      {isLast || !part.isFilled ? null : <line x1={x(to)} x2={x(to)} y1="29" y2="100%" stroke="var(--edge)" strokeDasharray="2 2" />}
      {part.isFilled ? <rect x={x(from)} width={x(part.isRange ? least : typical)} y="15" height="14" fill="var(--ink)" /> : null}
      {part.isFilled && part.isRange ? (
        <>
          <rect x={x(from + least)} width={x(most - least)} y="15" height="14" fill="url(#hatch-range)" stroke="var(--ink-2)" />
          <line x1={x(from + least)} x2={x(from + least)} y1="10" y2="34" stroke="var(--ink-2)" strokeWidth="3" />
          <line x1={x(from + most)} x2={x(from + most)} y1="10" y2="34" stroke="var(--ink-2)" strokeWidth="3" />
          <line x1={x(to)} x2={x(to)} y1="12" y2="32" stroke="var(--ink)" strokeWidth="2" />
        </>
      ) : null}
    </svg>
  );
}

/** Everything together, against the line at 100. */
export function Together({ judgement, end }: { judgement: Judgement; end: number }) {
  const x = (value: number) => `${Math.min(100, (value / end) * 100)}%`;
  const least = asNumber(judgement.least);
  const most = asNumber(judgement.most);
  const isOver = judgement.weight === 'stop';
  return (
    <svg role="img" aria-label={`Together ${toDecimal(judgement.typical, 4)} of 100 percent`}>
      <rect x="0" width={x(Math.min(least, 100))} y="17" height="10" fill="var(--ink-2)" />
      {isOver ? <rect x={x(100)} width={x(least - 100)} y="17" height="10" fill="url(#hatch-stop)" stroke="var(--stop)" /> : null}
      {!isOver && most > least ? <rect x={x(least)} width={x(most - least)} y="17" height="10" fill="url(#hatch-range)" stroke="var(--ink-2)" /> : null}
      <line x1={x(100)} x2={x(100)} y1="0" y2="100%" stroke="var(--bottle)" strokeWidth="1.5" />
    </svg>
  );
}

/** A constituent's range on its own scale: never a step, constituents need not sum to 100. */
export function RangeBar({ least, middle, most, end }: { least: number; middle: number; most: number; end: number }) {
  const x = (value: number) => `${Math.min(100, (value / end) * 100)}%`;
  return (
    <svg aria-hidden="true">
      <rect x={x(least)} width={x(most - least)} y="17" height="10" fill="var(--ink-2)" />
      <line x1={x(least)} x2={x(least)} y1="11" y2="33" stroke="var(--ink)" strokeWidth="3" />
      <line x1={x(most)} x2={x(most)} y1="11" y2="33" stroke="var(--ink)" strokeWidth="3" />
      <line x1={x(middle)} x2={x(middle)} y1="17" y2="27" stroke="var(--paper)" strokeWidth="2" />
    </svg>
  );
}
