import { useQuery } from '@tanstack/react-query';
import { can } from '#shared/policies/can.ts';
import type { PageLoader } from '#src/app/page.ts';
import { paths } from '#src/app/paths.ts';
import { categoryQueries } from '#src/features/products/category-queries.ts';
import { ProductRoom, filterOf } from '#src/features/products/product-room.tsx';
import { productQueries } from '#src/features/products/queries.ts';
import { useSession } from '#src/features/session/queries.ts';
import { sayCount } from '#src/lib/say.ts';
import { LinkButton } from '#src/ui/button.tsx';
import { Deck } from '#src/ui/deck.tsx';
import { Sheet } from '#src/ui/sheet.tsx';

export const loader: PageLoader = (client, { request }) =>
  Promise.all([client.ensureQueryData(productQueries.list(filterOf(new URL(request.url).searchParams))), client.ensureQueryData(categoryQueries.list())]);

export function Component() {
  const { house, dataRelease } = useSession();
  const { data } = useQuery(productQueries.list());
  const mayEdit = can(house, 'edit', 'products');
  return (
    <>
      <Deck title="Products" facts={[house.name, ...(data ? [sayCount(data.total, 'product')] : []), `data release ${dataRelease}`]} acts={<><LinkButton to={paths.read}>Read a list</LinkButton>{mayEdit ? <LinkButton weight="act" to={paths.newProduct}>New product</LinkButton> : null}</>} />
      <div className="wrap full">
        <Sheet className="hung"><ProductRoom mayEdit={mayEdit} /></Sheet>
        <p className="foot">Judged as of today, in the markets each product is sold in. “No rule broken” means none that data release {dataRelease} holds; it is no certificate.</p>
      </div>
    </>
  );
}
