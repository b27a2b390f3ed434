import { memo, type ReactNode } from 'react';
import type { Finding } from '#shared/engine/types.ts';
import { sayWeight, VerdictMark, VerdictWord } from '#src/ui/verdict-mark.tsx';
import { headOf, SourcingMark, whyOf } from './finding-text.tsx';
import { countFindings, type Counts } from './merge.ts';
import './verdicts.css';

export interface RailItem {
  readonly finding: Finding;
  readonly keys: readonly string[];
  readonly act?: ReactNode;
}

/** `2 need a decision`. */
export function CountWords({ counts }: { counts: Counts }) {
  return (
    <span className="count-words">
      {counts.stop > 0 ? <VerdictWord weight="stop">{counts.stop} {counts.stop === 1 ? 'stops sale' : 'stop sale'}</VerdictWord> : null}
      {counts.decide > 0 ? <VerdictWord weight="decide">{counts.decide} {counts.decide === 1 ? 'needs a decision' : 'need a decision'}</VerdictWord> : null}
      {counts.note > 0 ? <VerdictWord weight="note">{counts.note} worth knowing</VerdictWord> : null}
    </span>
  );
}

export interface VerdictRailProps {
  readonly items: readonly RailItem[];
  readonly release: string;
  readonly lit: ReadonlySet<string>;
  readonly onLight: (keys: readonly string[] | null) => void;
  readonly all: ReactNode;
}

/** The verdicts of the market at hand, beside the formula: what to do, why, citation. */
export const VerdictRail = memo(function VerdictRail({ items, release, lit, onLight, all }: VerdictRailProps) {
  if (items.length === 0) {
    return (
      <p className="rail-none">
        No rule in data release {release} is broken, and nothing waits for a decision. That is what these tables know; it is no certificate.
      </p>
    );
  }
  const shown = items.slice(0, 12);
  return (
    <>
      <ol className="rail">
        {shown.map(({ finding, keys, act }, index) => (
          <li
            key={`${finding.rule}|${finding.subject}|${index}`}
            className={`${finding.severity} ${keys.some((key) => lit.has(key)) ? 'lit' : ''}`}
            onPointerEnter={() => onLight(keys)}
            onPointerLeave={() => onLight(null)}
            onFocus={() => onLight(keys)}
            onBlur={() => onLight(null)}
          >
            <VerdictMark weight={finding.severity} silent />
            <div>
              <h3>
                <span className="sr-only">{sayWeight(finding.severity)}: </span>
                {headOf(finding)}
              </h3>
              {whyOf(finding) ? <p>{whyOf(finding)}</p> : null}
              {act}
              <p className="cite">
                {finding.citation} <SourcingMark finding={finding} />
              </p>
            </div>
          </li>
        ))}
      </ol>
      <p className="rail-more">
        {items.length > shown.length ? `${items.length - shown.length} more. ` : ''}
        {all}
      </p>
    </>
  );
});

export function railCounts(items: readonly RailItem[]): Counts {
  return countFindings(items.map((item) => item.finding));
}
