import { useId } from 'react';
import type { ReactNode, Ref } from 'react';
import { ComboBox as AriaComboBox, Input, Label, ListBox, ListBoxItem, Popover } from 'react-aria-components/ComboBox';
import { FieldFault } from './field.tsx';

export interface ComboboxOption {
  readonly id: string;
  /** What the field then holds, and what is read out. */
  readonly text: string;
  /** What is shown; the text when absent. */
  readonly shown?: ReactNode;
  readonly under?: ReactNode;
  readonly side?: ReactNode;
}
export interface ComboboxProps {
  readonly label: string;
  readonly bare?: boolean;
  /** What the field holds. */
  readonly value: string;
  readonly onType: (text: string) => void;
  readonly options: readonly ComboboxOption[];
  readonly onChoose: (option: ComboboxOption) => void;
  readonly onBlur?: () => void;
  readonly placeholder?: string;
  readonly error?: string;
  readonly hint?: ReactNode;
  readonly inputRef?: Ref<HTMLInputElement>;
  /** Shown in the list when nothing is found; absent while the answer is on its way. */
  readonly none?: ReactNode;
  readonly className?: string;
}

/**
 * A field that offers names as one types; what is typed may also stand as it is.
 * The caller brings the options: nothing is filtered here.
 */
export function Combobox({ label, bare = false, value, onType, options, onChoose, onBlur, placeholder, error, hint, inputRef, none, className = '' }: ComboboxProps) {
  const errorId = useId();
  return (
    <AriaComboBox
      className={`field ${className}`}
      inputValue={value}
      onInputChange={onType}
      items={options}
      allowsCustomValue
      // It opens with the first letter, before an answer is there: a list that waits for one would stay shut after a paste.
      allowsEmptyCollection={value !== ''}
      menuTrigger="input"
      defaultFilter={everything}
      selectedKey={null}
      onSelectionChange={(key) => {
        const option = options.find((one) => one.id === key);
        if (option) onChoose(option);
      }}
      onBlur={onBlur}
    >
      <Label className={bare ? 'sr-only' : 'label'}>{label}</Label>
      <Input ref={inputRef} className="input" placeholder={placeholder} aria-invalid={error ? true : undefined} aria-describedby={error ? errorId : undefined} autoComplete="off" spellCheck={false} />
      {hint ? <span className="hint">{hint}</span> : null}
      {error ? <FieldFault id={errorId}>{error}</FieldFault> : null}
      <Popover className="popover" offset={4} maxHeight={360} placement="bottom start">
        <ListBox className="options" renderEmptyState={() => <p className="option-note">{none ?? 'One moment'}</p>}>
          {(option: ComboboxOption) => (
            <ListBoxItem id={option.id} textValue={option.text} className="option">
              <span>{option.shown ?? option.text}</span>
              {option.side ? <span className="side">{option.side}</span> : null}
              {option.under ? <span className="under">{option.under}</span> : null}
            </ListBoxItem>
          )}
        </ListBox>
      </Popover>
    </AriaComboBox>
  );
}

const everything = () => true;
