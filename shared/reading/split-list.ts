import { findClose, findLists } from './clean-text.ts';

/** One name as it stands in a pasted list. */
export interface WrittenName {
  /** As written, without marks, percentages and footnote signs. */
  readonly written: string;
  /** `list`: in the order of the list; `may-contain`: after `+/-`; `active`: under a heading of active ingredients. */
  readonly block: 'list' | 'may-contain' | 'active';
  /** Stood in the brackets of the name before it, or was joined to it: its own place says nothing. */
  readonly isInside: boolean;
}

/** What the splitter asks where punctuation alone cannot tell. */
export type Knows = (name: string) => string | undefined;

/** Depth of brackets at each place; one that is never closed counts for nothing. */
function bracketDepths(text: string): number[] {
  const depths: number[] = new Array<number>(text.length).fill(0);
  const open: number[] = [];
  for (let at = 0; at < text.length; at += 1) {
    if ('[({'.includes(text[at]!)) open.push(at);
    else if ('])}'.includes(text[at]!)) {
      const from = open.pop();
      if (from !== undefined) depths.fill(1, from, at + 1);
    }
  }
  return depths;
}

const ABBREVIATION = /\b(?:denat|alc|no|nr|sp|spp|ssp|subsp|var|ext|c|c\.i|ci|dr|st|cv|f|fl|aq|vit)$/i;
const PLACE_NUMBERS = /(?:^|[-(\s])(?:\d{1,2}'?|[NOS]'?)$/;

/** Splits a block into its names by commas, semicolons, bullets, line breaks, full stops and the trade's joining words. */
function splitBlock(whole: string, knows: Knows): string[] {
  const text = openWhole(whole);
  const depths = bracketDepths(text);
  const isByLine = isOneNameALine(text, depths);
  const isByDash = !isByLine && isDashed(text, depths);
  const names: string[] = [];
  let from = 0;
  const cut = (at: number, width: number): void => {
    names.push(text.slice(from, at));
    from = at + width;
  };
  for (let at = 0; at < text.length; at += 1) {
    if (depths[at]! > 0) continue;
    const letter = text[at]!;
    if (letter === ';' || BULLETS.includes(letter)) cut(at, 1);
    else if (isByDash && isDash(text, at)) cut(at, 1);
    else if (letter === '\n' && (isByLine || /^\n[ ]*\n/.test(text.slice(at, at + 80)))) cut(at, 1);
    else if (letter === ',' && !isInsideName(text.slice(from, at), text.slice(at + 1, at + 60), knows)) cut(at, 1);
    else if (letter === '.' && isStop(text, at, from)) cut(at, 1);
    else if (letter === '+' && text[at - 1] === ' ' && text[at + 1] === ' ') cut(at, 1);
  }
  names.push(text.slice(from));
  return names;
}

/** A list that stands in brackets as a whole is taken out of them. */
function openWhole(text: string): string {
  const inner = text.trim().replace(/[.\s]+$/, '');
  return /^[[({]/.test(inner) && findClose(inner.slice(1)) === inner.length - 2 ? inner.slice(1, -1) : text;
}

/** A list set one name to the line: hardly any other mark between names. */
function isOneNameALine(text: string, depths: ArrayLike<number>): boolean {
  const lines = text.split('\n').filter((line) => line.trim() !== '').length;
  if (lines < 2) return false;
  let marks = 0;
  for (let at = 0; at < text.length; at += 1) if (depths[at] === 0 && isMark(text[at]!) && !/^\d/.test(text.slice(at + 1, at + 2))) marks += 1;
  return marks * 2 < lines;
}

/** Dashes between spaces part the names where nothing else does. */
function isDashed(text: string, depths: ArrayLike<number>): boolean {
  let dashes = 0;
  for (let at = 0; at < text.length; at += 1) {
    if (depths[at] !== 0) continue;
    if (isMark(text[at]!)) return false;
    if (isDash(text, at)) dashes += 1;
  }
  return dashes > 1;
}

const BULLETS = '•·●▪■◦‣|⋅∙‧・○◆◇▲△★☆✦✓➤►▶❖♦';
const isMark = (letter: string): boolean => letter === ',' || letter === ';' || BULLETS.includes(letter);
const isDash = (text: string, at: number): boolean => '-–—−'.includes(text[at]!) && /\s/.test(text[at - 1] ?? '') && /\s/.test(text[at + 1] ?? '');

/** Commas of place numbers (`1,2-Hexanediol`, `N,N'-…`) and of decimals (`5,5 %`). */
function isInsideName(before: string, after: string, knows: Knows): boolean {
  const name = before.replace(/^\s+/, '');
  if (/\d$/.test(name) && /^\d+\s*%/.test(after) && /(?:^|[\s(])\d{1,3}$/.test(name)) return true;
  if (!PLACE_NUMBERS.test(name)) return false;
  if (/^[NOS]'?$/.test(name)) return /^\s?[NOS]\b/.test(after);
  if (!/^\s?\d{1,2}'?(?:,\d{1,2}'?)*-\s?[A-Za-z(]/.test(after)) return false;
  if (/^\d{1,2}'?(?:,\d{1,2}'?)*$/.test(name)) return true;
  return !after.startsWith(' ') && /-\d{1,2}$/.test(name) && knows(name) === undefined;
}

/** A full stop between names, not one of an abbreviation or a number. */
function isStop(text: string, at: number, from: number): boolean {
  const before = text.slice(from, at).trim();
  if (!/^(?:\s|$)/.test(text.slice(at + 1, at + 2))) return false;
  return text.slice(at + 1).trim() === '' || (before.length > 1 && !ABBREVIATION.test(before) && !/^\d{1,3}$/.test(before));
}

const MARKS = '*†‡°¹²³⁴⁵⁶⁷⁸⁹⁰#^"“”„«»•·®™';
const LEADING = new RegExp(`^(?:[\\s${MARKS}]|[-–—]\\s+|\\(?\\d{1,3}[.)]\\s+|\\(\\d{1,2}\\)\\s+)+`);
const TRAILING = new RegExp(`(?:[\\s${MARKS}.:]|\\((?:[*†‡]+|\\d{1,2})\\))+$`);
const SHARE = /[([]?\s*(?:[<>≤≥~]|ca\.?|min\.?|max\.?)?\s*\d+(?:[.,]\d+)?\s*(?:-|–|to)?\s*(?:\d+(?:[.,]\d+)?)?\s*%\s*(?:w\/w|v\/v|m\/m)?\s*[)\]]?/gi;

/** A name free of bullets, footnote signs and percentages; unbalanced brackets at its ends go too. */
export function tidyName(raw: string): string {
  let name = raw.replace(/\s+/g, ' ').replace(SHARE, ' ').replace(LEADING, '').replace(/\s+/g, ' ').trim();
  const isDenatured = /\bdenat\.?$/i.test(name);
  name = name.replace(TRAILING, '').replace(/^[,;:]+|[,;:]+$/g, '').trim();
  if (isDenatured) name = `${name}.`;
  const opens = name.split(/[[({]/).length;
  const closes = name.split(/[\])}]/).length;
  if (opens > closes) name = name.replace(/^[[({]\s*/, '');
  if (closes > opens) name = name.replace(/\s*[\])}]$/, '');
  return name.replace(/^[([{]([^()[\]{}]*)[)\]}]$/, '$1').trim();
}

const JOINED = /\s*[([]\s*(?:and|und|et|y|e|en|&|\+)\s*[)\]]\s*/i;
const LAST_AND = /^(.{2,}?)\s+(?:and|und|et|&)\s+(.{2,})$/i;
const BRACKET = /^(.+?)\s*[([]([^()[\]]+)[)\]]\s*$/;
/** What introduces the constituents in a bracket. */
const OF_WHICH = /^(?:contains?|containing|contient|enthält|with|from|of which|davon|dont|natural(?:ly)?|including|incl\.?)\b\s*:?\s*/i;
/** Words beside a name that tell where it comes from, not what it is. Common practice, no source. */
const ORIGIN = '(?:certified |100 ?% )?(?:organic|bio|biologique|vegetable|vegan|natural|naturally derived|plant[- ](?:based|derived)|fair ?trade|wild(?:[- ]harvested)?|upcycled|from organic (?:farming|agriculture))';
const ORIGIN_AROUND = new RegExp(`^${ORIGIN}\\s+|\\s*[([]\\s*${ORIGIN}\\s*[)\\]]`, 'gi');
const COLOUR_INDEX = /^c\.?\s?i\.?\s?\d{5}(?::\d)?$/i;
const PHASE = /^(?:phase|teil)\s+[a-z0-9]$/i;

/** What one piece between two marks names: usually itself; several where it joins names that are known apart. */
function unfold(raw: string, knows: Knows): { name: string; isInside: boolean }[] {
  if (JOINED.test(raw)) return raw.split(new RegExp(JOINED.source, 'gi')).flatMap((part) => unfold(part, knows));
  const name = tidyName(raw);
  if (name === '' || !/[\p{L}\d]/u.test(name) || PHASE.test(name)) return [];
  const bracket = BRACKET.exec(name);
  const parts = bracket && unfoldBracket(bracket[1]!, bracket[2]!, knows);
  if (parts) return parts;
  if (knows(name) !== undefined) return [{ name, isInside: false }];
  return unfoldPair(name.split(/\s*\/\s*/), knows) ?? unfoldPair(LAST_AND.exec(name)?.slice(1) ?? [], knows) ?? [{ name: bareName(name, knows), isInside: false }];
}

/** Constituents in brackets after a name that is known; colour index numbers after a word for them all. */
function unfoldBracket(outside: string, inside: string, knows: Knows): { name: string; isInside: boolean }[] | undefined {
  const inner = inside.replace(OF_WHICH, '').split(/[,;•]/).map(tidyName).filter((one) => one !== '');
  if (inner.length < 2 && !OF_WHICH.test(inside)) return undefined;
  const outer = knows(outside);
  if (outer === undefined && inner.every((one) => COLOUR_INDEX.test(one))) return inner.map((one) => ({ name: one, isInside: false }));
  const others = inner.filter((one) => knows(one) !== undefined && knows(one) !== outer);
  if (outer === undefined || others.length * 2 <= inner.length) return undefined;
  return [{ name: tidyName(outside), isInside: false }, ...inner.filter((one) => knows(one) !== outer).map((one) => ({ name: one, isInside: true }))];
}

/** The name without words of origin, a heading before it or a figure after it, where only then it is known. */
function bareName(name: string, knows: Knows): string {
  const bare = name.replace(ORIGIN_AROUND, ' ').replace(/\s+/g, ' ').trim();
  const forms = [bare, name.replace(/^[^:]{1,40}[:：]\s*/, ''), bare.replace(/\s+\d+(?:[.,]\d+)?\s*(?:g|ppm)?$/, '')];
  return forms.find((form) => form !== '' && form !== name && knows(form) !== undefined) ?? name;
}

function unfoldPair(parts: readonly string[], knows: Knows): { name: string; isInside: boolean }[] | undefined {
  const known = parts.map((part) => knows(tidyName(part)));
  if (parts.length < 2 || known.some((one) => one === undefined) || new Set(known).size < parts.length) return undefined;
  return parts.map((part) => ({ name: tidyName(part), isInside: false }));
}

/** Fewer names than this in one unmarked row of words may be one unknown name. */
const LEAST_IN_A_ROW = 3;
const LONGEST_NAME = 8;

/** A list without any marks, `AQUA GLYCERIN PARFUM`: the longest known names one after the other, where they use up every word. */
function splitWords(text: string, knows: Knows): string[] | undefined {
  const words = text.trim().replace(/\.$/, '').split(/\s+/);
  if (words.length < LEAST_IN_A_ROW || words.length > 400) return undefined;
  const names: string[] = [];
  for (let at = 0; at < words.length; ) {
    let end = at + LONGEST_NAME < words.length ? at + LONGEST_NAME : words.length;
    while (end > at && knows(words.slice(at, end).join(' ')) === undefined) end -= 1;
    if (end === at) return undefined;
    names.push(words.slice(at, end).join(' '));
    at = end;
  }
  return names.length < LEAST_IN_A_ROW ? undefined : names;
}

/**
 * Splits a pasted ingredient list into its names, in their order. `knows` gives the name that a
 * text stands for, or nothing: asked only where marks alone cannot tell.
 */
export function splitList(text: string, knows: Knows = () => undefined): WrittenName[] {
  return findLists(text).flatMap(({ text: list, block }) => {
    const names = splitBlock(list, knows).flatMap((raw) => unfold(raw, knows));
    const only = names.length === 1 && knows(names[0]!.name) === undefined ? splitWords(names[0]!.name, knows) : undefined;
    return (only?.map((name) => ({ name, isInside: false })) ?? names).map(({ name, isInside }): WrittenName =>
      block === 'named' ? { written: name, block: 'list', isInside: true } : { written: name, block, isInside },
    );
  });
}
