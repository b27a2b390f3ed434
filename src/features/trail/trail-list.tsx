import { useInfiniteQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { TrailLine } from '#shared/contracts/trail.contract.ts';
import { paths } from '#src/app/paths.ts';
import { sayError } from '#src/lib/api/error.ts';
import { sayCount, sayDay, sayTime, today } from '#src/lib/say.ts';
import { Banner } from '#src/ui/banner.tsx';
import { Button } from '#src/ui/button.tsx';
import { trailQuery } from './queries.ts';
import './trail.css';

/** Days from the newest, each with its entries. */
function byDay(lines: readonly TrailLine[]): (readonly [string, readonly TrailLine[]])[] {
  const days = new Map<string, TrailLine[]>();
  for (const line of lines) {
    const day = today(new Date(line.at));
    days.set(day, [...(days.get(day) ?? []), line]);
  }
  return [...days];
}

/** What was done, by whom and when, newest first, in plain words. */
export function TrailList({ product }: { product?: string }) {
  const { data, error, isPending, hasNextPage, isFetchingNextPage, fetchNextPage } = useInfiniteQuery(trailQuery(product));
  if (isPending) return <p className="quiet" aria-busy="true">Reading the trail.</p>;
  if (error) return <Banner weight="stop" title="The trail could not be read.">{sayError(error)}</Banner>;
  const lines = data.pages.flatMap((page) => page.items);
  if (lines.length === 0) return <p className="quiet">Nothing was done here since the trail begins. The next change is its first entry.</p>;
  return (
    <>
      {byDay(lines).map(([day, entries]) => (
        <section key={day} className="trail-day" aria-label={sayDay(day)}>
          <h3>{sayDay(day)}</h3>
          <ol>{entries.map((line) => <TrailRow key={line.place} line={line} isProduct={product !== undefined} />)}</ol>
        </section>
      ))}
      {hasNextPage ? <Button busy={isFetchingNextPage} onClick={() => void fetchNextPage()}>Older entries</Button> : <p className="hint">This is the beginning of the trail.</p>}
    </>
  );
}

function TrailRow({ line, isProduct }: { line: TrailLine; isProduct: boolean }) {
  const isOwn = isProduct && line.subjectKind === 'product';
  return (
    <li className="trail-row">
      <span className="figure quiet" title={`Entry ${line.place}, ${line.at}`}>{sayTime(new Date(line.at))}</span>
      <div>
        <p><b>{line.actor}</b> {line.act} {isOwn ? 'this product' : <Subject line={line} />}</p>
        {line.changes.length > 0 ? <Changes line={line} /> : null}
      </div>
      <code title="Seal of this entry: SHA-256 over what it says and the seal before it">{line.hash.slice(0, 8)}</code>
    </li>
  );
}

function Subject({ line }: { line: TrailLine }) {
  const kind = <span className="quiet"> ({line.subjectKind})</span>;
  if (line.subjectId && line.subjectKind === 'product') return <><Link to={paths.product(line.subjectId)}>{line.subject}</Link>{kind}</>;
  if (line.subjectId && line.subjectKind === 'material') return <><Link to={paths.material(line.subjectId)}>{line.subject}</Link>{kind}</>;
  return <>{line.subject}{kind}</>;
}

/** Three changes at a glance, the rest on asking. */
const GLANCE = 3;

function Changes({ line }: { line: TrailLine }) {
  const rows = line.changes.map((change, index) => (
    <li key={index}><span className="where">{change.where}:</span> <del>{change.before}</del> <span aria-hidden="true">→</span> <ins>{change.after}</ins></li>
  ));
  if (rows.length <= GLANCE) return <ul className="trail-changes">{rows}</ul>;
  return (
    <details>
      <summary>{sayCount(rows.length, 'change')}</summary>
      <ul className="trail-changes">{rows}</ul>
    </details>
  );
}
