import { useEffect, useId, useRef } from 'react';
import type { ReactNode, Ref, RefObject } from 'react';
import { announce } from './announcer.tsx';
import { FieldFault } from './field.tsx';
import { useCombobox } from './use-combobox.ts';
import { useHungList } from './use-hung-list.ts';

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
 * The caller brings the options: nothing is filtered here. The list is written beside its field
 * and reuses its lines from letter to letter, so that it is painted with the letter itself.
 */
export function Combobox({ label, bare = false, value, onType, options, onChoose, onBlur, placeholder, error, hint, inputRef, none, className = '' }: ComboboxProps) {
  const id = useId();
  const list = useRef<HTMLDivElement>(null);
  const take = (index: number) => {
    const option = options[index];
    if (option) onChoose(option);
  };
  const { isOpen: isAsked, at, open, close, onKeyDown } = useCombobox(options.length, take);
  const isOpen = isAsked && (options.length > 0 || value !== '');
  useHungList(list, isOpen);
  useCountSaid(isOpen ? options.length : -1, value);
  useStandInView(isOpen ? at : -1, list);
  const listId = `${id}-list`;
  return (
    <div className={`field ${className}`}>
      <label htmlFor={id} className={bare ? 'sr-only' : 'label'}>{label}</label>
      <input
        id={id}
        ref={inputRef}
        className="input"
        type="text"
        role="combobox"
        aria-autocomplete="list"
        aria-expanded={isOpen}
        aria-controls={isOpen ? listId : undefined}
        aria-activedescendant={at >= 0 ? `${id}-${at}` : undefined}
        aria-invalid={error ? true : undefined}
        aria-describedby={error ? `${id}-error` : hint ? `${id}-hint` : undefined}
        placeholder={placeholder}
        autoComplete="off"
        spellCheck={false}
        value={value}
        onChange={(event) => {
          onType(event.target.value);
          if (event.target.value === '') close();
          else open();
        }}
        onKeyDown={onKeyDown}
        onBlur={() => {
          close();
          onBlur?.();
        }}
      />
      {hint ? <span className="hint" id={`${id}-hint`}>{hint}</span> : null}
      {error ? <FieldFault id={`${id}-error`}>{error}</FieldFault> : null}
      {isOpen ? (
        // The field keeps the focus while an option is pressed.
        <div ref={list} role="presentation" className="popover hung" onPointerDown={(event) => event.preventDefault()} onMouseDown={(event) => event.preventDefault()}>
          <div className="options" role="listbox" id={listId} aria-label={label}>
            {options.map((option, index) => (
              // Lines are kept by their place: only their words change from letter to letter.
              <Option key={index} id={`${id}-${index}`} option={option} isOn={index === at} onTake={() => { take(index); close(); }} />
            ))}
          </div>
          {options.length === 0 ? <p className="option-note">{none ?? 'One moment'}</p> : null}
        </div>
      ) : null}
    </div>
  );
}

interface OptionProps {
  readonly id: string;
  readonly option: ComboboxOption;
  readonly isOn: boolean;
  readonly onTake: () => void;
}

/** One line of the list; its keys are the field's. */
function Option({ id, option, isOn, onTake }: OptionProps) {
  return (
    // eslint-disable-next-line jsx-a11y/click-events-have-key-events, jsx-a11y/interactive-supports-focus
    <div id={id} role="option" aria-selected={isOn} className={isOn ? 'option on' : 'option'} onClick={onTake}>
      <span>{option.shown ?? option.text}</span>
      {option.side ? <span className="side">{option.side}</span> : null}
      {option.under ? <span className="under">{option.under}</span> : null}
    </div>
  );
}

/** Says how many names stand in the list once typing rests; -1 for a shut list. */
function useCountSaid(count: number, value: string): void {
  useEffect(() => {
    if (count < 0) return undefined;
    const timer = setTimeout(() => announce(count === 0 ? 'Nothing found' : count === 1 ? '1 name found' : `${count} names found`), 700);
    return () => clearTimeout(timer);
  }, [count, value]);
}

/** The option the keys stand on is never scrolled out of sight. */
function useStandInView(at: number, list: RefObject<HTMLElement | null>): void {
  useEffect(() => {
    if (at >= 0) list.current?.querySelectorAll('[role=option]')[at]?.scrollIntoView?.({ block: 'nearest' });
  }, [at, list]);
}
