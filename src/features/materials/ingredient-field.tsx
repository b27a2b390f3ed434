import { memo, useMemo } from 'react';
import { useQuery } from '@tanstack/react-query';
import { useController, useFormContext } from 'react-hook-form';
import type { z } from 'zod';
import type { dictionaryEntry } from '#shared/contracts/dictionary.contract.ts';
import { Combobox } from '#src/ui/combobox.tsx';
import type { ComboboxOption } from '#src/ui/combobox.tsx';
import { Lit } from '#src/ui/lit.tsx';
import { ingredientQueries } from './queries.ts';

export type Entry = z.infer<typeof dictionaryEntry>;

export interface IngredientFieldProps {
  /** The field's path in the form: `composition.0.inci`. */
  readonly name: string;
  readonly label: string;
  /** Called with the dictionary's entry when one is chosen. */
  readonly onChoose: (entry: Entry) => void;
  readonly placeholder?: string;
}

/**
 * A name found as it is typed. Each keystroke asks at once and drops the question before it:
 * waiting would be felt. The list keeps what it shows until the next answer is there, as long as the
 * word is only typed on: Enter must never take what another word had found.
 */
export const IngredientField = memo(function IngredientField({ name, label, onChoose, placeholder }: IngredientFieldProps) {
  const { control } = useFormContext();
  const { field, fieldState } = useController({ control, name });
  const typed = String(field.value ?? '');
  const asked = fieldState.isDirty || fieldState.isTouched ? typed.trim() : '';
  const { data, isFetching } = useQuery({ ...ingredientQueries.search(asked), placeholderData: (before, query) => (isTypedOn(query?.queryKey[2], asked) ? before : undefined) });
  const items = useMemo(() => (asked === '' ? [] : (data?.items ?? [])), [asked, data]);
  const options = useMemo(() => items.map((item) => optionOf(item.entry, item.by === 'inci' ? '' : item.matched, asked)), [items, asked]);
  return (
    <Combobox
      label={label}
      bare
      value={typed}
      onType={field.onChange}
      onBlur={field.onBlur}
      inputRef={field.ref}
      options={options}
      placeholder={placeholder}
      error={fieldState.error?.message}
      none={isFetching ? undefined : 'Not in the dictionary. The name may stand as you write it; it is then marked as unknown.'}
      onChoose={(option) => {
        const found = items.find((item) => item.entry.id === option.id);
        if (!found) return;
        field.onChange(found.entry.inci);
        onChoose(found.entry);
      }}
    />
  );
});

function isTypedOn(before: string | undefined, asked: string): boolean {
  return before !== undefined && before !== '' && asked.startsWith(before);
}

function optionOf(entry: Entry, matched: string, typed: string): ComboboxOption {
  return {
    id: entry.id,
    text: entry.inci,
    shown: <Lit text={entry.inci} typed={typed} />,
    side: entry.cas[0],
    under: matched ? <Lit text={matched} typed={typed} /> : entry.functions.slice(0, 2).join(', '),
  };
}
