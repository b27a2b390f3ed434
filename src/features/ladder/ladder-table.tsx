import type { Rung } from './geometry.ts';

export interface LadderTableRow extends Rung {
  readonly exact: { readonly min: string; readonly typical: string; readonly max: string };
}

const PLACE: Readonly<Record<Rung['zone'], string>> = {
  ordered: 'in order',
  free: 'free',
  allergen: 'free, as allergen',
  colourant: 'among the colourants',
  'may-contain': 'may contain',
  unnamed: 'not named',
};

/** The ladder for those who read rather than look. */
export function LadderTable({ rows, lit, onLight }: { rows: readonly LadderTableRow[]; lit: ReadonlySet<string>; onLight: (key: string | null) => void }) {
  return (
    <div className="ladder-table">
      <table className="table">
        <caption className="sr-only">Share of every ingredient in percent, in printed order</caption>
        <thead>
          <tr>
            <th scope="col">Printed order</th>
            <th scope="col" className="num">least</th>
            <th scope="col" className="num">typical</th>
            <th scope="col" className="num">most</th>
            <th scope="col">place</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.key} className={lit.has(row.key) ? 'lit' : ''} onPointerEnter={() => onLight(row.key)} onPointerLeave={() => onLight(null)}>
              <th scope="row">{row.name}</th>
              <td className="num">{row.exact.min}</td>
              <td className="num">{row.exact.typical}</td>
              <td className="num">{row.exact.max}</td>
              <td>{PLACE[row.zone]}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
