import { useState, type ReactNode } from 'react';
import type { Market } from '#shared/law/types.ts';
import { TextButton } from '#src/ui/button.tsx';
import { VerdictMark } from '#src/ui/verdict-mark.tsx';

/** Something worth knowing that no rule asks to be acted on. */
export interface LedgerNote {
  readonly id: string;
  readonly head: string;
  readonly why: string;
  readonly sum: string;
  readonly citations: readonly string[];
  /** What stands in each market's column. */
  readonly cells: ReadonlyMap<Market, { readonly figure: string; readonly against: string }>;
  /** What opens with "Why?". */
  readonly more?: ReactNode;
}

/** A note of the ledger, set as its findings are. */
export function NoteRow({ note, markets, columns }: { note: LedgerNote; markets: readonly Market[]; columns: { readonly gridTemplateColumns: string } }) {
  const [isOpen, setOpen] = useState(false);
  return (
    <article className="ledger-row" style={columns}>
      <div className="words">
        <div>
          <h3>{note.head}</h3>
          {note.why ? <p className="why0">{note.why}</p> : null}
        </div>
        <div className="grounds">
          {note.sum ? <p>{note.sum}</p> : null}
          {note.citations.length > 0 ? <p className="cite">{note.citations.join('; ')}</p> : null}
          {note.more ? <TextButton aria-expanded={isOpen} onClick={() => setOpen(!isOpen)} aria-label={`${isOpen ? 'Hide why' : 'Why'}: ${note.head}`}>{isOpen ? 'Hide why' : 'Why?'}</TextButton> : null}
        </div>
      </div>
      {markets.map((market) => {
        const cell = note.cells.get(market);
        return cell ? (
          <div className="cell" key={market} data-market={market}>
            <VerdictMark weight="note" />
            <b><span className="sr-only">{market}: </span>{cell.figure}</b>
            <span className="quiet">{cell.against}</span>
          </div>
        ) : (
          <div className="cell no" key={market} data-market={market}>
            <span aria-hidden="true">–</span>
            <span className="sr-only">{market}: no rule speaks</span>
          </div>
        );
      })}
      {isOpen && note.more ? <div className="why note">{note.more}</div> : null}
    </article>
  );
}
