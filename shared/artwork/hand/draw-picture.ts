import type { AddedElement, HandFrame } from '#shared/contracts/by-hand.ts';
import type { LabelPicture } from '../label-input.ts';
import type { Cmyk, Ink, Item, PathStep } from '../scene.ts';

export interface DrawnPicture {
  readonly items: readonly Item[];
  /** Inks that only this drawing uses. */
  readonly inks: Readonly<Record<string, Ink>>;
}

/** The largest box of these proportions inside a frame, in its middle. */
export function fitInto(frame: HandFrame, width: number, height: number): HandFrame {
  const scale = Math.min(frame.width / width, frame.height / height);
  const [w, h] = [Math.max(1, Math.round(width * scale)), Math.max(1, Math.round(height * scale))];
  return { x: frame.x + Math.round((frame.width - w) / 2), y: frame.y + Math.round((frame.height - h) / 2), width: w, height: h };
}

/** A picture in its frame, whole and never stretched: a photo as it is, a drawing as paths in its own inks. */
export function drawPicture(added: Extract<AddedElement, { kind: 'picture' }>, picture: LabelPicture): DrawnPicture {
  const box = fitInto(added.frame, picture.width, picture.height);
  if (picture.kind === 'photo') return { items: [{ kind: 'picture', element: 'drawing', ink: 'black', picture: picture.id, box, own: added.id }], inks: {} };
  const scale = box.width / picture.width;
  const inks: Record<string, Ink> = {};
  const items = picture.shapes.map((shape): Item => {
    // A choice of ink sets the whole drawing in that one ink.
    const ink = added.style.ink ?? inkKey(shape.cmyk);
    if (added.style.ink === undefined) inks[ink] = { name: shape.screen, cmyk: shape.cmyk, screen: shape.screen };
    const steps = shape.steps.map(([command, ...figures]) => [command, ...figures.map((figure, i) => (i % 2 === 0 ? box.x : box.y) + Math.round(figure * scale))] as unknown as PathStep);
    return { kind: 'path', element: 'drawing', ink, steps, own: added.id, ...(shape.evenOdd && { evenOdd: true }), ...(shape.stroke !== undefined && { stroke: Math.max(80, Math.round(shape.stroke * scale)) }) };
  });
  return { items, inks };
}

function inkKey(cmyk: Cmyk): string {
  return `cmyk-${cmyk.join('-')}`;
}

/** Pixels to the inch at which a photo is printed, whole ones. */
export function pixelsPerInch(widthPixels: number, printedMicrometres: number): number {
  return Math.floor((widthPixels * 25_400) / printedMicrometres);
}
