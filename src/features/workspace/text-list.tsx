import { useState } from 'react';
import { Button, IconButton } from '#src/ui/button.tsx';
import { TextField } from '#src/ui/field.tsx';
import { focusFirst } from './focus-first.ts';

interface Item {
  readonly text: string;
  readonly lang: string;
}
export interface TextListProps {
  readonly title: string;
  readonly items: readonly Item[];
  readonly addWord: string;
  readonly isReadOnly: boolean;
  readonly onItems: (items: Item[]) => void;
  readonly onSettle: () => void;
}

/** Texts with their language; an emptied one goes away when the field is left. */
export function TextList({ title, items, addWord, isReadOnly, onItems, onSettle }: TextListProps) {
  const [fresh, setFresh] = useState<string | null>(null);
  const add = () => {
    if (fresh !== null && fresh.trim() !== '') onItems([...items, { text: fresh.trim(), lang: 'en' }]);
    setFresh(null);
    onSettle();
  };
  return (
    <div className="text-list" role="group" aria-label={title}>
      <span className="field-label">{title}</span>
      {items.map((item, index) => (
        <div className="text-row" key={index}>
          <TextField bare label={`${title} ${index + 1}`} readOnly={isReadOnly} defaultValue={item.text} key={item.text} onBlur={(event) => {
            const text = event.target.value.trim();
            if (text !== item.text) onItems(text === '' ? items.filter((_, at) => at !== index) : items.map((each, at) => (at === index ? { ...each, text } : each)));
            onSettle();
          }} />
          <TextField bare label={`${title} ${index + 1}, language`} className="lang" readOnly={isReadOnly} maxLength={2} defaultValue={item.lang} onBlur={(event) => {
            const lang = event.target.value.trim().toLowerCase();
            if (/^[a-z]{2}$/.test(lang) && lang !== item.lang) onItems(items.map((each, at) => (at === index ? { ...each, lang } : each)));
          }} />
          {isReadOnly ? null : <IconButton icon="away" word={`Remove ${title.toLowerCase()} ${index + 1}`} onClick={() => onItems(items.filter((_, at) => at !== index))} />}
        </div>
      ))}
      {fresh === null ? null : <TextField bare ref={focusFirst} label={addWord} value={fresh} onChange={(event) => setFresh(event.target.value)} onBlur={add} onKeyDown={(event) => event.key === 'Enter' && add()} />}
      {isReadOnly || fresh !== null ? null : <Button small icon="plus" onClick={() => setFresh('')}>{addWord}</Button>}
    </div>
  );
}
