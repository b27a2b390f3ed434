import { useEffect, useState } from 'react';
import { FormProvider } from 'react-hook-form';
import { Link } from 'react-router-dom';
import type { Material } from '#shared/contracts/materials.contract.ts';
import { paths } from '#src/app/paths.ts';
import { sayError } from '#src/lib/api/error.ts';
import { sayCount, sayWhen } from '#src/lib/say.ts';
import { Banner } from '#src/ui/banner.tsx';
import { Button } from '#src/ui/button.tsx';
import { ArchiveButton } from './archive-button.tsx';
import { BuyingFields, NotesField } from './buying-fields.tsx';
import { CertificateFields } from './certificate-fields.tsx';
import { CompositionTable } from './composition-table.tsx';
import { ConflictDialog } from './conflict-dialog.tsx';
import { ConstituentTable } from './constituent-table.tsx';
import { DocumentsPanel } from './documents-panel.tsx';
import { HandlingFields } from './handling-fields.tsx';
import { isBlankPart } from './material-form.ts';
import type { PartFields } from './material-form.ts';
import { PasteDialog } from './paste-dialog.tsx';
import type { TemperatureUnit } from './temperature.ts';
import { useMaterialForm } from './use-material-form.ts';
import './materials.css';

export interface MaterialEditorProps {
  readonly material: Material | null;
  readonly houseId: string;
  readonly unit: TemperatureUnit;
  readonly mayEdit: boolean;
  readonly tradeName?: string;
  readonly startsWithPaste?: boolean;
  readonly onSaved: (material: Material) => void;
}

/** One material: what it is made of, where it comes from, what it does not bear. */
export function MaterialEditor({ material, houseId, unit, mayEdit, tradeName = '', startsWithPaste = false, onSaved }: MaterialEditorProps) {
  const work = useMaterialForm({ material, houseId, tradeName, onSaved });
  const { form } = work;
  const [pasting, setPasting] = useState(startsWithPaste);
  const { save } = work;
  useEffect(() => {
    const listen = (event: KeyboardEvent) => {
      if ((event.ctrlKey || event.metaKey) && event.key.toLowerCase() === 's') {
        event.preventDefault();
        void save();
      }
    };
    addEventListener('keydown', listen);
    return () => removeEventListener('keydown', listen);
  }, [save]);
  const take = (parts: PartFields[], how: 'instead' | 'after') => {
    const before = form.getValues('composition').filter((part) => !isBlankPart(part));
    form.setValue('composition', how === 'after' ? [...before, ...parts] : parts, { shouldDirty: true });
    setPasting(false);
  };
  return (
    <FormProvider {...form}>
      <form className="material" noValidate aria-label={material?.tradeName ?? 'New material'} onSubmit={(event) => void save(event)}>
        <fieldset className="contents" disabled={!mayEdit}>
          <EditorHead material={material} work={work} mayEdit={mayEdit} />
          <div className="ed">
            <EditorNotices work={work} />
            <BuyingFields />
          </div>
          <section className="ed" aria-label="Composition"><h3 className="top">Composition</h3><CompositionTable onPaste={() => setPasting(true)} /></section>
          <section className="ed" aria-label="Constituents"><h3 className="top">Constituents</h3><ConstituentTable /></section>
          <section className="ed" aria-label="Handling"><h3 className="top">What it does not bear</h3><HandlingFields unit={unit} /></section>
          <section className="ed" aria-label="Certificates"><h3 className="top">What its certificates say</h3><CertificateFields /></section>
          <section className="ed" aria-label="Notes"><NotesField /></section>
        </fieldset>
      </form>
      <div className="ed lower">
        {material ? <><DocumentsPanel material={material} mayEdit={mayEdit} /><WhereUsed material={material} /></> : <p className="quiet">Documents can be added once the material is saved.</p>}
      </div>
      {pasting ? <PasteDialog hasParts={form.getValues('composition').some((part) => !isBlankPart(part))} onTake={take} onClose={() => setPasting(false)} /> : null}
      {work.conflict ? <ConflictDialog base={work.base.current} mine={work.conflict.mine} theirs={work.conflict.theirs} onClose={work.closeConflict} onChoose={(fields) => void work.resolve(fields, work.conflict!.theirs)} /> : null}
    </FormProvider>
  );
}

type Work = ReturnType<typeof useMaterialForm>;

function EditorHead({ material, work, mayEdit }: { material: Material | null; work: Work; mayEdit: boolean }) {
  const { formState: { isDirty } } = work.form;
  const changed = isDirty || work.draftKeptAt !== null;
  const state = work.isSaving ? 'Saving' : work.failure ? 'Not saved' : changed ? (work.isKept ? 'Not saved; kept on this computer' : 'Not saved yet') : material ? `Saved ${sayWhen(material.savedAt)} by ${material.savedBy}` : '';
  return (
    <div className="ed-head">
      <h2>{material?.tradeName ?? 'New material'}</h2>
      <span className="end">
        <span className="quiet" role="status">{mayEdit ? state : 'You may read materials, not change them'}</span>
        {mayEdit && material ? <ArchiveButton material={material} /> : null}
        {mayEdit ? <Button type="submit" weight="act" busy={work.isSaving} disabled={!changed && material !== null}>Save</Button> : null}
      </span>
    </div>
  );
}

function EditorNotices({ work }: { work: Work }) {
  const count = countFaults(work.form.formState.errors);
  return (
    <div className="grid gap-2 not-empty:mb-4">
      {work.draftKeptAt ? (
        <Banner weight={work.isBehind ? 'decide' : 'note'} title={`What you changed ${sayWhen(work.draftKeptAt)} is back.`} acts={<Button small onClick={work.discard}>Set it aside</Button>}>
          {work.isBehind ? 'Someone has saved this material since: on saving you see both versions and choose.' : 'It was not saved then.'}
        </Banner>
      ) : null}
      {work.failure ? <Banner weight="stop" title="Not saved." acts={<Button small onClick={() => void work.save()}>Try again</Button>}>{sayError(work.failure)}</Banner> : null}
      {count > 0 && work.form.formState.isSubmitted ? <Banner weight="stop" title="Not saved yet.">{sayCount(count, 'field')} {count === 1 ? 'wants' : 'want'} a correction; each says what.</Banner> : null}
    </div>
  );
}

function countFaults(errors: object): number {
  return Object.values(errors).reduce<number>((count, value: unknown) => {
    if (typeof value !== 'object' || value === null) return count;
    return count + ('message' in value && typeof value.message === 'string' ? 1 : 'ref' in value ? 0 : countFaults(value));
  }, 0);
}

function WhereUsed({ material }: { material: Material }) {
  return (
    <div>
      <h3>Where used</h3>
      {material.usedIn.length === 0 ? <p className="quiet py-2">In no product yet.</p> : (
        <ul className="used">{material.usedIn.map((product) => <li key={product.productId}><Link to={paths.product(product.productId)}>{product.name}</Link></li>)}</ul>
      )}
    </div>
  );
}
