import { useCallback, useMemo, useRef } from 'react';
import { useForm } from 'react-hook-form';
import type { DefaultValues, FieldErrors, FieldPath, FieldValues, UseFormReturn } from 'react-hook-form';
import type { z } from 'zod';
import { ApiError } from './api/error.ts';

type Path = readonly PropertyKey[];

export interface ContractFormOptions<Fields extends FieldValues, Body extends z.ZodType> {
  /** The body schema of the contract: the only judge of what is valid. */
  readonly schema: Body;
  readonly defaultValues: Fields;
  /** What is sent, made from what the fields hold. Without it they are the same. */
  readonly toBody?: (fields: Fields) => unknown;
  /** Faults that the schema cannot see: how the fields stand to each other. */
  readonly findFaults?: (body: z.output<Body>) => readonly { pointer: string; message: string }[];
  /** Which field shows a fault found at this path of the body. Without it, the same path. */
  readonly toFieldPath?: (path: Path, fields: Fields) => string;
}

export interface ContractForm<Fields extends FieldValues, Body extends z.ZodType> extends UseFormReturn<Fields> {
  /** Parses the fields and hands the body to `send`; a refusal's issues go beside their fields. */
  submit(send: (body: z.output<Body>) => Promise<unknown>): (event?: { preventDefault(): void }) => Promise<void>;
  /** Puts the issues of a refusal beside their fields; false when it was something else. */
  showIssues(error: unknown): boolean;
}

const join = (path: Path): string => path.map(String).join('.');
/** `/formula/phases/0` as `['formula', 'phases', '0']`. */
export function pointerPath(pointer: string): string[] {
  return pointer.split('/').slice(1).map((part) => part.replace(/~1/g, '/').replace(/~0/g, '~'));
}

/** A form whose fields are judged by an endpoint's own body schema. */
export function useContractForm<Fields extends FieldValues, Body extends z.ZodType>(
  options: ContractFormOptions<Fields, Body>,
): ContractForm<Fields, Body> {
  const { schema, toBody, toFieldPath, findFaults } = options;
  const place = useCallback((path: Path, fields: Fields) => (toFieldPath ? toFieldPath(path, fields) : join(path)), [toFieldPath]);
  // A field left empty on the way to another is no fault before one asks to send: its message would
  // also push the page from under the very press that left it.
  const isAsked = useRef(false);
  const form = useForm<Fields>({
    defaultValues: options.defaultValues as DefaultValues<Fields>,
    mode: 'onTouched',
    resolver: (fields) => {
      const read = schema.safeParse(toBody ? toBody(fields) : fields);
      const found = read.success
        ? (findFaults?.(read.data) ?? []).map((fault) => ({ at: place(pointerPath(fault.pointer), fields), message: fault.message }))
        : read.error.issues.map((issue) => ({ at: place(issue.path, fields), message: issue.message }));
      const faults = isAsked.current ? found : found.filter(({ at }) => valueAt(fields, at) !== '');
      return faults.length === 0 ? { values: fields, errors: {} } : { values: {}, errors: nest(faults) as FieldErrors<Fields> };
    },
  });

  const showIssues = useCallback(
    (error: unknown): boolean => {
      if (!(error instanceof ApiError) || error.issues.length === 0) return false;
      error.issues.forEach((issue, index) => {
        const at = place(pointerPath(issue.pointer), form.getValues()) as FieldPath<Fields>;
        form.setError(at, { type: 'server', message: issue.message }, { shouldFocus: index === 0 });
      });
      return true;
    },
    [form, place],
  );

  const submit = useCallback(
    (send: (body: z.output<Body>) => Promise<unknown>) => {
      const handle = form.handleSubmit(async (fields) => {
        try {
          await send(schema.parse(toBody ? toBody(fields as Fields) : fields));
          isAsked.current = false;
        } catch (error) {
          if (!showIssues(error)) throw error;
        }
      });
      return (event?: { preventDefault(): void }) => {
        isAsked.current = true;
        return handle(event as Parameters<typeof handle>[0]);
      };
    },
    [form, schema, toBody, showIssues],
  );
  // The library keeps one object and changes its `formState`: a copy has to follow that, or faults are never shown.
  const { formState } = form;
  return useMemo(() => ({ ...form, formState, submit, showIssues }) as ContractForm<Fields, Body>, [form, formState, submit, showIssues]);
}

function valueAt(fields: FieldValues, at: string): unknown {
  return at.split('.').reduce<unknown>((here, key) => (typeof here === 'object' && here !== null ? (here as Record<string, unknown>)[key] : undefined), fields);
}

/** Errors as the form library nests them: `composition.2.inci` under its own keys. */
function nest(issues: readonly { at: string; message: string }[]): Record<string, unknown> {
  const errors: Record<string, unknown> = {};
  for (const { at, message } of issues) {
    const keys = at === '' ? ['root'] : at.split('.');
    let here = errors;
    keys.slice(0, -1).forEach((key) => (here = (here[key] ??= {}) as Record<string, unknown>));
    here[keys.at(-1)!] ??= { type: 'contract', message };
  }
  return errors;
}
