import { lawTables } from '#shared/law/tables.ts';
import type { Sourcing } from '#shared/law/types.ts';
import { law } from '#tests/shared/rules/judging.ts';

/** Where a fact of a market's law is held: a row, a step of the calendar, a warning, a wording, an instrument, a duty left open, or what the product does. */
export type Held =
  | { readonly row: string; readonly sourcing?: Sourcing }
  | { readonly change: string }
  | { readonly warning: string }
  | { readonly wording: string; readonly languages: readonly string[] }
  | { readonly formaldehyde: string }
  | { readonly instrument: string; readonly sourcing?: Sourcing }
  | { readonly condition: string }
  /** Left open, with the reason. `firm` is how firmly it is sourced. */
  | { readonly duty: string; readonly firm?: Sourcing }
  /** Tried by what the product says: true where it holds. */
  | { readonly shown: () => boolean };

/** A fact with its number in the digest, and where it is held. */
export type Item = readonly [number: string, fact: string, ...held: Held[]];

/** What is missing or not sourced as it should be; nothing where all is held. */
export function faultsOf(items: readonly Item[]): string[] {
  return items.flatMap(([number, fact, ...held]) => {
    if (held.length === 0) return [`${number} ${fact}: held nowhere`];
    return held.flatMap((one) => (faultOf(one) ?? []).concat()).map((fault) => `${number} ${fact}: ${fault}`);
  });
}

function faultOf(held: Held): string[] | undefined {
  if ('shown' in held) return held.shown() ? undefined : ['not shown'];
  if ('row' in held) {
    const row = law.rows.find(({ id }) => id === held.row);
    if (!row) return [`no row ${held.row}`];
    return held.sourcing && row.sourcing !== held.sourcing ? [`${held.row} is sourced ${row.sourcing}`] : undefined;
  }
  if ('change' in held) return lawTables.changes.some(({ id }) => id === held.change) ? undefined : [`no step ${held.change}`];
  if ('warning' in held) return law.warnings.some(({ id }) => id === held.warning) ? undefined : [`no warning ${held.warning}`];
  if ('formaldehyde' in held) return law.formaldehyde.rules.some(({ id }) => id === held.formaldehyde) ? undefined : [`no rule ${held.formaldehyde}`];
  if ('condition' in held) return law.productConditions.some(({ id }) => id === held.condition) ? undefined : [`no condition ${held.condition}`];
  if ('instrument' in held) {
    const instrument = law.instruments.get(held.instrument);
    return !instrument ? [`no instrument ${held.instrument}`] : held.sourcing && instrument.sourcing !== held.sourcing ? [`${held.instrument} is sourced ${instrument.sourcing}`] : undefined;
  }
  if ('wording' in held) {
    const absent = held.languages.filter((lang) => !law.wordingLanguages(held.wording).includes(lang));
    return absent.length > 0 ? [`${held.wording} lacks ${absent.join(', ')}`] : undefined;
  }
  const duty = law.duties.find(({ id }) => id === held.duty);
  if (!duty) return [`no duty ${held.duty}`];
  return held.firm && duty.sourcing !== held.firm ? [`${held.duty} is sourced ${duty.sourcing}`] : undefined;
}

/** How many facts are judged, and how many are left open with a reason. */
export function coverage(title: string, items: readonly Item[]): string {
  const open = items.filter(([, , ...held]) => held.every((one) => 'duty' in one)).length;
  return `${title}: ${String(items.length)} facts, ${String(items.length - open)} held by rules, rows and dates, ${String(open)} left open with a reason, ${String(faultsOf(items).length)} faults`;
}
