import { useQuery, useSuspenseQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { MARKETS } from '#shared/law/types.ts';
import type { PageLoader } from '#src/app/page.ts';
import { CalendarRoom } from '#src/features/calendar/calendar-room.tsx';
import { everyProduct, useEffectsOfLaw } from '#src/features/calendar/queries.ts';
import { houseQueries } from '#src/features/house/queries.ts';
import { useSession } from '#src/features/session/queries.ts';
import { engineQuery } from '#src/features/workspace/queries.ts';
import { sayError } from '#src/lib/api/error.ts';
import { sayDay, today as readToday } from '#src/lib/say.ts';
import { Banner } from '#src/ui/banner.tsx';
import { Deck } from '#src/ui/deck.tsx';
import { Sheet } from '#src/ui/sheet.tsx';

export const loader: PageLoader = (client) => Promise.all([client.ensureQueryData(engineQuery), client.ensureQueryData(houseQueries.current())]);

const NONE: readonly never[] = [];

/** The law calendar: when which rule begins to bind, and for which of the house's products. */
export function Component() {
  const { house } = useSession();
  const engine = useSuspenseQuery(engineQuery).data;
  const defaults = useSuspenseQuery(houseQueries.current()).data;
  const every = useQuery(everyProduct);
  const [search, setSearch] = useSearchParams();
  const today = readToday();
  const { law } = engine;
  const isWhole = search.get('since') === 'beginning';
  const products = every.data ?? NONE;
  const { known, done, failed } = useEffectsOfLaw({ products, engine, house: defaults, today, since: isWhole ? law.coveredFrom : today });
  const turn = (key: string, value: string) => setSearch((before) => {
    if (value) before.set(key, value);
    else before.delete(key);
    return before;
  }, { replace: true, preventScrollReset: true });
  return (
    <>
      <Deck title="Law calendar" facts={[house.name, `data release ${law.release}`, `${sayDay(law.coveredFrom)} to ${sayDay(law.coveredUntil)}`]} />
      <div className="wrap full">
        <Sheet className="hung">
          {every.error ? <div className="panel"><Banner weight="stop" title="The products could not be read.">{sayError(every.error)}</Banner></div> : null}
          <CalendarRoom
            law={law}
            today={today}
            market={MARKETS.find((each) => each === search.get('market')) ?? null}
            isWhole={isWhole}
            isOursOnly={search.get('show') === 'ours'}
            products={products}
            known={known}
            done={done}
            failed={failed}
            onTurn={turn}
          />
        </Sheet>
        <p className="foot">These are the dates that data release {law.release} holds, up to {sayDay(law.coveredUntil)}; what the law will decide later is not guessed. Each product is judged on the day before and on the day itself, with its formula as saved.</p>
      </div>
    </>
  );
}
