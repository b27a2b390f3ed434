import { useState } from 'react';
import { createMaterial, type Material } from '#shared/contracts/materials.contract.ts';
import { searchDictionary } from '#shared/contracts/dictionary.contract.ts';
import { useQuery } from '@tanstack/react-query';
import { call } from '#src/lib/api/call.ts';
import { sayError } from '#src/lib/api/error.ts';
import { Button } from '#src/ui/button.tsx';
import { Combobox } from '#src/ui/combobox.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { FieldFault, TextField } from '#src/ui/field.tsx';
import { focusFirst } from './focus-first.ts';

/** A material made on the way: its name, and the one ingredient it is, if it is one. The rest waits in Materials. */
export function NewMaterialDialog({ name, onClose, onMade }: { name: string; onClose: () => void; onMade: (material: Material) => void }) {
  const [tradeName, setTradeName] = useState(name);
  const [inci, setInci] = useState('');
  const [fault, setFault] = useState('');
  const [isBusy, setBusy] = useState(false);
  const { data } = useQuery({
    queryKey: ['dictionary', 'search', inci.trim()],
    queryFn: ({ signal }) => call(searchDictionary, { query: { q: inci.trim(), limit: 8 } }, signal),
    enabled: inci.trim() !== '',
    placeholderData: (before) => before,
  });
  const make = async () => {
    if (tradeName.trim() === '') return setFault('Give it a name.');
    setBusy(true);
    try {
      const composition = inci.trim() === '' ? [] : [{ inci: inci.trim(), percent: '100' }];
      onMade(await call(createMaterial, { body: { tradeName, supplier: '', declareAs: 'ingredients', composition, constituents: [], pricePerKg: null, currency: 'EUR', notes: '', handling: {} } }));
    } catch (error) {
      setFault(sayError(error));
      setBusy(false);
    }
  };
  return (
    <Dialog
      title="New material"
      isOpen
      onClose={onClose}
      foot={
        <>
          <Button onClick={onClose}>Back</Button>
          <Button weight="act" busy={isBusy} onClick={() => void make()}>Add to the formula</Button>
        </>
      }
    >
      <div className="grid gap-3">
        <TextField label="Trade name" value={tradeName} onChange={(event) => setTradeName(event.target.value)} ref={focusFirst} />
        <Combobox
          label="The one ingredient it is (leave empty for a blend)"
          value={inci}
          onType={setInci}
          options={(data?.items ?? []).map(({ entry }) => ({ id: entry.id, text: entry.inci, under: entry.functions.slice(0, 3).join(', ') }))}
          onChoose={(option) => setInci(option.text)}
        />
        <p className="hint">A blend, its ranges and the constituents of an oil are entered in Materials. Until then its part of the list is missing, and the verdicts say so.</p>
        {fault ? <FieldFault>{fault}</FieldFault> : null}
      </div>
    </Dialog>
  );
}
