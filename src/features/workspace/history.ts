/** Undo and redo over whole values: each step keeps the value it replaced. */
export interface History<T> {
  readonly past: readonly T[];
  readonly present: T;
  readonly future: readonly T[];
  /** Changes that carry this mark are still one step (typing within one field). */
  readonly joining: string | null;
}

export type HistoryAction<T> =
  | { readonly type: 'change'; readonly recipe: (value: T) => T; readonly join?: string }
  | { readonly type: 'settle' }
  | { readonly type: 'undo' }
  | { readonly type: 'redo' }
  /** Another value takes the place of this one, as one step that can be undone. */
  | { readonly type: 'replace'; readonly value: T };

/** Steps that can be taken back; older ones are let go. */
export const STEPS_KEPT = 200;

/** A history that begins with `present`. */
export function beginHistory<T>(present: T): History<T> {
  return { past: [], present, future: [], joining: null };
}

/** The next history; a recipe that returns the value it was given changes nothing. */
export function historyReducer<T>(history: History<T>, action: HistoryAction<T>): History<T> {
  switch (action.type) {
    case 'change': {
      const next = action.recipe(history.present);
      if (Object.is(next, history.present)) return history;
      const joins = action.join !== undefined && action.join === history.joining;
      return {
        past: joins ? history.past : [...history.past, history.present].slice(-STEPS_KEPT),
        present: next,
        future: [],
        joining: action.join ?? null,
      };
    }
    case 'settle':
      return history.joining === null ? history : { ...history, joining: null };
    case 'replace':
      return Object.is(action.value, history.present)
        ? history
        : { past: [...history.past, history.present].slice(-STEPS_KEPT), present: action.value, future: [], joining: null };
    case 'undo': {
      const last = history.past.at(-1);
      if (last === undefined) return history;
      return { past: history.past.slice(0, -1), present: last, future: [history.present, ...history.future], joining: null };
    }
    case 'redo': {
      const [first, ...rest] = history.future;
      if (first === undefined) return history;
      return { past: [...history.past, history.present], present: first, future: rest, joining: null };
    }
  }
}
