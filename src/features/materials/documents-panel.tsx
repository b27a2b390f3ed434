import { useState } from 'react';
import { getMaterialDocument } from '#shared/contracts/materials.contract.ts';
import type { Material, MaterialDocument } from '#shared/contracts/materials.contract.ts';
import { urlOf } from '#src/lib/api/url.ts';
import { sayBytes, sayDay, today } from '#src/lib/say.ts';
import { IconButton } from '#src/ui/button.tsx';
import { TakeAwayDialog } from '#src/ui/take-away-dialog.tsx';
import { useToast } from '#src/ui/toast.tsx';
import { VerdictWord } from '#src/ui/verdict-mark.tsx';
import { DocumentUpload } from './document-upload.tsx';
import { DOCUMENT_KINDS } from './document-kinds.ts';
import { LifeAxis, LifeLine, endsSoon } from './document-life.tsx';
import { useRemoveDocument } from './mutations.ts';

/** The supplier's papers and how long each holds. */
export function DocumentsPanel({ material, mayEdit }: { material: Material; mayEdit: boolean }) {
  const [leaving, setLeaving] = useState<MaterialDocument | null>(null);
  const now = today();
  const documents = [...material.documents].sort((a, b) => (a.runsOut ?? '9').localeCompare(b.runsOut ?? '9'));
  return (
    <div>
      <h3>Documents</h3>
      {documents.length === 0 ? <p className="quiet py-2">None on file. A composition or allergen sheet is what the figures above rest on.</p> : (
        <table className="table doc" aria-label="Documents">
          <thead><tr><th scope="col">Document</th><th scope="col">Dated</th><th scope="col">Runs out</th><th className="tl"><span className="sr-only">Its time, drawn</span><LifeAxis now={now} /></th>{mayEdit ? <th><span className="sr-only">Row</span></th> : null}</tr></thead>
          <tbody>
            {documents.map((one) => (
              <tr key={one.id}>
                <td>
                  <a className="font-medium" href={urlOf(getMaterialDocument, { params: { id: material.id, documentId: one.id } })} target="_blank" rel="noreferrer">{DOCUMENT_KINDS[one.kind]}</a>
                  <span className="quiet block text-12 [overflow-wrap:anywhere]">{one.fileName}, {sayBytes(one.bytes)}</span>
                </td>
                <td>{one.dated ? sayDay(one.dated) : <span className="quiet">not said</span>}</td>
                <td>{one.runsOut ? (endsSoon(one.runsOut, now) ? <VerdictWord weight="decide">{sayDay(one.runsOut)}</VerdictWord> : sayDay(one.runsOut)) : <span className="quiet">does not</span>}</td>
                <td className="tl"><LifeLine dated={one.dated} runsOut={one.runsOut} now={now} /></td>
                {mayEdit ? <td className="tools"><IconButton icon="away" word={`Take away ${one.fileName}`} onClick={() => setLeaving(one)} /></td> : null}
              </tr>
            ))}
          </tbody>
        </table>
      )}
      {documents.length > 0 ? <p className="hint mt-1 life-hint">The green line is today, {sayDay(now)}.</p> : null}
      {mayEdit ? <DocumentUpload materialId={material.id} /> : null}
      {leaving ? <RemoveDialog materialId={material.id} document={leaving} onClose={() => setLeaving(null)} /> : null}
    </div>
  );
}

function RemoveDialog({ materialId, document, onClose }: { materialId: string; document: MaterialDocument; onClose: () => void }) {
  const remove = useRemoveDocument(materialId);
  const toast = useToast();
  return (
    <TakeAwayDialog
      title="Take this document away?"
      what={`${DOCUMENT_KINDS[document.kind]}, ${document.fileName}`}
      isBusy={remove.isPending}
      error={remove.error}
      onTakeAway={() => remove.mutate(document.id, { onSuccess: () => { toast(`${document.fileName} taken away.`); onClose(); } })}
      onClose={onClose}
    />
  );
}
