import { useSuspenseQuery } from '@tanstack/react-query';
import { can } from '#shared/policies/can.ts';
import type { PageLoader } from '#src/app/page.ts';
import { paths } from '#src/app/paths.ts';
import { materialQueries } from '#src/features/materials/queries.ts';
import { productQueries } from '#src/features/products/queries.ts';
import { Shelf } from '#src/features/products/shelf.tsx';
import { useSession } from '#src/features/session/queries.ts';
import { HeldUp } from '#src/features/today/held-up.tsx';
import { LawLanes } from '#src/features/today/law-lanes.tsx';
import { sayCount, sayLongDay, today } from '#src/lib/say.ts';
import { LinkButton } from '#src/ui/button.tsx';
import { Deck } from '#src/ui/deck.tsx';
import { EmptyState } from '#src/ui/empty-state.tsx';
import { Sheet } from '#src/ui/sheet.tsx';
import { Link } from 'react-router-dom';
import '#src/features/today/today.css';

export const loader: PageLoader = (client) => Promise.all([client.ensureQueryData(productQueries.list()), client.ensureQueryData(materialQueries.list())]);

export function Component() {
  const { house, dataRelease } = useSession();
  const products = useSuspenseQuery(productQueries.list()).data;
  const materials = useSuspenseQuery(materialQueries.list()).data;
  const waiting = products.items.filter((one) => one.counts.stop + one.counts.decide > 0).length;
  const mayEdit = can(house, 'edit', 'products');
  const begin = mayEdit ? <><LinkButton to={`${paths.newProduct}?from=paste`}>Start from a spreadsheet</LinkButton><LinkButton weight="act" to={paths.newProduct}>New product</LinkButton></> : null;
  return (
    <>
      <Deck
        title={sayLongDay()}
        windowTitle="Today"
        facts={[house.name, sayCount(products.total, 'product'), sayCount(materials.total, 'material'), `data release ${dataRelease}`]}
        acts={<><span className="saved">{waiting > 0 ? `${sayCount(waiting, 'product needs', 'products need')} you` : 'Nothing waits'}</span>{begin}</>}
      />
      <div className="wrap full">
        <Sheet className="hung">
          {products.total > 0 ? <HeldUp products={products.items} /> : <div className="panel"><EmptyState title="No products yet." acts={begin}>Begin with a formula you have: paste it from a spreadsheet, or write it line by line.</EmptyState></div>}
          <LawLanes today={today()} products={products.items} />
        </Sheet>
      </div>
      {products.total > 0 ? (
        <div className="wrap">
          <section className="shelf-room" aria-labelledby="shelf-head">
            <div className="panel-head"><h2 id="shelf-head">Products</h2><span className="end"><Link className="font-medium" to={paths.products}>All products</Link></span></div>
            <Shelf products={products.items.slice(0, 12)} />
          </section>
        </div>
      ) : null}
    </>
  );
}
