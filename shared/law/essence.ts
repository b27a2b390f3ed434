/** Letters and digits only: case, punctuation and line breaks of a printed text do not matter. */
export function essence(text: string): string {
  return text.normalize('NFKD').toLowerCase().replace(/[^\p{L}\p{N}]+/gu, '');
}
