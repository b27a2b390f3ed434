import { useNavigate, useSearchParams } from 'react-router-dom';
import type { Product } from '#shared/contracts/products.contract.ts';
import type { PageLoader } from '#src/app/page.ts';
import { paths } from '#src/app/paths.ts';
import { categoryQueries } from '#src/features/products/category-queries.ts';
import { ImportDocument } from '#src/features/products/import-document.tsx';
import { NewProductForm } from '#src/features/products/new-product-form.tsx';
import { StartFromPaste } from '#src/features/products/start-from-paste.tsx';
import { useSession } from '#src/features/session/queries.ts';
import { Deck, TabLinks } from '#src/ui/deck.tsx';
import { Panel, Sheet } from '#src/ui/sheet.tsx';
import { useToast } from '#src/ui/toast.tsx';

export const loader: PageLoader = (client) => client.ensureQueryData(categoryQueries.list());

const WAYS = [['nothing', 'From nothing'], ['paste', 'From a spreadsheet'], ['document', 'From a formula document']] as const;

export function Component() {
  const { house } = useSession();
  const [search] = useSearchParams();
  const way = WAYS.find(([key]) => key === search.get('from'))?.[0] ?? 'nothing';
  const navigate = useNavigate();
  const toast = useToast();
  const open = (product: Product) => {
    toast(`${product.draft.name} created.`);
    void navigate(paths.product(product.id));
  };
  return (
    <>
      <Deck
        title="New product"
        facts={[house.name]}
        tabs={<TabLinks label="How to begin" tabs={[...WAYS.map(([key, word]) => ({ to: `${paths.newProduct}?from=${key}`, word, isCurrent: key === way })), { to: paths.read, word: 'From an ingredient list', isCurrent: false }]} />}
      />
      <div className="wrap full">
        <Sheet className="hung">
          {way === 'nothing' ? <Panel title="Name it, say what it is and where it is sold" className="max-w-[560px]"><NewProductForm act="Create product" onCreated={open} /></Panel> : null}
          {way === 'paste' ? <Panel title="Paste the formula"><StartFromPaste onCreated={open} /></Panel> : null}
          {way === 'document' ? (
            <Panel title="Choose a formula document" className="max-w-[640px]">
              <p className="quiet mb-4">A file in the open formula format, as a product of yours offers it for download. Materials it names are created where the house lacks them.</p>
              <ImportDocument onCreated={open} />
            </Panel>
          ) : null}
        </Sheet>
      </div>
    </>
  );
}
