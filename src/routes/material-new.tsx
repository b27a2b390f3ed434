import { useSuspenseQuery } from '@tanstack/react-query';
import { useNavigate, useSearchParams } from 'react-router-dom';
import type { PageLoader } from '#src/app/page.ts';
import { paths } from '#src/app/paths.ts';
import { houseQueries } from '#src/features/house/queries.ts';
import { MaterialEditor } from '#src/features/materials/material-editor.tsx';
import { useSession } from '#src/features/session/queries.ts';
import { useToast } from '#src/ui/toast.tsx';

export const loader: PageLoader = (client) => client.ensureQueryData(houseQueries.current());

export function Component() {
  const { house } = useSession();
  const { temperatureUnit } = useSuspenseQuery(houseQueries.current()).data;
  const [search] = useSearchParams();
  const navigate = useNavigate();
  const toast = useToast();
  return (
    <MaterialEditor
      material={null}
      houseId={house.id}
      unit={temperatureUnit}
      mayEdit
      tradeName={search.get('name') ?? ''}
      startsWithPaste={search.get('paste') === 'yes'}
      onSaved={(saved) => {
        toast(`${saved.tradeName} saved.`);
        void navigate(paths.material(saved.id), { replace: true });
      }}
    />
  );
}
