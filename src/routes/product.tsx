import { useSuspenseQuery } from '@tanstack/react-query';
import { Outlet, useParams } from 'react-router-dom';
import type { PageLoader } from '#src/app/page.ts';
import { paths } from '#src/app/paths.ts';
import { productQueries } from '#src/features/products/queries.ts';
import { Deck, TabLinks } from '#src/ui/deck.tsx';

export const loader: PageLoader = (client, { params }) => client.ensureQueryData(productQueries.detail(params.id!));

export function Component() {
  const { id = '' } = useParams();
  const { product } = useSuspenseQuery(productQueries.detail(id)).data;
  const tabs = [
    { to: paths.product(id), word: 'Formula', end: true },
    { to: paths.declaration(id), word: 'Declaration' },
    { to: paths.verdicts(id), word: 'Verdicts' },
    { to: paths.label(id), word: 'Label' },
    { to: paths.report(id), word: 'Report' },
  ];
  return (
    <>
      <Deck title={product.draft.name} tabs={<TabLinks label="Parts of the product" tabs={tabs} />} />
      <Outlet />
    </>
  );
}
