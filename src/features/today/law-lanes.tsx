import { useMemo } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { ProductSummary } from '#shared/contracts/products.contract.ts';
import { MARKETS } from '#shared/law/types.ts';
import type { Market } from '#shared/law/types.ts';
import { paths } from '#src/app/paths.ts';
import { sayError } from '#src/lib/api/error.ts';
import { sayCount, sayDay } from '#src/lib/say.ts';
import { Panel } from '#src/ui/sheet.tsx';
import { findDatesAhead, placeOf, quartersOf, spanFrom } from './lanes.ts';
import type { LawDate, Span } from './lanes.ts';
import { lawQueries } from './queries.ts';

const QUARTERS: Readonly<Record<string, string>> = { '04': 'Apr', '07': 'Jul', '10': 'Oct' };

/** The dates of the law still ahead, a lane for each market on one scale of time. */
export function LawLanes({ today, products }: { today: string; products: readonly ProductSummary[] }) {
  const { data, error } = useQuery(lawQueries.changes());
  const span = useMemo(() => spanFrom(today), [today]);
  const lanes = useMemo(() => findDatesAhead(data ?? [], span), [data, span]);
  return (
    <Panel title="Law dates ahead" className="law" aside={error ? undefined : 'those that data release tables hold'} end={<Link className="font-medium" to={paths.calendar}>All dates, and what they change</Link>}>
      {error ? <p className="error">{sayError(error)}</p> : null}
      <div className="lanes">
        {MARKETS.map((market) => <Lane key={market} market={market} dates={lanes[market]} span={span} isRead={data !== undefined} sold={products.filter((one) => one.markets.includes(market)).length} />)}
        <div className="ax"><Scale span={span} /></div>
      </div>
    </Panel>
  );
}

function Lane({ market, dates, span, sold, isRead }: { market: Market; dates: readonly LawDate[]; span: Span; sold: number; isRead: boolean }) {
  const rows = stack(dates, span);
  const height = Math.max(1, ...rows.map((one) => one.row + 1));
  return (
    <>
      <div className="m">{market}</div>
      <ul className="l" style={{ minHeight: `${height * 46}px` }} aria-label={`${market}, dates ahead`}>
        {rows.map(({ date, at, row }) => (
          <li key={date.id} className={`ev ${sold > 0 ? 'ours' : ''} ${at > 58 ? 'end' : ''}`} style={{ top: `${row * 46}px`, ...(at > 58 ? { right: `${100 - at}%` } : { left: `${at}%` }) }}>
            <b>{sayDay(date.day)}</b> <span className="quiet" title={`${date.citation}. ${date.words}`}>{date.words}, on {date.reach}{sold > 0 ? `: ${sayCount(sold, 'product')} sold here` : ''}</span>
          </li>
        ))}
        {isRead && dates.length === 0 ? <li className="ev none"><span className="quiet">No dated change in this release</span></li> : null}
      </ul>
    </>
  );
}

/** Dates that would stand on each other go one below the other. */
function stack(dates: readonly LawDate[], span: Span): { date: LawDate; at: number; row: number }[] {
  const WIDTH = 36;
  const taken: [number, number][][] = [];
  return dates.map((date) => {
    const at = placeOf(date.day, span);
    const [from, to] = at > 58 ? [at - WIDTH, at] : [at, at + WIDTH];
    let row = taken.findIndex((list) => list.every(([a, b]) => to <= a || from >= b));
    if (row < 0) row = taken.push([]) - 1;
    taken[row]!.push([from, to]);
    return { date, at, row };
  });
}

function Scale({ span }: { span: Span }) {
  return (
    <svg aria-hidden="true">
      <line x1="0" x2="0" y1="0" y2="12" stroke="var(--edge)" />
      {quartersOf(span).map((day) => {
        const x = `${placeOf(day, span)}%`;
        const isYear = day.slice(5, 7) === '01';
        return (
          <g key={day}>
            <line x1={x} x2={x} y1="0" y2={isYear ? 12 : 8} stroke="var(--edge)" />
            <text x={x} dx="4" y="24" fontSize="12" fill="var(--ink-2)">{isYear ? `Jan ${day.slice(0, 4)}` : QUARTERS[day.slice(5, 7)]}</text>
          </g>
        );
      })}
    </svg>
  );
}
