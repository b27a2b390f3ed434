import { z } from './zod.ts';
import { idField } from './fields.ts';
import { FREE_ELEMENTS } from './free-elements.ts';

export type { FreeElement } from './free-elements.ts';

/** Two metres: larger than any label, small enough that no sum leaves the whole numbers. */
const FAR = 2_000_000;
const place = z.int().min(-FAR).max(FAR);
const side = z.int().min(100, 'At least 0.1 mm.').max(FAR);

/** Whole micrometres from the upper left corner of the trim; on a cone, of its straight sheet. */
export const handFrame = z.strictObject({ x: place, y: place, width: side, height: side });
export type HandFrame = z.infer<typeof handFrame>;

export const handStyle = z.strictObject({
  /** The em in micrometres; absent: as large as the frame holds. Never set under the market's least letter height. */
  size: z.int().min(500).max(200_000).optional(),
  weight: z.union([z.literal(300), z.literal(400), z.literal(500), z.literal(600), z.literal(700)]).optional(),
  align: z.enum(['left', 'centre', 'right']).optional(),
  /** Added between letters, in thousandths of the em. */
  tracking: z.int().min(-30).max(400).optional(),
  /** Line to line, in thousandths of the em. */
  leading: z.int().min(900).max(3000).optional(),
  capitals: z.boolean().optional(),
  ink: z.enum(['black', 'ink', 'tint', 'light']).optional(),
  /** Columns of the ingredient list. */
  columns: z.int().min(1).max(4).optional(),
});
export type HandStyle = z.infer<typeof handStyle>;

const common = { frame: handFrame, style: handStyle, locked: z.boolean().optional(), group: z.string().min(1).max(40).optional() };

export const freedElement = z.strictObject({ element: z.enum(FREE_ELEMENTS), ...common });
export type FreedElement = z.infer<typeof freedElement>;

const id = z.string().min(1).max(40);
export const addedElement = z.discriminatedUnion('kind', [
  z.strictObject({ id, kind: z.literal('text'), text: z.string().trim().min(1, 'Write the text.').max(500), ...common }),
  z.strictObject({ id, kind: z.literal('rule'), ...common }),
  /** `stroke` in micrometres; filled when absent. */
  z.strictObject({ id, kind: z.literal('box'), stroke: z.int().min(80).max(20_000).optional(), ...common }),
  z.strictObject({ id, kind: z.literal('oval'), stroke: z.int().min(80).max(20_000).optional(), ...common }),
  /** A picture of the house's, whole inside the frame. */
  z.strictObject({ id, kind: z.literal('picture'), picture: idField, ...common }),
  z.strictObject({ id, kind: z.literal('code'), text: z.string().trim().min(1, 'Write the address the code leads to.').max(300), ...common }),
]);
export type AddedElement = z.infer<typeof addedElement>;

/** What a person changed on the template's setting. Later ones lie over earlier ones. */
export const byHand = z.strictObject({
  freed: z.array(freedElement).max(FREE_ELEMENTS.length).refine((list) => new Set(list.map(({ element }) => element)).size === list.length, 'Each element is set free once.'),
  added: z.array(addedElement).max(80, 'At most 80 things of your own.').refine((list) => new Set(list.map((one) => one.id)).size === list.length, 'Each has a name of its own.'),
});
export type ByHand = z.infer<typeof byHand>;

export const NOTHING_BY_HAND: ByHand = { freed: [], added: [] };
