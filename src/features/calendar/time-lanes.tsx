import { MARKETS, type Market } from '#shared/law/types.ts';
import type { LawChange } from '#shared/law/law-book.ts';
import { placeOf, type Span } from '#src/features/today/lanes.ts';
import { sayDay } from '#src/lib/say.ts';
import { stepOf } from './effects.ts';

export interface TimeLanesProps {
  readonly changes: readonly LawChange[];
  readonly markets: readonly Market[];
  readonly span: Span;
  readonly today: string;
  /** Steps that change something for a product of the house. */
  readonly ours: ReadonlySet<string>;
}

/** All dates of the law on one scale of time, a lane for each market: a drawing of the entries below, which hold the same in words. */
export function TimeLanes({ changes, markets, span, today, ours }: TimeLanesProps) {
  const [first, last] = [Number(span.from.slice(0, 4)), Number(span.to.slice(0, 4))];
  const years = Array.from({ length: last - first + 1 }, (_, index) => first + index);
  return (
    <div className="time-lanes" role="img" aria-label={`${changes.length} dates of the law from ${first} to ${last}, ${changes.filter((change) => ours.has(stepOf(change))).length} of them touching your products`}>
      {MARKETS.filter((market) => markets.includes(market)).map((market) => (
        <div className="lane" key={market}>
          <b>{market}</b>
          <div className="line">
            {changes.filter((change) => change.market === market).map((change) => {
              const step = stepOf(change);
              const words = `${sayDay(change.date)}: ${change.title}, ${change.kind === 'placed' ? 'for what is first sold' : 'for all that is still sold'}`;
              return <span key={step + change.kind} data-step={anchorOf(change)} className={`${change.kind} ${ours.has(step) ? 'ours' : ''}`} style={{ left: `${placeOf(change.date, span)}%` }} title={words} />;
            })}
          </div>
        </div>
      ))}
      <div className="years" aria-hidden="true">
        {years.map((year) => <span key={year} style={{ left: `${placeOf(`${year}-01-01`, span)}%` }}>{year}</span>)}
      </div>
      {today >= span.from && today <= span.to ? <div className="now" aria-hidden="true"><i style={{ left: `${placeOf(today, span)}%` }}><span>today</span></i></div> : null}
    </div>
  );
}

/** Where a change stands on the page. */
export function anchorOf(change: Pick<LawChange, 'id' | 'market' | 'date'>): string {
  return `${change.id}-${change.market}-${change.date}`.toLowerCase();
}
