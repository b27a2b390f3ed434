import type { MarketAssessment } from '#shared/engine/assessment.ts';
import type { Finding } from '#shared/engine/types.ts';
import { MARKET_NAMES } from '#shared/report/words.ts';

const NOT_CHECKED = [
  'Stability, microbiology, preservation and the pack: no rule reads these from a formula.',
  'Impurities and purity beyond what is entered with the materials.',
  'The safety assessment of the finished product, and national rules outside the data release.',
  'Whether the evidence for a claim holds.',
];

/** What these verdicts do not say, in general and of each market, and points that rest on memory or on the bench. */
export function NotChecked({ memory, handling, results }: { memory: number; handling: readonly Finding[]; results: readonly Pick<MarketAssessment, 'market' | 'notChecked'>[] }) {
  return (
    <section className="not-checked" aria-label="What was not checked">
      <div>
        <h3>What was not checked</h3>
        <ul>{NOT_CHECKED.map((each) => <li key={each}>{each}</li>)}</ul>
        {results.filter(({ notChecked }) => notChecked.length > 0).map(({ market, notChecked }) => (
          <details key={market}>
            <summary>{MARKET_NAMES[market]}: {notChecked.length === 1 ? 'one point' : `${notChecked.length} points`} of law left open</summary>
            <ul>{notChecked.map((each) => <li key={each}>{each}</li>)}</ul>
          </details>
        ))}
      </div>
      <div>
        {handling.length > 0 ? (
          <>
            <h3>In the making</h3>
            <ul>{handling.map((finding) => <li key={finding.rule + finding.subject + finding.message}>{finding.message} {finding.remedy} {finding.citation}.</li>)}</ul>
          </>
        ) : null}
        <h3>How firm the sources are</h3>
        <p className="quiet">
          {memory > 0
            ? `${memory === 1 ? 'One verdict rests' : `${memory} verdicts rest`} on figures set down from memory, marked where they stand. Check them in the official text before you rely on them.`
            : 'No verdict above rests on memory alone; secondary sources are marked where they stand.'}
        </p>
      </div>
    </section>
  );
}
