import { scaleUtc } from 'd3-scale';

/** One day on which the law changes for this product. */
export interface LawDay {
  readonly date: string;
  /** What changes, in a few words. */
  readonly words: string;
}

const DAY = 86_400_000;
const toTime = (day: string) => Date.parse(`${day}T00:00:00Z`);
const toDay = (time: number) => new Date(time).toISOString().slice(0, 10);

/** Whole years from the year before the earlier of the days to the one after the later: at least three. */
export function ruleSpan(days: readonly string[], today: string): { from: string; to: string } {
  const years = [...days, today].map((day) => Number(day.slice(0, 4)));
  const from = Math.min(...years);
  const to = Math.max(...years, from + 2);
  return { from: `${from}-01-01`, to: `${to}-12-31` };
}

/** Days since the rule's left end: the slider's value. */
export function dayNumber(day: string, from: string): number {
  return Math.round((toTime(day) - toTime(from)) / DAY);
}
export function dayAt(number: number, from: string): string {
  return toDay(toTime(from) + number * DAY);
}

export interface RuleTick {
  readonly x: number;
  readonly length: number;
  readonly year: string | null;
}

/** A tick for each month (fewer where it is narrow), a long one with its number for each year. */
export function ruleTicks(span: { from: string; to: string }, width: number): RuleTick[] {
  const scale = ruleScale(span, width);
  const ticks: RuleTick[] = [];
  const first = Number(span.from.slice(0, 4));
  const last = Number(span.to.slice(0, 4));
  const perYear = width / (last - first + 1);
  for (let year = first; year <= last; year++) {
    for (let month = 0; month < 12; month++) {
      if (month % 3 !== 0 && perYear < 160) continue;
      if (month !== 0 && perYear < 40) continue;
      ticks.push({
        x: scale(Date.UTC(year, month, 1)),
        length: month === 0 ? 14 : month % 3 === 0 ? 8 : 4,
        year: month === 0 && (perYear >= 36 || year % 5 === 0) ? String(year) : null,
      });
    }
  }
  return ticks;
}

function ruleScale(span: { from: string; to: string }, width: number) {
  return scaleUtc().domain([toTime(span.from), toTime(span.to)]).range([0, width]);
}

export interface RuleMark {
  readonly day: LawDay;
  readonly x: number;
  /** Where its words begin, or end for `end`; `null` where there is no room for them. */
  readonly label: { readonly at: number; readonly align: 'start' | 'end'; readonly hasWords: boolean } | null;
}

/** Law days with their words placed so that none runs into the next; words give way before dates. */
export function ruleMarks(days: readonly LawDay[], span: { from: string; to: string }, width: number): RuleMark[] {
  const scale = ruleScale(span, width);
  const shown = days.filter((day) => day.date >= span.from && day.date <= span.to).toSorted((a, b) => (a.date < b.date ? -1 : 1));
  const dateWidth = 78;
  const wordWidth = (words: string) => words.length * 6.1 + 8;
  let free = -Infinity;
  return shown.map((day, index): RuleMark => {
    const x = scale(toTime(day.date));
    const next = shown[index + 1] ? scale(toTime(shown[index + 1]!.date)) : width;
    const full = dateWidth + wordWidth(day.words);
    const isLast = index === shown.length - 1;
    if (x + 6 >= free && x + 6 + full <= (isLast ? width : next)) {
      free = x + 6 + full;
      return { day, x, label: { at: x + 6, align: 'start', hasWords: true } };
    }
    if (isLast && x - 6 - full >= Math.max(free, 0)) {
      free = x;
      return { day, x, label: { at: x - 6, align: 'end', hasWords: true } };
    }
    if (x + 6 >= free && x + 6 + dateWidth <= (isLast ? width : next)) {
      free = x + 6 + dateWidth;
      return { day, x, label: { at: x + 6, align: 'start', hasWords: false } };
    }
    if (x - 6 - dateWidth >= Math.max(free, 0)) {
      free = x;
      return { day, x, label: { at: x - 6, align: 'end', hasWords: false } };
    }
    return { day, x, label: null };
  });
}
