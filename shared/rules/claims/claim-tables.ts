import claims from '#data/parameters/claims.json' with { type: 'json' };
import named from '#data/parameters/claims-ingredients.json' with { type: 'json' };
import type { Market, Sourcing } from '#shared/law/types.ts';
import { readPhrase, type Phrase } from './match-words.ts';

export type ClaimVerdict = 'medicinal' | 'contradicted' | 'evidence';

interface RowJson {
  readonly id: string;
  readonly lang: string;
  readonly phrases: readonly string[];
  readonly near?: readonly string[];
  readonly unless?: readonly string[];
  readonly softens?: boolean;
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
  readonly agreed?: Partial<Record<Market, ClaimVerdict>>;
  readonly why?: string;
}

interface FrameJson {
  readonly before: readonly string[];
  readonly after: readonly string[];
  readonly stop: readonly string[];
  readonly and: readonly string[];
  readonly not: readonly string[];
  readonly notUnless: readonly string[];
  readonly look: readonly string[];
}

interface ClaimsJson {
  readonly citations: Readonly<Record<ClaimVerdict | 'named', Partial<Record<Market, { readonly text: string; readonly sourcing: Sourcing }>>>>;
  readonly frames: Readonly<Record<string, FrameJson>>;
  readonly rows: readonly RowJson[];
  readonly classes: readonly ClassJson[];
}

interface NamedJson {
  readonly containing: readonly string[];
  readonly parts: readonly string[];
  readonly scent: readonly string[];
  readonly ingredients: readonly { readonly word: string; readonly starts: readonly string[] }[];
}

/** One row of the claims table, its phrases ready to be looked for. */
export interface ClaimRow {
  readonly id: string;
  readonly phrases: readonly Phrase[];
  /** One of these stands in the same clause. */
  readonly near: readonly Phrase[];
  /** None of these stands around it. */
  readonly unless: readonly Phrase[];
  /** Speaking of the look only makes it a cosmetic claim. */
  readonly softens: boolean;
  readonly verdict: RowJson['verdict'];
  readonly why: string;
}

/** A class of ingredients that a claim may say are absent. */
export type ClaimClass = Omit<ClassJson, 'words' | 'plain'> & {
  readonly words: readonly Phrase[];
  /** Words that say by themselves that it is absent: "vegan". */
  readonly plain: readonly Phrase[];
};

/** How a language says that something is absent, not so, or a matter of looks. */
export interface Frame {
  readonly before: readonly Phrase[];
  readonly after: ReadonlySet<string>;
  readonly stop: ReadonlySet<string>;
  readonly and: ReadonlySet<string>;
  readonly not: ReadonlySet<string>;
  readonly notUnless: ReadonlySet<string>;
  readonly look: readonly Phrase[];
}

/** Everything the tables hold for one language. */
export interface LanguageTables {
  readonly rows: readonly ClaimRow[];
  readonly classes: readonly ClaimClass[];
  readonly frame: Frame;
}

const json = claims as unknown as ClaimsJson;
const opened = new Map<string, LanguageTables | undefined>();

export const CLAIM_LANGUAGES: readonly string[] = Object.keys(json.frames);
export const claimCitations: ClaimsJson['citations'] = json.citations;
export const namedTables: NamedJson = named;

/** The tables of a language, or nothing where claims in it cannot be judged. */
export function claimTables(lang: string): LanguageTables | undefined {
  if (!opened.has(lang)) opened.set(lang, openTables(lang));
  return opened.get(lang);
}

const phrases = (texts: readonly string[] | undefined): readonly Phrase[] => (texts ?? []).map(readPhrase);

function openTables(lang: string): LanguageTables | undefined {
  const frame = json.frames[lang];
  if (!frame) return undefined;
  return {
    rows: json.rows.filter((row) => row.lang === lang).map((row) => ({
      id: row.id, verdict: row.verdict, why: row.why, softens: row.softens ?? false,
      phrases: phrases(row.phrases), near: phrases(row.near), unless: phrases(row.unless),
    })),
    classes: json.classes.map(({ words, plain, ...rest }) => ({ ...rest, words: phrases(words[lang]), plain: phrases(plain?.[lang]) })),
    frame: {
      before: phrases(frame.before), look: phrases(frame.look),
      after: new Set(frame.after), stop: new Set(frame.stop), and: new Set(frame.and), not: new Set(frame.not), notUnless: new Set(frame.notUnless),
    },
  };
}
