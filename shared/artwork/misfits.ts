import { inMillimetres } from './lengths.ts';
import type { ElementName, Micrometres } from './scene.ts';
import type { Overflow } from './setting.ts';

/** What has no place on the label, with how much is missing. */
export interface Misfit {
  readonly element: ElementName | 'container';
  readonly direction: 'height' | 'width' | 'character' | 'measure' | 'place';
  readonly missing: Micrometres;
  /** A sentence for the maker. */
  readonly message: string;
}

/** What an element is called at the head of a sentence. */
export const ELEMENT_NAMES: Readonly<Record<ElementName, string>> = {
  ground: 'The ground', rule: 'The line', brand: 'The brand', name: 'The product name', function: 'The function', claim: 'The claim', 'net content': 'The net content',
  directions: 'The directions', warnings: 'The precautions', ingredients: 'The ingredient list', 'responsible person': 'The name and address',
  batch: 'The batch code', durability: 'The durability mark', barcode: 'The barcode',
  'own text': 'Your own text', drawing: 'Your drawing', code: 'The QR code',
};

/** An overflow in words: which element, how many millimetres, where. */
export function misfitOf(overflow: Overflow): Misfit {
  const { element, direction, missing, room, word } = overflow;
  const need = element === 'directions' || element === 'warnings' ? 'need' : 'needs';
  const more = `${inMillimetres(missing)} mm more ${direction}`;
  const column = `in a column ${inMillimetres(Math.max(0, room))} mm wide`;
  const which = word && direction === 'width' ? ` for “${word}”` : '';
  return { element, direction, missing, message: `${ELEMENT_NAMES[element]} ${need} ${more}${which} ${column}, with every letter at its least lawful height.` };
}
