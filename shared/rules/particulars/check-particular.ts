import { compare, decimal, parseDecimal, type Rational } from '#shared/kernel/rational.ts';
import type { DocumentParticulars } from '#shared/contracts/formula-document.ts';
import type { Finding } from '#shared/engine/types.ts';
import type { Market } from '#shared/law/types.ts';
import type { Answer } from '../answer.ts';
import type { Context } from '../context.ts';
import { judgeDurability } from './durability.ts';
import { heightFor, panelOf, sayArea, sayBound, squareInches } from './panel.ts';
import { places, type GivenField, type ParticularCheck } from './particular-rows.ts';

/** What a look at the label found; `undefined` in `met` is "cannot tell". */
export interface Look {
  readonly met: Answer;
  readonly needs?: readonly string[];
  /** In place of the row's own words. */
  readonly words?: string;
  readonly remedy?: string;
  readonly figures?: Pick<Finding, 'measured' | 'limit' | 'unit' | 'arithmetic'>;
  /** For the list of what was not checked. */
  readonly open?: string;
}

const MET: Look = { met: true };

/** Looks for one particular. What the document does not show is "cannot tell", with the facts that would settle it. */
export function lookFor(check: ParticularCheck, context: Context): Look {
  const particulars = context.document.product.particulars!;
  const { market } = context.facts;
  if ('given' in check) return { met: isGivenField(check.given, context) };
  if ('party' in check) return { met: check.party.some((one) => hasParty(particulars, one)) };
  if ('established' in check) return lookAtPlace(particulars.responsiblePerson[check.established]?.address, check.established);
  if ('says' in check) return { met: saysOne(check.says, particulars.responsiblePerson[market]) };
  if ('durability' in check) return lookAtDurability(check.durability, context);
  if ('measure' in check) return lookAtMeasure(check, context);
  if ('figures' in check) return lookAtFigures(check.figures, context);
  if ('content' in check) return lookAtContent(check.content, context);
  if ('heights' in check) return lookAtHeights(check, context);
  if ('height' in check) return lookAtHeight(check, context);
  if ('zone' in check) return lookAtZone(check.zone, context);
  if ('languages' in check) return lookAtLanguages(check.languages, context);
  if ('any' in check) return { met: check.any.some((one) => lookFor(one, context).met === true) };
  return { met: undefined, open: check.open };
}

export function isGiven(text: string | undefined): boolean {
  return text !== undefined && text.trim() !== '';
}

function isGivenField(field: GivenField, { document: { product } }: Context): boolean {
  return field === 'netContent' ? product.netContent !== undefined : isGiven(product.particulars![field]);
}

function hasParty(particulars: DocumentParticulars, market: Market): boolean {
  const party = particulars.responsiblePerson[market];
  return party !== undefined && isGiven(party.name) && isGiven(party.address);
}

/** Letters only, so that case and dots do not part two spellings. */
const bare = (text: string): string => text.toLowerCase().replace(/[.\s]+/g, ' ').trim();

function lookAtPlace(address: string | undefined, market: 'EU' | 'UK'): Look {
  if (!isGiven(address)) return MET;
  const end = bare(address!.split(/[,\n]/).at(-1)!);
  const names = (list: readonly string[]): boolean => list.some((name) => bare(name) === end);
  const { countries } = places;
  if (names(countries[market]) || names(countries.both)) return MET;
  const other = (['EU', 'UK', 'elsewhere'] as const).find((one) => one !== market && names(countries[one]));
  return other ? { met: false } : { met: undefined, open: 'An address that does not end with a country is not placed.' };
}

function saysOne(texts: readonly string[], party: { readonly name: string; readonly address: string } | undefined): boolean {
  const said = bare(`${party?.name ?? ''} ${party?.address ?? ''}`).replace(/ ?\/ ?/g, '/');
  return texts.some((text) => said.includes(text));
}

function factText(context: Context, key: string): string | undefined {
  const value = context.facts.facts[key];
  return typeof value === 'string' && value.trim() !== '' ? value.trim() : undefined;
}

function lookAtDurability(bound: string, context: Context): Look {
  const { durability } = context.document.product;
  const { facts, placedOnMarket } = context.facts;
  const found = judgeDurability(durability, { known: factText(context, 'minimumDurabilityMonths'), notRelevant: facts['durabilityNotRelevant'] === true, placed: placedOnMarket }, bound);
  if (found.met === true) return MET;
  const words = found.lacks === 'date' ? 'date of minimum durability' : found.lacks === 'period' ? 'period after opening' : undefined;
  const remedy = found.lacks === 'date' ? `The product keeps for ${bound} months or less: give a best-before date.` : found.lacks === 'period' ? `The product keeps for more than ${bound} months: give a period after opening.` : undefined;
  const from = found.met === undefined ? 'from the first day of sale to the date' : 'minimum durability entered';
  return {
    met: found.met, needs: found.needs,
    ...(words ? { words } : {}), ...(remedy ? { remedy } : {}),
    ...(found.months ? { figures: { measured: found.months, limit: bound, unit: 'months', arithmetic: [{ step: from, figure: `${found.months} months` }, { step: 'date up to, period after opening above', figure: `${bound} months` }] } } : {}),
  };
}

function lookAtMeasure(check: Extract<ParticularCheck, { measure: unknown }>, context: Context): Look {
  const content = context.document.product.netContent;
  const form = factText(context, 'physicalForm') ?? context.facts.category.facts?.['physicalForm'];
  if (!content) return MET;
  const wanted = context.facts.flags.aerosol ? check.aerosol : typeof form === 'string' ? check.measure[form] : undefined;
  if (wanted === undefined) return { met: undefined, needs: ['physicalForm'] };
  if (wanted === content.unit) return MET;
  return { met: false, needs: ['usualMeasure'], figures: { arithmetic: [{ step: context.facts.flags.aerosol ? 'pressurised pack' : `physical form: ${form as string}`, figure: wanted }, { step: 'given', figure: `${content.value} ${content.unit}` }] } };
}

function lookAtFigures(most: number, context: Context): Look {
  const content = context.document.product.netContent;
  if (!content) return MET;
  const [whole = '', part] = content.value.split('.');
  const digits = (part === undefined ? whole.replace(/0+$/, '') : `${whole}${part}`).replace(/^0+/, '');
  if (digits.length <= most) return MET;
  return { met: false, figures: { measured: `${digits.length}`, limit: `${most}`, unit: 'figures', arithmetic: [{ step: 'significant figures', figure: `${digits.length}`, from: content.value }] } };
}

function lookAtContent(bounds: { readonly least: string; readonly most: string }, context: Context): Look {
  const content = context.document.product.netContent;
  const value = content && parseDecimal(content.value);
  if (!value) return { met: undefined, needs: ['netContent'] };
  const isLess = compare(value, decimal(bounds.least)) < 0;
  if (!isLess && compare(value, decimal(bounds.most)) <= 0) return MET;
  return { met: false, figures: { measured: content!.value, limit: isLess ? bounds.least : bounds.most, unit: content!.unit } };
}

/** The figure that sets the row of a table of heights, in the table's unit. */
function figureOf(by: 'content' | 'sq-in' | 'sq-cm', context: Context): { readonly value: Rational; readonly unit: string; readonly step: string } | undefined {
  const { product, label } = context.document;
  if (by === 'content') {
    const value = product.netContent && parseDecimal(product.netContent.value);
    return value ? { value, unit: 'g or ml', step: `${product.netContent!.value} ${product.netContent!.unit}` } : undefined;
  }
  const panel = panelOf(factText(context, 'panelAreaSqCm'), label?.container);
  if (!panel) return undefined;
  const value = by === 'sq-cm' ? panel.squareCm : squareInches(panel);
  const unit = by === 'sq-cm' ? 'cm²' : 'sq in';
  return { value, unit, step: `${panel.step}: ${sayArea(value)} ${unit}` };
}

function lookAtHeights({ heights, by }: Extract<ParticularCheck, { heights: unknown }>, context: Context): Look {
  const figure = figureOf(by, context);
  if (!figure) return { met: undefined, open: by === 'content' ? 'The content is not given.' : 'The area of the principal display panel is not known: enter it with the product, or choose a container.' };
  const { height, bound } = heightFor(heights, figure.value);
  const arithmetic = [{ step: figure.step, figure: sayBound(heights, bound, figure.unit) }, { step: 'least height', figure: `${height} mm` }];
  const measured = factText(context, 'netContentHeightMm');
  const read = measured === undefined ? null : parseDecimal(measured);
  if (!read) return { met: undefined, open: `At least ${height} mm (${figure.step}, ${sayBound(heights, bound, figure.unit)}). The label set here keeps it; the height on another is not entered.` };
  if (compare(read, decimal(height)) >= 0) return MET;
  return { met: false, figures: { measured: measured!, limit: height, unit: 'mm', arithmetic: [...arithmetic, { step: 'measured', figure: `${measured!} mm` }] } };
}

function lookAtHeight(check: { readonly height: string; readonly fact: string }, context: Context): Look {
  const text = factText(context, check.fact);
  const read = text === undefined ? null : parseDecimal(text);
  if (!read) return { met: undefined, needs: [check.fact] };
  return compare(read, decimal(check.height)) >= 0 ? MET : { met: false, figures: { measured: text!, limit: check.height, unit: 'mm' } };
}

function lookAtZone(zone: { readonly over: string; readonly asks: string }, context: Context): Look {
  const figure = figureOf('sq-in', context);
  if (figure && compare(figure.value, decimal(zone.over)) <= 0) return MET;
  const said = context.facts.facts[zone.asks];
  if (said === true) return MET;
  if (said === undefined || !figure) return { met: undefined, open: 'The label set here keeps it; where it stands on another is not entered.' };
  return { met: false, figures: { arithmetic: [{ step: figure.step, figure: `over ${zone.over} sq in` }] } };
}

/** Only a label set for this market says which languages it has. */
function labelLanguages({ document: { product, label }, facts: { market } }: Context): readonly string[] | undefined {
  const isOfMarket = label?.market === market || (label?.market === undefined && product.markets.length === 1 && product.markets[0] === market);
  return isOfMarket && label?.languages && label.languages.length > 0 ? label.languages : undefined;
}

function lookAtLanguages(wanted: readonly string[] | 'destinations', context: Context): Look {
  const spoken = labelLanguages(context);
  if (!spoken) return { met: undefined, open: 'No label with its languages is set for this market.' };
  const destinations = factText(context, 'destinations');
  if (wanted === 'destinations' && destinations === undefined) return { met: undefined, open: 'Where in the Union it is sold is not entered: it decides the languages.' };
  const lacking = wanted === 'destinations' ? lackingFor(destinations!, spoken) : wanted.filter((lang) => !spoken.includes(lang));
  if (lacking.length === 0) return MET;
  return { met: false, words: `language of the place of sale: ${lacking.join(', ')}`, figures: { arithmetic: [{ step: 'languages of the label', figure: spoken.join(', ') }, { step: 'lacking', figure: lacking.join(', ') }] } };
}

function lackingFor(destinations: string, spoken: readonly string[]): string[] {
  return destinations.toUpperCase().split(/[^A-Z]+/).flatMap((code) => {
    const rule = places.languages[code];
    if (!rule) return [];
    if (rule.all) return rule.all.filter((lang) => !spoken.includes(lang)).map((lang) => `${lang} (${code})`);
    return rule.any!.some((lang) => spoken.includes(lang)) ? [] : [`${rule.any!.join(' or ')} (${code})`];
  });
}
