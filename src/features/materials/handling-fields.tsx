import { useState } from 'react';
import { useController, useFormContext } from 'react-hook-form';
import { SelectField, TextField } from '#src/ui/field.tsx';
import type { MaterialForm } from './material-form.ts';
import { keepTemperature, showTemperature } from './temperature.ts';
import type { TemperatureUnit } from './temperature.ts';

/** What the material does not bear, and on whose word: process steps are judged on it. */
export function HandlingFields({ unit: houseUnit }: { unit: TemperatureUnit }) {
  const { register, control, formState: { errors } } = useFormContext<MaterialForm>();
  const [unit, setUnit] = useState(houseUnit);
  const { field: { ref, value, onChange, onBlur } } = useController({ control, name: 'handling.heatLimitC' });
  // What is being typed in °F stands as typed; only °C is kept.
  const [typed, setTyped] = useState<string | null>(null);
  const shown = typed ?? showTemperature(value, unit);
  return (
    <div className="handling">
      <div className="flex items-start gap-2">
        <TextField
          className="grow"
          figure
          label="Not above"
          ref={ref}
          value={shown}
          onChange={(event) => {
            setTyped(event.target.value);
            onChange(keepTemperature(event.target.value, unit));
          }}
          onBlur={() => { setTyped(null); onBlur(); }}
          error={errors.handling?.heatLimitC?.message}
        />
        <div className="switch mt-5" role="group" aria-label="Unit of temperature">
          {(['C', 'F'] as const).map((one) => <button key={one} type="button" aria-pressed={unit === one} onClick={() => { setTyped(null); setUnit(one); }}>°{one}</button>)}
        </div>
      </div>
      <div className="grid grid-cols-2 gap-2">
        <TextField figure label="pH from" {...register('handling.phFrom')} error={errors.handling?.phFrom?.message} />
        <TextField figure label="pH to" {...register('handling.phTo')} error={errors.handling?.phTo?.message} />
      </div>
      <TextField figure label="Hours to hydrate" {...register('handling.hydrateHours')} error={errors.handling?.hydrateHours?.message} />
      <SelectField label="On whose word" {...register('handling.basis')} hint="Common practice is not a supplier’s figure; it is marked as such.">
        <option value="">not said</option>
        <option value="supplier">the supplier’s sheet</option>
        <option value="common-practice">common practice</option>
      </SelectField>
      <TextField className="wide" label="What else to mind" {...register('handling.note')} error={errors.handling?.note?.message} />
    </div>
  );
}
