/** The few words that a label needs of its own. Ours, not prescribed ones, unless said. */
interface LabelWords {
  readonly use: string;
  readonly care: string;
  readonly from: string;
  readonly batch: string;
  readonly origin: (place: string) => string;
  /** Prescribed in English by Regulation (EC) No 1223/2009, art. 19(1)(c); elsewhere the hourglass stands alone. */
  readonly bestBefore?: string;
}

const WORDS: Readonly<Record<string, LabelWords>> = {
  en: { use: 'How to use', care: 'Care', from: 'From', batch: 'Batch', origin: (place) => `Made in ${place}`, bestBefore: 'Best used before the end of' },
  fr: { use: 'Mode d’emploi', care: 'Précautions', from: 'Société', batch: 'Lot', origin: (place) => `Origine : ${place}` },
  de: { use: 'Anwendung', care: 'Hinweise', from: 'Firma', batch: 'Charge', origin: (place) => `Herkunft: ${place}` },
  es: { use: 'Modo de empleo', care: 'Precauciones', from: 'Empresa', batch: 'Lote', origin: (place) => `Origen: ${place}` },
  it: { use: 'Modo d’uso', care: 'Avvertenze', from: 'Azienda', batch: 'Lotto', origin: (place) => `Origine: ${place}` },
  nl: { use: 'Gebruik', care: 'Let op', from: 'Firma', batch: 'Partij', origin: (place) => `Herkomst: ${place}` },
};

function wordsOf(language: string): LabelWords {
  return WORDS[language] ?? WORDS['en']!;
}

/** One word in every language of the label, each once. */
export function sayIn(languages: readonly string[], pick: 'use' | 'care' | 'from' | 'batch'): string {
  const chosen = languages.length > 0 ? languages : ['en'];
  return [...new Set(chosen.map((language) => wordsOf(language)[pick]))].join(' / ');
}

/** Where it comes from, in every language of the label. */
export function sayOrigin(languages: readonly string[], place: string): string {
  const chosen = languages.length > 0 ? languages : ['en'];
  return [...new Set(chosen.map((language) => wordsOf(language).origin(place)))].join(' / ');
}

/** The words before a date of minimum durability; empty where the hourglass speaks alone. */
export function sayBestBefore(languages: readonly string[]): string {
  return wordsOf(languages.find((language) => wordsOf(language).bestBefore) ?? '').bestBefore && languages.includes('en') ? WORDS['en']!.bestBefore! : '';
}
