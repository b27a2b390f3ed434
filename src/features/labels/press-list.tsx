import type { Check } from '#shared/artwork/checks.ts';
import { Icon } from '#src/ui/icon.tsx';
import { VerdictMark, VerdictWord } from '#src/ui/verdict-mark.tsx';
import { Panel } from '#src/ui/sheet.tsx';

const STATES: Readonly<Record<Check['state'], string>> = { passed: 'Passed', stop: 'Stops the press', decide: 'Needs a decision', note: 'Worth knowing' };

/** The list before the press: what to do first, then what passed, each with its figure. */
export function PressList({ checks }: { checks: readonly Check[] }) {
  const stops = checks.filter((check) => check.state === 'stop').length;
  const decisions = checks.filter((check) => check.state === 'decide').length;
  const passed = checks.filter((check) => check.state === 'passed').length;
  return (
    <Panel
      className="press" title="Before the press"
      end={
        <span className="press-sum quiet">
          {stops > 0 ? <VerdictWord weight="stop">{stops === 1 ? '1 stops the press' : `${stops} stop the press`}</VerdictWord> : null}
          {decisions > 0 ? <VerdictWord weight="decide">{decisions === 1 ? '1 needs a decision' : `${decisions} need a decision`}</VerdictWord> : null}
          <span>{passed === 1 ? '1 check passed' : `${passed} checks passed`}</span>
        </span>
      }
    >
      <ol>
        {checks.map((check) => (
          <li key={check.id}>
            {check.state === 'passed' ? <Icon name="check" className="passed" /> : <VerdictMark weight={check.state} silent />}
            <span title={check.citation}>
              <span className="sr-only">{STATES[check.state]}: </span>
              <span className={check.state === 'passed' ? 'mid' : 'strong'}>{check.what}</span> <span className="quiet">{check.detail}</span>
            </span>
            <span className="quiet figure">{check.figure}</span>
          </li>
        ))}
      </ol>
    </Panel>
  );
}
