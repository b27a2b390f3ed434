import { useCallback, useId } from 'react';
import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { MARKETS } from '#shared/law/types.ts';
import type { Market } from '#shared/law/types.ts';
import { paths } from '#src/app/paths.ts';
import { sayError } from '#src/lib/api/error.ts';
import { useFindText } from '#src/lib/use-find-text.ts';
import { Banner } from '#src/ui/banner.tsx';
import { Button, LinkButton } from '#src/ui/button.tsx';
import { EmptyState } from '#src/ui/empty-state.tsx';
import { categoryQueries } from './category-queries.ts';
import { ProductTable } from './product-table.tsx';
import { productQueries } from './queries.ts';
import type { ProductFilter } from './queries.ts';

/** What the address says of the list: what is looked for, where it is sold. */
export function filterOf(search: URLSearchParams): ProductFilter {
  const market = MARKETS.find((one) => one === search.get('market'));
  const page = Number(search.get('page'));
  return { ...(search.get('find') ? { find: search.get('find')! } : {}), ...(market ? { market } : {}), ...(page > 1 ? { page } : {}) };
}

/** All products: narrowed by name and market, sorted by their heads. */
export function ProductRoom({ mayEdit }: { mayEdit: boolean }) {
  const [search, setSearch] = useSearchParams();
  const filter = filterOf(search);
  const { data, error } = useQuery(productQueries.list(filter));
  const { data: categories } = useQuery(categoryQueries.list());
  const findId = useId();
  const titleOf = useCallback((slug: string) => categories?.items.find((one) => one.slug === slug)?.title ?? slug.replaceAll('-', ' '), [categories]);
  const turn = (key: string, value: string) => setSearch((before) => {
    if (value) before.set(key, value);
    else before.delete(key);
    if (key !== 'page') before.delete('page');
    return before;
  }, { replace: true });
  const [find, setFind] = useFindText(search.get('find') ?? '', (text) => turn('find', text));
  const isNarrowed = filter.find !== undefined || filter.market !== undefined;
  return (
    <div className="panel">
      <div className="filters">
        <div className="field">
          <label className="label" htmlFor={findId}>Find by name</label>
          <input id={findId} type="search" className="input" value={find} onChange={(event) => setFind(event.target.value)} />
        </div>
        <div className="switch" role="group" aria-label="Sold in">
          {(['', ...MARKETS] as const).map((market: Market | '') => <button key={market} type="button" aria-pressed={(filter.market ?? '') === market} onClick={() => turn('market', market)}>{market || 'All'}</button>)}
        </div>
      </div>
      {error ? <Banner weight="stop" title="The products could not be read.">{sayError(error)}</Banner> : null}
      {data && data.items.length > 0 ? <ProductTable products={data.items} titleOf={titleOf} /> : null}
      {data && data.total > data.pageSize ? <Pager page={data.page} pages={Math.ceil(data.total / data.pageSize)} onTurn={(page) => turn('page', String(page))} /> : null}
      {data?.items.length === 0 && isNarrowed ? <EmptyState title="No product fits." acts={<Button onClick={() => setSearch({}, { replace: true })}>Show all products</Button>}>Change the name or the market above.</EmptyState> : null}
      {data?.items.length === 0 && !isNarrowed ? (
        <EmptyState title="No products yet." acts={mayEdit ? <LinkButton weight="act" to={paths.newProduct}>New product</LinkButton> : undefined}>
          A product is a formula with its markets: Colophon then writes its declaration, its verdicts and its label.
        </EmptyState>
      ) : null}
    </div>
  );
}

function Pager({ page, pages, onTurn }: { page: number; pages: number; onTurn: (page: number) => void }) {
  return (
    <div className="pager">
      <span>Page {page} of {pages}</span>
      <Button small disabled={page <= 1} onClick={() => onTurn(page - 1)}>Back</Button>
      <Button small disabled={page >= pages} onClick={() => onTurn(page + 1)}>Further</Button>
    </div>
  );
}
