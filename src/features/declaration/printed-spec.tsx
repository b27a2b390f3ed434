import type { Market } from '#shared/law/types.ts';

const NAMES: Readonly<Record<Market, string>> = { EU: 'INCI, EU glossary', UK: 'INCI', US: 'US names', CA: 'INCI and schedule' };
/** Least letter heights: 21 CFR 701.3(b) in the US; elsewhere the law asks for legible letters only. */
const HEIGHTS: Readonly<Record<Market, string>> = { EU: 'legible; 1.2 mm advised', UK: 'legible; 1.2 mm advised', US: '1.6 mm', CA: 'legible; 1.6 mm advised' };

/** How the list is set, beside it. `allergens` is `null` where the market asks for none. */
export function PrintedSpec({ market, allergens }: { market: Market; allergens: number | null }) {
  const facts: readonly (readonly [string, string])[] = [
    ['Letters', '8.8 pt, small o 1.6 mm'],
    ['Least height', HEIGHTS[market]],
    ['Names', NAMES[market]],
    ['Allergens', allergens === null ? 'no duty in force' : `${allergens} named`],
  ];
  return (
    <dl className="printed-spec">
      {facts.map(([term, fact]) => (
        <div key={term}>
          <dt>{term}</dt>
          <dd>{fact}</dd>
        </div>
      ))}
    </dl>
  );
}
