import { useFormContext, useWatch } from 'react-hook-form';
import { useLocation } from 'react-router-dom';
import { MATERIAL_FACTS } from '#shared/law/material-facts.ts';
import { SelectField, TextField } from '#src/ui/field.tsx';
import type { MaterialForm } from './material-form.ts';

/** Where a verdict's question leads: the field of one answer. */
export const factAnchor = (key: string): string => `fact-${key}`;

/** What the material's certificates say: asked for what it holds, or for what a verdict waits for. */
export function CertificateFields() {
  const { register, formState: { errors } } = useFormContext<MaterialForm>();
  const parts = useWatch<MaterialForm, 'composition'>({ name: 'composition' });
  const constituents = useWatch<MaterialForm, 'constituents'>({ name: 'constituents' });
  const facts = useWatch<MaterialForm, 'facts'>({ name: 'facts' });
  const { hash } = useLocation();
  const names = [...(parts ?? []).map(({ inci }) => inci), ...(constituents ?? []).map(({ name }) => name)];
  const isShown = (key: string): boolean => {
    const { about } = MATERIAL_FACTS[key]!;
    return about === undefined || (facts?.[key] ?? '') !== '' || hash === `#${factAnchor(key)}` || names.some((name) => about.test(name));
  };
  return (
    <>
      <p className="quiet">Kept with the material: every product that uses it is answered at once.</p>
      <div className="certificates">
        {Object.keys(MATERIAL_FACTS).filter(isShown).map((key) => {
          const { label, kind, hint } = MATERIAL_FACTS[key]!;
          const common = { label, hint, autoFocus: hash === `#${factAnchor(key)}`, error: errors.facts?.[key]?.message, ...register(`facts.${key}`) };
          return (
            <div key={key} id={factAnchor(key)}>
              {kind === 'figure' ? <TextField figure {...common} /> : (
                <SelectField {...common}>
                  <option value="">not answered</option>
                  <option value="true">yes</option>
                  <option value="false">no</option>
                </SelectField>
              )}
            </div>
          );
        })}
      </div>
    </>
  );
}
