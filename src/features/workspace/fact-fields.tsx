import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import { SelectField, TextField } from '#src/ui/field.tsx';

type Facts = ProductDraft['facts'];

/** Facts that conditions of the law turn on, in the words of the bench. */
const WORDS: Readonly<Record<string, { label: string; kind: 'figure' | 'yes-no' | 'form'; hint?: string }>> = {
  pH: { label: 'pH', kind: 'figure' },
  physicalForm: { label: 'Physical form', kind: 'form' },
  releasedFormaldehyde: { label: 'Formaldehyde released, measured', kind: 'figure', hint: 'in percent' },
  fromAge: { label: 'For use from the age of', kind: 'figure', hint: 'in years' },
  particleSizeNm: { label: 'Particle size', kind: 'figure', hint: 'in nanometres' },
  inhalable: { label: 'Can be breathed in when used', kind: 'yes-no' },
  antiperspirant: { label: 'Antiperspirant', kind: 'yes-no' },
};
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

/** Words for a fact's key that no one has named yet: `bodyPart` as `body part`. */
export function sayFact(key: string): string {
  return WORDS[key]?.label ?? key.replace(/([a-z])([A-Z])/g, '$1 $2').toLowerCase();
}

/** Answers that verdicts wait for; those that are asked for now stand first. */
export function FactFields({ facts, known, asked, isReadOnly, onFacts, onSettle }: FactFieldsProps) {
  const keys = [...new Set([...asked, ...Object.keys(facts), 'pH', 'physicalForm'])];
  const set = (key: string, value: string | boolean | undefined) => {
    const { [key]: _, ...rest } = facts;
    onFacts(value === undefined || value === '' ? rest : { ...rest, [key]: value }, `fact:${key}`);
  };
  return (
    <>
      {keys.map((key) => {
        const { label, kind, hint } = WORDS[key] ?? { label: sayFact(key), kind: typeof facts[key] === 'boolean' ? ('yes-no' as const) : ('figure' as const), hint: undefined };
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
