import { useFormContext, useWatch } from 'react-hook-form';
import { AreaField, SelectField, TextField } from '#src/ui/field.tsx';
import type { MaterialForm } from './material-form.ts';

/** Name, supplier, price, and how the material stands on a label. */
export function BuyingFields() {
  const { register, formState: { errors } } = useFormContext<MaterialForm>();
  const declareAs = useWatch<MaterialForm, 'declareAs'>({ name: 'declareAs' });
  return (
    <div className="buying">
      <TextField className="wide" label="Name, as you call it" {...register('tradeName')} error={errors.tradeName?.message} />
      <TextField className="wide" label="Supplier" {...register('supplier')} error={errors.supplier?.message} />
      <SelectField className="wide" label="Declared" {...register('declareAs')} hint={declareAs === 'ingredients' ? undefined : `The whole material is one entry, ${declareAs === 'parfum' ? 'Parfum' : 'Aroma'}; its allergens are still named.`}>
        <option value="ingredients">by its ingredients</option>
        <option value="parfum">as perfume</option>
        <option value="aroma">as flavour</option>
      </SelectField>
      <TextField figure label="Price per kg" {...register('pricePerKg')} error={errors.pricePerKg?.message} />
      <TextField label="Currency" maxLength={3} {...register('currency')} error={errors.currency?.message && 'Use three letters, such as EUR.'} />
    </div>
  );
}

/** Notes that stay in the house: never printed. */
export function NotesField() {
  const { register, formState: { errors } } = useFormContext<MaterialForm>();
  return <AreaField label="Notes, for the house only" rows={3} {...register('notes')} error={errors.notes?.message} />;
}
