import { useSuspenseQuery } from '@tanstack/react-query';
import { can } from '#shared/policies/can.ts';
import type { PageLoader } from '#src/app/page.ts';
import { HouseForm } from '#src/features/house/house-form.tsx';
import { Members } from '#src/features/house/members.tsx';
import { houseQueries } from '#src/features/house/queries.ts';
import { useSession } from '#src/features/session/queries.ts';
import { sayCount } from '#src/lib/say.ts';
import { Deck } from '#src/ui/deck.tsx';
import { Sheet } from '#src/ui/sheet.tsx';

export const loader: PageLoader = (client) => client.ensureQueryData(houseQueries.current());

export function Component() {
  const session = useSession();
  const house = useSuspenseQuery(houseQueries.current()).data;
  return (
    <>
      <Deck title={house.name} windowTitle="House" facts={['House', sayCount(house.members.length, 'member')]} />
      <div className="wrap full">
        <Sheet className="hung"><HouseForm key={house.id} house={house} mayEdit={can(session.house, 'edit', 'house')} /><Members members={house.members} /></Sheet>
      </div>
    </>
  );
}
