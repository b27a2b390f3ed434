/** Rows of one page of a list. */
export const PAGE_SIZE = 50;

/** What a list's search looks in: words in lower case, one space between fields. */
export function toSearchText(parts: readonly string[]): string {
  return parts.map(fold).join(' ');
}

/** The words asked for, at most eight. Each is looked for as it stands: no pattern signs. */
export function searchWords(find: string | undefined): string[] {
  return fold(find ?? '').split(' ').filter(Boolean).slice(0, 8);
}

function fold(text: string): string {
  return text.normalize('NFKD').replaceAll(/\p{M}/gu, '').toLowerCase().replaceAll(/\s+/g, ' ').trim();
}
