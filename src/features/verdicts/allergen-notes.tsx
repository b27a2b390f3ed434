import type { AllergenVerdict } from '#shared/engine/allergens.ts';
import { toDecimal, type Rational } from '#shared/kernel/rational.ts';
import { MARKETS, type Market } from '#shared/law/types.ts';
import { roughlyText } from '#src/lib/figures.ts';
import { sayCount, sayList } from '#src/lib/say.ts';
import type { LedgerNote } from './note-row.tsx';

interface Judged {
  readonly market: Market;
  readonly exposure: string;
  readonly allergens: readonly AllergenVerdict[];
}

const isPresent = ({ total }: AllergenVerdict): boolean => total.max.n > 0n;
const figure = (share: Rational): string => roughlyText(toDecimal(share, 12));

/** Which fragrance allergens are named and which stay unnamed, with their totals against the threshold. */
export function findAllergenNotes(results: readonly Judged[]): LedgerNote[] {
  const rows = [
    { id: 'allergens-named', isOf: (one: AllergenVerdict) => one.disclose, verb: ['is named', 'are named'], word: 'named', side: 'above', why: 'Each total over every source is above the threshold, so the label names it.' },
    { id: 'allergens-unnamed', isOf: (one: AllergenVerdict) => !one.disclose && isPresent(one), verb: ['stays unnamed', 'stay unnamed'], word: 'unnamed', side: 'up to', why: 'Present, but not above the threshold: naming it is not asked for.' },
  ] as const;
  return rows.flatMap(({ id, isOf, verb, word, side, why }): LedgerNote[] => {
    const found = results.map((result) => ({ ...result, allergens: result.allergens.filter(isOf) })).filter(({ allergens }) => allergens.length > 0);
    if (found.length === 0) return [];
    const names = [...new Set(found.flatMap(({ allergens }) => allergens.map(({ name }) => name)))];
    const greatest = found[0]!.allergens.reduce((most, one) => (Number(toDecimal(one.total.max)) > Number(toDecimal(most.total.max)) ? one : most));
    return [{
      id,
      head: `${names.length > 4 ? `${sayCount(names.length, 'fragrance allergen')}` : sayList(names)} ${names.length === 1 ? verb[0] : verb[1]}`,
      why,
      sum: `${greatest.name}: ${sayTotal(greatest)}, ${word === 'named' ? 'above' : 'not above'} ${greatest.threshold} % (${found[0]!.exposure}).`,
      citations: [...new Set(found.flatMap(({ allergens }) => allergens.map(({ citation }) => citation)))].slice(0, 4),
      cells: new Map(found.map(({ market, allergens }) => [market, { figure: `${allergens.length} ${word}`, against: `${side} ${allergens[0]!.threshold} %` }])),
      more: <Totals results={found} names={names} />,
    }];
  });
}

function sayTotal({ total }: AllergenVerdict): string {
  const [min, max] = [figure(total.min), figure(total.max)];
  return min === max ? `${max} %` : `${min} to ${max} %`;
}

function Totals({ results, names }: { results: readonly Judged[]; names: readonly string[] }) {
  const markets = MARKETS.filter((market) => results.some((one) => one.market === market));
  const of = (market: Market, name: string) => results.find((one) => one.market === market)!.allergens.find((one) => one.name === name);
  return (
    <div>
      <h4>Totals over every source</h4>
      <table className="table">
        <caption className="sr-only">Fragrance allergens, their totals and where the rule speaks</caption>
        <thead><tr><th scope="col">Allergen</th><th scope="col">Total, of the product</th><th scope="col">Against</th><th scope="col">In</th></tr></thead>
        <tbody>
          {names.map((name) => {
            const own = markets.flatMap((market) => { const verdict = of(market, name); return verdict ? [{ market, verdict }] : []; });
            const { verdict } = own[0]!;
            return (
              <tr key={name}>
                <th scope="row">{name}</th>
                <td title={`${toDecimal(verdict.total.min)} % to ${toDecimal(verdict.total.max)} %`}>{sayTotal(verdict)}{verdict.certainty === 'possible' ? ', perhaps below' : ''}</td>
                <td>{verdict.threshold} %</td>
                <td className="quiet">{own.map(({ market }) => market).join(', ')}</td>
              </tr>
            );
          })}
        </tbody>
      </table>
      <p className="quiet end">The total adds what is added as itself and what comes inside perfumes, oils and extracts, at the greatest that the ranges allow. Exactly the threshold is not above it. The members of a group are those of today’s table, for every date.</p>
    </div>
  );
}
