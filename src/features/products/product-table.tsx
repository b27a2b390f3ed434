import { useMemo } from 'react';
import type { ProductSummary } from '#shared/contracts/products.contract.ts';
import { paths } from '#src/app/paths.ts';
import { sayWhen } from '#src/lib/say.ts';
import { Table } from '#src/ui/table.tsx';
import type { Column } from '#src/ui/table.tsx';
import { Standing } from './standing.tsx';
import './products.css';

/** Products as a table: sorted by what one asks, each row its product's address. */
export function ProductTable({ products, titleOf }: { products: readonly ProductSummary[]; titleOf: (category: string) => string }) {
  const columns = useMemo<Column<ProductSummary>[]>(() => [
    { id: 'name', head: 'Product', by: (one) => one.name.toLowerCase(), cell: (one) => one.name, link: (one) => paths.product(one.id) },
    { id: 'category', head: 'Category', by: (one) => titleOf(one.category), cell: (one) => titleOf(one.category), className: 'wide' },
    { id: 'net', head: 'Net content', cell: (one) => one.netContent, isNumber: true, className: 'wide' },
    { id: 'markets', head: 'Markets', by: (one) => one.markets.join(' '), cell: (one) => one.markets.join(', ') },
    { id: 'standing', head: 'Today', by: (one) => one.counts.stop * 10_000 + one.counts.decide * 100 + one.counts.note, cell: (one) => <Standing product={one} /> },
    { id: 'headline', head: 'What to do first', cell: (one) => one.headline, className: 'wide said' },
    { id: 'saved', head: 'Saved', by: (one) => one.savedAt, cell: (one) => `${sayWhen(one.savedAt)}, ${one.savedBy}`, className: 'wide nowrap' },
  ], [titleOf]);
  return <div className="products-table"><Table label="Products" columns={columns} rows={products} rowKey={(one) => one.id} sortedBy={{ id: 'standing', desc: true }} /></div>;
}
