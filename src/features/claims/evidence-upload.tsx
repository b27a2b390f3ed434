import { useId, useState } from 'react';
import type { ChangeEvent } from 'react';
import type { ClaimEvidence } from '#shared/contracts/evidence.contract.ts';
import { ApiError, sayError } from '#src/lib/api/error.ts';
import { ACCEPTED, MOST_BYTES } from '#src/lib/papers.ts';
import { sayBytes, sayDay } from '#src/lib/say.ts';
import { Button } from '#src/ui/button.tsx';
import { FieldFault, SelectField, TextField } from '#src/ui/field.tsx';
import { Icon } from '#src/ui/icon.tsx';
import { Progress } from '#src/ui/progress.tsx';
import { useToast } from '#src/ui/toast.tsx';
import { EVIDENCE_KINDS } from './evidence-kinds.ts';
import { useAddEvidence } from './mutations.ts';

/** A place to attach what shows a claim: a file, its kind and its day. */
export function EvidenceUpload({ productId, claim, isAsked }: { productId: string; claim: string; isAsked: boolean }) {
  const inputId = useId();
  const [file, setFile] = useState<File | null>(null);
  const [fault, setFault] = useState('');
  const take = (chosen: File | undefined) => {
    if (!chosen) return;
    const isLarge = chosen.size > MOST_BYTES;
    setFault(isLarge ? `${chosen.name} is ${sayBytes(chosen.size)}. A paper may be 20 MB at most.` : '');
    setFile(isLarge ? null : chosen);
  };
  return (
    <div className="evidence-add" role="group" aria-label={`Attach evidence for ${claim}`}>
      {file ? <EvidenceForm key={file.name + file.size} productId={productId} claim={claim} file={file} onDone={() => setFile(null)} /> : (
        <>
          <input id={inputId} type="file" className="sr-only" accept={ACCEPTED} onChange={(event: ChangeEvent<HTMLInputElement>) => { take(event.target.files?.[0]); event.target.value = ''; }} />
          <label className="btn small" htmlFor={inputId}><Icon name="upload" /> Attach evidence<span className="sr-only"> for {claim}</span></label>
          {isAsked ? <span className="hint">PDF or photo, up to 20 MB</span> : null}
        </>
      )}
      {fault ? <FieldFault>{fault}</FieldFault> : null}
    </div>
  );
}

function EvidenceForm({ productId, claim, file, onDone }: { productId: string; claim: string; file: File; onDone: () => void }) {
  const add = useAddEvidence(productId);
  const toast = useToast();
  const [kind, setKind] = useState<ClaimEvidence['kind']>('test-report');
  const [dated, setDated] = useState('');
  const [sent, setSent] = useState(0);
  const issue = (field: string) => (add.error instanceof ApiError ? add.error.issues.find((one) => one.pointer === `/${field}`)?.message : undefined);
  const send = () => add.mutate(
    { file, fields: { kind, claim, ...(dated ? { dated } : {}) }, onProgress: setSent },
    { onSuccess: () => { toast(`${EVIDENCE_KINDS[kind]} attached.`); onDone(); } },
  );
  return (
    <div className="evidence-form">
      <p className="[overflow-wrap:anywhere]"><b>{file.name}</b> <span className="quiet">{sayBytes(file.size)}</span></p>
      <div className="evidence-fields">
        <SelectField label="Kind" value={kind} onChange={(event) => setKind(event.target.value as ClaimEvidence['kind'])}>
          {Object.entries(EVIDENCE_KINDS).map(([key, word]) => <option key={key} value={key}>{word}</option>)}
        </SelectField>
        <TextField type="date" label="Dated" value={dated} onChange={(event) => setDated(event.target.value)} hint={dated ? sayDay(dated) : undefined} error={issue('dated')} />
      </div>
      {add.isPending ? <Progress label={`Sending ${file.name}`} done={Math.round(sent * 100)} all={100} /> : null}
      {add.error ? <FieldFault>{sayError(add.error)}</FieldFault> : null}
      <div className="flex gap-2">
        <Button small weight="act" busy={add.isPending} onClick={send}>{add.isPending ? 'Being sent' : add.error ? 'Try again' : 'Attach'}</Button>
        <Button small onClick={onDone} disabled={add.isPending}>Not this one</Button>
      </div>
    </div>
  );
}
