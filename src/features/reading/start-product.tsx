import { useState } from 'react';
import type { Product } from '#shared/contracts/products.contract.ts';
import type { Category, Market } from '#shared/law/types.ts';
import { estimateDocument, estimateShares } from '#shared/reading/estimate.ts';
import type { ReadName } from '#shared/reading/read-list.ts';
import { sayError } from '#src/lib/api/error.ts';
import { sayCount } from '#src/lib/say.ts';
import { Banner } from '#src/ui/banner.tsx';
import { Button } from '#src/ui/button.tsx';
import { TextField } from '#src/ui/field.tsx';
import { useImportEstimate } from './mutations.ts';

export interface StartProductProps {
  readonly names: readonly ReadName[];
  readonly market: Market;
  readonly category: Category;
  readonly onCreated: (product: Product) => void;
}

/** A product begun from what was read: each name a material, its share an estimate that fits. */
export function StartProduct({ names, market, category, onCreated }: StartProductProps) {
  const [name, setName] = useState('');
  const start = useImportEstimate();
  const estimates = estimateShares(names);
  const unknown = names.filter(({ one }) => one.match === 'unknown').length;
  if (!estimates) return <p className="quiet">No shares fit this list, so no product can be begun from it. Put its order right first.</p>;
  const create = () => {
    const document = estimateDocument(estimates, names, { name: name.trim() || `${category.title} from a list`, market, category });
    start.mutate({ document }, { onSuccess: onCreated });
  };
  return (
    <div className="start-product">
      <p>
        {sayCount(estimates.length, 'line')}, one for each name, with shares that lie within the bounds and come to 100 %. They are an estimate, one of many that would fit this list, and the formula says so.
        {unknown > 0 ? ` ${sayCount(unknown, 'name is', 'names are')} not in the dictionary and ${unknown === 1 ? 'is' : 'are'} taken over as written.` : ''}
      </p>
      <TextField label="Name of the product" placeholder={`${category.title} from a list`} maxLength={255} value={name} onChange={(event) => setName(event.target.value)} />
      {start.error ? <Banner weight="stop" title="Not created.">{sayError(start.error)}</Banner> : null}
      <div><Button weight="act" busy={start.isPending} onClick={create}>Start a product from it</Button></div>
    </div>
  );
}
