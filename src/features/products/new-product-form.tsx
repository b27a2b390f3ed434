import { useSuspenseQuery } from '@tanstack/react-query';
import { Controller } from 'react-hook-form';
import { createProduct } from '#shared/contracts/products.contract.ts';
import type { Product } from '#shared/contracts/products.contract.ts';
import { MARKETS } from '#shared/law/types.ts';
import { sayError } from '#src/lib/api/error.ts';
import { useContractForm } from '#src/lib/use-contract-form.ts';
import { Banner } from '#src/ui/banner.tsx';
import { Button } from '#src/ui/button.tsx';
import { CheckField, FieldFault, SelectField, TextField } from '#src/ui/field.tsx';
import { categoryQueries } from './category-queries.ts';
import { useCreateProduct } from './mutations.ts';
import type { NewProduct } from './mutations.ts';

const MARKET_WORDS = { EU: 'European Union', UK: 'Great Britain', US: 'United States', CA: 'Canada' } as const;

/** A product from nothing, or for a pasted formula: its name, what it is, where it is sold. */
export function NewProductForm({ act, onCreated }: { act: string; onCreated: (product: Product) => Promise<unknown> | unknown }) {
  const { data } = useSuspenseQuery(categoryQueries.list());
  const create = useCreateProduct();
  const form = useContractForm<NewProduct, NonNullable<typeof createProduct.body>>({ schema: createProduct.body!, defaultValues: { name: '', category: '', markets: ['EU'] } });
  const { errors } = form.formState;
  const send = form.submit(async (body) => onCreated(await create.mutateAsync(body)));
  return (
    <form className="grid gap-4" noValidate onSubmit={(event) => void send(event).catch(() => undefined)}>
      <TextField label="Name" {...form.register('name')} error={errors.name?.message} />
      <SelectField label="What it is" hint="It decides what is judged: rinse-off or leave-on, hair, lips, eyes." {...form.register('category')} error={errors.category ? 'Choose what the product is.' : undefined}>
        <option value="">Choose</option>
        {(['rinse-off', 'leave-on'] as const).map((exposure) => (
          <optgroup key={exposure} label={exposure === 'rinse-off' ? 'Rinsed off' : 'Left on'}>
            {data.items.filter((one) => one.exposure === exposure).map((one) => <option key={one.slug} value={one.slug}>{one.title}</option>)}
          </optgroup>
        ))}
      </SelectField>
      <Controller
        control={form.control}
        name="markets"
        render={({ field }) => (
          <fieldset>
            <legend className="field-label">Sold in</legend>
            {MARKETS.map((market) => (
              <CheckField
                key={market}
                label={`${market}, ${MARKET_WORDS[market]}`}
                checked={field.value.includes(market)}
                onChange={(event) => field.onChange(MARKETS.filter((one) => (one === market ? event.target.checked : field.value.includes(one))))}
              />
            ))}
            {errors.markets ? <FieldFault>{errors.markets.message ?? 'Choose at least one market.'}</FieldFault> : null}
          </fieldset>
        )}
      />
      {create.error ? <Banner weight="stop" title="Not created.">{sayError(create.error)}</Banner> : null}
      <div><Button type="submit" weight="act" busy={create.isPending}>{act}</Button></div>
    </form>
  );
}
