/** One stretch of a pasted text that is a list, with what its heading says of it. */
export interface ListBlock {
  readonly text: string;
  /** `list`: in the order of the list; `may-contain`: after `+/-`; `active`: under a heading of active ingredients; `named`: what the list is said to contain besides. */
  readonly block: 'list' | 'may-contain' | 'active' | 'named';
}

/** How a list is headed in the languages of the four markets and their neighbours. Common practice, no source. */
const HEADING_WORD =
  '(?:ingredients?(?: list)?|ingrédients?|ingredientes?|ingredienti|ingrediënten|ingredienten|ingredienser|ingrediente|inhaltsstoffe|bestandteile|zutaten|zusammensetzung|inci(?:[ -]?(?:names?|list))?|composition|composição|composición|composizione|składniki?|skład|ainesosat|koostis(?:osad)?|sudėtis|sastāvs|sastojci|sestavine|složení|zloženie|összetevők|innehåll|innihaldsefni|içindekiler|състав(?:ки)?|состав|склад|συστατικά|成分|全成分|成份)';
/** `Ingredients:`, `INGREDIENTS / INGRÉDIENTS :`, `Ingredients (INCI) -`, `List of ingredients:`. */
const HEADING = new RegExp(`(?:^|[\\n.;]|(?<![\\p{L}\\p{N}]))[ \\t*]*(?:(?:full |complete )?(?:list of|liste des|liste der) )?((?:in)?active |other )?${HEADING_WORD}(?:[ \\t]*(?:[/|(]|,(?=[ \\t]*${HEADING_WORD}))[ \\t]*${HEADING_WORD}[ \\t]*\\)?)*[ \\t]*(?:[:：]|[-–—][ \\t\\n])`, 'giu');
/** A heading without a colon counts only at the beginning of the text or on a line of its own. */
const BARE_HEADING = new RegExp(`^\\s*${HEADING_WORD}(?:[ \\t]*[/|(][ \\t]*${HEADING_WORD}[ \\t]*\\)?)*[ \\t]*(?:\\n|[ \\t]+(?=\\p{Lu}))`, 'iu');
const MAY_CONTAIN = /[[({]?\s*(?:(?:\+\s*[/\\]?\s*[-–—−]|±|may (?:also )?contain|peut contenir|kann enthalten|puede contener|può contenere|pode conter|kan bevatten|kan indeholde|kan innehålla|może zawierać|saattaa sisältää)(?:[\s:/()|[\]{}]*(?=\+\s*[/-]|±|may |peut |kann |puede |può |pode |kan |może |saattaa ))?\s*[)\]]?\s*:?\s*)+/i;
/** `Contains: …`, `Allergens: …` after the list: names again, whose place says nothing. */
const NAMED = /(?:^|[.;\n]\s*)(?:contains?|also contains|contient|enthält|contiene|bevat|(?:fragrance )?allergens?|allergène?s?|allergene)(?:\s*[/|]\s*(?:contains?|contient|enthält|contiene|bevat|allergens?|allergène?s?|allergene))*\s*:\s*/i;
/** Words with which what follows a list begins. Common practice, no source. */
const AFTERWARDS = /(?:^|[.;\n]\s*|\n\s*)(?=(?:directions?|how to use|to use|usage|apply |warnings?|caution|precautions?|avertissement|mode d'emploi|mise en garde|anwendung|warnhinweise?|hinweis|made in|fabriqué|hergestellt|manufactured|distributed|distribué|produced (?:by|in|for)|responsible person|net (?:wt|weight|content)|store |keep out|for external|avoid contact|best before|batch|lot\b|exp\b|questions\b|free (?:from|of) |without |ohne |sans |no (?:parabens?|sulfates?|silicones?|artificial)|not tested|never tested|cruelty[- ]free|vegan\b|dermatolog|suitable for |contains (?!:)|contient (?!:)|enthält (?!:)|\d{1,2} ?m(?:onths?)?\b(?:[.\s]|$)|\d+(?:[.,]\d+)? ?(?:ml|g|fl|oz|℮)\b|tel[.:]|www\.|https?:|©))/i;
const FOOTNOTE = /(?:^|[\n.;,]\s*)(?=[*†‡°¹²³]+\s?(?:\p{L}|\d)[^,]*(?:organic|biolog|bio\b|ecocert|natural|naturel|natürlich|farming|anbau|essential oils?|ätherisch|huiles? essentielles?|fair|certified|trade|constituents?|occurring|origin|derived|from))/iu;

/** Capitals of other scripts that look like Latin ones, as a photograph's text or a keyboard brings them. */
const LOOKALIKES: Readonly<Record<string, string>> = { Α: 'A', Β: 'B', Ε: 'E', Ζ: 'Z', Η: 'H', Ι: 'I', Κ: 'K', Μ: 'M', Ν: 'N', Ο: 'O', Ρ: 'P', Τ: 'T', Υ: 'Y', Χ: 'X', А: 'A', В: 'B', Е: 'E', К: 'K', М: 'M', Н: 'H', О: 'O', Р: 'P', С: 'C', Т: 'T', Х: 'X', а: 'a', е: 'e', о: 'o', р: 'p', с: 'c', у: 'y', х: 'x', і: 'i' };
const AMONG_LATIN = /(?<=[a-z])[Α-Ωа-яА-Яі]|[Α-Ωа-яА-Яі](?=[a-z])/gi;

/** Sets the text free of what a photograph, a web page or a spreadsheet adds to it. */
function plainText(text: string): string {
  return text
    .normalize('NFC')
    .replace(/\r\n?|[\v\f\u0085\u2028\u2029]/g, '\n')
    .replace(/[\u00AD\u200B-\u200F\u202A-\u202E\u2060-\u2069\uFE0E\uFE0F\uFEFF]/g, '')
    // A spreadsheet's column of figures is none of the names'.
    .replace(/\t+ *[<>≤≥]? *\d+(?:[.,]\d+)? *%? *(?=\t|\n|$)/g, '')
    .replace(/[\u00A0\u2000-\u200A\u202F\u3000\t]/g, ' ')
    .replace(/[\u2010\u2011\uFF0D]/g, '-')
    .replace(/[，、،]/g, ',')
    .replace(/；/g, ';')
    .replace(/[（]/g, '(')
    .replace(/[）]/g, ')')
    .replace(/[［【]/g, '[')
    .replace(/[］】]/g, ']')
    .replace(/[／∕⁄]/g, '/')
    .replace(/(?<=[\p{L})])\\(?=[\p{L}(])/gu, '/')
    .replace(AMONG_LATIN, (letter) => LOOKALIKES[letter] ?? letter)
    .replace(/(\p{Ll})- *\n *(?=\p{Ll})/gu, '$1')
    .replace(/(\d)- *\n *(?=\d)/g, '$1-');
}

/** `1. Aqua 2. Glycerin`: counting figures that run from one are marks between names. */
function openCounted(text: string): string {
  const marks = [...text.matchAll(/(^|[\s,;])\(?(\d{1,3})[.)]\s+(?=\S)/g)];
  if (marks.length < 2 || !marks.every((mark, index) => mark[2] === `${index + 1}`)) return text;
  return text.replace(/(^|[\s,;])\(?\d{1,3}[.)]\s+(?=\S)/g, '$1; ');
}

/** The lists of a pasted text, without headings, prose and footnotes, in their order. */
export function findLists(pasted: string): ListBlock[] {
  const text = openCounted(plainText(pasted));
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

function splitShades(text: string, block: ListBlock['block']): ListBlock[] {
  const list = cutAfterwards(text);
  const mark = MAY_CONTAIN.exec(list);
  if (!mark) return splitNamed(list, block);
  const before = list.slice(0, mark.index);
  const after = list.slice(mark.index + mark[0].length);
  const close = /^\s*[[({]/.test(mark[0]) ? findClose(after) : -1;
  const shades = close < 0 ? after : after.slice(0, close);
  const rest = close < 0 ? '' : after.slice(close + 1);
  return [...splitNamed(before, block), { text: shades, block: 'may-contain' }, ...(rest.trim() === '' ? [] : splitNamed(rest, block))];
}

function splitNamed(text: string, block: ListBlock['block']): ListBlock[] {
  const mark = NAMED.exec(text);
  if (!mark || text.slice(0, mark.index).trim() === '') return [{ text: mark ? text.slice(mark.index + mark[0].length) : text, block }];
  return [{ text: text.slice(0, mark.index), block }, { text: text.slice(mark.index + mark[0].length), block: 'named' }];
}

/** The bracket that closes one opened before `text` began. */
export function findClose(text: string): number {
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
