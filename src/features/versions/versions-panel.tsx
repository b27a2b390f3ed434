import { useMemo, useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import type { Finding } from '#shared/engine/types.ts';
import type { Market } from '#shared/law/types.ts';
import type { MarketAssessment } from '#shared/engine/assessment.ts';
import { compareResults, type ResultChange } from '#src/features/workspace/compare-results.ts';
import { compareDrafts, type Difference } from '#src/features/workspace/differences.ts';
import { sayError } from '#src/lib/api/error.ts';
import { sayCount, sayList, sayWhen } from '#src/lib/say.ts';
import { Banner } from '#src/ui/banner.tsx';
import { Button } from '#src/ui/button.tsx';
import { SelectField } from '#src/ui/field.tsx';
import { VerdictMark } from '#src/ui/verdict-mark.tsx';
import { versionQueries } from './queries.ts';
import './versions.css';

export interface VersionsPanelProps {
  readonly id: string;
  /** The product as it stands on this screen. */
  readonly draft: ProductDraft;
  readonly version: number;
  readonly nameOf: (materialId: string) => string;
  /** Judges a draft in one market, for the days at hand. */
  readonly judge: (draft: ProductDraft, market: Market) => MarketAssessment;
  /** Takes an earlier state up again, as one step that can be undone; absent for readers. */
  readonly onTakeUp?: ((draft: ProductDraft) => void) | undefined;
}

/** Any two states of a product side by side: what was changed, and what the law says to it. */
export function VersionsPanel({ id, draft, version, nameOf, judge, onTakeUp }: VersionsPanelProps) {
  const { data: lines = [], error } = useQuery(versionQueries.list(id, version));
  const [picked, setPicked] = useState<number | null>(null);
  const from = picked ?? lines.find((line) => line.version < version)?.version ?? 0;
  const { data: earlier } = useQuery(versionQueries.one(id, from));
  const before = earlier?.draft;
  const differences = useMemo(() => (before ? compareDrafts(before, before, draft, nameOf) : []), [before, draft, nameOf]);
  const effects = useMemo(() => (before ? draft.markets.flatMap((market) => {
    const change = compareResults(judge(before, market), judge(draft, market));
    return change ? [{ market, change }] : [];
  }) : []), [before, draft, judge]);
  if (error) return <Banner weight="stop" title="The versions could not be read.">{sayError(error)}</Banner>;
  if (lines.length < 2 && from === 0) return <p className="quiet">There is one version so far. The next saved change is compared with it here.</p>;
  return (
    <div className="versions">
      <div className="versions-head">
        <SelectField label="Compare with" value={from} onChange={(event) => setPicked(Number(event.target.value))}>
          {lines.map((line) => <option key={line.version} value={line.version}>Version {line.version}, {sayWhen(line.savedAt)}, {line.savedBy}</option>)}
        </SelectField>
        {before && onTakeUp && differences.length > 0 ? <Button small icon="undo" onClick={() => onTakeUp(before)}>Take version {from} up again</Button> : null}
      </div>
      {before ? (
        <div className="versions-two">
          <section aria-label="What was changed">
            <h3>{differences.length === 0 ? 'Nothing was changed' : sayCount(differences.length, 'change')}</h3>
            <DifferenceTable differences={differences} from={from} />
          </section>
          <section aria-label="What the law says to it">
            <h3>{effects.length === 0 ? 'No verdict and no list changes' : 'What the law says to it'}</h3>
            {togetherWhereAlike(effects).map(({ markets, change }) => <EffectOf key={markets.join()} markets={markets} change={change} />)}
            {effects.length > 0 ? <p className="hint">Both are judged for the days chosen above, with the materials as they are today.</p> : null}
          </section>
        </div>
      ) : <p className="quiet" aria-busy="true">Reading version {from}.</p>}
    </div>
  );
}

function DifferenceTable({ differences, from }: { differences: readonly Difference[]; from: number }) {
  if (differences.length === 0) return null;
  return (
    <table className="table versions-table">
      <thead><tr><th scope="col">What</th><th scope="col">Version {from}</th><th scope="col">Now</th></tr></thead>
      <tbody>{differences.map((one) => <tr key={one.id}><th scope="row">{one.title}</th><td data-l={`Version ${from}`}>{one.before}</td><td data-l="Now">{one.theirs}</td></tr>)}</tbody>
    </table>
  );
}

/** Markets in which a change says the same are told once. */
function togetherWhereAlike(effects: readonly { readonly market: Market; readonly change: ResultChange }[]): { markets: Market[]; change: ResultChange }[] {
  const groups = new Map<string, { markets: Market[]; change: ResultChange }>();
  for (const { market, change } of effects) {
    const key = JSON.stringify([[change.added, change.removed].map((findings) => findings.map(({ kind, message }) => [kind, message])), change.list, change.wording]);
    const group = groups.get(key);
    if (group) group.markets.push(market);
    else groups.set(key, { markets: [market], change });
  }
  return [...groups.values()];
}

function EffectOf({ markets, change }: { markets: readonly Market[]; change: ResultChange }) {
  const { list } = change;
  const said = [list.added.length > 0 ? `now names ${sayList(list.added)}` : '', list.removed.length > 0 ? `no longer names ${sayList(list.removed)}` : ''].filter(Boolean).join('; ');
  return (
    <div className="versions-effect">
      <h4>{sayList(markets)}</h4>
      <ul>
        {change.added.map((finding) => <Point key={`+${finding.message}`} finding={finding} word="New" />)}
        {change.removed.map((finding) => <Point key={`-${finding.message}`} finding={finding} word="Gone" />)}
        {list.isChanged ? <li><span>The list {said || 'stands in another order'}.</span></li> : null}
        {change.wording.map((text) => <li key={text}><span>The label must carry “{text}”.</span></li>)}
      </ul>
    </div>
  );
}

function Point({ finding, word }: { finding: Finding; word: string }) {
  return <li className={word === 'Gone' ? 'gone' : ''}><VerdictMark weight={finding.severity} /><span><b>{word}:</b> {finding.message}</span></li>;
}
