import { useState, type ReactNode } from 'react';
import type { Finding } from '#shared/engine/types.ts';
import type { Market } from '#shared/law/types.ts';
import type { Explanation } from '#shared/report/explain.ts';
import { TextButton } from '#src/ui/button.tsx';
import { sayWeight, VerdictMark, VerdictWord } from '#src/ui/verdict-mark.tsx';
import { headOf, SourcingMark, sumOf, whyOf } from './finding-text.tsx';
import { cellWords, SEVERITIES, summarise, type Counts, type MergedFinding } from './merge.ts';
import { NoteRow, type LedgerNote } from './note-row.tsx';
import { Why } from './why.tsx';
import './verdicts.css';

export interface LedgerProps {
  readonly findings: readonly MergedFinding[];
  readonly counts: ReadonlyMap<Market, Counts>;
  readonly sold: readonly Market[];
  readonly release: string;
  readonly nameOf: (from: string) => string;
  /** A button that puts a finding right at once, where there is one. */
  readonly actOf: (finding: MergedFinding) => ReactNode;
  readonly waysOf: (finding: MergedFinding) => readonly ReactNode[];
  /** What stands behind a finding in a market: asked when someone opens it. */
  readonly explain: (finding: Finding, market: Market) => Explanation;
  /** Further things worth knowing, below the findings of that weight. */
  readonly notes?: readonly LedgerNote[];
  readonly isWorking: boolean;
}

/** Every finding once, with a column for each market: a dash means that no rule speaks. */
export function Ledger({ findings, counts, sold, release, nameOf, actOf, waysOf, explain, notes = [], isWorking }: LedgerProps) {
  const markets = [...counts.keys()];
  const words = summarise(counts, release);
  const columns = { gridTemplateColumns: `minmax(0, 1fr) repeat(${markets.length}, var(--market-column))` };
  return (
    <div className="ledger" aria-busy={isWorking}>
      <div className="ledger-sum" style={columns}>
        <div>
          <p className="lead">{words.first}</p>
          {words.second ? <p className="quiet">{words.second}</p> : null}
        </div>
        {markets.map((market) => {
          const count = counts.get(market)!;
          return (
            <div className="col" key={market}>
              <b>
                {market} {sold.includes(market) ? null : <span className="trial">trial</span>}
              </b>
              <span className="n">
                {SEVERITIES.map((severity) => (count[severity] > 0 ? (
                  <span key={severity} className={`weight ${severity}`} title={sayWeight(severity)}>
                    <VerdictMark weight={severity} />
                    {count[severity]}
                  </span>
                ) : null))}
                {count.stop + count.decide + count.note === 0 ? <span>nothing found</span> : null}
              </span>
            </div>
          );
        })}
      </div>
      {SEVERITIES.map((severity) => {
        const group = findings.filter((finding) => finding.severity === severity);
        const more = severity === 'note' ? notes : [];
        return group.length + more.length === 0 ? null : (
          <section key={severity} aria-label={sayWeight(severity)}>
            <h2 className="ledger-head"><VerdictWord weight={severity} /></h2>
            {group.map((finding) => (
              <LedgerRow key={finding.id} finding={finding} markets={markets} columns={columns} nameOf={nameOf} act={actOf(finding)} ways={waysOf(finding)} explain={explain} />
            ))}
            {more.map((note) => <NoteRow key={note.id} note={note} markets={markets} columns={columns} />)}
          </section>
        );
      })}
      {findings.length === 0 && notes.length === 0 ? <p className="ledger-none">No rule in data release {release} is broken, and nothing waits for a decision.</p> : null}
    </div>
  );
}

interface LedgerRowProps {
  readonly finding: MergedFinding;
  readonly markets: readonly Market[];
  readonly columns: { readonly gridTemplateColumns: string };
  readonly nameOf: (from: string) => string;
  readonly act: ReactNode;
  readonly ways: readonly ReactNode[];
  readonly explain: LedgerProps['explain'];
}
function LedgerRow({ finding, markets, columns, nameOf, act, ways, explain }: LedgerRowProps) {
  const [isOpen, setOpen] = useState(false);
  const { lead } = finding;
  const leads = [...finding.markets].find(([, own]) => own === lead)![0];
  const sum = sumOf(lead);
  return (
    <article className="ledger-row" style={columns}>
      <div className="words">
        <div>
          <h3>{headOf(lead)}</h3>
          {whyOf(lead) ? <p className="why0">{whyOf(lead)}</p> : null}
          {act ? <div className="acts">{act}</div> : null}
        </div>
        <div className="grounds">
          {sum ? <p>{sum.length > 160 ? `${sum.slice(0, sum.indexOf(';', 90) + 1 || 160)} …` : sum}</p> : null}
          <p className="cite">
            {finding.citations.join('; ')} <SourcingMark finding={lead} />
          </p>
          <TextButton aria-expanded={isOpen} onClick={() => setOpen(!isOpen)} aria-label={`${isOpen ? 'Hide why' : 'Why'}: ${headOf(lead)}`}>
            {isOpen ? 'Hide why' : 'Why?'}
          </TextButton>
        </div>
      </div>
      {markets.map((market) => {
        const own = finding.markets.get(market);
        if (!own) {
          return (
            <div className="cell no" key={market} data-market={market}>
              <span aria-hidden="true">–</span>
              <span className="sr-only">{market}: no rule speaks</span>
            </div>
          );
        }
        const { figure, against } = cellWords(own);
        return (
          <div className="cell" key={market} data-market={market}>
            <VerdictMark weight={own.severity} />
            <b><span className="sr-only">{market}: </span>{figure}</b>
            <span className="quiet">{against}</span>
          </div>
        );
      })}
      {isOpen ? <Why finding={lead} explanation={explain(lead, leads)} nameOf={nameOf} ways={ways} /> : null}
    </article>
  );
}
