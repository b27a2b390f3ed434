import type { ReactNode } from 'react';
import type { MergedFinding, ReportModel } from '#shared/report/report-model.ts';
import { VerdictMark } from '#src/ui/verdict-mark.tsx';
import { FormulaTable, LadderTable, ParticularsTable } from './report-tables.tsx';
import './report.css';

/** The report as it will lie on paper: white in either theme, the same sections in the same order. */
export function ReportPaper({ model }: { model: ReportModel }) {
  return (
    <article className="report slip" aria-label="Compliance report">
      <header>
        <p className="run"><b>Colophon</b> report<span>{model.house}</span></p>
        <h2 className="title">{model.name}</h2>
        <p className="sub">{model.subtitle}</p>
      </header>
      <Part head="Finding">
        <ul className="tally">
          {(['stop', 'decide', 'note'] as const).map((weight) => (
            <li key={weight} className={weight} data-nil={model.counts[weight] === 0 || undefined}>
              <VerdictMark weight={weight} silent />
              <strong>{model.counts[weight]}</strong> {WORDS[weight]}
            </li>
          ))}
        </ul>
        <p>{model.finding}</p>
      </Part>
      <Part head="Declaration">
        {model.declarations.map((entry) => (
          <div key={entry.label} className="declared">
            <h4>{entry.label}</h4>
            <p><b>{entry.heading}:</b> {entry.names.map((name, index) => <span key={index} className="whole">{name}{index < entry.names.length - 1 ? ', ' : '.'}</span>)}</p>
          </div>
        ))}
      </Part>
      {(['stop', 'decide', 'note'] as const).map((weight) => <Verdicts key={weight} head={WORDS[weight]} weight={weight} findings={model.verdicts[weight]} />)}
      {model.requiredWording.length > 0 ? (
        <Part head="Required wording" note="As the law prints it">
          {model.requiredWording.map((wording, index) => (
            <p key={index}>{wording.market}, {wording.lang}: {wording.isOfficialText ? `“${wording.text}”` : wording.text} <span className="cite">{wording.citation}</span></p>
          ))}
        </Part>
      ) : null}
      {model.ladder ? <Part head="Shares" note={model.ladder.note}><LadderTable ladder={model.ladder} /></Part> : null}
      <Part head="Formula" note={model.formula.basis}><FormulaTable formula={model.formula} /></Part>
      <Part head="Particulars" note={model.markets.join(', ')}><ParticularsTable rows={model.particulars} /></Part>
      <Part head="Not checked">{model.notChecked.map((text) => <p key={text}>{text}</p>)}</Part>
      <Part head="Law read"><p>Data: {model.dataRelease}. The law was read on {model.lawReadOn}.</p></Part>
      <Part head="Cautions">{model.cautions.map((text) => <p key={text}>{text}</p>)}</Part>
    </article>
  );
}

const WORDS = { stop: 'Stops sale', decide: 'Needs a decision', note: 'Worth knowing' } as const;

function Part({ head, note, children, tone = '' }: { head: string; note?: string; children: ReactNode; tone?: string }) {
  return (
    <section className={`part ${tone}`}>
      <h3>{head}{note ? <small>{note}</small> : null}</h3>
      <div>{children}</div>
    </section>
  );
}

function Verdicts({ head, weight, findings }: { head: string; weight: 'stop' | 'decide' | 'note'; findings: readonly MergedFinding[] }) {
  if (findings.length === 0) return null;
  return (
    <Part head={head} tone={weight}>
      {findings.map((finding, index) => (
        <div key={index} className="verdict">
          <VerdictMark weight={weight} silent />
          <div>
            <h4>{finding.act} <span className="markets">{finding.markets.join(', ')}</span></h4>
            {finding.why ? <p>{finding.why}</p> : null}
            {finding.arithmetic.map((line) => <p key={line} className="sum">{line}</p>)}
            {finding.reading ? <p className="cite">Reading: {finding.reading}</p> : null}
            <p className="cite">
              {finding.citations.join(' · ')}
              {finding.sourcing === 'memory' ? ' · from memory: re-read before relying on it' : finding.sourcing === 'secondary' ? ' · from a secondary source' : ''}
            </p>
          </div>
        </div>
      ))}
    </Part>
  );
}
