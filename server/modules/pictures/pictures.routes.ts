import { createHash } from 'node:crypto';
import { addPicture as addContract, getPicturePreview, listPictures as listContract, removePicture as removeContract } from '#shared/contracts/pictures.contract.ts';
import { readPicture } from '#server/artwork/pictures/read-picture.ts';
import { AppError } from '#server/http/app-error.ts';
import { FileAnswer, safeFileName } from '#server/http/file-answer.ts';
import { route, type Call, type Route } from '#server/http/route.ts';
import { dropPaper, newPaperKey, type PaperStore } from '#server/storage/papers.ts';
import { addPicture, getPicture, listPictures, presentPicture, removePicture } from './pictures.service.ts';

interface Deps {
  readonly storage: PaperStore;
  readonly now: () => Date;
}

/** Logos and images for labels. */
export function picturesRoutes(deps: Deps): Route[] {
  const { storage } = deps;
  return [
    route(listContract, { may: ['read', 'labels'] }, ({ inHouse, actor }) => inHouse(async (em) => ({ items: (await listPictures(em, actor)).map(presentPicture) }))),
    route(addContract, { may: ['edit', 'labels'] }, (call) => takePicture(deps, call)),
    route(getPicturePreview, { may: ['read', 'labels'] }, async ({ inHouse, actor, params }) => {
      const picture = await inHouse((em) => getPicture(em, actor, params.id));
      // A drawing is painted from its shapes: there is nothing to fetch.
      const stored = picture.previewKey === '' ? null : await storage.getObject(picture.previewKey);
      if (!stored) throw picture.previewKey === '' ? new AppError('not-found') : new AppError('unavailable', { message: 'This picture is missing in the storage for files. Send it again.' });
      return new FileAnswer({ bytes: stored.bytes, mediaType: 'image/png', fileName: `${safeFileName(picture.name)}.png`, isPreview: true });
    }),
    route(removeContract, { may: ['edit', 'labels'] }, async ({ inHouse, actor, params }) => {
      const { gone, left } = await inHouse(async (em) => ({ gone: await removePicture(em, actor, params.id), left: await listPictures(em, actor) }));
      for (const key of [gone.previewKey, gone.platesKey].filter(Boolean)) await dropPaper(storage, key);
      return { items: left.map(presentPicture) };
    }),
  ];
}

/** Bytes first, then the row: a picture that is listed can always be painted. */
async function takePicture({ storage, now }: Deps, { inHouse, actor, upload }: Call<unknown, unknown, unknown>) {
  const read = await readPicture(upload.bytes);
  const name = safeFileName(upload.fileName).replace(/\.[a-z0-9]{1,8}$/i, '') || 'Picture';
  const sha256 = createHash('sha256').update(upload.bytes).digest('hex');
  const common = { name, kind: read.kind, width: read.width, height: read.height, bytes: upload.bytes.length, sha256 };
  if (read.kind === 'drawing') return presentPicture(await inHouse((em) => addPicture(em, actor, { ...common, shapes: [...read.shapes], previewKey: '', platesKey: '' }, now())));
  const [previewKey, platesKey] = [newPaperKey(actor, 'pictures'), newPaperKey(actor, 'pictures')];
  await storage.putObject(previewKey, read.preview, 'image/png');
  try {
    await storage.putObject(platesKey, read.plates, 'application/octet-stream');
    return presentPicture(await inHouse((em) => addPicture(em, actor, { ...common, shapes: [], previewKey, platesKey }, now())));
  } catch (error) {
    for (const key of [previewKey, platesKey]) await dropPaper(storage, key);
    throw error;
  }
}
