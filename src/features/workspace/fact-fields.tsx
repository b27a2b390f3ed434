import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import { SelectField, TextField } from '#src/ui/field.tsx';
import { isProductFact, LABEL_FACTS, sayFact, wordsOf, type FactWords } from './fact-words.ts';

type Facts = ProductDraft['facts'];

const FORMS = ['liquid', 'cream', 'powder', 'solid', 'gas'];
const PLACES: readonly (readonly [string, string])[] = [['EU', 'the European Union'], ['UK', 'the United Kingdom'], ['US', 'the United States'], ['CA', 'Canada'], ['elsewhere', 'elsewhere']];

export interface FactFieldsProps {
  readonly facts: Facts;
  /** What follows from the kind of product. */
  readonly known: Facts;
  readonly asked: readonly string[];
  readonly isReadOnly: boolean;
  readonly onFacts: (facts: Facts, join?: string) => void;
  readonly onSettle: () => void;
}

/** Answers that verdicts wait for; those that are asked for now stand first, those that the label may turn on are kept folded. */
export function FactFields(props: FactFieldsProps) {
  const { facts, asked } = props;
  const keys = [...new Set([...asked.filter(isProductFact), ...Object.keys(facts), 'pH', 'physicalForm'])];
  const more = Object.keys(LABEL_FACTS).filter((key) => !keys.includes(key));
  return (
    <>
      {keys.map((key) => <FactField key={key} name={key} {...props} />)}
      {more.length > 0 ? (
        <details className="more-facts">
          <summary>More that the label may turn on</summary>
          {more.map((key) => <FactField key={key} name={key} {...props} />)}
        </details>
      ) : null}
    </>
  );
}

function FactField({ name, facts, known, asked, isReadOnly, onFacts, onSettle }: FactFieldsProps & { readonly name: string }) {
  const value = facts[name];
  const words: FactWords = wordsOf(name) ?? { label: sayFact(name), kind: typeof value === 'boolean' ? 'yes-no' : 'figure' };
  const { label, kind, hint } = words;
  const set = (next: string | boolean | undefined) => {
    const { [name]: _, ...rest } = facts;
    onFacts(next === undefined || next === '' ? rest : { ...rest, [name]: next }, `fact:${name}`);
  };
  const standing = known[name];
  const wanted = asked.includes(name) && value === undefined ? 'A verdict waits for this answer.' : hint;
  if (kind === 'figure' || kind === 'text') return <TextField label={label} hint={wanted} readOnly={isReadOnly} maxLength={200} value={typeof value === 'string' ? value : ''} onChange={(event) => set(kind === 'figure' ? event.target.value.replace(',', '.') : event.target.value)} onBlur={onSettle} />;
  const isText = kind === 'form' || kind === 'place';
  return (
    <SelectField label={label} hint={wanted} disabled={isReadOnly} value={value === undefined ? '' : String(value)} onChange={(event) => set(isText ? event.target.value : event.target.value === '' ? undefined : event.target.value === 'true')}>
      <option value="">{standing === undefined ? 'not answered' : `${standing === true ? 'yes' : standing === false ? 'no' : standing} (from the kind of product)`}</option>
      {choicesOf(kind).map(([key, said]) => <option key={key} value={key}>{said}</option>)}
    </SelectField>
  );
}

function choicesOf(kind: FactWords['kind']): readonly (readonly [string, string])[] {
  if (kind === 'place') return PLACES;
  return kind === 'form' ? FORMS.map((form) => [form, form] as const) : [['true', 'yes'], ['false', 'no']];
}
