import { createContext, useCallback, useContext, useEffect, useMemo, useRef, useState } from 'react';
import type { ReactNode } from 'react';
import { Icon } from './icon.tsx';

interface Toast {
  readonly id: number;
  readonly words: string;
  readonly undo?: () => void;
}
/** Says what was done, with an undo where there is one. */
export type ShowToast = (words: string, undo?: () => void) => void;
const ToastContext = createContext<ShowToast>(() => undefined);

/** Long enough to read and to reach Undo by keyboard; stays while pointed at or focused. */
const STAYS_MS = 8000;

export function ToastProvider({ children }: { children: ReactNode }) {
  const [toasts, setToasts] = useState<readonly Toast[]>([]);
  const next = useRef(1);
  const show = useCallback<ShowToast>((words, undo) => {
    const toast = { id: next.current++, words, undo };
    setToasts((before) => [...before.slice(-2), toast]);
  }, []);
  const away = useCallback((id: number) => setToasts((before) => before.filter((toast) => toast.id !== id)), []);
  return (
    <ToastContext.Provider value={show}>
      {children}
      <div className="toasts" role="region" aria-label="What was done" aria-live="polite">
        {toasts.map((toast) => <ToastSlip key={toast.id} toast={toast} away={away} />)}
      </div>
    </ToastContext.Provider>
  );
}

function ToastSlip({ toast, away }: { toast: Toast; away: (id: number) => void }) {
  const [held, setHeld] = useState(false);
  useEffect(() => {
    if (held) return;
    const timer = setTimeout(() => away(toast.id), STAYS_MS);
    return () => clearTimeout(timer);
  }, [held, toast.id, away]);
  const hold = useMemo(() => ({ onMouseEnter: () => setHeld(true), onMouseLeave: () => setHeld(false), onFocus: () => setHeld(true), onBlur: () => setHeld(false) }), []);
  return (
    <div className="toast" {...hold}>
      <Icon name="check" />
      <span>{toast.words}</span>
      {toast.undo ? <button type="button" onClick={() => { toast.undo?.(); away(toast.id); }}>Undo</button> : null}
      <button type="button" className="away" aria-label="Close" onClick={() => away(toast.id)}><Icon name="close" /></button>
    </div>
  );
}

export function useToast(): ShowToast {
  return useContext(ToastContext);
}
