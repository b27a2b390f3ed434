import { useState } from 'react';
import type { House } from '#shared/contracts/house.contract.ts';
import { houseFields } from '#shared/contracts/house.contract.ts';
import { MARKETS } from '#shared/law/types.ts';
import type { Market } from '#shared/law/types.ts';
import { isRefusal, sayError } from '#src/lib/api/error.ts';
import { useContractForm } from '#src/lib/use-contract-form.ts';
import { Banner } from '#src/ui/banner.tsx';
import { Button } from '#src/ui/button.tsx';
import { AreaField, SelectField, TextField } from '#src/ui/field.tsx';
import { Panel } from '#src/ui/sheet.tsx';
import { useToast } from '#src/ui/toast.tsx';
import { useUpdateHouse } from './mutations.ts';
import './house.css';

type Party = { name: string; address: string };
interface Fields {
  name: string;
  brand: string;
  responsiblePerson: Record<Market, Party>;
  usContact: string;
  canadaContact: string;
  countryOfOrigin: string;
  temperatureUnit: 'C' | 'F';
}
const fieldsOf = (house: House): Fields => ({
  name: house.name, brand: house.brand, usContact: house.usContact, canadaContact: house.canadaContact, countryOfOrigin: house.countryOfOrigin, temperatureUnit: house.temperatureUnit,
  responsiblePerson: Object.fromEntries(MARKETS.map((market) => [market, { name: '', address: '', ...house.responsiblePerson[market] }])) as Record<Market, Party>,
});
/** A party with neither name nor address is none. */
const bodyOf = (fields: Fields) => ({ ...fields, responsiblePerson: Object.fromEntries(MARKETS.flatMap((market) => { const party = fields.responsiblePerson[market]; return party.name.trim() || party.address.trim() ? [[market, party]] : []; })) });

const WHO: Readonly<Record<Market, string>> = { EU: 'Responsible person, EU', UK: 'Responsible person, Great Britain', US: 'Maker, packer or distributor, US', CA: 'Manufacturer or importer, Canada' };

/** What the house prints on its labels unless a product says otherwise. */
export function HouseForm({ house, mayEdit }: { house: House; mayEdit: boolean }) {
  const form = useContractForm({ schema: houseFields, defaultValues: fieldsOf(house), toBody: bodyOf });
  const update = useUpdateHouse();
  const toast = useToast();
  const [failure, setFailure] = useState<unknown>(null);
  const { register, formState: { errors, isDirty } } = form;
  const send = form.submit(async (body) => {
    setFailure(null);
    try {
      const saved = await update.mutateAsync({ ...body, version: house.version });
      form.reset(fieldsOf(saved));
      toast('The house is saved.');
    } catch (error) {
      if (!form.showIssues(error)) setFailure(error);
    }
  });
  return (
    <form noValidate onSubmit={(event) => void send(event)}>
      <fieldset className="contents" disabled={!mayEdit}>
        <Panel title="Name and brand" end={mayEdit ? <Button type="submit" weight="act" busy={update.isPending} disabled={!isDirty}>Save</Button> : <span className="quiet">An owner may change these.</span>}>
          {failure ? <div className="mb-3"><Banner weight="stop" title="Not saved.">{isRefusal(failure, 'stale') ? 'Someone else has saved the house since. Load the page again, then make your change.' : sayError(failure)}</Banner></div> : null}
          <div className="house-grid">
            <TextField label="Name of the house" {...register('name')} error={errors.name?.message} />
            <TextField label="Brand, as printed" {...register('brand')} error={errors.brand?.message} />
            <TextField label="Made in" hint="As printed, where a market asks for it." {...register('countryOfOrigin')} error={errors.countryOfOrigin?.message} />
            <SelectField label="Temperatures in" {...register('temperatureUnit')}><option value="C">°C</option><option value="F">°F</option></SelectField>
          </div>
        </Panel>
        <Panel title="Who answers for the product" aside="printed on the label of each market">
          <div className="parties">
            {MARKETS.map((market) => (
              <fieldset key={market} className="grid gap-2">
                <legend className="mb-2 font-semibold">{WHO[market]}</legend>
                <TextField label="Name" {...register(`responsiblePerson.${market}.name`)} error={errors.responsiblePerson?.[market]?.name?.message} />
                <AreaField label="Address" rows={3} {...register(`responsiblePerson.${market}.address`)} error={errors.responsiblePerson?.[market]?.address?.message} />
                {market === 'US' ? <TextField label="Contact for reports of adverse events" {...register('usContact')} error={errors.usContact?.message} /> : null}
                {market === 'CA' ? <TextField label="Contact in Canada" {...register('canadaContact')} error={errors.canadaContact?.message} /> : null}
              </fieldset>
            ))}
          </div>
        </Panel>
      </fieldset>
    </form>
  );
}
