import { memo, useCallback, useId, useState } from 'react';
import { useFormContext, useWatch } from 'react-hook-form';
import { toDecimal } from '#shared/kernel/rational.ts';
import { IconButton, TextButton } from '#src/ui/button.tsx';
import { CheckField, SelectField, TextField } from '#src/ui/field.tsx';
import { Tag } from '#src/ui/tag.tsx';
import { VerdictMark } from '#src/ui/verdict-mark.tsx';
import { IngredientField } from './ingredient-field.tsx';
import type { Entry } from './ingredient-field.tsx';
import type { JudgedPart } from './judge-composition.ts';
import type { MaterialForm } from './material-form.ts';
import { ShareInputs } from './share-inputs.tsx';
import { Step } from './stair.tsx';
import type { NameSaid } from './use-known-names.ts';

export interface CompositionRowProps {
  readonly index: number;
  readonly part: JudgedPart | undefined;
  readonly end: number;
  readonly isLast: boolean;
  readonly said: NameSaid | undefined;
  /** The dictionary's number, where none is written. */
  readonly knownCas: string | undefined;
  readonly onRemove: (index: number) => void;
}

/** One ingredient of the material: name, share or range, and its step of the staircase. */
export function CompositionRow({ index, part, end, isLast, said, knownCas, onRemove }: CompositionRowProps) {
  const detailsId = useId();
  const [open, setOpen] = useState(false);
  const { setValue, setFocus } = useFormContext<MaterialForm>();
  const at = `composition.${index}` as const;
  const chosen = useCallback((entry: Entry) => {
    setValue(`${at}.cas`, entry.cas[0] ?? '', { shouldDirty: true });
    setFocus(`${at}.least`, { shouldSelect: true });
  }, [at, setValue, setFocus]);
  const take = useCallback((name: string) => setValue(`${at}.inci`, name, { shouldDirty: true, shouldValidate: true }), [at, setValue]);
  return (
    <>
      <tr>
        <td className="nm">
          <IngredientField name={`${at}.inci`} label={`Ingredient ${index + 1}`} onChoose={chosen} placeholder={index === 0 ? 'INCI, common name or CAS' : undefined} />
          <PartTags index={index} />
        </td>
        <td className="cas"><CasText index={index} known={knownCas} /></td>
        <ShareInputs at={at} name={`ingredient ${index + 1}`} derived={part?.isFilled ? toDecimal(part.typical, 4) : ''} row={index} />
        <td className="bar">{part ? <Step part={part} end={end} isFirst={index === 0} isLast={isLast} /> : null}</td>
        <td className="tools">
          <span className="flex justify-end">
            <IconButton icon={open ? 'up' : 'down'} word="More about this ingredient" aria-expanded={open} aria-controls={detailsId} onClick={() => setOpen(!open)} />
            <IconButton icon="close" word={`Take out ingredient ${index + 1}`} onClick={() => onRemove(index)} />
          </span>
        </td>
      </tr>
      {said ? <tr className="said"><td colSpan={7}><NameNote said={said} onTake={take} /></td></tr> : null}
      {open ? <tr className="details" id={detailsId}><td colSpan={7}><PartDetails index={index} /></td></tr> : null}
    </>
  );
}

const NameNote = memo(function NameNote({ said, onTake }: { said: NameSaid; onTake: (name: string) => void }) {
  const isUnknown = said.kind === 'unknown';
  return (
    <p className="name-note">
      <VerdictMark weight={isUnknown ? 'decide' : 'note'} />
      <span>{isUnknown ? (said.take.length > 0 ? 'Not a known INCI name. Perhaps' : 'Not a known INCI name. It may stand, and is marked as unknown.') : 'In the dictionary it is printed as'}</span>
      {said.take.map((name) => <TextButton key={name} mini onClick={() => onTake(name)}>{name}</TextButton>)}
    </p>
  );
});

function CasText({ index, known }: { index: number; known: string | undefined }) {
  const cas = useWatch<MaterialForm, `composition.${number}.cas`>({ name: `composition.${index}.cas` });
  return <>{cas || known}</>;
}

const PURPOSES = [['preservative', 'preservative'], ['fragrance', 'fragrance'], ['colourant', 'colourant'], ['uv-filter', 'UV filter'], ['other', 'other']] as const;

function PartTags({ index }: { index: number }) {
  const [isNano, isIncidental, purpose] = useWatch<MaterialForm, [`composition.${number}.isNano`, `composition.${number}.isIncidental`, `composition.${number}.purpose`]>({
    name: [`composition.${index}.isNano`, `composition.${index}.isIncidental`, `composition.${index}.purpose`],
  });
  if (!isNano && !isIncidental && !purpose) return null;
  return (
    <span className="mt-1 flex flex-wrap gap-1">
      {isNano ? <Tag>nano</Tag> : null}
      {isIncidental ? <Tag>incidental, never listed</Tag> : null}
      {purpose ? <Tag>{PURPOSES.find(([key]) => key === purpose)?.[1]}</Tag> : null}
    </span>
  );
}

function PartDetails({ index }: { index: number }) {
  const { register, formState } = useFormContext<MaterialForm>();
  const at = `composition.${index}` as const;
  const errors = formState.errors.composition?.[index];
  return (
    <div className="part-details">
      <TextField label="CAS number" {...register(`${at}.cas`)} error={errors?.cas?.message} />
      <SelectField label="What it is for" hint="Limits depend on it." {...register(`${at}.purpose`)}>
        <option value="">not said</option>
        {PURPOSES.map(([key, word]) => <option key={key} value={key}>{word}</option>)}
      </SelectField>
      <TextField label="US colour name" hint="Where one CI number has several." {...register(`${at}.usName`)} error={errors?.usName?.message} />
      <div>
        <CheckField label="Nanomaterial" {...register(`${at}.isNano`)} />
        <CheckField label="Incidental: an impurity or processing aid" {...register(`${at}.isIncidental`)} />
      </div>
    </div>
  );
}
