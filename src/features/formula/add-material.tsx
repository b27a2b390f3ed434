import { useDeferredValue, useState, type Ref } from 'react';
import { useQuery } from '@tanstack/react-query';
import { listMaterials, type MaterialSummary } from '#shared/contracts/materials.contract.ts';
import { call } from '#src/lib/api/call.ts';
import { Combobox, type ComboboxOption } from '#src/ui/combobox.tsx';
import { Lit } from '#src/ui/lit.tsx';

export interface AddMaterialProps {
  readonly onChoose: (materialId: string) => void;
  /** Asked to make a material of this name. */
  readonly onNew: (name: string) => void;
  /** Text with several columns or lines, pasted into the field. */
  readonly onPaste: (text: string) => void;
  readonly inputRef?: Ref<HTMLInputElement>;
}

const NEW = 'new-material';

function toOption(item: MaterialSummary, typed: string): ComboboxOption {
  const names = item.inci.slice(0, 4).join(', ');
  return { id: item.id, text: item.tradeName, shown: <Lit text={item.tradeName} typed={typed} />, under: names, side: item.supplier };
}

function isTypedOn(key: readonly unknown[] | undefined, find: string): boolean {
  const { find: before = '' } = (key?.[2] ?? {}) as { find?: string };
  return before !== '' && find.startsWith(before);
}

/** Finds one of the house's materials by trade name, INCI or CAS; Enter adds it as the next line. */
export function AddMaterial({ onChoose, onNew, onPaste, inputRef }: AddMaterialProps) {
  const [typed, setTyped] = useState('');
  const find = useDeferredValue(typed.trim());
  const { data } = useQuery({
    queryKey: ['materials', 'list', { find }],
    queryFn: ({ signal }) => call(listMaterials, { query: { find } }, signal),
    enabled: find !== '',
    // What an earlier word found may stand only while that word is being typed on: Enter must never take another's material.
    placeholderData: (before, query) => (isTypedOn(query?.queryKey, find) ? before : undefined),
  });
  const found = find === '' ? [] : (data?.items ?? []).slice(0, 8).map((item) => toOption(item, find));
  const options: ComboboxOption[] = find === '' ? [] : [...found, { id: NEW, text: find, shown: <>New material “{find}”</>, under: 'Add it here, complete its composition later' }];
  return (
    <div
      onPasteCapture={(event) => {
        const text = event.clipboardData.getData('text/plain');
        if (!/[\t\n]/.test(text.trim())) return;
        event.preventDefault();
        event.stopPropagation();
        onPaste(text);
      }}
    >
      <Combobox
        className="add-material"
        label="Add a material"
        bare
        inputRef={inputRef}
        placeholder="Add a material: name, INCI or CAS"
        value={typed}
        onType={setTyped}
        options={options}
        onChoose={(option) => {
          setTyped('');
          if (option.id === NEW) onNew(find);
          else onChoose(option.id);
        }}
      />
    </div>
  );
}
