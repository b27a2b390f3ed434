import { useEffect } from 'react';
import { useSuspenseQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { can } from '#shared/policies/can.ts';
import type { PageLoader } from '#src/app/page.ts';
import { houseQueries } from '#src/features/house/queries.ts';
import { MaterialEditor } from '#src/features/materials/material-editor.tsx';
import { materialQueries } from '#src/features/materials/queries.ts';
import { useSession } from '#src/features/session/queries.ts';
import { useToast } from '#src/ui/toast.tsx';

export const loader: PageLoader = (client, { params }) =>
  Promise.all([client.ensureQueryData(materialQueries.detail(params.id!)), client.ensureQueryData(houseQueries.current())]);

export function Component() {
  const { id = '' } = useParams();
  const { house } = useSession();
  const material = useSuspenseQuery(materialQueries.detail(id)).data;
  const { temperatureUnit } = useSuspenseQuery(houseQueries.current()).data;
  const toast = useToast();
  useEffect(() => {
    document.title = `${material.tradeName} · Materials · Colophon`;
  }, [material.tradeName]);
  return <MaterialEditor key={id} material={material} houseId={house.id} unit={temperatureUnit} mayEdit={can(house, 'edit', 'materials')} onSaved={(saved) => toast(`${saved.tradeName} saved.`)} />;
}
