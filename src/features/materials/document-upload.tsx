import { useId, useState } from 'react';
import type { ChangeEvent, DragEvent } from 'react';
import type { MaterialDocument } from '#shared/contracts/materials.contract.ts';
import { ApiError, sayError } from '#src/lib/api/error.ts';
import { ACCEPTED, MOST_BYTES } from '#src/lib/papers.ts';
import { sayBytes, sayDay } from '#src/lib/say.ts';
import { Button } from '#src/ui/button.tsx';
import { FieldFault, SelectField, TextField } from '#src/ui/field.tsx';
import { Progress } from '#src/ui/progress.tsx';
import { useToast } from '#src/ui/toast.tsx';
import { DOCUMENT_KINDS } from './document-kinds.ts';
import { useAddDocument } from './mutations.ts';

/** Adding a paper: dropped here or chosen, with its kind and days; a refusal is said here and the choice stays. */
export function DocumentUpload({ materialId }: { materialId: string }) {
  const inputId = useId();
  const [file, setFile] = useState<File | null>(null);
  const [fault, setFault] = useState('');
  const [over, setOver] = useState(false);
  const take = (chosen: File | undefined) => {
    if (!chosen) return;
    if (chosen.size > MOST_BYTES) return setFault(`${chosen.name} is ${sayBytes(chosen.size)}. A document may be 20 MB at most; a photo can be made smaller.`);
    setFault('');
    setFile(chosen);
  };
  const handleDrop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    take(event.dataTransfer.files[0]);
  };
  return (
    <div className={`drop ${over ? 'over' : ''}`} onDragOver={(event) => { event.preventDefault(); setOver(true); }} onDragLeave={() => setOver(false)} onDrop={handleDrop} role="group" aria-label="Add a document">
      {file ? <UploadForm key={file.name + file.size} file={file} materialId={materialId} onDone={() => setFile(null)} /> : (
        <>
          <label className="btn small" htmlFor={inputId}>Add a document</label>
          <input id={inputId} type="file" className="sr-only" accept={ACCEPTED} onChange={(event: ChangeEvent<HTMLInputElement>) => { take(event.target.files?.[0]); event.target.value = ''; }} />
          <span className="hint">PDF or photo, up to 20 MB. It may also be dropped here.</span>
        </>
      )}
      {fault ? <FieldFault>{fault}</FieldFault> : null}
    </div>
  );
}

function UploadForm({ file, materialId, onDone }: { file: File; materialId: string; onDone: () => void }) {
  const add = useAddDocument(materialId);
  const toast = useToast();
  const [kind, setKind] = useState<MaterialDocument['kind']>('composition-sheet');
  const [dated, setDated] = useState('');
  const [runsOut, setRunsOut] = useState('');
  const [sent, setSent] = useState(0);
  const issue = (field: string) => (add.error instanceof ApiError ? add.error.issues.find((one) => one.pointer === `/${field}`)?.message : undefined);
  const send = () => add.mutate(
    { file, fields: { kind, ...(dated ? { dated } : {}), ...(runsOut ? { runsOut } : {}) }, onProgress: setSent },
    { onSuccess: () => { toast(`${DOCUMENT_KINDS[kind]} added.`); onDone(); } },
  );
  return (
    <div className="grid w-full gap-3">
      <p className="[overflow-wrap:anywhere]"><b>{file.name}</b> <span className="quiet">{sayBytes(file.size)}</span></p>
      <div className="upload-fields">
        <SelectField label="Kind" value={kind} onChange={(event) => setKind(event.target.value as MaterialDocument['kind'])}>
          {Object.entries(DOCUMENT_KINDS).map(([key, word]) => <option key={key} value={key}>{word}</option>)}
        </SelectField>
        <TextField type="date" label="Dated" value={dated} onChange={(event) => setDated(event.target.value)} hint={dated ? sayDay(dated) : undefined} error={issue('dated')} />
        <TextField type="date" label="Runs out, if it does" value={runsOut} onChange={(event) => setRunsOut(event.target.value)} hint={runsOut ? sayDay(runsOut) : undefined} error={issue('runsOut')} />
      </div>
      {add.isPending ? <Progress label={`Sending ${file.name}`} done={Math.round(sent * 100)} all={100} /> : null}
      {add.error ? <FieldFault>{sayError(add.error)}</FieldFault> : null}
      <div className="flex gap-2">
        <Button small weight="act" busy={add.isPending} onClick={send}>{add.isPending ? (sent < 1 ? `Sending, ${Math.round(sent * 100)} %` : 'Being checked') : add.error ? 'Try again' : 'Add'}</Button>
        <Button small onClick={onDone} disabled={add.isPending}>Not this one</Button>
      </div>
    </div>
  );
}
