import { useId, useRef } from 'react';
import type { KeyboardEvent } from 'react';
import { useQuery } from '@tanstack/react-query';
import { NavLink, useSearchParams } from 'react-router-dom';
import type { MaterialSummary } from '#shared/contracts/materials.contract.ts';
import { paths } from '#src/app/paths.ts';
import { sayError } from '#src/lib/api/error.ts';
import { sayCount } from '#src/lib/say.ts';
import { useFindText } from '#src/lib/use-find-text.ts';
import { TextButton } from '#src/ui/button.tsx';
import { materialQueries } from './queries.ts';
import './materials.css';

/** The house's materials at the left, narrowed as one types; one tab stop, walked with the arrow keys. */
export function MaterialList() {
  const [search, setSearch] = useSearchParams();
  const find = search.get('find') ?? '';
  const page = Number(search.get('page') ?? '1') || 1;
  const { data, error } = useQuery(materialQueries.list({ find: find || undefined, page: page > 1 ? page : undefined }));
  const id = useId();
  const turn = (next: Record<string, string>) => setSearch((before) => {
    for (const [key, value] of Object.entries(next)) {
      if (value) before.set(key, value);
      else before.delete(key);
    }
    return before;
  }, { replace: true, preventScrollReset: true });
  const [typed, setTyped] = useFindText(find, (text) => turn({ find: text, page: '' }));
  const items = data?.items ?? [];
  const pages = data ? Math.ceil(data.total / data.pageSize) : 1;
  return (
    <div className="list">
      <div className="field px-4 pb-3">
        <label className="label" htmlFor={id}>Find by name, INCI or CAS</label>
        <input id={id} type="search" className="input" value={typed} onChange={(event) => setTyped(event.target.value)} />
      </div>
      {error ? <p className="error px-4" role="alert">{sayError(error)}</p> : null}
      <Rows items={items} search={search.toString()} />
      {data && items.length === 0 ? <p className="quiet border-t border-hair px-4 py-3">{find ? `No material has “${find}” in its name or composition.` : 'No materials yet.'}</p> : null}
      {pages > 1 ? (
        <p className="flex items-center justify-between border-t border-hair px-4 pt-3">
          <TextButton disabled={page <= 1} onClick={() => turn({ page: page === 2 ? '' : String(page - 1) })}>Back</TextButton>
          <span className="quiet">{page} of {pages}</span>
          <TextButton disabled={page >= pages} onClick={() => turn({ page: String(page + 1) })}>Further</TextButton>
        </p>
      ) : null}
    </div>
  );
}

function Rows({ items, search }: { items: readonly MaterialSummary[]; search: string }) {
  const ref = useRef<HTMLElement>(null);
  const walk = (event: KeyboardEvent<HTMLAnchorElement>) => {
    const links = [...(ref.current?.querySelectorAll('a') ?? [])];
    const at = links.indexOf(event.currentTarget);
    const to = { ArrowDown: at + 1, ArrowRight: at + 1, ArrowUp: at - 1, ArrowLeft: at - 1, Home: 0, End: links.length - 1 }[event.key];
    const link = to === undefined ? undefined : links[to];
    if (!link) return;
    event.preventDefault();
    links.forEach((one) => (one.tabIndex = one === link ? 0 : -1));
    link.focus();
  };
  return (
    <nav aria-label="Materials" ref={ref}>
      {items.map((one, index) => (
        <NavLink key={one.id} to={{ pathname: paths.material(one.id), search }} tabIndex={index === 0 ? 0 : -1} onKeyDown={walk} preventScrollReset>
          <span>{one.tradeName}</span>
          <span className="under">{sayParts(one)}</span>
        </NavLink>
      ))}
    </nav>
  );
}

function sayParts(one: MaterialSummary): string {
  const parts = one.declareAs === 'parfum' ? 'perfume' : one.declareAs === 'aroma' ? 'flavour' : sayCount(one.parts, 'ingredient');
  return one.constituents > 0 ? `${parts}, ${sayCount(one.constituents, 'constituent')}` : parts;
}
