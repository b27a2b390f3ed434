import { useController, useFormContext } from 'react-hook-form';
import { FieldFault } from '#src/ui/field.tsx';

export interface ShareInputsProps {
  /** The line's path in the form: `composition.0`. */
  readonly at: string;
  /** For those who hear it: `ingredient 1`. */
  readonly name: string;
  /** The typical figure that follows from the others, shown where none is written. */
  readonly derived: string;
  readonly row: number;
}

/** Three cells: the share or its least, its most, and a typical figure if the supplier gives one. */
export function ShareInputs({ at, name, derived, row }: ShareInputsProps) {
  return (
    <>
      <td className="n" data-l="% or least"><ShareInput path={`${at}.least`} label={`Share or least of ${name}, percent`} row={row} /></td>
      <td className="n" data-l="most %"><ShareInput path={`${at}.most`} label={`Most of ${name}, percent`} row={row} /></td>
      <td className="n ty" data-l="typical"><ShareInput path={`${at}.typical`} label={`Typical share of ${name}, percent`} row={row} ghost={derived} /></td>
    </>
  );
}

const RANGE = /^([\d.,]+)\s*(?:-|–|—|to|\.\.)\s*([\d.,]+)\s*%?$/;

function ShareInput({ path, label, row, ghost }: { path: string; label: string; row: number; ghost?: string }) {
  const { control, setValue } = useFormContext();
  const { field: { ref, value, onChange, onBlur }, fieldState } = useController({ control, name: path });
  const error = fieldState.error?.message;
  const errorId = `${path.replaceAll('.', '-')}-fault`;
  const column = path.slice(path.lastIndexOf('.') + 1);
  const handleBlur = () => {
    // A range typed into the first field is a least and a most.
    const range = column === 'least' ? RANGE.exec(String(value).trim()) : null;
    if (range) {
      setValue(path, range[1]!, { shouldDirty: true });
      setValue(path.replace(/least$/, 'most'), range[2]!, { shouldDirty: true });
    }
    onBlur();
  };
  return (
    <>
      <input
        ref={ref}
        name={path}
        value={String(value ?? '')}
        onChange={onChange}
        onBlur={handleBlur}
        onFocus={(event) => event.currentTarget.select()}
        data-row={row}
        data-column={column}
        inputMode="decimal"
        autoComplete="off"
        aria-label={label}
        aria-invalid={error ? true : undefined}
        aria-describedby={error ? errorId : undefined}
        placeholder={ghost || undefined}
        className={`input figure ${ghost !== undefined ? 'ghost' : ''}`}
      />
      {error ? <FieldFault id={errorId}>{error}</FieldFault> : null}
    </>
  );
}
