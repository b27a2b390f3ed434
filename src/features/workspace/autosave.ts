import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import type { Product } from '#shared/contracts/products.contract.ts';

/** What a person sees of saving. */
export type SaveState =
  | { readonly kind: 'saved'; readonly at: string; readonly by: string }
  /** Typed and kept on this computer, about to be sent. */
  | { readonly kind: 'waiting' }
  | { readonly kind: 'saving' }
  /** `retries` where it is tried again by itself. */
  | { readonly kind: 'not-saved'; readonly why: string; readonly retries: boolean }
  /** Someone else saved in between: nothing is sent until a person has chosen. */
  | { readonly kind: 'conflict'; readonly theirs: Product };

/** What went wrong, as far as saving needs to know. */
export type SaveFault =
  | { readonly kind: 'stale'; readonly theirs: Product }
  | { readonly kind: 'unreachable'; readonly why: string }
  | { readonly kind: 'refused'; readonly why: string };

export interface AutosaveOptions {
  readonly product: Product;
  readonly send: (version: number, draft: ProductDraft) => Promise<Product>;
  /** Sorts whatever `send` threw. */
  readonly explain: (error: unknown) => SaveFault;
  /** Why a draft cannot be sent yet, in words; `null` where it can. */
  readonly judge: (draft: ProductDraft) => string | null;
  readonly keep: (draft: ProductDraft, baseVersion: number) => void;
  readonly forget: () => void;
  readonly onSaved?: (product: Product) => void;
  /** Quiet time after the last change, in milliseconds. */
  readonly delay?: number;
}

export interface Autosave {
  state(): SaveState;
  /** The version and draft that the server is known to hold. */
  base(): { readonly version: number; readonly draft: ProductDraft };
  hasUnsaved(): boolean;
  change(draft: ProductDraft): void;
  /** Sends at once, and after a failure again. */
  flush(): void;
  /** Ends a conflict: `draft` is to be saved over `theirs`. */
  resolve(theirs: Product, draft: ProductDraft): void;
  /** The server's newer product, where nothing here is unsaved. False where something is. */
  adopt(product: Product): boolean;
  /** What follows was begun from this older version. */
  rebase(version: number): void;
  subscribe(listener: () => void): () => void;
  dispose(): void;
}

const FIRST_RETRY = 2_000;
const LAST_RETRY = 30_000;

/**
 * Saves a draft by itself: a moment after the last change, one request at a time, again and
 * again while the server cannot be reached. Every change is kept on this computer first.
 */
export function createAutosave(options: AutosaveOptions): Autosave {
  const delay = options.delay ?? 900;
  const listeners = new Set<() => void>();
  let base = { version: options.product.version, draft: options.product.draft };
  let draft = base.draft;
  let lastSaved: SaveState = { kind: 'saved', at: options.product.savedAt, by: options.product.savedBy };
  let state: SaveState = lastSaved;
  let timer: ReturnType<typeof setTimeout> | undefined;
  let isSending = false;
  let retry = FIRST_RETRY;
  let isDisposed = false;

  const show = (next: SaveState) => {
    state = next;
    if (next.kind === 'saved') lastSaved = next;
    for (const listener of listeners) listener();
  };
  const plan = (after: number) => {
    clearTimeout(timer);
    timer = setTimeout(() => void send(), after);
  };
  const hasUnsaved = () => draft !== base.draft;

  async function send(): Promise<void> {
    clearTimeout(timer);
    // A retry waits for whatever is under way.
    if (isSending || isDisposed || state.kind === 'conflict' || !hasUnsaved()) return;
    const why = options.judge(draft);
    if (why !== null) return show({ kind: 'not-saved', why, retries: false });
    const sent = draft;
    isSending = true;
    show({ kind: 'saving' });
    try {
      const product = await options.send(base.version, sent);
      base = { version: product.version, draft: sent };
      retry = FIRST_RETRY;
      isSending = false;
      options.onSaved?.({ ...product, draft: sent });
      if (hasUnsaved()) {
        options.keep(draft, base.version);
        show({ kind: 'waiting' });
        plan(delay);
      } else {
        options.forget();
        show({ kind: 'saved', at: product.savedAt, by: product.savedBy });
      }
    } catch (error) {
      isSending = false;
      fail(options.explain(error));
    }
  }

  function fail(fault: SaveFault): void {
    if (fault.kind === 'stale') return show({ kind: 'conflict', theirs: fault.theirs });
    show({ kind: 'not-saved', why: fault.why, retries: fault.kind === 'unreachable' });
    if (fault.kind !== 'unreachable') return;
    plan(retry);
    retry = Math.min(LAST_RETRY, retry * 2);
  }

  return {
    state: () => state,
    base: () => base,
    hasUnsaved,
    change(next) {
      if (next === draft) return;
      draft = next;
      if (!hasUnsaved()) {
        options.forget();
        if (!isSending && state.kind !== 'conflict') show(lastSaved);
        return;
      }
      options.keep(draft, base.version);
      if (isSending || state.kind === 'conflict') return;
      if (state.kind !== 'waiting') show({ kind: 'waiting' });
      plan(delay);
    },
    flush() {
      retry = FIRST_RETRY;
      void send();
    },
    resolve(theirs, merged) {
      base = { version: theirs.version, draft: theirs.draft };
      draft = merged;
      if (hasUnsaved()) {
        options.keep(draft, base.version);
        show({ kind: 'waiting' });
        plan(0);
      } else {
        options.forget();
        show({ kind: 'saved', at: theirs.savedAt, by: theirs.savedBy });
      }
    },
    adopt(product) {
      if (isSending || hasUnsaved() || state.kind === 'conflict') return false;
      if (product.version <= base.version) return false;
      base = { version: product.version, draft: product.draft };
      draft = product.draft;
      show({ kind: 'saved', at: product.savedAt, by: product.savedBy });
      return true;
    },
    rebase(version) {
      base = { ...base, version };
    },
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    dispose() {
      isDisposed = true;
      clearTimeout(timer);
      listeners.clear();
    },
  };
}
