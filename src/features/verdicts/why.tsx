import type { ReactNode } from 'react';
import type { Explanation } from '#shared/report/explain.ts';
import type { Finding } from '#shared/engine/types.ts';
import { Icon } from '#src/ui/icon.tsx';
import { Gauge } from './gauge.tsx';
import { sayDay } from '#src/lib/say.ts';
import { sayEffective, SourcingMark } from './finding-text.tsx';

export interface WhyProps {
  readonly finding: Finding;
  /** The rule behind it, its dates and readings; absent while the law is not at hand. */
  readonly explanation?: Explanation;
  /** Names for the places a figure comes from. */
  readonly nameOf: (from: string) => string;
  /** What would put it right, beyond the remedy itself. */
  readonly ways: readonly ReactNode[];
}

/** How a verdict was found: every step with its figure, the rule's dates and reading, and the ways out. */
export function Why({ finding, explanation, nameOf, ways }: WhyProps) {
  const steps = finding.arithmetic ?? [];
  const ends = explanation ? [] : [sayEffective(finding), finding.reading ?? ''].filter(Boolean);
  const asks = finding.needs ?? [];
  return (
    <div className={`why ${finding.severity}`}>
      <div>
        <h4>How this was found</h4>
        {steps.length > 0 ? (
          <table className="table">
            <caption className="sr-only">Steps of the sum</caption>
            <thead>
              <tr>
                <th scope="col">Step</th>
                <th scope="col">Figure</th>
                <th scope="col" className="from">From</th>
              </tr>
            </thead>
            <tbody>
              {steps.map((step, index) => (
                <tr key={index} className={index === steps.length - 1 ? 'res' : ''}>
                  <th scope="row">{step.step}</th>
                  <td>{step.figure}</td>
                  <td className="quiet from">{step.from ? nameOf(step.from) : ''}</td>
                </tr>
              ))}
            </tbody>
          </table>
        ) : (
          <p className="quiet">{finding.message}</p>
        )}
        {ends.map((sentence) => <p key={sentence} className="quiet end">{sentence}</p>)}
        {explanation ? <Grounds finding={finding} explanation={explanation} /> : <p className="cite">{finding.citation} <SourcingMark finding={finding} /></p>}
      </div>
      <div>
        {ways.length > 0 || asks.length > 0 || finding.remedy ? <h4>Ways out</h4> : null}
        <ul className="ways">
          {finding.remedy ? <li><Icon name="right" /><span>{finding.remedy}</span></li> : null}
          {ways.map((way, index) => <li key={index}><Icon name="right" /><span>{way}</span></li>)}
          {asks.length > 0 ? <li><Icon name="right" /><span>Answer what the law asks: {asks.join(', ')}.</span></li> : null}
          {(finding.suggestions ?? []).length > 0 ? <li><Icon name="right" /><span>Likely meant: {finding.suggestions!.join(', ')}.</span></li> : null}
        </ul>
        {finding.measured !== undefined && finding.limit !== undefined ? <Gauge measured={finding.measured} range={finding.measuredRange} limit={finding.limit} unit={finding.unit ?? '%'} severity={finding.severity} /> : null}
      </div>
    </div>
  );
}

/** The rule in words, what it is set with, its dates, the choices of reading, and the official text. */
function Grounds({ finding, explanation }: { finding: Finding; explanation: Explanation }) {
  const { says, parameters, dates, readings, source } = explanation;
  return (
    <div className="why-grounds">
      <section>
        <h4>What the rule says</h4>
        {says.map((sentence) => <p key={sentence}>{sentence}</p>)}
        <p className="cite">
          {finding.citation} <SourcingMark finding={finding} />
          {source ? <><br /><a href={source.link} target="_blank" rel="noreferrer" title={source.title}>Official text</a>. {source.state.replace(/\.$/, '')}.</> : null}
        </p>
      </section>
      <section>
        {parameters.length + dates.length > 0 ? (
          <>
            <h4>What it is set with</h4>
            <dl>
              {parameters.map(({ name, value }) => <div key={name}><dt>{name}</dt><dd>{value}</dd></div>)}
              {dates.map(({ words, day }) => <div key={words + day}><dt>{words}</dt><dd>{sayDay(day)}</dd></div>)}
            </dl>
          </>
        ) : null}
        {readings.length > 0 ? (
          <>
            <h4>Where the text leaves a choice</h4>
            <ul className="readings">{readings.map(({ chosen, why }) => <li key={chosen}><b>{chosen}</b> {why}</li>)}</ul>
          </>
        ) : null}
      </section>
    </div>
  );
}
