import { useCallback, useEffect, useReducer, useState, useSyncExternalStore } from 'react';
import { useQueryClient, type QueryKey } from '@tanstack/react-query';
import { product as productSchema, updateProduct, type Product, type ProductWorkspace } from '#shared/contracts/products.contract.ts';
import { productDraft, type ProductDraft } from '#shared/contracts/product-draft.ts';
import { call } from '#src/lib/api/call.ts';
import { ApiError, OfflineError, sayError } from '#src/lib/api/error.ts';
import type { Draft, DraftStore } from '#src/lib/drafts.ts';
import { createAutosave, type Autosave, type SaveFault, type SaveState } from './autosave.ts';
import { beginHistory, historyReducer, type History, type HistoryAction } from './history.ts';

type Recipe = (draft: ProductDraft) => ProductDraft;

/** A product under the pen: the draft, its steps back and forth, and the state of saving. */
export interface DraftDesk {
  readonly draft: ProductDraft;
  readonly version: number;
  readonly save: SaveState;
  readonly canUndo: boolean;
  readonly canRedo: boolean;
  /** Work found on this computer that the server does not have. */
  readonly kept: Draft<ProductDraft> | null;
  change(recipe: Recipe, join?: string): void;
  settle(): void;
  undo(): void;
  redo(): void;
  saveNow(): void;
  /** What the server holds, and what someone else made of it, while a conflict is open. */
  base(): ProductDraft;
  resolve(theirs: Product, merged: ProductDraft): void;
  takeKept(): void;
  dropKept(): void;
}

/** Only the outline is checked: work in progress may break the contract, and must still come back. */
export function isDraft(value: unknown): value is ProductDraft {
  const draft = value as ProductDraft | null;
  return typeof draft === 'object' && draft !== null && Array.isArray(draft.formula?.phases) && Array.isArray(draft.markets) && typeof draft.name === 'string';
}

/** Why a draft cannot be sent yet. */
export function judgeDraft(draft: ProductDraft): string | null {
  const read = productDraft.safeParse(draft);
  return read.success ? null : (read.error.issues[0]?.message ?? 'Something in it cannot be saved yet.');
}

function explain(error: unknown): SaveFault {
  if (error instanceof OfflineError) return { kind: 'unreachable', why: 'no connection. Your work is kept on this computer' };
  if (error instanceof ApiError) {
    if (error.code === 'stale') {
      const theirs = productSchema.safeParse(error.problem.current);
      if (theirs.success) return { kind: 'stale', theirs: theirs.data };
    }
    if (error.code === 'not-signed-in') return { kind: 'unreachable', why: 'your session has ended. Your work is kept on this computer' };
    if (error.code === 'unavailable' || error.code === 'too-many-requests') return { kind: 'unreachable', why: error.message };
    return { kind: 'refused', why: error.issues[0]?.message ?? error.message };
  }
  return { kind: 'refused', why: sayError(error) };
}

function useAutosaveOf(product: Product, queryKey: QueryKey, store: DraftStore<ProductDraft>): Autosave {
  const client = useQueryClient();
  const [autosave] = useState(() =>
    createAutosave({
      product,
      send: (version, draft) => call(updateProduct, { params: { id: product.id }, body: { version, draft } }),
      explain,
      judge: judgeDraft,
      keep: (draft, baseVersion) => void store.keep(draft, baseVersion),
      forget: () => store.clear(),
      onSaved: (saved) => client.setQueryData<ProductWorkspace>(queryKey, (before) => before && { ...before, product: saved }),
    }),
  );
  return autosave;
}

/** Edits a product: every change can be undone, is kept on this computer at once and saved a moment later. */
export function useDraftDesk(product: Product, queryKey: QueryKey, store: DraftStore<ProductDraft>): DraftDesk {
  const autosave = useAutosaveOf(product, queryKey, store);
  const [history, dispatch] = useReducer<History<ProductDraft>, ProductDraft, [HistoryAction<ProductDraft>]>(historyReducer, product.draft, beginHistory);
  const save = useSyncExternalStore(autosave.subscribe, autosave.state);
  const [kept, setKept] = useState<Draft<ProductDraft> | null>(() => {
    const found = store.read();
    return found && JSON.stringify(found.value) !== JSON.stringify(product.draft) ? found : null;
  });

  useEffect(() => autosave.change(history.present), [autosave, history.present]);
  // Someone else's newer version comes in by itself while nothing here is unsaved.
  useEffect(() => {
    if (autosave.adopt(product)) dispatch({ type: 'replace', value: product.draft });
  }, [autosave, product]);
  useEffect(() => {
    const again = () => autosave.flush();
    const warn = (event: BeforeUnloadEvent) => {
      if (autosave.hasUnsaved()) event.preventDefault();
    };
    addEventListener('online', again);
    addEventListener('focus', again);
    addEventListener('beforeunload', warn);
    return () => {
      removeEventListener('online', again);
      removeEventListener('focus', again);
      removeEventListener('beforeunload', warn);
      autosave.flush();
    };
  }, [autosave]);

  const change = useCallback((recipe: Recipe, join?: string) => dispatch({ type: 'change', recipe, join }), []);
  const settle = useCallback(() => dispatch({ type: 'settle' }), []);
  return {
    draft: history.present,
    version: autosave.base().version,
    save,
    canUndo: history.past.length > 0,
    canRedo: history.future.length > 0,
    kept,
    change,
    settle,
    undo: () => dispatch({ type: 'undo' }),
    redo: () => dispatch({ type: 'redo' }),
    saveNow: () => autosave.flush(),
    base: () => autosave.base().draft,
    resolve(theirs, merged) {
      autosave.resolve(theirs, merged);
      dispatch({ type: 'replace', value: merged });
    },
    takeKept() {
      if (!kept) return;
      // Sent as what it was begun from: where someone saved since, both versions are shown.
      autosave.rebase(kept.baseVersion);
      dispatch({ type: 'replace', value: kept.value });
      setKept(null);
    },
    dropKept() {
      store.clear();
      setKept(null);
    },
  };
}
