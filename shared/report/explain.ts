import type { Finding } from '#shared/engine/types.ts';
import type { LawBook } from '#shared/law/law-book.ts';
import { readings, sayRule } from '#shared/law/readings.ts';
import { sayCondition } from '#shared/law/say-condition.ts';
import type { Dates, LawRow, Market, Provision } from '#shared/law/types.ts';

/** What stands behind a finding besides its sum, for the screen that answers "Why?". */
export interface Explanation {
  /** The rule in our own words, the duty first, then its fields of application. */
  readonly says: readonly string[];
  /** What the rule is set with: names and values. */
  readonly parameters: readonly { readonly name: string; readonly value: string }[];
  /** Since when and until when it binds; days as `YYYY-MM-DD`. */
  readonly dates: readonly DatedWords[];
  /** Where the text leaves a choice: what was chosen, and why. */
  readonly readings: readonly { readonly chosen: string; readonly why: string }[];
  /** The official text, and which state of it was read. */
  readonly source?: { readonly title: string; readonly link: string; readonly state: string };
}

export interface DatedWords {
  readonly words: string;
  readonly day: string;
}

const MOST_FIELDS = 8;

/** Explains a finding of one market from the tables it rests on. Pure; nothing is looked up elsewhere. */
export function explainFinding(finding: Finding, market: Market, law: LawBook): Explanation {
  const row = rowOf(finding.rule, law);
  const group = law.allergenGroups.find(({ id }) => finding.rule.startsWith(`${id}/`));
  const provisions = row ? provisionsOf(row, finding.rule, market) : [];
  const says = [sayRule(finding.kind, market), ...(row ? sayRow(row, provisions, law, market) : []), ...(group ? [`${group.label} is named where the total of all its members is above ${group.leaveOn} % in leave-on and ${group.rinseOff} % in rinse-off products.`] : [])];
  const source = sourceOf(finding, row, law, market);
  return {
    says: says.filter((one) => one !== undefined),
    parameters: [
      ...(row ? parametersOf(row, provisions, finding) : []),
      ...(group ? [{ name: 'Members of the group', value: group.members.map(({ name }) => name).join(', ') }] : []),
      ...(row || finding.limit === undefined ? [] : [{ name: 'Held against', value: `${finding.limit} ${finding.unit ?? '%'}` }]),
    ],
    dates: datesOf(finding, row, provisions, group?.markets.find((one) => one.market === market)?.from),
    readings: readingsOf(finding, market, [...provisions.map((one) => one.reading), finding.reading, group?.reading]),
    ...(source && { source }),
  };
}

/** Rules of the list itself, as they are spoken of. */
const LIST_RULES: Readonly<Record<string, string>> = {
  'order-proved': 'the order of the list', 'zone-proved': 'the 1 % line', 'name-known': 'a name that is not known', 'formula-adds-up': 'the sum of the batch', 'composition-adds-up': 'a composition that does not add up', 'colour-name-chosen': 'the name of a colour',
};

/** A rule's id in words: its citation, or what it is about. */
export function nameRule(rule: string, market: Market, law: LawBook): string {
  const row = rowOf(rule, law);
  if (row) return law.citation(row, market);
  const group = law.allergenGroups.find(({ id }) => rule === id || rule.startsWith(`${id}/`));
  return group ? `naming ${group.label}` : (LIST_RULES[rule] ?? rule.replaceAll('/', ' ').replaceAll('-', ' '));
}

/** The row that a rule's id begins with; provisions add their letter to it. */
function rowOf(rule: string, law: LawBook): LawRow | undefined {
  let found: LawRow | undefined;
  for (const row of law.rows) if ((rule === row.id || rule.startsWith(`${row.id}/`)) && row.id.length >= (found?.id.length ?? 0)) found = row;
  return found;
}

function provisionsOf(row: LawRow, rule: string, market: Market): readonly Provision[] {
  const here = row.provisions.filter((one) => one.markets?.includes(market) ?? true);
  const letter = rule.slice(row.id.length + 1);
  const own = here.filter((one) => one.letter !== '' && one.letter.replaceAll(', ', '-') === letter);
  return own.length > 0 ? own : here;
}

const LISTS: Readonly<Record<LawRow['list'], string>> = {
  prohibited: 'list of prohibited substances', restricted: 'list of restricted substances', colourant: 'list of colourants', preservative: 'list of preservatives', 'uv-filter': 'list of UV filters',
};

function sayRow(row: LawRow, provisions: readonly Provision[], law: LawBook, market: Market): string[] {
  const fields = provisions.slice(0, MOST_FIELDS).map((one) => sayProvision(one, law));
  const more = provisions.length - fields.length;
  return [
    `${law.citation(row, market)}, on the ${LISTS[row.list]}: ${row.title}.`,
    ...fields.filter((one) => one !== ''),
    ...(more > 0 ? [`And ${more} more fields of application.`] : []),
    ...(row.onlyListedUses ? ['Any use outside these is not allowed.'] : []),
  ];
}

function sayProvision(provision: Provision, law: LawBook): string {
  const { where, max, basis, use, words, requires, wording, notComputable, letter } = provision;
  const what = [
    ...(use === 'forbidden' ? [words ?? 'Not allowed.'] : []),
    ...(max === undefined ? [] : [`At most ${max} %${basis ? ` ${basis}` : ''} in the ready-for-use product.`]),
    ...(requires ?? []).map((one) => one.words),
    ...(wording ?? []).map(({ id, above }) => `The label says${above ? `, above ${above} %` : ''}: “${law.wording(id, 'en').text}”`),
    ...(notComputable ? [`Not computed here: ${notComputable}`] : []),
  ];
  if (what.length === 0) return '';
  return `${/^[a-z]$/.test(letter) ? `(${letter}) ` : ''}${where ? `For ${sayCondition(where)}: ` : ''}${what.join(' ')}`;
}

const COUNTS: Readonly<Record<LawRow['together'], string>> = { each: 'each member alone', sum: 'the sum of all members', ratios: 'the sum of the members’ shares over their own maxima' };

function parametersOf(row: LawRow, provisions: readonly Provision[], finding: Finding): { name: string; value: string }[] {
  const named = new Set([finding.subject, ...(finding.members ?? [])].map((name) => name.toLowerCase()));
  const own = row.members.filter(({ name, otherNames }) => [name, ...(otherNames ?? [])].some((one) => named.has(one.toLowerCase())));
  const factors = own.flatMap(({ name, factor }) => (factor ? [{ name: `Factor of ${name}`, value: `${factor.times} over ${factor.over}` }] : []));
  return [
    ...(finding.limit === undefined ? [] : [{ name: 'Maximum', value: `${finding.limit}${finding.unit ? ` ${finding.unit}` : ''}${finding.basis ? ` ${finding.basis}` : ''}` }]),
    ...(row.members.length > 1 ? [{ name: 'What is counted', value: COUNTS[provisions[0]?.together ?? row.together] }, { name: 'Members of the entry', value: `${row.members.length}` }] : []),
    ...factors,
  ];
}

function datesOf(finding: Finding, row: LawRow | undefined, provisions: readonly Provision[], groupFrom: Dates | undefined): DatedWords[] {
  const from = (provisions.length === 1 ? provisions[0]!.from : undefined) ?? row?.from ?? groupFrom;
  const until = (provisions.length === 1 ? provisions[0]!.until : undefined) ?? row?.until;
  if (!from && !until) return finding.effective ? [{ words: 'In force from', day: finding.effective.from }, ...(finding.effective.to ? [{ words: 'until', day: finding.effective.to }] : [])] : [];
  return [...sayDates(from, 'binds'), ...sayDates(until, 'ends')];
}

function sayDates(dates: Dates | undefined, verb: 'binds' | 'ends'): DatedWords[] {
  if (!dates) return [];
  const { placed, available } = dates;
  const word = verb === 'binds' ? 'Binds' : 'Ends for';
  if (placed === undefined) return [{ words: `${word} everything sold from`, day: available }];
  return [{ words: `${word} batches first sold from`, day: placed }, { words: `${word} everything still sold from`, day: available }];
}

function readingsOf(finding: Finding, market: Market, own: readonly (string | undefined)[]): Explanation['readings'] {
  const has = { basis: finding.basis !== undefined, purpose: finding.needs?.includes('purpose') ?? false, effective: finding.effective !== undefined };
  const general = readings.filter(
    (one) => one.kinds.includes(finding.kind) && (one.markets?.includes(market) ?? true) && (one.rule === undefined || finding.rule.endsWith(one.rule)) && (one.needs === undefined || has[one.needs]),
  );
  const special = [...new Set(own.filter((one) => one !== undefined))].map((chosen) => ({ chosen, why: '' }));
  return [...special, ...general.map(({ chosen, why }) => ({ chosen, why }))];
}

function sourceOf({ citation }: Finding, row: LawRow | undefined, law: LawBook, market: Market): Explanation['source'] {
  const instruments = [...law.instruments.values()];
  // The Act is cited by the section of the Code in which it stands.
  const act = citation.startsWith('21 USC') ? law.instruments.get('us-fdca') : undefined;
  const cited = row ? law.instruments.get(row.instrument) : act ?? instruments.find(({ short, elsewhere }) => citation.startsWith(short) || Object.values(elsewhere ?? {}).some((one) => citation.startsWith(one.short)));
  if (!cited) return undefined;
  return { title: cited.title, link: cited.link, state: cited.elsewhere?.[market]?.note ?? cited.state };
}
