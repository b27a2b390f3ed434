import { useMemo, useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { sayError } from '#src/lib/api/error.ts';
import { Banner } from '#src/ui/banner.tsx';
import { Button } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { SelectField } from '#src/ui/field.tsx';
import type { ConstituentFields } from './material-form.ts';
import { ingredientQueries } from './queries.ts';

/** Published ranges of an essential oil's constituents, to start from until the lot's own figures are there. */
export function OilDialog({ onFill, onClose }: { onFill: (lines: ConstituentFields[]) => void; onClose: () => void }) {
  const { data, error } = useQuery(ingredientQueries.oils());
  const [id, setId] = useState('');
  const oils = useMemo(() => [...(data?.items ?? [])].sort((a, b) => a.oil.localeCompare(b.oil)), [data]);
  const oil = oils.find((one) => one.id === id);
  const lines = oil?.constituents.map((one): ConstituentFields => ({ name: one.name, cas: one.cas ?? '', least: one.min, most: one.min === one.max ? '' : one.max, typical: '', basis: 'published' }));
  return (
    <Dialog
      title="Fill in from published ranges"
      size="wide"
      isOpen
      onClose={onClose}
      foot={<><Button onClick={onClose}>Not now</Button><Button weight="act" disabled={!lines} onClick={() => lines && onFill(lines)}>Fill in {lines ? `${lines.length} lines` : ''}</Button></>}
    >
      <p className="quiet max-w-[64ch]">Ranges as published for the oil as such. Your lot may differ: they are marked as published until your supplier’s sheet replaces them.</p>
      {error ? <div className="mt-3"><Banner weight="stop" title="The ranges could not be read.">{sayError(error)}</Banner></div> : null}
      <div className="mt-4 max-w-[360px]">
        <SelectField label="Oil" value={id} onChange={(event) => setId(event.target.value)}>
          <option value="">{data ? 'Choose an oil' : 'One moment'}</option>
          {oils.map((one) => <option key={one.id} value={one.id}>{one.oil}</option>)}
        </SelectField>
      </div>
      {oil ? (
        <div className="mt-4 max-h-[40vh] overflow-auto">
          <table className="table">
            <thead><tr><th scope="col">Constituent</th><th scope="col">CAS</th><th scope="col" className="num">least %</th><th scope="col" className="num">most %</th><th scope="col">read from</th></tr></thead>
            <tbody>
              {oil.constituents.map((one) => (
                <tr key={one.name}><td>{one.name}</td><td className="quiet">{one.cas}</td><td className="num">{one.min}</td><td className="num">{one.max}</td><td className="quiet">{one.sourcing}</td></tr>
              ))}
            </tbody>
          </table>
          <p className="hint mt-2">{oil.inci}. {oil.standard}</p>
        </div>
      ) : null}
    </Dialog>
  );
}
