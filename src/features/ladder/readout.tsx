import { Button } from '#src/ui/button.tsx';

export interface ReadoutProps {
  /** What is lit, told in words; empty where nothing is. */
  readonly told: readonly { readonly name: string; readonly figure: string; readonly parts: string }[];
  readonly rest: string;
  /** Where one free ingredient is lit: its place may be changed with one hand. */
  readonly move?: { readonly onEarlier?: () => void; readonly onLater?: () => void };
}

/** The line under the ladder that reads out what is lit. */
export function Readout({ told, rest, move }: ReadoutProps) {
  return (
    <div className="readout">
      <div aria-live="polite">
        {told.length === 0 ? <p>{rest}</p> : null}
        {told.slice(0, 6).map((each) => (
          <p key={each.name}>
            <b>{each.name}</b> {each.figure}
            {each.parts ? <span className="parts">{each.parts}</span> : null}
          </p>
        ))}
        {told.length > 6 ? <p>and {told.length - 6} more</p> : null}
      </div>
      {move ? (
        // Pressing must not take the focus from the row, or its light would go out under the finger.
        <span className="moves">
          <Button small disabled={!move.onEarlier} onPointerDown={(event) => event.preventDefault()} onClick={move.onEarlier}>Earlier</Button>
          <Button small disabled={!move.onLater} onPointerDown={(event) => event.preventDefault()} onClick={move.onLater}>Later</Button>
        </span>
      ) : null}
    </div>
  );
}
