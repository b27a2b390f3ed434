import type { DictionaryEntry } from '#shared/dictionary/types.ts';
import { foldName } from '#shared/law/fold.ts';
import type { Market } from '#shared/law/types.ts';

/** What a market prints for one ingredient, and why. */
export interface PrintedName {
  readonly name: string;
  readonly why: string;
  /** Every name it could be, where nothing given decides between them. */
  readonly ambiguous?: readonly string[];
}

export interface Named {
  readonly inci: string;
  readonly written: string;
  readonly entry?: DictionaryEntry;
  readonly isNano: boolean;
  readonly usName?: string;
  /** The row of the schedule of trivial names that the name as written stands in: one EU name may have several. */
  readonly schedule?: { readonly inci: string; readonly fr: string };
}

/** The printed name of an ingredient in a market; the shortest lawful form unless joined names are chosen. */
export function printedName(ingredient: Named, market: Market, joinedNames: boolean): PrintedName {
  if (market === 'US') return usName(ingredient, joinedNames);
  if (market === 'CA') return canadianName(ingredient, joinedNames);
  const name = ingredient.isNano ? `${ingredient.inci} (nano)` : ingredient.inci;
  const why = ingredient.isNano ? 'The name of the common-ingredient glossary, with the mark for a nanomaterial.' : 'The name of the common-ingredient glossary.';
  return { name, why: ingredient.entry ? why : 'The name as written: the dictionary does not know it.' };
}

/** `SD Alcohol 40-B`: the formula numbers of 27 CFR 21 that US labels use. */
const DENATURED = /^SD Alcohol (\d{1,2}(?:-[A-Z])?)$/i;

/** A certified colour's full name as labels shorten it: FDA's letter of 7 June 1999 drops FD&C, D&C and No. and keeps Ext. */
export function shortColourName(name: string): string {
  return name.replace(/\b(?:F?D&C)\s+/i, '').replace(/\bNo\.?\s*(?=\d)/i, '');
}

function usName({ inci, written, entry, usName: given, schedule }: Named, joinedNames: boolean): PrintedName {
  const colours = entry?.names.usColours ?? [];
  if (colours.length > 0) {
    const short = shortColourName(written);
    const chosen = given ?? colours.find((colour) => foldName(colour) === foldName(short));
    if (chosen !== undefined) return { name: chosen, why: 'The US colour name given with the material.' };
    if (colours.length === 1) return { name: colours[0]!, why: `The US name of ${inci}.` };
    return { name: inci, why: `${inci} stands for several US colours.`, ambiguous: colours };
  }
  if (given !== undefined) return { name: given, why: 'The US name given with the material.' };
  if (schedule && foldName(schedule.inci) === foldName(written)) return { name: schedule.inci, why: `The US name as written: ${inci} stands for several.` };
  const denatured = DENATURED.exec(written.trim());
  if (denatured && inci === 'Alcohol Denat.') return { name: `SD Alcohol ${denatured[1]!.toUpperCase()}`, why: 'The specially denatured alcohol as written; the US accepts its number.' };
  const us = entry?.names.us;
  if (us === undefined || us === inci) return { name: inci, why: entry ? 'The INCI name, which is also the US name.' : 'The name as written: the dictionary does not know it.' };
  // A botanical form already shows both names.
  const joins = joinedNames && !us.includes('(');
  return { name: joins ? `${us} (${inci})` : us, why: joins ? 'The English name first, the INCI name in brackets.' : 'The name that US consumers know it by.' };
}

function canadianName({ inci, entry, schedule }: Named, joinedNames: boolean): PrintedName {
  const own = entry?.names.ca ?? inci;
  const french = schedule?.fr ?? entry?.names.fr;
  if (joinedNames && french !== undefined) {
    const names = [own, schedule?.inci ?? entry?.names.us, french].filter((name, index, all) => name !== undefined && all.indexOf(name) === index);
    return { name: names.join('/'), why: 'The three-part form of the schedule to the Cosmetic Regulations.' };
  }
  return { name: own, why: entry ? 'The INCI name; for items of the schedule its EU name.' : 'The name as written: the dictionary does not know it.' };
}

/** True where the ingredient is a colourant: said so, or known by its Colour Index number or US colour name alone. */
export function isColourant(purposes: readonly string[], { inci, entry }: Pick<Named, 'inci' | 'entry'>, hasPlainUse: boolean): boolean {
  if (purposes.includes('colourant')) return !hasPlainUse && purposes.length === 1;
  if (purposes.length > 0) return false;
  return /^CI \d{5}/i.test(inci) || (entry !== undefined && (entry.names.usColours?.length ?? 0) > 0 && entry.functions.length > 0 && entry.functions.every((use) => use.startsWith('color') || use.startsWith('colour')));
}
