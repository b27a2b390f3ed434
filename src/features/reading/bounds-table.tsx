import { scaleLog } from 'd3-scale';
import { useId } from 'react';
import { compare, toDecimal, ZERO } from '#shared/kernel/rational.ts';
import type { ReadName } from '#shared/reading/read-list.ts';
import { VerdictMark } from '#src/ui/verdict-mark.tsx';
import { TextButton } from '#src/ui/button.tsx';
import { roughlyText, toNumber } from '#src/lib/figures.ts';

const LOWEST = 0.0001;
/** Where a share stands on the scale, in percent of its width. */
const scale = scaleLog().domain([LOWEST, 100]).range([0, 100]).clamp(true);
const placeOf = (percent: number) => (percent <= LOWEST ? 0 : scale(percent));
const POWERS = [100, 10, 1, 0.1, 0.01, 0.001, 0.0001];
const TICKS = POWERS.slice(0, -1).flatMap((power) => [10, 9, 8, 7, 6, 5, 4, 3, 2].map((step) => ({ at: (power * step) / 10, isLong: step === 10, isHalf: step === 5 }))).concat({ at: LOWEST, isLong: true, isHalf: false });

export interface BoundsTableProps {
  readonly names: readonly ReadName[];
  /** The words on the line below which order is free. */
  readonly freeLine: string;
  readonly onChoose: (written: string, inci: string) => void;
}

/** The ladder laid on its side: each name of the list with the stretch in which its share must lie. */
export function BoundsTable({ names, freeLine, onChoose }: BoundsTableProps) {
  const hatch = useId().replaceAll(':', '');
  return (
    <>
      <svg className="hatch" aria-hidden="true">
        <pattern id={hatch} width="4" height="4" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <path d="M0 0V4" stroke="var(--ink-2)" strokeWidth="1.2" opacity=".55" />
        </pattern>
      </svg>
      <table className="bounds" aria-label="Names and their bounds">
        <thead>
          <tr>
            <th scope="col" className="no"><span className="sr-only">Place</span></th>
            <th scope="col">As written</th>
            <th scope="col" className="rule"><Scale freeLine={freeLine} /></th>
            <th scope="col" className="num">% of the product</th>
          </tr>
        </thead>
        <tbody>
          {names.map((read, index) => <Row key={`${index}|${read.one.written}`} read={read} index={index} hatch={hatch} onChoose={onChoose} />)}
        </tbody>
      </table>
    </>
  );
}

function Row({ read, index, hatch, onChoose }: { read: ReadName; index: number; hatch: string; onChoose: BoundsTableProps['onChoose'] }) {
  const { one, bounds, cap, place } = read;
  const [min, max] = [toDecimal(bounds.min), toDecimal(bounds.max)];
  return (
    <tr className={one.match === 'unknown' ? 'unknown' : ''}>
      <td className="no">{index + 1}</td>
      <th scope="row">
        <span className="name">{one.written}</span>
        <Match read={read} onChoose={onChoose} />
        {place.kind === 'loose' && one.block !== 'may-contain' ? <span className="quiet">{one.isInside ? 'part of the name before it' : one.block === 'active' ? 'active ingredient' : 'closes the list in any order'}</span> : null}
        {one.block === 'may-contain' ? <span className="quiet">may contain</span> : null}
      </th>
      <td className="rule">
        <Stretch min={toNumber(bounds.min)} max={toNumber(bounds.max)} cap={cap && toNumber(cap.share)} hatch={hatch} />
        {cap ? <span className="law-cap" title={cap.citation}>the law allows {cap.limit} %{cap.basis ? ` ${cap.basis}` : ''}: <span className="cite">{cap.citation}</span></span> : null}
      </td>
      <td className="num" title={`${min} % to ${max} %`}>
        {compare(bounds.min, ZERO) === 0 ? <>at most <b>{roughlyText(max)}</b></> : min === max ? <b>{roughlyText(max)}</b> : <><b>{roughlyText(min)}</b> to <b>{roughlyText(max)}</b></>}
      </td>
    </tr>
  );
}

function Match({ read: { one }, onChoose }: { read: ReadName; onChoose: BoundsTableProps['onChoose'] }) {
  if (one.match === 'synonym') return <span className="quiet">read as {one.entry!.inci}</span>;
  if (one.match === 'respelt') return <span className="quiet">respelt: {one.entry!.inci} <TextButton mini onClick={() => onChoose(one.written, one.entry!.inci)} aria-label={`write it so: ${one.entry!.inci} for ${one.written}`}>write it so</TextButton></span>;
  if (one.match !== 'unknown') return null;
  return (
    <span className="likely">
      <span className="weight decide"><VerdictMark weight="decide" silent /> not known</span>
      {one.suggestions.length > 0 ? <span className="quiet">perhaps</span> : null}
      {one.suggestions.map((inci) => <TextButton key={inci} mini onClick={() => onChoose(one.written, inci)} aria-label={`Take ${inci} for ${one.written}`}>{inci}</TextButton>)}
    </span>
  );
}

const share = (percent: number) => `${placeOf(percent).toFixed(3)}%`;

function Stretch({ min, max, cap, hatch }: { min: number; max: number; cap?: number; hatch: string }) {
  const isOpen = min < LOWEST;
  const width = Math.max(0.4, placeOf(max) - placeOf(min));
  return (
    <svg className="stretch" aria-hidden="true">
      <rect x={`${placeOf(min)}%`} width={`${width}%`} y="9" height="10" fill={`url(#${hatch})`} />
      <line className="whisker" x1={share(min)} x2={share(max)} y1="14" y2="14" />
      {isOpen ? null : <line className="cap" x1={share(min)} x2={share(min)} y1="8" y2="20" />}
      <line className="cap" x1={share(max)} x2={share(max)} y1="8" y2="20" />
      {cap !== undefined ? <line className="limit" x1={share(cap)} x2={share(cap)} y1="3" y2="25" /> : null}
    </svg>
  );
}

function Scale({ freeLine }: { freeLine: string }) {
  return (
    <>
      <span className="sr-only">On a scale from 0.0001 % to 100 %</span>
      <svg className="scale" aria-hidden="true">
        {TICKS.map(({ at, isLong, isHalf }) => <line key={at} x1={share(at)} x2={share(at)} y1={isLong ? 24 : isHalf ? 28 : 30} y2="34" stroke={isLong ? 'var(--ink)' : 'var(--edge)'} />)}
        <line x1="0" x2="100%" y1="33.5" y2="33.5" stroke="var(--ink)" />
        <line className="one" x1={share(1)} x2={share(1)} y1="22" y2="34" />
        {POWERS.map((power) => <text key={power} x={share(power)} y="18" textAnchor={power === 100 ? 'end' : power === LOWEST ? 'start' : 'middle'} className={power === 1 ? 'one' : power === 10 || power === 0.001 ? 'between' : ''}>{power}{power === 100 ? ' %' : ''}</text>)}
      </svg>
      <span className="free-line">order is free {freeLine}</span>
    </>
  );
}
