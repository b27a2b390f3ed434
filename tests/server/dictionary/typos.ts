export type Slip = 'dropped' | 'doubled' | 'replaced' | 'exchanged' | 'inserted';
export const SLIPS: readonly Slip[] = ['dropped', 'doubled', 'replaced', 'exchanged', 'inserted'];

const NEIGHBOURS: Readonly<Record<string, string>> = {
  a: 's', b: 'v', c: 'x', d: 'f', e: 'r', f: 'g', g: 'h', h: 'j', i: 'o', j: 'k', k: 'l', l: 'k', m: 'n',
  n: 'm', o: 'p', p: 'o', q: 'w', r: 't', s: 'd', t: 'y', u: 'i', v: 'b', w: 'e', x: 'c', y: 'u', z: 'x',
};

/**
 * The name with one slip of the given kind at a letter chosen by its own text, so that every
 * run asks the same. Figures are left alone: another figure is another ingredient.
 * `undefined` where the name has no place for it.
 */
export function withSlip(name: string, slip: Slip): string | undefined {
  const text = name.toLowerCase();
  const places = [...text].flatMap((letter, at) => (/[a-z]/.test(letter) && /[a-z]/.test(text[at + 1] ?? '') && letter !== text[at + 1] ? [at] : []));
  if (places.length < 3) return undefined;
  const at = places[hash(name + slip) % places.length]!;
  const letter = text[at]!;
  const near = NEIGHBOURS[letter]!;
  const tail = text.slice(at + 1);
  const head = text.slice(0, at);
  switch (slip) {
    case 'dropped':
      return head + tail;
    case 'doubled':
      return head + letter + letter + tail;
    case 'replaced':
      return head + near + tail;
    case 'exchanged':
      return head + tail[0]! + letter + tail.slice(1);
    case 'inserted':
      return head + letter + near + tail;
  }
}

/** A small fixed hash (FNV-1a). */
export function hash(text: string): number {
  let value = 0x811c9dc5;
  for (const letter of text) value = Math.imul(value ^ letter.codePointAt(0)!, 0x01000193) >>> 0;
  return value;
}
