import { useId, useState } from 'react';
import type { ChangeEvent } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { Picture } from '#shared/contracts/pictures.contract.ts';
import { sayError } from '#src/lib/api/error.ts';
import { MOST_BYTES } from '#src/lib/papers.ts';
import { sayBytes } from '#src/lib/say.ts';
import { IconButton } from '#src/ui/button.tsx';
import { FieldFault } from '#src/ui/field.tsx';
import { Icon } from '#src/ui/icon.tsx';
import { Progress } from '#src/ui/progress.tsx';
import { TakeAwayDialog } from '#src/ui/take-away-dialog.tsx';
import { useToast } from '#src/ui/toast.tsx';
import { pathData } from '../label-art.tsx';
import { picturesQuery, useAddPicture, useRemovePicture } from './pictures.ts';

const TAKEN = '.png,.jpg,.jpeg,.svg,image/png,image/jpeg,image/svg+xml';

/** The house's logos and images: sent here, put on the label by a press. */
export function PictureShelf({ onPlace, isLocked }: { onPlace: (picture: Picture) => void; isLocked: boolean }) {
  const { data: pictures = [], error } = useQuery(picturesQuery);
  const [leaving, setLeaving] = useState<Picture | null>(null);
  return (
    <div className="picture-shelf" role="group" aria-label="Pictures of the house">
      {pictures.length > 0 ? (
        <ul>
          {pictures.map((picture) => (
            <li key={picture.id}>
              <button type="button" disabled={isLocked} onClick={() => onPlace(picture)} title={`Put ${picture.name} on the label`}>
                <Small picture={picture} />
                <span>{picture.name}</span>
              </button>
              {isLocked ? null : <IconButton icon="away" word={`Remove ${picture.name} from the house`} onClick={() => setLeaving(picture)} />}
            </li>
          ))}
        </ul>
      ) : null}
      {error ? <FieldFault>{sayError(error)}</FieldFault> : null}
      {isLocked ? null : <SendPicture onDone={onPlace} />}
      {leaving ? <LeaveDialog picture={leaving} onClose={() => setLeaving(null)} /> : null}
    </div>
  );
}

/** A photo by its preview, a drawing by its own shapes. */
function Small({ picture }: { picture: Picture }) {
  if (picture.kind === 'photo') return <img src={`/api/pictures/${picture.id}/preview`} alt="" />;
  return (
    <svg viewBox={`0 0 ${picture.width} ${picture.height}`} aria-hidden="true">
      {picture.shapes.map((shape, index) => {
        // Paths are written in thousandths here as micrometres are there.
        const d = pathData(shape.steps.map(([command, ...figures]) => [command, ...figures.map((figure) => figure * 1000)]) as unknown as Parameters<typeof pathData>[0]);
        return shape.stroke === undefined ? <path key={index} d={d} fill={shape.screen} fillRule={shape.evenOdd ? 'evenodd' : undefined} /> : <path key={index} d={d} fill="none" stroke={shape.screen} strokeWidth={shape.stroke} />;
      })}
    </svg>
  );
}

function SendPicture({ onDone }: { onDone: (picture: Picture) => void }) {
  const inputId = useId();
  const add = useAddPicture();
  const toast = useToast();
  const [fault, setFault] = useState('');
  const [sent, setSent] = useState(0);
  const take = (file: File | undefined): void => {
    if (!file) return;
    setFault(file.size > MOST_BYTES ? `${file.name} is ${sayBytes(file.size)}. A picture may be 20 MB at most.` : '');
    if (file.size > MOST_BYTES) return;
    setSent(0);
    add.mutate({ file, onProgress: setSent }, { onSuccess: (picture) => { toast(`${picture.name} added to the house.`); onDone(picture); } });
  };
  const said = fault || (add.error ? sayError(add.error) : '');
  return (
    <>
      <input id={inputId} type="file" className="sr-only" accept={TAKEN} onChange={(event: ChangeEvent<HTMLInputElement>) => { take(event.target.files?.[0]); event.target.value = ''; }} />
      <label className="btn small" htmlFor={inputId}><Icon name="upload" /> Send a picture</label>
      {add.isPending ? <Progress label="Sending the picture" done={Math.round(sent * 100)} all={100} /> : <span className="hint">PNG, JPEG or SVG. A drawing becomes plain paths; a photo is turned into process inks.</span>}
      {said ? <FieldFault>{said}</FieldFault> : null}
    </>
  );
}

function LeaveDialog({ picture, onClose }: { picture: Picture; onClose: () => void }) {
  const remove = useRemovePicture();
  const toast = useToast();
  return (
    <TakeAwayDialog
      title={`Remove ${picture.name}?`} what="The picture leaves the house" isBusy={remove.isPending} error={remove.error} onClose={onClose}
      onTakeAway={() => remove.mutate(picture.id, { onSuccess: () => { toast(`${picture.name} removed.`); onClose(); } })}
    />
  );
}
