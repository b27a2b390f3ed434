import { useMemo, useState } from 'react';
import type { KeyboardEvent, ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { createSortedRowModel, rowSortingFeature, sortFn_alphanumeric, tableFeatures, useTable } from '@tanstack/react-table';
import type { SortingState } from '@tanstack/react-table';
import { Icon } from './icon.tsx';

const features = tableFeatures({ rowSortingFeature, sortedRowModel: createSortedRowModel(), sortFns: { alphanumeric: sortFn_alphanumeric } });

export interface Column<Row> {
  readonly id: string;
  readonly head: string;
  /** What it is sorted by; a column without it is not sorted. */
  readonly by?: (row: Row) => string | number;
  readonly cell: (row: Row) => ReactNode;
  /** The address of the row: its link spreads over the whole row. */
  readonly link?: (row: Row) => string;
  readonly isNumber?: boolean;
  readonly className?: string;
}
export interface TableProps<Row> {
  readonly label: string;
  readonly columns: readonly Column<Row>[];
  readonly rows: readonly Row[];
  readonly rowKey: (row: Row) => string;
  readonly sortedBy?: { readonly id: string; readonly desc: boolean };
}

/** A table whose heads sort it, and whose row links are one tab stop walked with the arrow keys. */
export function Table<Row extends object>({ label, columns, rows, rowKey, sortedBy }: TableProps<Row>) {
  const [sorting, setSorting] = useState<SortingState>(sortedBy ? [{ ...sortedBy }] : []);
  const [stop, setStop] = useState('');
  const defs = useMemo(() => columns.map((column) => ({ id: column.id, accessorFn: (row: Row) => column.by?.(row) ?? '', enableSorting: column.by !== undefined, sortFn: 'alphanumeric' as const, sortDescFirst: false })), [columns]);
  const table = useTable({ features, data: rows as Row[], columns: defs, state: { sorting }, onSortingChange: setSorting, getRowId: rowKey, enableSortingRemoval: false });
  const shown = table.getRowModel().rows;
  const tabStop = shown.some((row) => row.id === stop) ? stop : shown[0]?.id;
  return (
    <div className="table-scroll">
      <table className="table" aria-label={label}>
        <thead>
          <tr>
            {table.getFlatHeaders().map((header, index) => (
              <Head key={header.id} column={columns[index]!} sorted={header.column.getIsSorted()} onSort={header.column.getToggleSortingHandler()} />
            ))}
          </tr>
        </thead>
        <tbody>
          {shown.map((row) => (
            <tr key={row.id}>
              {columns.map((column) => (
                <td key={column.id} className={classOf(column)}>
                  {column.link ? (
                    <Link className="row-link" data-row-link to={column.link(row.original)} tabIndex={row.id === tabStop ? 0 : -1} onFocus={() => setStop(row.id)} onKeyDown={walkRows}>
                      {column.cell(row.original)}
                    </Link>
                  ) : column.cell(row.original)}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function Head<Row>({ column, sorted, onSort }: { column: Column<Row>; sorted: false | 'asc' | 'desc'; onSort?: (event: unknown) => void }) {
  return (
    <th scope="col" className={classOf(column)} aria-sort={sorted ? (sorted === 'desc' ? 'descending' : 'ascending') : undefined}>
      {column.by ? (
        <button type="button" className="sorter" onClick={onSort}>
          {column.head}
          <Icon name="down" />
        </button>
      ) : column.head}
    </th>
  );
}

const classOf = (column: { isNumber?: boolean; className?: string }): string => `${column.isNumber ? 'num' : ''} ${column.className ?? ''}`;

/** Arrow keys, Home and End move between the links of the rows. */
function walkRows(event: KeyboardEvent<HTMLAnchorElement>): void {
  const links = [...(event.currentTarget.closest('tbody')?.querySelectorAll<HTMLElement>('[data-row-link]') ?? [])];
  const at = links.indexOf(event.currentTarget);
  const to = { ArrowDown: at + 1, ArrowUp: at - 1, Home: 0, End: links.length - 1 }[event.key];
  const link = to === undefined ? undefined : links[to];
  if (!link) return;
  event.preventDefault();
  link.focus();
}
