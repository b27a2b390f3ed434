import { useId, useMemo } from 'react';
import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import type { z } from 'zod';
import type { dictionaryEntry } from '#shared/contracts/dictionary.contract.ts';
import { paths } from '#src/app/paths.ts';
import { sayError } from '#src/lib/api/error.ts';
import { useFindText } from '#src/lib/use-find-text.ts';
import { Banner } from '#src/ui/banner.tsx';
import { Button } from '#src/ui/button.tsx';
import { EmptyState } from '#src/ui/empty-state.tsx';
import { SelectField } from '#src/ui/field.tsx';
import { Table } from '#src/ui/table.tsx';
import type { Column } from '#src/ui/table.tsx';
import { dictionaryQueries } from './queries.ts';
import type { DictionaryFilter } from './queries.ts';
import './dictionary.css';

export type Entry = z.infer<typeof dictionaryEntry>;

/** What the inventory says of a name; nobody curated it, so it has no page of its own. */
const IMPORTED: Column<Entry>[] = [
  { id: 'inci', head: 'INCI name', by: (one) => one.inci.toLowerCase(), cell: (one) => <span className="[overflow-wrap:anywhere]">{one.inci}</span> },
  { id: 'functions', head: 'Functions', by: (one) => one.functions.join(' '), cell: (one) => one.functions.join(', '), className: 'wide' },
  { id: 'cas', head: 'CAS', cell: (one) => one.cas.join(', ') },
  { id: 'origin', head: 'Standing', cell: () => 'from the inventory, not curated', className: 'wide quiet' },
];

/** What the address says of the list. */
export function filterOf(search: URLSearchParams): DictionaryFilter {
  const page = Number(search.get('page'));
  return { ...(search.get('find') ? { find: search.get('find')! } : {}), ...(search.get('function') ? { function: search.get('function')! } : {}), ...(search.get('from') === 'inventory' ? { from: 'inventory' as const } : {}), ...(page > 1 ? { page } : {}) };
}

/** Every ingredient known here: found by any of its names or its CAS number, narrowed by what it does. */
export function DictionaryRoom() {
  const [search, setSearch] = useSearchParams();
  const filter = filterOf(search);
  const { data, error } = useQuery(dictionaryQueries.list(filter));
  const findId = useId();
  const isImported = filter.from === 'inventory';
  const columns = useMemo<Column<Entry>[]>(() => isImported ? IMPORTED : [
    { id: 'inci', head: 'INCI name', by: (one) => one.inci.toLowerCase(), cell: (one) => one.inci, link: (one) => paths.entry(one.inci) },
    { id: 'common', head: 'Also known as', cell: (one) => [...one.commonNames, ...one.synonyms].slice(0, 3).join(', '), className: 'wide quiet' },
    { id: 'functions', head: 'Functions', by: (one) => one.functions.join(' '), cell: (one) => one.functions.join(', '), className: 'wide' },
    { id: 'cas', head: 'CAS', cell: (one) => one.cas.join(', '), className: 'nowrap' },
    { id: 'ec', head: 'EC', cell: (one) => one.ec.join(', '), className: 'wide nowrap' },
  ], [isImported]);
  const turn = (key: string, value: string) => setSearch((before) => {
    if (value) before.set(key, value);
    else before.delete(key);
    if (key !== 'page') before.delete('page');
    return before;
  }, { replace: true });
  const [find, setFind] = useFindText(search.get('find') ?? '', (text) => turn('find', text));
  const pages = data ? Math.ceil(data.total / data.pageSize) : 1;
  return (
    <div className="panel dictionary">
      <div className="filters">
        <div className="field">
          <label className="label" htmlFor={findId}>Find by any name, or CAS</label>
          <input id={findId} type="search" className="input" value={find} onChange={(event) => setFind(event.target.value)} />
        </div>
        <SelectField label="Function" value={filter.function ?? ''} onChange={(event) => turn('function', event.target.value)}>
          <option value="">any</option>
          {(data?.functions ?? []).map((one) => <option key={one} value={one}>{one}</option>)}
        </SelectField>
        <SelectField label="Names" value={filter.from ?? ''} onChange={(event) => turn('from', event.target.value)}>
          <option value="">curated</option>
          <option value="inventory">from the inventory, not curated</option>
        </SelectField>
        <span className="quiet self-end pb-1.5" role="status">{data ? `${data.total} found` : ''}</span>
      </div>
      {error ? <Banner weight="stop" title="The dictionary could not be read.">{sayError(error)}</Banner> : null}
      {data && data.items.length > 0 ? <Table label="Ingredients" columns={columns} rows={data.items} rowKey={(one) => one.id} /> : null}
      {data?.items.length === 0 ? <EmptyState title="Nothing is known by that name." acts={<Button onClick={() => setSearch({}, { replace: true })}>Show all</Button>}>Try a part of the name, a common name, or the CAS number. A name that is not here may still be used; it is then marked as unknown.</EmptyState> : null}
      {data && pages > 1 ? (
        <div className="pager">
          <span>Page {data.page} of {pages}</span>
          <Button small disabled={data.page <= 1} onClick={() => turn('page', data.page === 2 ? '' : String(data.page - 1))}>Back</Button>
          <Button small disabled={data.page >= pages} onClick={() => turn('page', String(data.page + 1))}>Further</Button>
        </div>
      ) : null}
    </div>
  );
}
