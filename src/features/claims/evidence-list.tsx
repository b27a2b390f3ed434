import { useState } from 'react';
import { getEvidence, type ClaimEvidence } from '#shared/contracts/evidence.contract.ts';
import { urlOf } from '#src/lib/api/url.ts';
import { sayBytes, sayDay } from '#src/lib/say.ts';
import { IconButton } from '#src/ui/button.tsx';
import { TakeAwayDialog } from '#src/ui/take-away-dialog.tsx';
import { Icon } from '#src/ui/icon.tsx';
import { useToast } from '#src/ui/toast.tsx';
import { EVIDENCE_KINDS } from './evidence-kinds.ts';
import { useRemoveEvidence } from './mutations.ts';

interface EvidenceListProps {
  readonly productId: string;
  readonly papers: readonly ClaimEvidence[];
  readonly isReadOnly: boolean;
  /** Whether to say which words each paper was attached for. */
  readonly saysClaim?: boolean;
}

/** The papers behind a claim, each to be opened or taken away. */
export function EvidenceList({ productId, papers, isReadOnly, saysClaim = false }: EvidenceListProps) {
  const [leaving, setLeaving] = useState<ClaimEvidence | null>(null);
  if (papers.length === 0) return null;
  return (
    <>
      <ul className="evidence">
        {papers.map((paper) => (
          <li key={paper.id}>
            <Icon name="sheet" />
            <span>
              <a href={urlOf(getEvidence, { params: { id: productId, documentId: paper.id } })} target="_blank" rel="noreferrer">{EVIDENCE_KINDS[paper.kind]}, {paper.fileName}</a>
              <span className="quiet">{paper.dated ? `dated ${sayDay(paper.dated)}` : 'not dated'}, {sayBytes(paper.bytes)}, attached by {paper.addedBy} on {sayDay(paper.addedAt.slice(0, 10))}{saysClaim && paper.claim !== '' ? <> for “{paper.claim}”</> : null}</span>
            </span>
            {isReadOnly ? null : <IconButton icon="away" word={`Take away ${paper.fileName}`} onClick={() => setLeaving(paper)} />}
          </li>
        ))}
      </ul>
      {leaving ? <RemoveDialog productId={productId} paper={leaving} onClose={() => setLeaving(null)} /> : null}
    </>
  );
}

function RemoveDialog({ productId, paper, onClose }: { productId: string; paper: ClaimEvidence; onClose: () => void }) {
  const remove = useRemoveEvidence(productId);
  const toast = useToast();
  return (
    <TakeAwayDialog
      title="Take this paper away?"
      what={`${EVIDENCE_KINDS[paper.kind]}, ${paper.fileName}`}
      isBusy={remove.isPending}
      error={remove.error}
      onTakeAway={() => remove.mutate(paper.id, { onSuccess: () => { toast(`${paper.fileName} taken away.`); onClose(); } })}
      onClose={onClose}
    />
  );
}
