/** What the sum of one entry needs; decimals as text. */
export interface ListedSource {
  readonly materialId: string;
  readonly name: string;
  readonly grams: string;
  readonly ofMaterial: { readonly min: string; readonly typical: string; readonly max: string };
  readonly share: { readonly min: string; readonly typical: string; readonly max: string };
  readonly isInside: boolean;
}
export interface ListedEntry {
  readonly key: string;
  readonly name: string;
  readonly inci: string;
  readonly zone: 'ordered' | 'free' | 'allergen' | 'colourant' | 'may-contain' | 'unnamed';
  readonly exact: { readonly min: string; readonly typical: string; readonly max: string };
  readonly sources: readonly ListedSource[];
  readonly isUnsure: boolean;
  readonly isFree: boolean;
  readonly certainty?: 'certain' | 'possible';
  readonly members: readonly string[];
  readonly why: readonly string[];
  readonly citation: string;
}

/** `4.35 to 4.8`, or one figure. */
export function sayShare(share: { readonly min: string; readonly max: string; readonly typical: string }): string {
  return share.min === share.max ? share.typical : `${share.min} to ${share.max}`;
}

const ZONE: Readonly<Record<ListedEntry['zone'], string>> = {
  ordered: 'In descending order: it may not be moved.',
  free: 'Below the line of the free part: it may stand anywhere within it.',
  allergen: 'Named as a fragrance allergen; it may stand anywhere in the free part.',
  colourant: 'A colourant: colourants close the list.',
  'may-contain': 'A shade that may be present.',
  unnamed: 'Not named.',
};

/** The arithmetic of one printed name: which materials, how much of each, the range, the zone and why this name. */
export function EntrySum({ entry, totalGrams }: { entry: ListedEntry; totalGrams: string }) {
  const isRange = entry.exact.min !== entry.exact.max;
  return (
    <div className="entry-sum">
      {entry.sources.length > 0 ? (
        <div className="table-scroll">
          <table className="table">
            <caption className="sr-only">Where the {entry.name} comes from</caption>
            <thead>
              <tr>
                <th scope="col">Material</th>
                <th scope="col" className="num">in the batch</th>
                <th scope="col" className="num">{entry.sources.some((source) => source.isInside) ? 'within it' : 'of it'}</th>
                <th scope="col" className="num">share of the product</th>
              </tr>
            </thead>
            <tbody>
              {entry.sources.map((source) => (
                <tr key={source.materialId}>
                  <th scope="row">{source.name}</th>
                  <td className="num">{source.grams} g</td>
                  <td className="num">{sayShare(source.ofMaterial)} %</td>
                  <td className="num">{sayShare(source.share)} %</td>
                </tr>
              ))}
            </tbody>
            <tfoot>
              <tr>
                <th scope="row">Sum over {totalGrams} g</th>
                <td colSpan={3} className="num">
                  {isRange ? `${sayShare(entry.exact)} %, usually ${entry.exact.typical} %` : `${entry.exact.typical} %`}
                </td>
              </tr>
            </tfoot>
          </table>
        </div>
      ) : null}
      {entry.members.length > 1 ? <p>Printed once for {entry.members.join(', ')}.</p> : null}
      {entry.certainty === 'possible' ? <p>Named because the greatest that the ranges allow is above the threshold; the least is not.</p> : null}
      <p>{ZONE[entry.zone]}</p>
      {entry.why.map((sentence) => <p key={sentence}>{sentence}</p>)}
      <p className="cite">{entry.citation}</p>
    </div>
  );
}
