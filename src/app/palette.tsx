import { useEffect, useId, useMemo, useRef, useState } from 'react';
import type { KeyboardEvent } from 'react';
import { useQuery } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { dictionaryQueries } from '#src/features/dictionary/queries.ts';
import { materialQueries } from '#src/features/materials/queries.ts';
import { productQueries } from '#src/features/products/queries.ts';
import { Lit } from '#src/ui/lit.tsx';
import { paths, rooms } from './paths.ts';

interface Place {
  readonly id: string;
  readonly to: string;
  readonly text: string;
  readonly under?: string;
  readonly side: string;
}
const MOST = 6;

/** Finds anything of the house, and any ingredient, by name, INCI or CAS. */
export function Palette({ onClose }: { onClose: () => void }) {
  const ref = useRef<HTMLDialogElement>(null);
  const [typed, setTyped] = useState('');
  const [at, setAt] = useState(0);
  const places = usePlaces(typed.trim());
  const navigate = useNavigate();
  const listId = useId();
  useEffect(() => ref.current?.showModal?.(), []);
  const go = (place: Place | undefined) => {
    if (!place) return;
    ref.current?.close?.();
    onClose();
    void navigate(place.to);
  };
  const handleKey = (event: KeyboardEvent) => {
    const step = event.key === 'ArrowDown' ? 1 : event.key === 'ArrowUp' ? -1 : 0;
    if (step !== 0 && places.length > 0) {
      event.preventDefault();
      setAt((before) => (Math.min(before, places.length - 1) + step + places.length) % places.length);
    } else if (event.key === 'Enter') {
      event.preventDefault();
      go(places[Math.min(at, places.length - 1)]);
    }
  };
  const chosen = Math.min(at, places.length - 1);
  return (
    <dialog ref={ref} className="palette" aria-label="Find" onClose={onClose}>
      <input
        // The palette is opened to type into.
        // eslint-disable-next-line jsx-a11y/no-autofocus
        autoFocus
        className="input"
        role="combobox"
        aria-expanded={places.length > 0}
        aria-controls={listId}
        aria-activedescendant={places[chosen] ? `${listId}-${chosen}` : undefined}
        aria-label="Name, INCI or CAS"
        placeholder="Name, INCI or CAS"
        autoComplete="off"
        spellCheck={false}
        value={typed}
        onChange={(event) => { setTyped(event.target.value); setAt(0); }}
        onKeyDown={handleKey}
      />
      <ul id={listId} role="listbox" aria-label="Found">
        {places.map((place, index) => (
          // Keys are handled where one types; the list follows.
          // eslint-disable-next-line jsx-a11y/click-events-have-key-events
          <li key={place.id} id={`${listId}-${index}`} role="option" tabIndex={-1} aria-selected={index === chosen} className={`option ${index === chosen ? 'on' : ''}`} onPointerMove={() => setAt(index)} onClick={() => go(place)}>
            <span><Lit text={place.text} typed={typed} /></span>
            <span className="side">{place.side}</span>
            {place.under ? <span className="under"><Lit text={place.under} typed={typed} /></span> : null}
          </li>
        ))}
      </ul>
      {typed.trim() !== '' && places.length === 0 ? <p className="option-note" role="status">Nothing is known by that name.</p> : null}
    </dialog>
  );
}

function usePlaces(typed: string): Place[] {
  const products = useQuery({ ...productQueries.list(typed ? { find: typed } : {}), enabled: typed !== '' });
  const materials = useQuery({ ...materialQueries.list(typed ? { find: typed } : {}), enabled: typed !== '' });
  const entries = useQuery(dictionaryQueries.search(typed));
  return useMemo(() => {
    const asked = typed.toLowerCase();
    const inRooms = rooms.filter((room) => room.word.toLowerCase().startsWith(asked)).map((room): Place => ({ id: room.to, to: room.to, text: room.word, side: 'room' }));
    if (typed === '') return inRooms;
    return [
      ...inRooms,
      ...(products.data?.items ?? []).slice(0, MOST).map((one): Place => ({ id: one.id, to: paths.product(one.id), text: one.name, side: 'product' })),
      ...(materials.data?.items ?? []).slice(0, MOST).map((one): Place => ({ id: one.id, to: paths.material(one.id), text: one.tradeName, under: one.inci.slice(0, 4).join(', '), side: 'material' })),
      ...(entries.data?.items ?? []).slice(0, MOST).map((one): Place => ({ id: `d-${one.entry.id}`, to: paths.entry(one.entry.inci), text: one.entry.inci, under: one.by === 'inci' ? one.entry.cas[0] : one.matched, side: 'dictionary' })),
    ];
  }, [typed, products.data, materials.data, entries.data]);
}
