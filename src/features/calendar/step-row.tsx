import { Link } from 'react-router-dom';
import type { LawChange } from '#shared/law/law-book.ts';
import { paths } from '#src/app/paths.ts';
import { sayCount, sayDay, sayList } from '#src/lib/say.ts';
import { VerdictMark } from '#src/ui/verdict-mark.tsx';
import type { Effect } from './effects.ts';
import { anchorOf } from './time-lanes.tsx';

export interface Ours {
  readonly id: string;
  readonly name: string;
  readonly effect: Effect;
}
export interface StepRowProps {
  readonly change: LawChange;
  readonly isPast: boolean;
  readonly ours: readonly Ours[];
  /** Products sold in this market, judged or not yet. */
  readonly sold: number;
  readonly isWorking: boolean;
  readonly link?: { readonly href: string; readonly words: string };
}

/** One day on which a rule begins to bind: what it says, and what it does to the house's products. */
export function StepRow({ change, isPast, ours, sold, isWorking, link }: StepRowProps) {
  return (
    <article className={`step ${isPast ? 'past' : ''} ${ours.length > 0 ? 'ours' : ''}`} id={anchorOf(change)} aria-label={`${sayDay(change.date)}, ${change.market}: ${change.title}`}>
      <p className="when"><b>{sayDay(change.date)}</b><span className="quiet">{change.kind === 'placed' ? 'for what is first sold from this day' : 'for all that is still sold'}</span></p>
      <p className="where">{change.market}</p>
      <div className="law">
        <h2>{change.title}</h2>
        <p>{change.what}</p>
        <p className="cite">{change.citation}{link ? <> · <a href={link.href} target="_blank" rel="noreferrer">{link.words}</a></> : null}</p>
      </div>
      <div className="mine">
        {ours.map((one) => <OwnProduct key={one.id} {...one} isPast={isPast} />)}
        {ours.length === 0 ? <p className="quiet">{sold === 0 ? 'Nothing of yours is sold here.' : isWorking ? 'Being worked out …' : `Nothing changes for ${sold === 1 ? 'the one product' : `your ${sold} products`} sold here.`}</p> : null}
      </div>
    </article>
  );
}

function OwnProduct({ id, name, effect, isPast }: Ours & { isPast: boolean }) {
  const weight = (['stop', 'decide'] as const).find((each) => effect.added.some(({ severity }) => severity === each)) ?? 'note';
  const asOf = new URLSearchParams({ market: effect.market, placed: effect.asOf.placed, available: effect.asOf.available });
  return (
    <details>
      <summary><span className={`weight ${weight}`}><VerdictMark weight={weight} /></span><b>{name}</b><span className="quiet">{sayEffect(effect)}</span></summary>
      <ul>
        {effect.added.map((finding) => (
          <li key={`${finding.rule}|${finding.subject}|${finding.kind}`}>{finding.remedy ?? finding.message} <span className="quiet">{finding.remedy ? finding.message : ''} {finding.citation}.</span></li>
        ))}
        {effect.list.added.length > 0 ? <li>{isPast ? 'The list names' : 'Print the list anew: it then names'} {sayList(effect.list.added)}.</li> : null}
        {effect.list.removed.length > 0 ? <li>No longer on the list: {sayList(effect.list.removed)}.</li> : null}
        {effect.list.isChanged && effect.list.added.length + effect.list.removed.length === 0 ? <li>The order of the printed list changes.</li> : null}
        {effect.wording.map((text) => <li key={text}>The label must say: “{text.length > 140 ? `${text.slice(0, 140)} …` : text}”</li>)}
        {effect.removed.map((finding) => <li key={`${finding.rule}|${finding.subject}`} className="quiet">Settled from this day: {finding.message}</li>)}
      </ul>
      <Link to={`${paths.verdicts(id)}?${asOf}`}>Its verdicts on that day</Link>
    </details>
  );
}

function sayEffect({ added, removed, list, wording }: Effect): string {
  const stops = added.filter(({ severity }) => severity === 'stop').length;
  const others = added.length - stops;
  return [
    ...(stops > 0 ? [`${sayCount(stops, 'point')} stopping sale`] : []),
    ...(others > 0 ? [`${sayCount(others, 'new point')}`] : []),
    ...(list.isChanged ? ['another list'] : []),
    ...(wording.length > 0 ? ['words to print'] : []),
    ...(added.length === 0 && removed.length > 0 ? [`${sayCount(removed.length, 'point')} settled`] : []),
  ].join(', ');
}
