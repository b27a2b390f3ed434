import classesJson from '#data/parameters/claims-classes.json' with { type: 'json' };
import ingredientsJson from '#data/parameters/claims-ingredients.json' with { type: 'json' };
import criteriaJson from '#data/parameters/claims-criteria.json' with { type: 'json' };
import german from '#data/parameters/claims-de.json' with { type: 'json' };
import english from '#data/parameters/claims-en.json' with { type: 'json' };
import french from '#data/parameters/claims-fr.json' with { type: 'json' };
import type { Market, Sourcing } from '#shared/law/types.ts';
import type { ClaimLanguage } from './languages.ts';
import { PhraseIndex, readPhrase, type Phrase } from './match-words.ts';

export type ClaimVerdict = 'medicinal' | 'contradicted' | 'evidence';

/** What a verdict is measured by: a key of `claims-criteria.json`. */
export type Criterion = 'medicine' | 'truthfulness' | 'evidence' | 'honesty' | 'fairness' | 'legal-compliance' | 'animal-testing' | 'injury' | 'prescription' | 'named' | `drug-${string}`;

interface Cited {
  readonly text: string;
  readonly sourcing: Sourcing;
}

interface RowJson {
  readonly id: string;
  readonly phrases: readonly string[];
  readonly near?: readonly string[];
  readonly unless?: readonly string[];
  readonly softens?: boolean;
  readonly by?: Criterion;
  readonly verdict: Partial<Record<Market, ClaimVerdict>>;
  readonly why: string;
}

interface ClassJson {
  readonly id: string;
  readonly title: string;
  readonly words: Readonly<Record<string, readonly string[]>>;
  readonly plain?: Readonly<Record<string, readonly string[]>>;
  readonly properties?: readonly string[];
  readonly names?: readonly string[];
  readonly perhaps?: readonly string[];
  readonly perhapsNames?: readonly string[];
  readonly inPerfume?: boolean;
  readonly agreed?: Partial<Record<Market, ClaimVerdict>>;
  readonly by?: Criterion;
  readonly why?: string;
}

interface FrameJson {
  readonly before: readonly string[];
  readonly after: readonly string[];
  readonly stop: readonly string[];
  readonly and: readonly string[];
  readonly not: readonly string[];
  readonly notUnless: readonly string[];
  readonly deniedList: readonly string[];
  readonly look: readonly string[];
  readonly lookAfter: readonly string[];
  readonly containing: readonly string[];
  readonly parts: readonly string[];
  readonly scent: readonly string[];
  readonly likeness: readonly string[];
  readonly elsewhere: readonly string[];
  readonly ph: { readonly word: string; readonly ranges: readonly { readonly phrases: readonly string[]; readonly from: string; readonly to: string }[] };
}

interface LanguageJson {
  readonly frame: FrameJson;
  readonly rows: readonly RowJson[];
}

interface IngredientJson {
  readonly word: string;
  readonly starts: readonly string[];
  readonly de?: readonly string[];
  readonly fr?: readonly string[];
}

/** One row of the claims table. */
export interface ClaimRow {
  readonly id: string;
  /** One of these stands nearby, in the same clause. */
  readonly near: PhraseIndex<true> | undefined;
  /** None of these stands around it. */
  readonly unless: readonly Phrase[];
  /** Speaking of the look only makes it a cosmetic claim. */
  readonly softens: boolean;
  readonly by: Criterion | undefined;
  readonly verdict: RowJson['verdict'];
  readonly why: string;
}

/** A class of ingredients that a claim may say are absent. */
export type ClaimClass = Omit<ClassJson, 'words' | 'plain'>;

/** An ingredient as claims name it; `starts` are folded beginnings of INCI names. */
export interface NamedIngredient {
  readonly word: string;
  readonly starts: readonly string[];
}

/** How a language says that something is absent, contained, not so, or a matter of looks. */
export interface Frame {
  readonly before: PhraseIndex<true>;
  readonly after: ReadonlySet<string>;
  readonly stop: ReadonlySet<string>;
  readonly and: ReadonlySet<string>;
  readonly not: ReadonlySet<string>;
  readonly notUnless: ReadonlySet<string>;
  readonly deniedList: ReadonlySet<string>;
  readonly look: PhraseIndex<true>;
  readonly lookAfter: ReadonlySet<string>;
  readonly containing: PhraseIndex<true>;
  readonly parts: ReadonlySet<string>;
  readonly scent: ReadonlySet<string>;
  readonly likeness: ReadonlySet<string>;
  readonly elsewhere: ReadonlySet<string>;
  readonly phWord: string;
  readonly phRanges: PhraseIndex<{ readonly from: string; readonly to: string }>;
}

/** Everything the tables hold for one language. */
export interface LanguageTables {
  readonly lang: string;
  readonly frame: Frame;
  readonly rows: PhraseIndex<ClaimRow>;
  /** Words by which a class is called. */
  readonly classes: PhraseIndex<ClaimClass>;
  /** Words that say by themselves that a class is absent: "vegan". */
  readonly plain: PhraseIndex<ClaimClass>;
  readonly ingredients: PhraseIndex<NamedIngredient>;
  /** Classes called by one word, for words joined with "frei" or "free". */
  readonly single: readonly { readonly text: string; readonly isStem: boolean; readonly claimClass: ClaimClass }[];
}

const LANGUAGES: Readonly<Record<ClaimLanguage, LanguageJson>> = { en: english as LanguageJson, de: german as LanguageJson, fr: french as LanguageJson };
const classes = classesJson.classes as readonly ClassJson[];
const ingredients = ingredientsJson.ingredients as readonly IngredientJson[];
const opened = new Map<ClaimLanguage, LanguageTables>();

/** Each criterion as each market's law cites it, and how firmly that is sourced. */
export const claimCriteria = criteriaJson.criteria as unknown as Readonly<Record<Criterion, Readonly<Record<Market, Cited>>>>;

/** The tables of a language, opened on first use. */
export function claimTables(lang: ClaimLanguage): LanguageTables {
  let tables = opened.get(lang);
  if (!tables) opened.set(lang, (tables = openTables(lang, LANGUAGES[lang])));
  return tables;
}

/** @returns an index of these texts, each leading to its item */
function index<T>(entries: readonly (readonly [texts: readonly string[], item: T])[]): PhraseIndex<T> {
  const made = new PhraseIndex<T>();
  for (const [texts, item] of entries) for (const text of texts) made.add(text, item);
  return made;
}
const marks = (texts: readonly string[]): PhraseIndex<true> => index([[texts, true]]);

function openTables(lang: string, { frame, rows }: LanguageJson): LanguageTables {
  const ofLanguage = classes.map((claimClass) => ({ claimClass, words: claimClass.words[lang] ?? [], plain: claimClass.plain?.[lang] ?? [] }));
  return {
    lang,
    frame: openFrame(frame),
    rows: index(rows.map((row) => [row.phrases, new OpenRow(row) as ClaimRow] as const)),
    classes: index(ofLanguage.map(({ claimClass, words }) => [words, claimClass as ClaimClass] as const)),
    plain: index(ofLanguage.map(({ claimClass, plain }) => [plain, claimClass as ClaimClass] as const)),
    ingredients: index(ingredients.map((one) => [wordsOf(one, lang), new OpenIngredient(one) as NamedIngredient] as const)),
    single: ofLanguage.flatMap(({ claimClass, words }) => words.filter((text) => !text.includes(' ')).map((text) => ({ ...readPhrase(text).parts[0]!, claimClass }))),
  };
}

/** English words also in the plural; other languages by stems. */
function wordsOf({ word, de, fr }: IngredientJson, lang: string): readonly string[] {
  return lang === 'en' ? [word, `${word}s`] : ((lang === 'de' ? de : fr) ?? []);
}

/** Most rows are never met: what stands around their words is read on the first hit. */
class OpenRow implements ClaimRow {
  readonly #row: RowJson;
  #near: PhraseIndex<true> | undefined;
  #unless: readonly Phrase[] | undefined;

  constructor(row: RowJson) {
    this.#row = row;
  }

  get id(): string {
    return this.#row.id;
  }
  get verdict(): RowJson['verdict'] {
    return this.#row.verdict;
  }
  get why(): string {
    return this.#row.why;
  }
  get by(): Criterion | undefined {
    return this.#row.by;
  }
  get softens(): boolean {
    return this.#row.softens ?? false;
  }
  get near(): PhraseIndex<true> | undefined {
    return (this.#near ??= this.#row.near && marks(this.#row.near));
  }
  get unless(): readonly Phrase[] {
    return (this.#unless ??= (this.#row.unless ?? []).map(readPhrase));
  }
}

class OpenIngredient implements NamedIngredient {
  readonly word: string;
  readonly #starts: readonly string[];

  constructor({ word, starts }: IngredientJson) {
    this.word = word;
    this.#starts = starts;
  }

  get starts(): readonly string[] {
    return this.#starts.map((text) => text.replaceAll(' ', ''));
  }
}

function openFrame({ ph, ...frame }: FrameJson): Frame {
  return {
    before: marks(frame.before), look: marks(frame.look), containing: marks(frame.containing),
    after: new Set(frame.after), stop: new Set(frame.stop), and: new Set(frame.and), not: new Set(frame.not), notUnless: new Set(frame.notUnless),
    deniedList: new Set(frame.deniedList), lookAfter: new Set(frame.lookAfter), parts: new Set(frame.parts), scent: new Set(frame.scent),
    likeness: new Set(frame.likeness), elsewhere: new Set(frame.elsewhere),
    phWord: ph.word,
    phRanges: index(ph.ranges.map(({ phrases, from, to }) => [phrases, { from, to }] as const)),
  };
}
