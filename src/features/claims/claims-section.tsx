import { useQuery } from '@tanstack/react-query';
import { useEffect, useRef, type ReactNode } from 'react';
import { useLocation } from 'react-router-dom';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import type { Finding } from '#shared/engine/types.ts';
import type { Market } from '#shared/law/types.ts';
import { sayError } from '#src/lib/api/error.ts';
import { Tag } from '#src/ui/tag.tsx';
import { VerdictMark } from '#src/ui/verdict-mark.tsx';
import { buildClaimRows, sayAnswer, type ClaimRowView } from './claim-rows.ts';
import { EvidenceList } from './evidence-list.tsx';
import { EvidenceUpload } from './evidence-upload.tsx';
import { evidenceQueries } from './queries.ts';
import './claims.css';

export interface ClaimsSectionProps {
  readonly productId: string;
  readonly draft: Pick<ProductDraft, 'name' | 'claims'>;
  readonly results: readonly { readonly market: Market; readonly findings: readonly Finding[] }[];
  readonly isReadOnly: boolean;
  /** Where claims are written. */
  readonly editLink: ReactNode;
}

/** Each claim and the name, the words a verdict stands on marked, and a place for what shows them. */
export function ClaimsSection({ productId, draft, results, isReadOnly, editLink }: ClaimsSectionProps) {
  const evidence = useQuery(evidenceQueries.ofProduct(productId));
  const { rows, leftOver } = buildClaimRows(draft, results, evidence.data?.items ?? []);
  const place = useRef<HTMLElement>(null);
  const { hash } = useLocation();
  useEffect(() => {
    if (hash === '#claims') place.current?.scrollIntoView();
  }, [hash]);
  const columns = { gridTemplateColumns: `minmax(0, 1fr) repeat(${results.length}, var(--market-column))` };
  return (
    <section className="claims" id="claims" ref={place} aria-labelledby="claims-title">
      <div className="claims-head">
        <h2 id="claims-title">Claims and their evidence</h2>
        <p className="quiet">The words a verdict stands on are marked. A paper does not settle a verdict: whether it shows what the claim says is for a person to decide.</p>
      </div>
      {rows.map((row) => (
        <article className="claim-row" key={row.text} style={columns} aria-label={row.isName ? `Name: ${row.text}` : row.text}>
          <div className="claim-words">
            <p className="claim-text" lang={row.lang || undefined}>{row.isName ? <ClaimText row={row} /> : <>“<ClaimText row={row} />”</>} {row.isName ? <Tag>name</Tag> : row.lang === 'en' ? null : <Tag>{row.lang}</Tag>}</p>
            <EvidenceList productId={productId} papers={row.papers} isReadOnly={isReadOnly} />
            {row.isJudged ? null : <p className="claim-lack">Claims are judged in English, German and French. Have this one read by a person.</p>}
            {row.isBeyondEvidence ? <p className="claim-lack">No paper mends this: change the words or the formula.</p> : null}
            {row.asksEvidence && row.papers.length === 0 && evidence.isSuccess ? <p className="claim-lack">No evidence attached yet.</p> : null}
            {isReadOnly || row.isBeyondEvidence || (row.isName && !row.asksEvidence) ? null : <EvidenceUpload productId={productId} claim={row.text} isAsked={row.asksEvidence} />}
          </div>
          {results.map(({ market }) => <MarketCell key={market} market={market} isJudged={row.isJudged} findings={row.byMarket.get(market) ?? []} />)}
        </article>
      ))}
      {draft.claims.length === 0 ? <p className="claims-none">No claim is written down yet. {editLink}</p> : null}
      {evidence.error ? <p className="error claims-none" role="alert">{sayError(evidence.error)}</p> : null}
      {leftOver.length > 0 ? (
        <div className="claims-left">
          <h3>Papers for words that no longer stand here</h3>
          <EvidenceList productId={productId} papers={leftOver} isReadOnly={isReadOnly} saysClaim />
        </div>
      ) : null}
    </section>
  );
}

function ClaimText({ row }: { row: ClaimRowView }) {
  return row.stretches.map(({ text, weight }, index) => (weight ? <mark key={index} className={weight}>{text}</mark> : <span key={index}>{text}</span>));
}

function MarketCell({ market, isJudged, findings }: { market: Market; isJudged: boolean; findings: readonly Finding[] }) {
  const [first] = findings;
  return (
    <div className={`claim-cell ${first ? '' : 'no'}`} data-market={market}>
      {first ? <VerdictMark weight={first.severity} silent /> : null}
      <span><span className="sr-only">{market}: </span>{isJudged ? sayAnswer(findings) : 'not judged'}</span>
    </div>
  );
}
