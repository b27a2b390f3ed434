import type { Market } from '#shared/law/types.ts';

interface RoomLine {
  readonly line: number;
  readonly max: string | null;
  readonly limitedBy: string | null;
}

/** How far each line may rise before something new is found, the others scaled in proportion. */
export function RoomLeft({ market, headroom, lines, nameRule }: { market: Market; headroom: readonly RoomLine[] | null; lines: readonly string[]; nameRule: (rule: string) => string }) {
  const bounded = (headroom ?? []).filter((each) => each.max !== null && lines[each.line] !== undefined);
  if (headroom !== null && bounded.length === 0) return null;
  return (
    <details className="room-left">
      <summary>Room left in each line, {market}</summary>
      {headroom === null ? (
        <p className="quiet">Being worked out …</p>
      ) : (
        <table className="table">
          <caption className="sr-only">The largest share of each line at which nothing new is found</caption>
          <thead><tr><th scope="col">Line</th><th scope="col" className="num">at most, % of the product</th><th scope="col">held by</th></tr></thead>
          <tbody>
            {bounded.map((each) => (
              <tr key={each.line}>
                <td>{lines[each.line]}</td>
                <td className="num" title={`${each.max} %`}>{String(Number(Number(each.max).toPrecision(6)))}</td>
                <td className="quiet">{each.limitedBy === null ? '' : nameRule(each.limitedBy)}</td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </details>
  );
}
