import type { ByHand } from '#shared/contracts/by-hand.ts';
import type { Picture } from '#shared/contracts/pictures.contract.ts';
import type { HandKey } from '#shared/artwork/hand/elements.ts';
import { thingOf } from './edit-hand.ts';

const NAMES: Readonly<Record<string, string>> = {
  brand: 'Brand', name: 'Product name', function: 'Function', claim: 'Claim', 'net content': 'Net content', directions: 'Directions', warnings: 'Precautions',
  ingredients: 'Ingredients', 'responsible person': 'Name and address', durability: 'Durability and batch', barcode: 'Barcode',
};
const OWN: Readonly<Record<string, string>> = { rule: 'Line', box: 'Box', oval: 'Oval', code: 'QR code', picture: 'Picture' };

/** What a thing on the label is called in lists. */
export function nameOfThing(byHand: ByHand, key: HandKey, pictures: readonly Pick<Picture, 'id' | 'name'>[] = []): string {
  const thing = thingOf(byHand, key);
  if (thing && 'kind' in thing && thing.kind === 'picture') return pictures.find(({ id }) => id === thing.picture)?.name ?? 'Picture';
  if (thing && 'kind' in thing) return thing.kind === 'text' ? `“${thing.text.length > 24 ? `${thing.text.slice(0, 23)}…` : thing.text}”` : OWN[thing.kind]!;
  return NAMES[key] ?? key;
}

/** Whether type is set in it, so that size, weight and the like can be chosen. */
export function holdsType(byHand: ByHand, key: HandKey): boolean {
  const thing = thingOf(byHand, key);
  return thing && 'kind' in thing ? thing.kind === 'text' : key !== 'barcode';
}
