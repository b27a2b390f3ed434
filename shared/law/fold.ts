const GREEK: Readonly<Record<string, string>> = {
  α: 'alpha', β: 'beta', γ: 'gamma', δ: 'delta', ε: 'epsilon', ω: 'omega',
  œ: 'oe', æ: 'ae', ß: 'ss', ø: 'o', ł: 'l', ı: 'i',
};
const PLAIN_JUNK = /[^a-z0-9]+/g;
const ANY_JUNK = /[^\p{L}\p{N}]+/gu;
 
const IS_ASCII = /^[\x00-\x7f]*$/;

/**
 * The one key by which names of substances are compared: letters and digits only, small,
 * accents and Greek letters written out. Case, spaces, hyphens, brackets and every other mark
 * fall away, so `PEG-7 Glyceryl Cocoate`, `peg 7 glyceryl cocoate` and `PEG7 GLYCERYL COCOATE`
 * are one name, and so are `CI 77891` and `C.I. 77891`.
 */
export function foldName(name: string): string {
  if (IS_ASCII.test(name)) return name.toLowerCase().replace(PLAIN_JUNK, '');
  return name
    .toLowerCase()
    .normalize('NFKD')
    .replace(/\p{M}+/gu, '')
    .replace(/[αβγδεωœæßøłı]/g, (letter) => GREEK[letter] ?? letter)
    .replace(ANY_JUNK, '');
}
