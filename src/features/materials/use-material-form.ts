import { useCallback, useEffect, useRef, useState } from 'react';
import { material as materialSchema, materialFields } from '#shared/contracts/materials.contract.ts';
import type { Material, MaterialFields } from '#shared/contracts/materials.contract.ts';
import { findMaterialFaults } from '#shared/contracts/material-faults.ts';
import { isRefusal } from '#src/lib/api/error.ts';
import type { DraftStore } from '#src/lib/drafts.ts';
import { useDraftStore } from '#src/lib/drafts.ts';
import { useContractForm } from '#src/lib/use-contract-form.ts';
import { findDiffering } from './conflict.ts';
import { bodyOf, emptyMaterial, fieldPathOf, formOf, isMaterialForm } from './material-form.ts';
import type { MaterialForm } from './material-form.ts';
import { useCreateMaterial, useUpdateMaterial } from './mutations.ts';

export interface Conflict {
  readonly mine: MaterialFields;
  readonly theirs: Material;
}
interface Start {
  readonly values: MaterialForm;
  readonly version: number;
  readonly draftKeptAt: string | null;
}

function startOf(material: Material | null, tradeName: string, drafts: DraftStore<MaterialForm>): Start {
  const draft = drafts.read();
  if (draft) return { values: draft.value, version: draft.baseVersion, draftKeptAt: draft.keptAt };
  return { values: material ? formOf(material) : emptyMaterial(tradeName), version: material?.version ?? 0, draftKeptAt: null };
}

export interface MaterialFormOptions {
  /** `null` for a new one. */
  readonly material: Material | null;
  readonly houseId: string;
  readonly tradeName: string;
  readonly onSaved: (material: Material) => void;
}

/**
 * The fields of one material, their draft on this computer, and saving against the version
 * that was on screen when the work began.
 */
export function useMaterialForm({ material, houseId, tradeName, onSaved }: MaterialFormOptions) {
  const drafts = useDraftStore(houseId, 'material', material?.id ?? 'new', isMaterialForm);
  const [start, setStart] = useState(() => startOf(material, tradeName, drafts));
  const [conflict, setConflict] = useState<Conflict | null>(null);
  const [failure, setFailure] = useState<unknown>(null);
  const [isKept, setKept] = useState(start.draftKeptAt !== null);
  const version = useRef(start.version);
  const base = useRef<MaterialFields | null>(material && material.version === start.version ? material : null);
  const create = useCreateMaterial();
  const update = useUpdateMaterial(material?.id ?? '');
  const form = useContractForm({ schema: materialFields, defaultValues: start.values, toBody: bodyOf, toFieldPath: fieldPathOf, findFaults: findMaterialFaults });
  const { reset, subscribe } = form;

  useEffect(() => {
    let timer: ReturnType<typeof setTimeout> | undefined;
    const stop = subscribe({
      formState: { values: true, isDirty: true },
      callback: ({ values, isDirty }) => {
        clearTimeout(timer);
        if (!isDirty) return;
        timer = setTimeout(() => setKept(drafts.keep(values, version.current)), 250);
      },
    });
    return () => { clearTimeout(timer); stop(); };
  }, [subscribe, drafts]);

  // Saved elsewhere, or a document added here: unchanged fields follow, changed ones stay.
  useEffect(() => {
    if (!material || material.version <= version.current || drafts.read() !== null) return;
    const isSameText = base.current !== null && findDiffering(null, base.current, material).length === 0;
    if (!isSameText && form.formState.isDirty) return;
    version.current = material.version;
    base.current = material;
    if (!isSameText) reset(formOf(material));
  }, [material, drafts, form, reset]);

  const settle = useCallback((saved: Material) => {
    drafts.clear();
    version.current = saved.version;
    base.current = saved;
    setKept(false);
    setStart((before) => ({ ...before, draftKeptAt: null }));
    reset(formOf(saved));
    onSaved(saved);
  }, [drafts, reset, onSaved]);

  const send = useCallback(async (body: MaterialFields) => {
    setFailure(null);
    try {
      settle(material ? await update.mutateAsync({ ...body, version: version.current }) : await create.mutateAsync(body));
    } catch (error) {
      const theirs = isRefusal(error, 'stale') ? materialSchema.safeParse(error.problem.current) : null;
      if (theirs?.success) setConflict({ mine: body, theirs: theirs.data });
      else if (!form.showIssues(error)) setFailure(error);
    }
  }, [material, update, create, settle, form]);

  const resolve = useCallback(async (fields: MaterialFields, theirs: Material) => {
    version.current = theirs.version;
    base.current = theirs;
    setConflict(null);
    reset(formOf(fields), { keepDefaultValues: true });
    await send(fields);
  }, [reset, send]);

  const discard = useCallback(() => {
    drafts.clear();
    setKept(false);
    version.current = material?.version ?? 0;
    base.current = material;
    setStart({ values: material ? formOf(material) : emptyMaterial(), version: material?.version ?? 0, draftKeptAt: null });
    reset(material ? formOf(material) : emptyMaterial());
  }, [drafts, material, reset]);

  return {
    form, conflict, failure, isKept, resolve, discard,
    save: form.submit(send),
    draftKeptAt: start.draftKeptAt,
    isBehind: material !== null && start.draftKeptAt !== null && start.version < material.version,
    base: base as { readonly current: MaterialFields | null },
    closeConflict: () => setConflict(null),
    isSaving: create.isPending || update.isPending,
  };
}
