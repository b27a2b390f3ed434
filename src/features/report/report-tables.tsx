import type { ReportModel } from '#shared/report/report-model.ts';

const ZONES: Readonly<Record<string, string>> = {
  ordered: 'in order of weight',
  free: 'any order',
  allergen: 'allergen, named',
  colourant: 'colourant, last',
  unnamed: 'not named',
};

/** The concentration ladder to be read rather than looked at. */
export function LadderTable({ ladder }: { ladder: NonNullable<ReportModel['ladder']> }) {
  return (
    <table>
      <thead><tr><th scope="col">Ingredient</th><th scope="col" className="num">%</th><th scope="col" className="num">from</th><th scope="col" className="num">to</th><th scope="col">Place</th></tr></thead>
      <tbody>
        {ladder.rows.map((row) => (
          <tr key={`${row.name} ${row.zone}`}>
            <th scope="row">{row.name}</th>
            <td className="num">{row.typical}</td>
            <td className="num">{row.min === row.max ? '' : row.min}</td>
            <td className="num">{row.min === row.max ? '' : row.max}</td>
            <td>{ZONES[row.zone]}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

export function FormulaTable({ formula }: { formula: ReportModel['formula'] }) {
  return (
    <table>
      <thead><tr><th scope="col">Material</th>{formula.isExact ? <th scope="col" className="num">g</th> : null}<th scope="col" className="num">{formula.isExact ? '%' : '% of the whole'}</th></tr></thead>
      {formula.phases.map((phase, index) => (
        <tbody key={index}>
          <tr className="phase"><th scope="rowgroup" colSpan={3}>{phase.name}</th></tr>
          {phase.lines.map((line, at) => (
            <tr key={at}>
              <td>{line.name}{line.note ? <span className="aside"> {line.note}</span> : null}</td>
              {formula.isExact ? <td className="num">{line.grams}</td> : null}
              <td className="num">{line.percent}</td>
            </tr>
          ))}
        </tbody>
      ))}
      <tfoot><tr><th scope="row">Sum</th>{formula.isExact ? <td className="num">{formula.total.grams}</td> : null}<td className="num">{formula.total.percent}</td></tr></tfoot>
    </table>
  );
}

export function ParticularsTable({ rows }: { rows: ReportModel['particulars'] }) {
  return (
    <table>
      <thead><tr><th scope="col">Particular</th><th scope="col">On the label</th><th scope="col">Rule</th></tr></thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.name}><th scope="row">{row.name}</th><td className={row.value === 'not given' ? 'aside' : ''}>{row.value}</td><td className="aside">{row.rule}</td></tr>
        ))}
      </tbody>
    </table>
  );
}
