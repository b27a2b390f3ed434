import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import { SelectField, TextField } from '#src/ui/field.tsx';
import { FACT_WORDS, isProductFact, sayFact } from './fact-words.ts';

type Facts = ProductDraft['facts'];

const FORMS = ['liquid', 'cream', 'powder', 'solid', 'gas'];

export interface FactFieldsProps {
  readonly facts: Facts;
  /** What follows from the kind of product. */
  readonly known: Facts;
  readonly asked: readonly string[];
  readonly isReadOnly: boolean;
  readonly onFacts: (facts: Facts, join?: string) => void;
  readonly onSettle: () => void;
}

/** Answers that verdicts wait for; those that are asked for now stand first. */
export function FactFields({ facts, known, asked, isReadOnly, onFacts, onSettle }: FactFieldsProps) {
  const keys = [...new Set([...asked.filter(isProductFact), ...Object.keys(facts), 'pH', 'physicalForm'])];
  const set = (key: string, value: string | boolean | undefined) => {
    const { [key]: _, ...rest } = facts;
    onFacts(value === undefined || value === '' ? rest : { ...rest, [key]: value }, `fact:${key}`);
  };
  return (
    <>
      {keys.map((key) => {
        const { label, kind, hint } = FACT_WORDS[key] ?? { label: sayFact(key), kind: typeof facts[key] === 'boolean' ? ('yes-no' as const) : ('figure' as const), hint: undefined };
        const value = facts[key];
        const standing = known[key];
        const wanted = asked.includes(key) && value === undefined ? 'A verdict waits for this answer.' : hint;
        if (kind === 'figure') return <TextField key={key} label={label} hint={wanted} readOnly={isReadOnly} maxLength={200} value={typeof value === 'string' ? value : ''} onChange={(event) => set(key, event.target.value.replace(',', '.'))} onBlur={onSettle} />;
        return (
          <SelectField key={key} label={label} hint={wanted} disabled={isReadOnly} value={value === undefined ? '' : String(value)} onChange={(event) => set(key, kind === 'form' ? event.target.value : event.target.value === '' ? undefined : event.target.value === 'true')}>
            <option value="">{standing === undefined ? 'not answered' : `${standing === true ? 'yes' : standing === false ? 'no' : standing} (from the kind of product)`}</option>
            {kind === 'form' ? FORMS.map((form) => <option key={form} value={form}>{form}</option>) : [<option key="yes" value="true">yes</option>, <option key="no" value="false">no</option>]}
          </SelectField>
        );
      })}
    </>
  );
}
