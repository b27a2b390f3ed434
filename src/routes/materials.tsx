import { useQuery } from '@tanstack/react-query';
import { Outlet, useSearchParams } from 'react-router-dom';
import { can } from '#shared/policies/can.ts';
import type { PageLoader } from '#src/app/page.ts';
import { paths } from '#src/app/paths.ts';
import { MaterialList } from '#src/features/materials/material-list.tsx';
import { materialQueries } from '#src/features/materials/queries.ts';
import { useSession } from '#src/features/session/queries.ts';
import { sayCount } from '#src/lib/say.ts';
import { LinkButton } from '#src/ui/button.tsx';
import { Deck } from '#src/ui/deck.tsx';
import { Sheet } from '#src/ui/sheet.tsx';

export const loader: PageLoader = (client, { request }) => client.ensureQueryData(materialQueries.list({ find: new URL(request.url).searchParams.get('find') || undefined }));

export function Component() {
  const { house } = useSession();
  const [search] = useSearchParams();
  const { data } = useQuery(materialQueries.list({ find: search.get('find') || undefined }));
  const facts = [house.name, ...(data ? [search.get('find') ? `${sayCount(data.total, 'material')} found` : sayCount(data.total, 'material')] : [])];
  return (
    <>
      <Deck
        title="Materials"
        facts={facts}
        acts={can(house, 'edit', 'materials') ? <><LinkButton to={`${paths.newMaterial}?paste=yes`} icon="sheet">Read a supplier’s line</LinkButton><LinkButton weight="act" to={paths.newMaterial}>New material</LinkButton></> : undefined}
      />
      <div className="wrap full">
        <Sheet className="hung two"><MaterialList /><div><Outlet /></div></Sheet>
        <p className="foot">Changing a composition re-judges every product that uses the material.</p>
      </div>
    </>
  );
}
