import { endpoint } from './endpoint.ts';
import { idField } from './fields.ts';
import { z } from './zod.ts';

const figure = z.number();
const pathStep = z.union([
  z.tuple([z.enum(['M', 'L']), figure, figure]),
  z.tuple([z.literal('C'), figure, figure, figure, figure, figure, figure]),
  z.tuple([z.literal('Z')]),
]);

/** One shape of a drawing: its path in thousandths of the drawing's longer side, and its ink. */
export const pictureShape = z.object({
  steps: z.array(pathStep),
  cmyk: z.tuple([figure, figure, figure, figure]),
  /** The colour on a screen, `#rrggbb`. */
  screen: z.string(),
  evenOdd: z.boolean().optional(),
  /** Width of the stroke in the path's own measure; filled when absent. */
  stroke: figure.optional(),
});
export type PictureShape = z.infer<typeof pictureShape>;

/** A logo or an image of the house, fit for the press. */
export const picture = z.object({
  id: idField,
  name: z.string(),
  kind: z.enum(['photo', 'drawing']),
  /** Pixels of a photo; proportions of a drawing, its longer side 1000. */
  width: z.number(),
  height: z.number(),
  /** The shapes of a drawing; empty for a photo. */
  shapes: z.array(pictureShape),
  bytes: z.int(),
  addedAt: z.string(),
  addedBy: z.string(),
});
export type Picture = z.infer<typeof picture>;

const byId = z.strictObject({ id: idField });
const pictures = z.object({ items: z.array(picture) });

/** Every picture of the house, by name. */
export const listPictures = endpoint({ method: 'GET', path: '/pictures', response: pictures });
export const addPicture = endpoint({ method: 'POST', path: '/pictures', accepts: 'multipart', body: z.strictObject({}), response: picture });
/** What a screen shows of a photo. */
export const getPicturePreview = endpoint({ method: 'GET', path: '/pictures/:id/preview', params: byId, response: z.unknown(), answers: 'file' });
/** Refused while a product's label shows it. */
export const removePicture = endpoint({ method: 'DELETE', path: '/pictures/:id', params: byId, response: pictures });
