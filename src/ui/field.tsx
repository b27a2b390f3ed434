import { useId } from 'react';
import type { InputHTMLAttributes, ReactNode, Ref, SelectHTMLAttributes, TextareaHTMLAttributes } from 'react';

export interface FieldParts {
  readonly id: string;
  readonly 'aria-describedby'?: string;
  readonly 'aria-invalid'?: true;
}
interface FieldFrame {
  readonly label: ReactNode;
  readonly hint?: ReactNode;
  /** The fault, said at the field. */
  readonly error?: string;
  readonly className?: string;
  /** The label is for those who hear it only: a column head already says it. */
  readonly bare?: boolean;
}

/** Label, hint and fault around one control; `children` gets what ties them together. */
export function Field({ label, hint, error, className = '', bare = false, children }: FieldFrame & { children: (parts: FieldParts) => ReactNode }) {
  const id = useId();
  const described = [hint ? `${id}-hint` : '', error ? `${id}-error` : ''].filter(Boolean).join(' ');
  return (
    <div className={`field ${className}`}>
      <label htmlFor={id} className={bare ? 'sr-only' : 'label'}>
        {label}
      </label>
      {children({ id, 'aria-describedby': described || undefined, 'aria-invalid': error ? true : undefined })}
      {hint ? <span className="hint" id={`${id}-hint`}>{hint}</span> : null}
      {error ? <FieldFault id={`${id}-error`}>{error}</FieldFault> : null}
    </div>
  );
}

/** A fault, said where it is. */
export function FieldFault({ id, children }: { id?: string; children: ReactNode }) {
  return (
    <span className="error" id={id} role="alert">
      <i className="mark stop" aria-hidden="true" />
      <span>{children}</span>
    </span>
  );
}

export type TextFieldProps = InputHTMLAttributes<HTMLInputElement> & FieldFrame & { ref?: Ref<HTMLInputElement>; figure?: boolean };
/** One line of text; `figure` for a number, set to the right. */
export function TextField({ label, hint, error, className, bare, figure = false, ...input }: TextFieldProps) {
  return (
    <Field label={label} hint={hint} error={error} className={className} bare={bare}>
      {(parts) => <input autoComplete="off" inputMode={figure ? 'decimal' : undefined} {...input} {...parts} className={`input ${figure ? 'figure' : ''}`} />}
    </Field>
  );
}

/** Several lines of text. */
export function AreaField({ label, hint, error, className, bare, ...area }: TextareaHTMLAttributes<HTMLTextAreaElement> & FieldFrame & { ref?: Ref<HTMLTextAreaElement> }) {
  return (
    <Field label={label} hint={hint} error={error} className={className} bare={bare}>
      {(parts) => <textarea {...area} {...parts} className="input" />}
    </Field>
  );
}

/** One of a few: the browser's own list, which phones show well. */
export function SelectField({ label, hint, error, className, bare, children, ...select }: SelectHTMLAttributes<HTMLSelectElement> & FieldFrame & { ref?: Ref<HTMLSelectElement> }) {
  return (
    <Field label={label} hint={hint} error={error} className={className} bare={bare}>
      {(parts) => <select {...select} {...parts} className="input">{children}</select>}
    </Field>
  );
}

/** Yes or no, with its word. */
export function CheckField({ label, className = '', ...input }: InputHTMLAttributes<HTMLInputElement> & { label: ReactNode; ref?: Ref<HTMLInputElement> }) {
  return (
    <label className={`check ${className}`}>
      <input type="checkbox" {...input} />
      <span>{label}</span>
    </label>
  );
}
