import { useState } from 'react';
import type { Market } from '#shared/law/types.ts';
import { sayDay } from '#src/lib/say.ts';
import type { AsOf } from './as-of.ts';
import { DayBox } from './day-box.tsx';
import type { LawDay } from './rule-scale.ts';
import { TimeRule } from './time-rule.tsx';
import './as-of.css';

const MARKETS: readonly Market[] = ['EU', 'UK', 'US', 'CA'];
const MARKET_WORDS: Readonly<Record<Market, string>> = { EU: 'European Union', UK: 'Great Britain', US: 'United States', CA: 'Canada' };

const NO_CHANGES: readonly LawDay[] = [];

export interface AsOfControlProps {
  readonly asOf: AsOf;
  /** Markets in which the product is sold; the others are a trial. */
  readonly sold: readonly Market[];
  readonly today: string;
  /** `null` while they are still being worked out: then nothing is said of them. */
  readonly changes: readonly LawDay[] | null;
  /** The law data's covered days: beyond them nothing is guessed. */
  readonly covered: { readonly from: string; readonly until: string };
  readonly release: string;
  readonly onChange: (next: AsOf) => void;
}

/** The sentence at the top of a product: market, first sold on, still on the shelf on; and the rule of time. */
export function AsOfControl({ asOf, sold, today, changes, covered, release, onChange }: AsOfControlProps) {
  const [isSplit, setSplit] = useState(asOf.available !== asOf.placed);
  const showsShelf = isSplit || asOf.available !== asOf.placed;
  // Where the data have grown old, today can still be asked for.
  const most = covered.until > today ? covered.until : today;
  const within = (day: string) => (day < covered.from ? covered.from : day > most ? most : day);
  const setPlaced = (placed: string) => onChange({ ...asOf, placed, available: showsShelf && asOf.available > placed ? asOf.available : placed });
  const setAvailable = (available: string) => onChange({ ...asOf, available: available < asOf.placed ? asOf.placed : available });
  const beyond =
    asOf.placed < covered.from ? `The law data begin on ${sayDay(covered.from)}; what bound before is not known to them.`
    : asOf.available > covered.until ? `The law data know of no change after ${sayDay(covered.until)}; what comes later is not guessed.`
    : '';
  const isTrial = !sold.includes(asOf.market);
  return (
    <div className="as-of wrap">
      <div className="say">
        <div className="switch" role="group" aria-label="Market">
          {MARKETS.map((market) => (
            <button
              key={market}
              type="button"
              aria-pressed={market === asOf.market}
              className={sold.includes(market) ? '' : 'trial'}
              title={sold.includes(market) ? MARKET_WORDS[market] : `${MARKET_WORDS[market]}: not sold there, a trial`}
              onClick={() => onChange({ ...asOf, market })}
            >
              <span>{market}</span>
            </button>
          ))}
        </div>
        <span className="phrase">
          {isTrial ? 'on trial, ' : ''}as first sold on <DayBox label="First sold on" day={asOf.placed} covered={covered} most={most} onDay={setPlaced} />
        </span>
        {showsShelf ? (
          <span className="phrase">
            still on the shelf on <DayBox label="Still on the shelf on" day={asOf.available} covered={covered} least={asOf.placed} most={most} onDay={setAvailable} />
            <button
              type="button"
              className="link"
              onClick={() => {
                setSplit(false);
                onChange({ ...asOf, available: asOf.placed });
              }}
            >
              same day
            </button>
          </span>
        ) : (
          <button type="button" className="link shelf" onClick={() => setSplit(true)}>
            still on the shelf on …
          </button>
        )}
      </div>
      <TimeRule
        day={showsShelf ? asOf.available : asOf.placed}
        today={today}
        changes={changes ?? NO_CHANGES}
        none={changes === null ? '' : `No dated change for this product in data release ${release}`}
        label={showsShelf ? 'Still on the shelf on' : 'First sold on'}
        onDay={(day) => (showsShelf ? setAvailable : setPlaced)(within(day))}
      />
      {beyond ? <p className="beyond">{beyond}</p> : null}
    </div>
  );
}
