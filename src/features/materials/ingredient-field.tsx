import { memo, useMemo } from 'react';
import { useQuery } from '@tanstack/react-query';
import { useController, useFormContext } from 'react-hook-form';
import type { DictionaryEntry } from '#shared/dictionary/types.ts';
import { Combobox } from '#src/ui/combobox.tsx';
import type { ComboboxOption } from '#src/ui/combobox.tsx';
import { Lit } from '#src/ui/lit.tsx';
import { beginningsQuery } from '#src/features/reading/queries.ts';
import { ingredientQueries } from './queries.ts';

export type Entry = DictionaryEntry;

/** As many as are read at a glance: a longer list is drawn later and read by nobody. */
const SHOWN = 6;

export interface IngredientFieldProps {
  /** The field's path in the form: `composition.0.inci`. */
  readonly name: string;
  readonly label: string;
  /** Called with the dictionary's entry when one is chosen. */
  readonly onChoose: (entry: Entry) => void;
  readonly placeholder?: string;
}

/**
 * A name found as it is typed. What begins so is shown in the same moment, from the names in the
 * browser's memory; the server's search, asked at every keystroke, then adds what is misspelt.
 * Until the names are there the list keeps what it shows as long as the word is only typed on:
 * Enter must never take what another word had found.
 */
export const IngredientField = memo(function IngredientField({ name, label, onChoose, placeholder }: IngredientFieldProps) {
  const { control } = useFormContext();
  const { field, fieldState } = useController({ control, name });
  const typed = String(field.value ?? '');
  const asked = fieldState.isDirty || fieldState.isTouched ? typed.trim() : '';
  const { data: names } = useQuery(beginningsQuery);
  const begun = useMemo(() => (asked === '' ? [] : (names?.begin(asked, SHOWN) ?? [])), [asked, names]);
  const { data, isFetching, isPlaceholderData } = useQuery({ ...ingredientQueries.search(asked), placeholderData: (before, query) => (isTypedOn(query?.queryKey[2], asked) ? before : undefined) });
  const found = isPlaceholderData ? undefined : data?.items;
  const items = useMemo(() => (asked === '' ? [] : (found ?? (begun.length > 0 ? begun : (data?.items ?? [])))), [asked, found, begun, data]);
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
        const chosen = items.find((item) => item.entry.id === option.id);
        if (!chosen) return;
        field.onChange(chosen.entry.inci);
        onChoose(chosen.entry);
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
