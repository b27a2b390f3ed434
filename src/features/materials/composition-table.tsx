import { useMemo } from 'react';
import { useFieldArray, useFormContext, useWatch } from 'react-hook-form';
import { toDecimal } from '#shared/kernel/rational.ts';
import { Banner } from '#src/ui/banner.tsx';
import { Button } from '#src/ui/button.tsx';
import { FieldFault } from '#src/ui/field.tsx';
import { CompositionRow } from './composition-row.tsx';
import { judgeComposition } from './judge-composition.ts';
import type { Judgement } from './judge-composition.ts';
import { emptyPart } from './material-form.ts';
import type { MaterialForm } from './material-form.ts';
import { scaleEnd } from './scale.ts';
import { Axis, Hatches, Together } from './stair.tsx';
import { useKnownNames, useKnownNumbers } from './use-known-names.ts';
import { walkRows } from './walk-rows.ts';

/** What the material is made of: a staircase that has to land on 100. */
export function CompositionTable({ onPaste }: { onPaste: () => void }) {
  const { control, formState } = useFormContext<MaterialForm>();
  const { fields, append, remove } = useFieldArray({ control, name: 'composition' });
  const written = useWatch<MaterialForm, 'composition'>({ name: 'composition' });
  const declareAs = useWatch<MaterialForm, 'declareAs'>({ name: 'declareAs' });
  const judgement = useMemo(() => judgeComposition(written, declareAs), [written, declareAs]);
  const names = useMemo(() => written.map((part) => part.inci), [written]);
  const said = useKnownNames(names);
  const numbers = useKnownNumbers(names);
  const end = scaleEnd(judgement.most);
  const addRow = () => append({ ...emptyPart }, { focusName: `composition.${fields.length}.inci` });
  const fault = (formState.errors.root as Record<string, { message?: string }> | undefined)?.composition?.message;
  return (
    <>
      <Hatches />
      {/* Enter walks the column: the keys belong to the figures inside. */}
      {/* eslint-disable-next-line jsx-a11y/no-noninteractive-element-interactions */}
      <table className="table cmp" aria-label="Composition" onKeyDown={(event) => walkRows(event, addRow)}>
        <colgroup><col className="name" /><col className="cas" /><col className="n" /><col className="n" /><col className="n" /><col /><col className="tools" /></colgroup>
        <thead>
          <tr>
            <th scope="col">Ingredient</th><th scope="col" className="cas">CAS</th>
            <th scope="col" className="n">% or least</th><th scope="col" className="n">most %</th><th scope="col" className="n">typical</th>
            <th className="axis-cell"><span className="sr-only">Share, drawn</span><Axis end={end} step={20} /></th>
            <th><span className="sr-only">Row</span></th>
          </tr>
        </thead>
        <tbody>
          {fields.map((field, index) => (
            <CompositionRow key={field.id} index={index} part={judgement.parts[index]} end={end} isLast={index === fields.length - 1} said={said.get(names[index]?.trim() ?? '')} knownCas={numbers.get(names[index]?.trim() ?? '')} onRemove={remove} />
          ))}
        </tbody>
        <Sum judgement={judgement} end={end} />
      </table>
      <div className="under-table">
        <Button small icon="plus" onClick={addRow}>Add an ingredient</Button>
        <Button small icon="sheet" onClick={onPaste}>Paste a composition</Button>
      </div>
      {fault ? <p className="mt-2"><FieldFault>{fault}</FieldFault></p> : null}
      <SumWords judgement={judgement} />
    </>
  );
}

function Sum({ judgement, end }: { judgement: Judgement; end: number }) {
  return (
    <tfoot>
      <tr>
        <td className="nm">Together</td><td className="cas" />
        <td className="n sum" data-l="least %">{toDecimal(judgement.least, 4)}</td>
        <td className="n sum" data-l="most %">{toDecimal(judgement.most, 4)}</td>
        <td className="n sum" data-l="typical">{toDecimal(judgement.typical, 4)}</td>
        <td className="bar"><Together judgement={judgement} end={end} /></td>
        <td className="tools" />
      </tr>
    </tfoot>
  );
}

function SumWords({ judgement }: { judgement: Judgement }) {
  if (judgement.weight) return <div className="mt-3 max-w-[75ch]"><Banner weight={judgement.weight} title={judgement.title}>{judgement.words}</Banner></div>;
  return <p className="quiet mt-2 max-w-[64ch]" role="status">{judgement.words}</p>;
}
