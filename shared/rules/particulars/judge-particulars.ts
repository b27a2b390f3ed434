import { compare, parseDecimal } from '#shared/kernel/rational.ts';
import { hasBegun } from '#shared/law/as-at.ts';
import { plainDate } from '#shared/kernel/plain-date.ts';
import type { DocumentParticulars } from '#shared/contracts/formula-document.ts';
import type { Finding } from '#shared/engine/types.ts';
import type { Market, Sourcing } from '#shared/law/types.ts';
import type { Context } from '../context.ts';

/** A particular that a market wants on the label. */
interface Duty {
  readonly field: string;
  readonly markets: readonly Market[];
  readonly citation: Partial<Record<Market, string>>;
  readonly words: string;
  readonly remedy: string;
  readonly sourcing?: Partial<Record<Market, Sourcing>>;
  readonly reading?: string;
  /** First day it binds; absent: throughout. */
  readonly from?: Partial<Record<Market, string>>;
  readonly isMet: (particulars: DocumentParticulars, context: Context) => boolean;
}

const EU19 = (point: string): string => `Regulation (EC) No 1223/2009, Article 19(1)(${point})`;
const GB19 = (point: string): string => `Regulation (EC) No 1223/2009 as assimilated in Great Britain, Article 19(1)(${point})`;
const GB: Partial<Record<Market, Sourcing>> = { UK: 'secondary' };

const DUTIES: readonly Duty[] = [
  {
    field: 'responsiblePerson',
    markets: ['EU', 'UK', 'US', 'CA'],
    citation: { EU: EU19('a'), UK: GB19('a'), US: '21 CFR 701.12', CA: 'Consumer Packaging and Labelling Regulations, C.R.C., c. 417, s. 31' },
    words: 'name and address of the responsible person',
    remedy: 'Add name and address.',
    sourcing: { UK: 'secondary', US: 'memory' },
    isMet: (particulars, context) => hasPerson(particulars, context),
  },
  {
    field: 'netContent',
    markets: ['EU', 'UK', 'US', 'CA'],
    citation: { EU: EU19('b'), UK: GB19('b'), US: '21 CFR 701.13', CA: 'Consumer Packaging and Labelling Regulations, C.R.C., c. 417, s. 14' },
    words: 'nominal content',
    remedy: 'Give the content by weight or volume.',
    sourcing: { UK: 'secondary', US: 'secondary' },
    reading: 'Packs under 5 g or 5 ml, free samples and single-application packs are exempt in the EU and Great Britain.',
    isMet: (_, context) => context.document.product.netContent !== undefined || isContentExempt(context),
  },
  {
    field: 'durability',
    markets: ['EU', 'UK'],
    citation: { EU: EU19('c'), UK: GB19('c') },
    words: 'date of minimum durability or period after opening',
    remedy: 'Give a period after opening, or a best-before date where the product keeps 30 months or less.',
    sourcing: GB,
    isMet: (_, context) => context.document.product.durability !== undefined || context.facts.facts['durabilityNotRelevant'] === true,
  },
  { field: 'batchCode', markets: ['EU', 'UK'], citation: { EU: EU19('e'), UK: GB19('e') }, words: 'batch number or reference', remedy: 'Add the batch code.', sourcing: GB, isMet: (particulars) => isGiven(particulars.batchCode) },
  {
    field: 'function',
    markets: ['EU', 'UK'],
    citation: { EU: EU19('f'), UK: GB19('f') },
    words: 'function of the product',
    remedy: 'Say what the product is, unless its presentation makes it clear.',
    sourcing: GB,
    isMet: (particulars, context) => isGiven(particulars.function) || context.facts.facts['functionClearFromPresentation'] === true,
  },
  {
    field: 'countryOfOrigin',
    markets: ['EU', 'UK'],
    citation: { EU: EU19('a'), UK: GB19('a') },
    words: 'country of origin of an imported product',
    remedy: 'Add the country of origin.',
    sourcing: GB,
    isMet: (particulars, context) => context.facts.facts['imported'] !== true || isGiven(particulars.countryOfOrigin),
  },
  {
    field: 'usContact',
    markets: ['US'],
    citation: { US: 'FD&C Act, section 609(a)' },
    words: 'contact for reports of adverse events',
    remedy: 'Add a domestic address, a domestic telephone number or an electronic contact.',
    sourcing: { US: 'secondary' },
    reading: 'It is asked for as a particular of its own, also where a US address stands on the label.',
    from: { US: '2024-12-29' },
    isMet: (particulars) => isGiven(particulars.usContact),
  },
  {
    field: 'canadaContact',
    markets: ['CA'],
    citation: { CA: 'Cosmetic Regulations, C.R.C., c. 869, s. 20' },
    words: 'contact information on the inner label',
    remedy: 'Add a telephone number, e-mail, website or postal address.',
    from: { CA: '2024-10-09' },
    isMet: (particulars) => isGiven(particulars.canadaContact),
  },
];

function isGiven(text: string | undefined): boolean {
  return text !== undefined && text.trim() !== '';
}

/** Until 31 December 2027 an EU responsible person's details satisfy Great Britain. */
const UK_OWN_PERSON = { available: plainDate('2028-01-01') };

function hasPerson(particulars: DocumentParticulars, context: Context): boolean {
  const isNamed = (market: Market): boolean => {
    const person = particulars.responsiblePerson[market];
    return person !== undefined && isGiven(person.name) && isGiven(person.address);
  };
  const { market } = context.facts;
  if (isNamed(market)) return true;
  return market === 'UK' && !hasBegun(UK_OWN_PERSON, context.days) && isNamed('EU');
}

function isContentExempt(context: Context): boolean {
  const { facts, market } = context.facts;
  if (market !== 'EU' && market !== 'UK') return false;
  const declared = facts['netContent'];
  const value = typeof declared === 'string' ? parseDecimal(declared) : null;
  return facts['freeSample'] === true || facts['singleApplication'] === true || (value !== null && compare(value, { n: 5n, d: 1n }) < 0);
}

/** `particular-missing` for each particular the market wants and the label lacks; only where the document has particulars. */
export function judgeParticulars(context: Context): Finding[] {
  const particulars = context.document.product.particulars;
  if (!particulars) return [];
  const { market } = context.facts;
  const findings: Finding[] = [];
  for (const duty of DUTIES) {
    const from = duty.from?.[market];
    if (!duty.markets.includes(market) || (from && !hasBegun({ available: plainDate(from) }, context.days)) || duty.isMet(particulars, context)) continue;
    const sourcing = duty.sourcing?.[market];
    findings.push({
      kind: 'particular-missing',
      severity: 'stop',
      rule: `${market.toLowerCase()}/particulars/${duty.field}`,
      subject: duty.field,
      citation: duty.citation[market]!,
      message: `The label lacks the ${duty.words}.`,
      remedy: duty.remedy,
      certainty: 'certain',
      ...(sourcing && sourcing !== 'official' ? { sourcing } : {}),
      ...(duty.reading ? { reading: duty.reading } : {}),
    });
  }
  return findings;
}
