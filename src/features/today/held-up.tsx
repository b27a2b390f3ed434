import type { ProductSummary } from '#shared/contracts/products.contract.ts';
import { paths } from '#src/app/paths.ts';
import { sayCount, sayWhen } from '#src/lib/say.ts';
import { LinkButton } from '#src/ui/button.tsx';
import { VerdictMark } from '#src/ui/verdict-mark.tsx';

/** Products that something holds up, the weightiest first. */
export function HeldUp({ products }: { products: readonly ProductSummary[] }) {
  const groups = [
    { title: 'Stops sale', words: 'before the next batch goes out', weight: 'stop' as const, items: products.filter((one) => one.counts.stop > 0) },
    { title: 'Needs a decision', words: 'rests on a range or a missing fact', weight: 'decide' as const, items: products.filter((one) => one.counts.stop === 0 && one.counts.decide > 0) },
  ].filter((group) => group.items.length > 0);
  if (groups.length === 0) {
    return <div className="need"><section className="grp"><h2>Nothing waits</h2><p className="quiet py-2.5">No product of yours is held up by a rule that this data release holds.</p></section></div>;
  }
  return (
    <div className="need">
      {groups.map((group) => (
        <section key={group.title} className="grp" aria-label={group.title}>
          <h2>{group.title}<span className="quiet">{group.words}</span></h2>
          <div>
            {group.items.map((one) => (
              <article key={one.id} className="it">
                <VerdictMark weight={group.weight} />
                <div><h3>{one.name}</h3><p className="quiet">{one.headline}</p></div>
                <p className="by"><b>{group.weight === 'stop' ? sayCount(one.counts.stop, 'point') : sayCount(one.counts.decide, 'point')}</b>saved {sayWhen(one.savedAt)}</p>
                <LinkButton small to={paths.verdicts(one.id)} aria-label={`${group.weight === 'stop' ? 'See the verdicts' : 'Decide'}: ${one.name}`}>{group.weight === 'stop' ? 'See the verdicts' : 'Decide'}</LinkButton>
              </article>
            ))}
          </div>
        </section>
      ))}
    </div>
  );
}
