import { useQuery } from '@tanstack/react-query';
import { Navigate, useSearchParams } from 'react-router-dom';
import { paths } from '#src/app/paths.ts';
import { materialQueries } from '#src/features/materials/queries.ts';
import { LinkButton } from '#src/ui/button.tsx';
import { EmptyState } from '#src/ui/empty-state.tsx';

/** Without a choice the first material is shown; without any, how to begin. */
export function Component() {
  const [search] = useSearchParams();
  const find = search.get('find') || undefined;
  const { data } = useQuery(materialQueries.list({ find }));
  const first = data?.items[0];
  if (first) return <Navigate replace to={{ pathname: paths.material(first.id), search: search.toString() }} />;
  if (!data || find) return null;
  return (
    <div className="panel">
      <EmptyState title="No materials yet." acts={<><LinkButton weight="act" to={paths.newMaterial}>New material</LinkButton><LinkButton to={`${paths.newMaterial}?paste=yes`}>Read a supplier’s line</LinkButton></>}>
        A material is what you buy: one ingredient or a blend, with the composition its supplier gives. Formulas are made of materials.
      </EmptyState>
    </div>
  );
}
