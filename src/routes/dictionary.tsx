import { can } from '#shared/policies/can.ts';
import type { PageLoader } from '#src/app/page.ts';
import { DictionaryRoom, filterOf } from '#src/features/dictionary/dictionary-room.tsx';
import { InventoryPanel } from '#src/features/dictionary/inventory-panel.tsx';
import { dictionaryQueries } from '#src/features/dictionary/queries.ts';
import { useSession } from '#src/features/session/queries.ts';
import { Deck } from '#src/ui/deck.tsx';
import { Sheet } from '#src/ui/sheet.tsx';

export const loader: PageLoader = (client, { request }) => client.ensureQueryData(dictionaryQueries.list(filterOf(new URL(request.url).searchParams)));

export function Component() {
  const { dataRelease, house } = useSession();
  return (
    <>
      <Deck title="Dictionary" facts={['Ingredients, their names and numbers', `data release ${dataRelease}`]} />
      <div className="wrap full">
        <Sheet className="hung"><DictionaryRoom /><InventoryPanel isOwner={can(house, 'edit', 'house')} /></Sheet>
        <p className="foot">Curated for makers; not the whole inventory. A name missing here is not forbidden: it is only unknown to Colophon.</p>
      </div>
    </>
  );
}
