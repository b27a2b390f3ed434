import { useCallback, useMemo, useState } from 'react';
import { useFieldArray, useFormContext, useWatch } from 'react-hook-form';
import { decimal, toDecimal, add, divide, rational } from '#shared/kernel/rational.ts';
import { Button, IconButton } from '#src/ui/button.tsx';
import { Tag } from '#src/ui/tag.tsx';
import { IngredientField } from './ingredient-field.tsx';
import type { Entry } from './ingredient-field.tsx';
import { readShare } from './judge-composition.ts';
import { emptyConstituent } from './material-form.ts';
import type { ConstituentFields, MaterialForm } from './material-form.ts';
import { OilDialog } from './oil-dialog.tsx';
import { asNumber, constituentScale } from './scale.ts';
import { ShareInputs } from './share-inputs.tsx';
import { Axis, RangeBar } from './stair.tsx';
import { useKnownNumbers } from './use-known-names.ts';
import { walkRows } from './walk-rows.ts';

interface Drawn {
  readonly least: number;
  readonly middle: number;
  readonly most: number;
  readonly midpoint: string;
}

/** Substances inside an oil's or a perfume's mass: what allergen rules are judged on. */
export function ConstituentTable() {
  const { control } = useFormContext<MaterialForm>();
  const { fields, append, remove, replace } = useFieldArray({ control, name: 'constituents' });
  const written = useWatch<MaterialForm, 'constituents'>({ name: 'constituents' });
  const numbers = useKnownNumbers(useMemo(() => written.map((line) => line.name), [written]));
  const [prefilling, setPrefilling] = useState(false);
  const drawn = useMemo(() => written.map(draw), [written]);
  const scale = constituentScale(Math.max(0, ...drawn.map((one) => one?.most ?? 0)));
  const addRow = () => append({ ...emptyConstituent }, { focusName: `constituents.${fields.length}.name` });
  const fill = (lines: ConstituentFields[]) => {
    const kept = written.filter((line) => line.name.trim() !== '' && !lines.some((one) => one.name.toLowerCase() === line.name.toLowerCase()));
    replace([...kept, ...lines]);
    setPrefilling(false);
  };
  return (
    <>
      {fields.length > 0 ? (
        // Enter walks the column: the keys belong to the figures inside.
        // eslint-disable-next-line jsx-a11y/no-noninteractive-element-interactions
        <table className="table cmp" aria-label="Constituents" onKeyDown={(event) => walkRows(event, addRow)}>
          <colgroup><col className="name" /><col className="cas" /><col className="n" /><col className="n" /><col className="n" /><col /><col className="tools" /></colgroup>
          <thead>
            <tr>
              <th scope="col">Constituent, inside the material’s mass</th><th scope="col" className="cas">CAS</th>
              <th scope="col" className="n">% or least</th><th scope="col" className="n">most %</th><th scope="col" className="n">midpoint</th>
              <th className="axis-cell"><span className="sr-only">Range, drawn</span><Axis end={scale.end} step={scale.step} /></th>
              <th><span className="sr-only">Row</span></th>
            </tr>
          </thead>
          <tbody>
            {fields.map((field, index) => (
              <ConstituentRow key={field.id} index={index} fields={written[index] ?? emptyConstituent} drawn={drawn[index] ?? null} end={scale.end} knownCas={numbers.get(written[index]?.name.trim() ?? '')} onRemove={remove} />
            ))}
          </tbody>
        </table>
      ) : null}
      <div className="under-table">
        <Button small icon="plus" onClick={addRow}>Add a constituent</Button>
        <Button small icon="sheet" onClick={() => setPrefilling(true)}>Fill in from published ranges</Button>
      </div>
      <p className="quiet mt-2 max-w-[64ch]">Constituents are part of the material: an oil’s limonene, a perfume’s linalool, as its allergen sheet gives them. They are never ingredients of their own and need not sum to 100.</p>
      {prefilling ? <OilDialog onFill={fill} onClose={() => setPrefilling(false)} /> : null}
    </>
  );
}

function draw(fields: ConstituentFields): Drawn | null {
  const share = readShare(fields);
  if (!share) return null;
  const least = decimal(share.percent ?? share.min ?? '0');
  const most = decimal(share.percent ?? share.max ?? '0');
  const middle = share.typical === undefined ? divide(add(least, most), rational(2n)) : decimal(share.typical);
  return { least: asNumber(least), middle: asNumber(middle), most: asNumber(most), midpoint: toDecimal(middle, 4) };
}

interface RowProps {
  readonly index: number;
  readonly fields: ConstituentFields;
  readonly drawn: Drawn | null;
  readonly end: number;
  /** The dictionary's number, where none is written. */
  readonly knownCas: string | undefined;
  readonly onRemove: (index: number) => void;
}
function ConstituentRow({ index, fields, drawn, end, knownCas, onRemove }: RowProps) {
  const { setValue, setFocus } = useFormContext<MaterialForm>();
  const at = `constituents.${index}` as const;
  const chosen = useCallback((entry: Entry) => {
    setValue(`${at}.cas`, entry.cas[0] ?? '', { shouldDirty: true });
    setFocus(`${at}.least`, { shouldSelect: true });
  }, [at, setValue, setFocus]);
  return (
    <tr>
      <td className="nm">
        <IngredientField name={`${at}.name`} label={`Constituent ${index + 1}`} onChoose={chosen} />
        {fields.basis === 'published' ? <span className="mt-1 flex"><Tag>published range, not your lot</Tag></span> : null}
      </td>
      <td className="cas">{fields.cas || knownCas}</td>
      <ShareInputs at={at} name={`constituent ${index + 1}`} derived={drawn?.midpoint ?? ''} row={index} />
      <td className="bar">{drawn ? <RangeBar {...drawn} end={end} /> : null}</td>
      <td className="tools"><span className="flex justify-end"><IconButton icon="close" word={`Take out constituent ${index + 1}`} onClick={() => onRemove(index)} /></span></td>
    </tr>
  );
}
