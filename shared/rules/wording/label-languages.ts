import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import { essence } from '#shared/law/essence.ts';
import type { LawBook } from '#shared/law/law-book.ts';
import type { Market } from '#shared/law/types.ts';

/** Languages in which a market wants its texts; the Union's follow the countries that the label is for. */
const LANGUAGES: Readonly<Record<Market, readonly string[]>> = { EU: [], UK: ['en'], US: ['en'], CA: ['en', 'fr'] };

/** English names of the Union's official languages (Regulation No 1/1958, Article 1). */
const NAMES: Readonly<Record<string, string>> = {
  bg: 'Bulgarian', cs: 'Czech', da: 'Danish', de: 'German', el: 'Greek', en: 'English', es: 'Spanish', et: 'Estonian',
  fi: 'Finnish', fr: 'French', ga: 'Irish', hr: 'Croatian', hu: 'Hungarian', it: 'Italian', lt: 'Lithuanian', lv: 'Latvian',
  mt: 'Maltese', nl: 'Dutch', pl: 'Polish', pt: 'Portuguese', ro: 'Romanian', sk: 'Slovak', sl: 'Slovenian', sv: 'Swedish',
};

/** A language's English name; its code where it has none here. */
export function languageName(lang: string): string {
  return NAMES[primary(lang)] ?? lang;
}

/**
 * Languages that a label of this market must carry its texts in, each once.
 * Empty where the document names none and the market leaves them to the country of sale.
 */
export function labelLanguages(market: Market, document: FormulaDocument): readonly string[] {
  if (market !== 'EU') return LANGUAGES[market];
  return [...new Set((document.label?.languages ?? []).map(primary))];
}

/**
 * The languages in which a label lacks a wording: none where the document gives no particulars.
 * Where no language is named, the wording in any language held is enough, and else it lacks in English.
 * @param wordingId id of a wording of the law book
 */
export function missingLanguages(wordingId: string, market: Market, document: FormulaDocument, law: LawBook): readonly string[] {
  const particulars = document.product.particulars;
  if (!particulars) return [];
  const whole = essence([...particulars.warnings.map((one) => one.text), particulars.directions ?? '', particulars.function ?? ''].join(' '));
  const held = law.wordingLanguages(wordingId);
  const isSaidIn = (lang: string): boolean => held.includes(lang) && isSaid(law.wording(wordingId, lang).text, whole);
  // A text in a language whose wording is not held cannot be compared here.
  const isOpen = (lang: string): boolean => !held.includes(lang) && particulars.warnings.some((one) => one.lang !== undefined && primary(one.lang) === lang);
  const asked = labelLanguages(market, document);
  if (asked.length > 0) return asked.filter((lang) => !isSaidIn(lang) && !isOpen(lang));
  const isSaidOrOpen = held.some(isSaidIn) || particulars.warnings.some((one) => one.lang !== undefined && isOpen(primary(one.lang)));
  return isSaidOrOpen ? [] : ['en'];
}

function primary(lang: string): string {
  return lang.toLowerCase().split('-')[0]!;
}

function isSaid(text: string, whole: string): boolean {
  return whole.includes(essence(text)) || text.split(/[.:;—]\s+/).every((sentence) => whole.includes(essence(sentence)));
}
