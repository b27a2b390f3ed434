import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Market } from '#shared/law/types.ts';
import type { ReportModel } from './report-model.ts';

/** Where each market asks for a particular. The letters of 21 CFR 701 are left out where they are not confirmed. */
const RULES: Readonly<Record<string, Partial<Record<Market, string>>>> = {
  responsiblePerson: { EU: 'Art. 19(1)(a)', UK: 'Art. 19(1)(a)', US: '21 CFR 701.12', CA: 'CPLR s. 13' },
  netContent: { EU: 'Art. 19(1)(b)', UK: 'Art. 19(1)(b)', US: '21 CFR 701.13', CA: 'CPLR s. 12' },
  durability: { EU: 'Art. 19(1)(c)', UK: 'Art. 19(1)(c)' },
  warnings: { EU: 'Art. 19(1)(d)', UK: 'Art. 19(1)(d)', US: '21 CFR 740', CA: 'C.R.C. 869 s. 24' },
  batchCode: { EU: 'Art. 19(1)(e)', UK: 'Art. 19(1)(e)' },
  function: { EU: 'Art. 19(1)(f)', UK: 'Art. 19(1)(f)', US: '21 CFR 701.11', CA: 'C.R.C. 869 s. 20' },
  usContact: { US: 'FD&C Act 609(a)' },
  canadaContact: { CA: 'C.R.C. 869 s. 20' },
};

/** What the label says of each particular, beside the rule that asks for it in the product's markets. */
export function particularRows(document: FormulaDocument): ReportModel['particulars'] {
  const { product } = document;
  const { particulars } = product;
  const ruleOf = (key: string, markets: readonly Market[]): string => {
    const rules = new Set(markets.map((market) => RULES[key]?.[market]).filter((rule) => rule !== undefined));
    return [...rules].join(', ');
  };
  const rows: { name: string; value: string; rule: string }[] = [];
  const put = (name: string, value: string | undefined, key: string, markets = product.markets): void => {
    const rule = ruleOf(key, markets);
    if (value || rule) rows.push({ name, value: value || 'not given', rule });
  };
  for (const market of product.markets) {
    const party = particulars?.responsiblePerson[market];
    put(`Responsible person, ${market}`, party ? `${party.name}, ${party.address}` : undefined, 'responsiblePerson', [market]);
  }
  put('Net content', product.netContent && `${product.netContent.value}\u00a0${product.netContent.unit}`, 'netContent');
  put('Durability', durabilityOf(product.durability), 'durability');
  put('Precautions', particulars?.warnings.map((warning) => warning.text).join(' ') || undefined, 'warnings');
  put('Batch', particulars?.batchCode, 'batchCode');
  put('Function', particulars?.function, 'function');
  if (product.markets.includes('US')) put('Contact, US', particulars?.usContact, 'usContact');
  if (product.markets.includes('CA')) put('Contact, Canada', particulars?.canadaContact, 'canadaContact');
  put('Country of origin', particulars?.countryOfOrigin, 'countryOfOrigin');
  put('Directions', particulars?.directions, 'directions');
  return rows;
}

function durabilityOf(durability: FormulaDocument['product']['durability']): string | undefined {
  if (!durability) return undefined;
  return durability.kind === 'pao' ? `${durability.months}M after opening` : `best used before the end of ${durability.date}`;
}
