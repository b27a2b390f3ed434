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

const HEADING_WORD = '(?:ingredients?|ingrédients?|ingredientes?|ingredienti|ingrediënten|inhaltsstoffe|bestandteile|zutaten|inci|composition|składniki|ainesosat|sastojci|ingredienser)';
/** `Ingredients:`, `INGREDIENTS / INGRÉDIENTS :`, `Ingredients (INCI) -`, `List of ingredients:`. */
const HEADING = new RegExp(`(?:^|[\\n.;]|\\b)[ \\t*]*(?:(?:full |complete )?(?:list of|liste des|liste der) )?((?:in)?active |other )?${HEADING_WORD}(?:[ \\t]*(?:[/|(]|,(?=[ \\t]*${HEADING_WORD}))[ \\t]*${HEADING_WORD}[ \\t]*\\)?)*[ \\t]*(?:[:：]|[-–—][ \\t\\n])`, 'giu');
/** A heading without a colon counts only at the beginning of the text or on a line of its own. */
const BARE_HEADING = new RegExp(`^\\s*${HEADING_WORD}(?:[ \\t]*[/|(][ \\t]*${HEADING_WORD}[ \\t]*\\)?)*[ \\t]*(?:\\n|[ \\t]+(?=\\p{Lu}))`, 'iu');
const MAY_CONTAIN = /[[({]?\s*(?:(?:\+\s*[/\\]?\s*[-–—−]|±|may (?:also )?contain|peut contenir|kann enthalten|puede contener|può contenere|kan bevatten)(?:[\s:/()|[\]{}]*(?=\+\s*\/|±|may |peut |kann )|\s*[)\]]?\s*:?\s*))+/i;
/** Words with which what follows a list begins. Common practice, no source. */
const AFTERWARDS = /(?:^|[.;\n]\s*|\n\s*)(?=(?:directions?|how to use|to use|usage|apply |warnings?|caution|avertissement|mode d'emploi|mise en garde|anwendung|warnhinweise?|hinweis|made in|fabriqué|hergestellt|manufactured|distributed|distribué|net (?:wt|weight|content)|store |keep out|for external|avoid contact|best before|batch|lot\b|exp\b|questions\b|www\.|https?:|©))/i;
const FOOTNOTE = /(?:^|[\n.;,]\s*)(?=[*†‡°¹²³]+\s?(?:\p{L}|\d)[^,]*(?:organic|biolog|bio\b|ecocert|natural|naturel|natürlich|farming|anbau|essential oils?|ätherisch|huiles? essentielles?|fair|certified|trade|constituents?|occurring|origin|derived|from))/iu;

/** Sets the plain list free of what surrounds it on a label: heading, prose, footnotes. */
function cleanText(text: string): string {
  return text
    .normalize('NFC')
    .replace(/\r\n?/g, '\n')
    .replace(/[\u00AD\u200B-\u200D\uFEFF]/g, '')
    .replace(/[\u00A0\u2000-\u200A\u202F\u3000\t]/g, ' ')
    .replace(/[‐‑]/g, '-')
    .replace(/，|、/g, ',')
    .replace(/；/g, ';')
    .replace(/（/g, '(')
    .replace(/）/g, ')')
    .replace(/(\p{Ll})- *\n *(?=\p{Ll})/gu, '$1')
    .replace(/(\d)- *\n *(?=\d)/g, '$1-');
}

interface Block {
  readonly text: string;
  readonly block: WrittenName['block'];
}

function findBlocks(text: string): Block[] {
  const marks = [...text.matchAll(HEADING)].filter((mark) => isHeadingHere(text, mark));
  if (marks.length === 0) {
    const bare = BARE_HEADING.exec(text);
    return splitShades(bare ? text.slice(bare[0].length) : text, 'list');
  }
  return marks.flatMap((mark, index) => {
    const isActive = /^active/i.test(mark[1] ?? '');
    const rest = text.slice(mark.index + mark[0].length, marks[index + 1]?.index ?? text.length);
    return splitShades(rest, isActive ? 'active' : 'list');
  });
}

/** The word inside running text ("other ingredients - such as") is none: a dash counts at the start of a line only. */
function isHeadingHere(text: string, mark: RegExpMatchArray): boolean {
  if (/[:：]$/.test(mark[0])) return true;
  const before = text.slice(0, mark.index);
  return before.trim() === '' || /\n\s*$/.test(before) || mark[0].startsWith('\n');
}

function splitShades(text: string, block: WrittenName['block']): Block[] {
  const list = cutAfterwards(text);
  const mark = MAY_CONTAIN.exec(list);
  if (!mark) return [{ text: list, block }];
  const before = list.slice(0, mark.index);
  const after = list.slice(mark.index + mark[0].length);
  const close = /^\s*[[({]/.test(mark[0]) ? findClose(after) : -1;
  const shades = close < 0 ? after : after.slice(0, close);
  const rest = close < 0 ? '' : after.slice(close + 1);
  return [{ text: before, block }, { text: shades, block: 'may-contain' }, ...(rest.trim() === '' ? [] : [{ text: rest, block } as const])];
}

/** The bracket that closes one opened before `text` began. */
function findClose(text: string): number {
  let depth = 0;
  for (let at = 0; at < text.length; at += 1) {
    if ('[({'.includes(text[at]!)) depth += 1;
    else if ('])}'.includes(text[at]!)) {
      if (depth === 0) return at;
      depth -= 1;
    }
  }
  return -1;
}

function cutAfterwards(text: string): string {
  const lead = /^\s*/.exec(text)![0].length;
  let end = text.length;
  for (const pattern of [AFTERWARDS, FOOTNOTE]) {
    const found = pattern.exec(text.slice(lead));
    if (found && found.index + found[0].length > 0) end = found.index + lead < end ? found.index + lead : end;
  }
  return text.slice(0, end);
}

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
  const names: string[] = [];
  let from = 0;
  const cut = (at: number, width: number): void => {
    names.push(text.slice(from, at));
    from = at + width;
  };
  for (let at = 0; at < text.length; at += 1) {
    if (depths[at]! > 0) continue;
    const letter = text[at]!;
    if (';•·●▪■◦‣|⋅∙'.includes(letter)) cut(at, 1);
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
  for (let at = 0; at < text.length; at += 1) if (depths[at] === 0 && /[,;•·●▪|]/.test(text[at]!) && !/^\s*(?:\n|$)/.test(text.slice(at + 1, at + 40)) && !/^\d/.test(text.slice(at + 1, at + 2))) marks += 1;
  return marks * 2 < lines;
}

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

const MARKS = '*†‡°¹²³⁴⁵⁶⁷⁸⁹⁰#^"“”„«»•·';
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
const BRACKET = /^([^()[\]]+?)\s*[([]([^()[\]]+)[)\]]\s*$/;

/** What one piece between two marks names: usually itself; several where it joins names that are known apart. */
function unfold(raw: string, knows: Knows): { name: string; isInside: boolean }[] {
  if (JOINED.test(raw)) return raw.split(new RegExp(JOINED.source, 'gi')).flatMap((part) => unfold(part, knows));
  const name = tidyName(raw);
  if (name === '' || !/[\p{L}\d]/u.test(name)) return [];
  const plain = [{ name, isInside: false }];
  const bracket = BRACKET.exec(name);
  if (bracket && /[,;•]/.test(bracket[2]!)) {
    const outer = knows(bracket[1]!);
    const inner = bracket[2]!.split(/[,;•]/).map(tidyName).filter((one) => one !== '');
    const others = inner.filter((one) => knows(one) !== undefined && knows(one) !== outer);
    if (outer !== undefined && others.length * 2 > inner.length) {
      return [{ name: tidyName(bracket[1]!), isInside: false }, ...inner.filter((one) => knows(one) !== outer).map((one) => ({ name: one, isInside: true }))];
    }
  }
  if (knows(name) !== undefined) return plain;
  return unfoldPair(name.split(/\s*\/\s*/), knows) ?? unfoldPair(LAST_AND.exec(name)?.slice(1) ?? [], knows) ?? plain;
}

function unfoldPair(parts: readonly string[], knows: Knows): { name: string; isInside: boolean }[] | undefined {
  const known = parts.map((part) => knows(tidyName(part)));
  if (parts.length < 2 || known.some((one) => one === undefined) || new Set(known).size < parts.length) return undefined;
  return parts.map((part) => ({ name: tidyName(part), isInside: false }));
}

/**
 * Splits a pasted ingredient list into its names, in their order. `knows` gives the name that a
 * text stands for, or nothing: asked only where marks alone cannot tell.
 */
export function splitList(text: string, knows: Knows = () => undefined): WrittenName[] {
  return findBlocks(cleanText(text)).flatMap(({ text: list, block }) =>
    splitBlock(list, knows).flatMap((raw) => unfold(raw, knows).map(({ name, isInside }) => ({ written: name, block, isInside }))),
  );
}
