import { useMemo, useState } from 'react';
import { MARKETS, type Market } from '#shared/law/types.ts';
import { CopyText } from '#src/features/declaration/copy-text.tsx';
import { EntryList } from '#src/features/declaration/entry-list.tsx';
import { chooseOrder, placeKey, resetOrder, setJoinedNames } from '#src/features/declaration/free-order.ts';
import { PrintedList } from '#src/features/declaration/printed-list.tsx';
import '#src/features/declaration/declaration.css';
import { useProductPage } from '#src/features/workspace/product-page.ts';
import { TextButton } from '#src/ui/button.tsx';
import { CheckField } from '#src/ui/field.tsx';
import { Panel, Sheet } from '#src/ui/sheet.tsx';

const MARKET_NAMES: Readonly<Record<Market, string>> = { EU: 'European Union', UK: 'Great Britain', US: 'United States', CA: 'Canada' };

/** The declaration in full: every entry with its sum, and the list of each market as it is printed. */
export function Component() {
  const { desk, live, asOf, isReadOnly } = useProductPage();
  const { draft, change } = desk;
  const { view, all } = live;
  const [lit, setLit] = useState<string | null>(null);
  const keys = useMemo(() => new Set(lit === null ? [] : [lit]), [lit]);
  const free = view.entries.filter((entry) => entry.isFree).map((entry) => entry.key);
  const isChosen = (draft.declaration.freeOrder[asOf.market] ?? []).length > 0;
  const { declaration } = view.result;
  const others = MARKETS.filter((market) => market !== asOf.market).flatMap((market) => {
    const result = all.get(market);
    return result ? [{ market, text: result.declaration.text, heading: result.declaration.heading }] : [];
  });
  return (
    <div className="wrap full">
      <Sheet className="hung declaration-sheet">
        <Panel
          title={`Entry by entry, ${MARKET_NAMES[asOf.market]}`}
          end={isChosen && !isReadOnly ? <TextButton onClick={() => change(resetOrder(asOf.market))}>Back to the default order</TextButton> : null}
        >
          <p className="quiet mb-3 max-w-[68ch]">
            Press a name for its arithmetic. Entries {declaration.freeLine} may stand in any order: drag them, press Alt with an arrow key, or use the arrows. The choice is kept for this market.
          </p>
          <EntryList
            entries={view.entries}
            totalGrams={view.totalGrams}
            freeLine={declaration.freeLine}
            lit={keys}
            onLight={setLit}
            onMove={isReadOnly ? undefined : (key, place) => change(chooseOrder(asOf.market, placeKey(free, key, place)), `order:${asOf.market}`)}
          />
          {view.entries.length === 0 ? <p className="quiet">The list begins with the formula’s first line.</p> : null}
        </Panel>
        <Panel title="As it must be printed">
          <section className="market-list" aria-label={MARKET_NAMES[asOf.market]}>
            <h3>
              {MARKET_NAMES[asOf.market]} <CopyText text={declaration.text} what={`The list for ${MARKET_NAMES[asOf.market]}`} />
            </h3>
            <PrintedList heading={declaration.heading} entries={view.entries} totalGrams={view.totalGrams} lit={keys} onLight={setLit} market={asOf.market} label={`Ingredients for ${MARKET_NAMES[asOf.market]}, as printed`} />
            <p className="hint mt-2">True size. Dotted words wait for a decision; the dots are not printed.</p>
          </section>
          {others.map(({ market, text, heading }) => (
            <section className="market-list" key={market} aria-label={MARKET_NAMES[market]}>
              <h3>
                {MARKET_NAMES[market]} {draft.markets.includes(market) ? null : <span className="quiet">trial</span>}
                <CopyText text={text} what={`The list for ${MARKET_NAMES[market]}`} />
              </h3>
              <div className="slip printed-text">
                <b>{heading}:</b>
                {text.slice(heading.length + 1)}
              </div>
            </section>
          ))}
          <CheckField
            className="mt-4"
            label="Joined names where a market allows them: Water (Aqua), Aqua/Water/Eau"
            disabled={isReadOnly}
            checked={draft.declaration.joinedNames}
            onChange={(event) => change(setJoinedNames(event.target.checked))}
          />
        </Panel>
      </Sheet>
    </div>
  );
}
