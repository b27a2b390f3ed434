import { useMemo } from 'react';
import type { LawBook, LawChange } from '#shared/law/law-book.ts';
import { MARKETS, type Market } from '#shared/law/types.ts';
import type { ProductSummary } from '#shared/contracts/products.contract.ts';
import type { Span } from '#src/features/today/lanes.ts';
import { sayCount, sayDay } from '#src/lib/say.ts';
import { EmptyState } from '#src/ui/empty-state.tsx';
import { Progress } from '#src/ui/progress.tsx';
import { stepOf } from './effects.ts';
import type { ProductEffects } from './queries.ts';
import { StepRow, type Ours } from './step-row.tsx';
import { TimeLanes } from './time-lanes.tsx';
import './calendar.css';

export interface CalendarRoomProps {
  readonly law: LawBook;
  readonly today: string;
  readonly market: Market | null;
  readonly isWhole: boolean;
  readonly isOursOnly: boolean;
  readonly products: readonly ProductSummary[];
  readonly known: readonly ProductEffects[];
  readonly done: number;
  readonly failed: number;
  readonly onTurn: (key: 'market' | 'since' | 'show', value: string) => void;
}

/** Every dated rule of the tables on one scale of time, and what each does to the house's products. */
export function CalendarRoom(props: CalendarRoomProps) {
  const { law, today, market, isWhole, isOursOnly, products, known, done, failed, onTurn } = props;
  const ours = useMemo(() => oursByStep(known), [known]);
  const changes = law.changes.filter((change) => (isWhole || change.date > today) && (!market || change.market === market));
  const shown = isOursOnly ? changes.filter((change) => ours.has(stepOf(change))) : changes;
  const isWorking = done < products.length;
  const link = linkOf(law);
  const soldIn = (where: Market) => products.filter((one) => one.markets.includes(where)).length;
  return (
    <>
      <div className="panel">
        <div className="calendar-filters">
          <div className="switch" role="group" aria-label="Market">
            {(['', ...MARKETS] as const).map((each) => <button key={each} type="button" aria-pressed={(market ?? '') === each} onClick={() => onTurn('market', each)}>{each || 'All'}</button>)}
          </div>
          <div className="switch" role="group" aria-label="Dates">
            <button type="button" aria-pressed={!isWhole} onClick={() => onTurn('since', '')}>Ahead</button>
            <button type="button" aria-pressed={isWhole} onClick={() => onTurn('since', 'beginning')}>Since {law.coveredFrom.slice(0, 4)}</button>
          </div>
          <div className="switch" role="group" aria-label="Show">
            <button type="button" aria-pressed={!isOursOnly} onClick={() => onTurn('show', '')}>All dates</button>
            <button type="button" aria-pressed={isOursOnly} onClick={() => onTurn('show', 'ours')}>Only those that touch us</button>
          </div>
          <Work products={products} done={done} failed={failed} touched={changes.filter((change) => ours.has(stepOf(change))).length} />
        </div>
        <TimeLanes changes={changes} markets={market ? [market] : MARKETS} span={spanOf(law, today, isWhole)} today={today} ours={new Set(ours.keys())} />
      </div>
      <div className="steps">
        {shown.map((change) => (
          <StepRow key={`${stepOf(change)}|${change.kind}`} change={change} isPast={change.date <= today} ours={ours.get(stepOf(change)) ?? []} sold={soldIn(change.market)} isWorking={isWorking} link={link(change)} />
        ))}
        {shown.length === 0 ? <EmptyState title={isOursOnly && isWorking ? 'Not found yet.' : 'No date fits.'}>{isOursOnly ? 'None of the dates chosen above changes anything for a product of yours.' : `The law data hold no date for this market after ${sayDay(today)}.`}</EmptyState> : null}
      </div>
    </>
  );
}

function Work({ products, done, failed, touched }: { products: readonly ProductSummary[]; done: number; failed: number; touched: number }) {
  if (products.length === 0) return <p className="work quiet">No products yet to hold against these dates.</p>;
  if (done < products.length) return <div className="work"><Progress label="Judging products on the day before and on the day" done={done} all={products.length} /><p className="quiet">{done} of {sayCount(products.length, 'product')} judged on each day and the day before</p></div>;
  return <p className="work quiet" role="status">{touched === 0 ? 'None of these dates touches a product of yours.' : `${sayCount(touched, 'date touches', 'dates touch')} a product of yours.`}{failed > 0 ? ` ${sayCount(failed, 'product')} could not be judged.` : ''}</p>;
}

function oursByStep(known: readonly ProductEffects[]): ReadonlyMap<string, readonly Ours[]> {
  const steps = new Map<string, Ours[]>();
  for (const { product, effects } of known) for (const effect of effects) steps.set(effect.step, [...(steps.get(effect.step) ?? []), { id: product.id, name: product.name, effect }]);
  return steps;
}

/** Whole years around the dates shown. */
function spanOf(law: LawBook, today: string, isWhole: boolean): Span {
  const last = law.coveredUntil > today ? law.coveredUntil : today;
  return { from: isWhole ? `${law.coveredFrom.slice(0, 4)}-01-01` : `${today.slice(0, 4)}-01-01`, to: `${Number(last.slice(0, 4)) + 1}-01-01` };
}

/** The official text of the instrument that a change is cited from, where its address is held. */
function linkOf(law: LawBook): (change: LawChange) => { href: string; words: string } | undefined {
  return (change) => {
    // Regulations of the Union have an address that follows from their number.
    const act = /Regulation \(EU\) (\d{4})\/(\d+)/.exec(change.citation);
    if (act) return { href: `https://eur-lex.europa.eu/eli/reg/${act[1]}/${act[2]}/oj`, words: 'official text' };
    const row = change.rowIds[0] === undefined ? undefined : law.row(change.rowIds[0]);
    const cited = [...law.instruments.values()].find((one) => change.citation.startsWith(one.short)) ?? (row && law.instruments.get(row.instrument)) ?? [...law.instruments.values()].find((one) => one.markets[0] === change.market);
    return cited ? { href: cited.link, words: change.citation.startsWith(cited.short) ? 'official text' : `official text: ${cited.short}` } : undefined;
  };
}
