import { TrailList } from '#src/features/trail/trail-list.tsx';
import { TrailSeal } from '#src/features/trail/trail-seal.tsx';
import { useSession } from '#src/features/session/queries.ts';
import { Deck } from '#src/ui/deck.tsx';
import { Panel, Sheet } from '#src/ui/sheet.tsx';

/** Everything that was done in the house. */
export function Component() {
  const { house } = useSession();
  return (
    <>
      <Deck title="Trail" facts={[house.name, 'who did what, and when']} />
      <div className="wrap full">
        <Sheet className="hung">
          <Panel title="Seal"><TrailSeal /></Panel>
          <Panel title="Entries"><TrailList /></Panel>
        </Sheet>
      </div>
    </>
  );
}
