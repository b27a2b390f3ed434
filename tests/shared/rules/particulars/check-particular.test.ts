import { describe, expect, test } from 'vitest';
import type { Finding } from '#shared/engine/types.ts';
import { judge, said, type Asked } from '../judging.ts';

const person = { name: 'Brackenmere Bathhouse', address: '4 Sluice Row, 0000 Exampleport' };
const label = (asked: Asked = {}): Asked => ({
  ...asked,
  facts: { madeIn: asked.market ?? 'EU', ...asked.facts },
  particulars: { responsiblePerson: { EU: person, UK: person, US: person, CA: person }, usContact: 'hello@brackenmere.example', canadaContact: 'hello@brackenmere.example', batchCode: 'BW-0412', function: 'Body wash', ...asked.particulars },
  product: { netContent: { value: '250', unit: 'ml' }, durability: { kind: 'pao', months: '12' }, ...asked.product },
});
const found = (asked: Asked): string[] => said(judge([], label(asked)), 'particular-missing', 'particular-uncertain').map((line) => line.split(' ').slice(0, 2).join(' '));
const one = (asked: Asked, kind: Finding['kind'] = 'particular-missing'): Finding => judge([], label(asked)).findings.find((finding) => finding.kind === kind)!;
const open = (asked: Asked, rule: string): string | undefined => judge([], label(asked)).notChecked.find((each) => each.rule === rule)?.words;

// Regulation (EC) No 1223/2009, Article 19(1)(b): under 5 g or 5 ml, free samples, single application.
describe('content of small packs', () => {
  test.each([['4.9', []], ['4.999', []], ['5', ['particular-missing netContent']], ['5.1', ['particular-missing netContent']]])('a pack of %s without its content printed: %s', (netContent, expected) => {
    const { product, ...rest } = label({ facts: { netContent } });
    const { netContent: _, ...others } = product!;
    expect(said(judge([], { ...rest, product: others }), 'particular-missing').map((line) => line.split(' ').slice(0, 2).join(' '))).toEqual(expected);
  });
  test.each(['freeSample', 'singleApplication', 'numberPlainToSee'])('%s frees it in the Union and Great Britain, not in the US or Canada', (fact) => {
    const lacks = (['EU', 'UK', 'US', 'CA'] as const).filter((market) => {
      const { product, ...rest } = label({ market, facts: { [fact]: true } });
      const { netContent: _, ...others } = product!;
      return said(judge([], { ...rest, product: others }), 'particular-missing').some((line) => line.includes(' netContent '));
    });
    expect(lacks).toEqual(['US', 'CA']);
  });
});

describe('durability on the label', () => {
  test.each([['29', ['particular-missing durability']], ['30', ['particular-missing durability']], ['31', []]])('a period after opening on what keeps %s months: %s', (minimumDurabilityMonths, expected) => {
    expect(found({ facts: { minimumDurabilityMonths } })).toEqual(expected);
  });
  test('the arithmetic stands with it', () => {
    expect(one({ facts: { minimumDurabilityMonths: '30' } })).toMatchObject({ measured: '30', limit: '30', unit: 'months', citation: 'Regulation (EC) No 1223/2009, Article 19(1)(c)', message: 'The label lacks the date of minimum durability.' });
  });
  test('a date more than 30 months after the first sale is asked about', () => {
    expect(one({ product: { durability: { kind: 'best-before', date: '2029-07' } } }, 'particular-uncertain')).toMatchObject({ subject: 'durability', measured: '31', needs: ['minimumDurabilityMonths', 'durabilityNotRelevant'] });
  });
});

// UK digest 7: an EU-made product needs its origin in Great Britain, and a British one in the Union.
describe('origin', () => {
  test.each([
    ['EU', 'EU', []], ['UK', 'EU', ['particular-missing countryOfOrigin']], ['EU', 'UK', ['particular-missing countryOfOrigin']], ['UK', 'UK', []], ['US', 'US', []], ['US', 'EU', ['particular-missing countryOfOrigin']],
  ] as const)('sold in %s, made in %s: %s', (market, madeIn, expected) => {
    expect(found({ market, facts: { madeIn, madeByNamedFirm: true } })).toEqual(expected);
  });
  test('not said where it was made: asked, unless the country is named', () => {
    expect(one({ facts: { madeIn: '' } }, 'particular-uncertain')).toMatchObject({ severity: 'decide', subject: 'countryOfOrigin', needs: ['madeIn'] });
    expect(found({ facts: { madeIn: '' }, particulars: { countryOfOrigin: 'Exampleland' } })).toEqual([]);
  });
  // CPLR section 31.
  test('Canada wants the importer’s words in both languages, or the origin', () => {
    const CA = (name: string): Asked => ({ market: 'CA', facts: { madeIn: 'EU' }, particulars: { responsiblePerson: { CA: { name, address: '1 Weir Lane, Exampleton ON' } } } });
    expect(found(CA('Brackenmere'))).toEqual(['particular-missing responsiblePerson']);
    expect(found(CA('Imported by'))).toEqual(['particular-missing responsiblePerson']);
    expect(found(CA('Imported by / Importé par Brackenmere'))).toEqual([]);
    expect(found({ ...CA('Brackenmere'), particulars: { ...CA('Brackenmere').particulars, countryOfOrigin: 'Exampleland' } })).toEqual([]);
  });
});

describe('who answers for it', () => {
  test.each([['Hamburg, Germany', []], ['Leeds, United Kingdom', ['particular-uncertain responsiblePerson']], ['Belfast, Northern Ireland', []], ['Chicago, U.S.A.', ['particular-uncertain responsiblePerson']], ['0000 Exampleport', []]])('a person for the Union in %s: %s', (place, expected) => {
    expect(found({ particulars: { responsiblePerson: { EU: { name: 'Brackenmere', address: `4 Sluice Row, ${place}` } } } })).toEqual(expected);
  });
  test.each([['2027-12-31', []], ['2028-01-01', ['particular-uncertain responsiblePerson']]])('for Great Britain an address in the Union is enough on %s: %s', (available, expected) => {
    expect(found({ market: 'UK', available, placed: '2026-01-01', particulars: { responsiblePerson: { UK: { name: 'Brackenmere', address: '4 Sluice Row, Ireland' } } } })).toEqual(expected);
  });
  test('what the change of 2028 asks for is told before', () => {
    const verdict = judge([], label({ market: 'UK', particulars: { responsiblePerson: { EU: person } } }));
    expect(verdict.findings.filter(({ kind }) => kind === 'upcoming')).toEqual([expect.objectContaining({ severity: 'note', subject: 'responsiblePerson', effective: { from: '2028-01-01' } })]);
  });
  // 21 CFR 701.12, from memory.
  test('a firm in the US that did not make it says how it is connected', () => {
    const US = (name: string): Asked => ({ market: 'US', facts: { madeByNamedFirm: false }, particulars: { responsiblePerson: { US: { name, address: '1 Weir Lane' } } } });
    expect(found(US('Brackenmere Inc.'))).toEqual(['particular-missing responsiblePerson']);
    expect(found(US('Distributed by Brackenmere Inc.'))).toEqual([]);
    expect(found(US('MANUFACTURED FOR Brackenmere Inc.'))).toEqual([]);
  });
});

// CPLR sections 21, 22, 25, 26; US digest E1 from memory.
describe('measure and figures of the content', () => {
  test.each([
    ['CA', 'face-cream', 'g', ['particular-uncertain netContent']], ['CA', 'face-cream', 'ml', []], ['CA', 'soap-bar', 'g', []], ['CA', 'soap-bar', 'ml', ['particular-uncertain netContent']], ['CA', 'deodorant-spray', 'ml', ['particular-uncertain netContent']], ['CA', 'deodorant-spray', 'g', []],
    ['US', 'face-cream', 'ml', ['particular-uncertain netContent']], ['US', 'face-cream', 'g', []], ['US', 'body-wash', 'ml', []], ['EU', 'face-cream', 'g', []], ['EU', 'face-cream', 'ml', []],
  ] as const)('%s, %s in %s: %s', (market, category, unit, expected) => {
    expect(found({ market, category, flags: { aerosol: category === 'deodorant-spray' }, product: { netContent: { value: '50', unit } } })).toEqual(expected);
  });
  test('trade usage settles it', () => {
    expect(found({ market: 'CA', category: 'face-cream', facts: { usualMeasure: true }, product: { netContent: { value: '50', unit: 'g' } } })).toEqual([]);
  });
  test.each([['250', []], ['99.5', []], ['1000', []], ['1250', []], ['1234', ['particular-missing netContent']], ['12.34', ['particular-missing netContent']], ['0.55', []]])('%s ml in Canada: %s', (value, expected) => {
    expect(found({ market: 'CA', product: { netContent: { value, unit: 'ml' } } })).toEqual(expected);
  });
});

describe('height of the figures', () => {
  test.each([['EU', '50', '2', []], ['EU', '50', '1.99', ['particular-missing netContent']], ['EU', '51', '2', ['particular-missing netContent']], ['EU', '1001', '5.9', ['particular-missing netContent']], ['EU', '1001', '6', []]] as const)('%s, %s ml, figures of %s mm: %s', (market, value, netContentHeightMm, expected) => {
    expect(found({ market, facts: { netContentHeightMm }, product: { netContent: { value, unit: 'ml' } } })).toEqual(expected);
  });
  test.each([
    ['US', '32.258', '1.5875', []], ['US', '32.259', '1.5875', ['particular-missing netContent']], ['US', '161.29', '3.175', []], ['US', '161.291', '3.175', ['particular-missing netContent']], ['US', '645.16', '4.7625', []], ['US', '645.161', '4.7625', ['particular-missing netContent']], ['US', '2580.64', '6.35', []], ['US', '2580.641', '6.35', ['particular-missing netContent']],
    ['CA', '32', '1.6', []], ['CA', '32.001', '1.6', ['particular-missing netContent']],
  ] as const)('%s, a panel of %s cm², figures of %s mm: %s', (market, panelAreaSqCm, netContentHeightMm, expected) => {
    expect(found({ market, facts: { panelAreaSqCm, netContentHeightMm } })).toEqual(expected);
  });
  test('without a measure the least height is told, with how it was come by', () => {
    expect(open({}, 'eu/particulars/netContent-height')).toContain('At least 4 mm (250 ml, up to 1000 g or ml)');
    expect(open({ market: 'US' }, 'us/particulars/netContent-height')).toContain('The area of the principal display panel is not known');
  });
  // 21 CFR 701.13, digest E4: no bottom 30 % on a panel of 5 square inches or less.
  test.each([['32.258', []], ['32.259', ['particular-missing netContent']]])('content above the bottom 30 %% of a panel of %s cm²: %s', (panelAreaSqCm, expected) => {
    expect(found({ market: 'US', facts: { panelAreaSqCm, netContentInBottom30: false } })).toEqual(expected);
  });
});

// Directive 76/211/EEC: 5 g or ml to 10 kg or l, e of 3 mm.
test.each([['4.9', '3', ['particular-missing eMark']], ['5', '3', []], ['10000', '3', []], ['10001', '3', ['particular-missing eMark']], ['250', '2.9', ['particular-missing eMark']]])('an e beside %s ml, %s mm high: %s', (value, eMarkHeightMm, expected) => {
  expect(found({ facts: { eMark: true, eMarkHeightMm }, product: { netContent: { value, unit: 'ml' } } })).toEqual(expected);
});

describe('languages', () => {
  const spoken = (market: 'EU' | 'CA' | 'UK' | 'US', languages: readonly string[], facts: Record<string, string> = {}) => found({ market, languages, facts });
  test('Canada wants both', () => {
    expect([spoken('CA', ['en', 'fr']), spoken('CA', ['en']), spoken('CA', ['fr'])]).toEqual([[], ['particular-missing languages'], ['particular-missing languages']]);
  });
  test('each Member State has its own', () => {
    expect([spoken('EU', ['en', 'de'], { destinations: 'DE, AT' }), spoken('EU', ['en', 'de'], { destinations: 'de fr' }), spoken('EU', ['nl', 'fr'], { destinations: 'BE' })]).toEqual([[], ['particular-missing languages'], ['particular-missing languages']]);
    expect(open({ languages: ['de'] }, 'eu/particulars/languages')).toContain('Where in the Union it is sold is not entered');
  });
  test('English in Great Britain and the US', () => {
    expect([spoken('UK', ['de']), spoken('US', ['es']), spoken('US', ['en', 'es'])]).toEqual([['particular-missing languages'], ['particular-missing languages'], []]);
  });
});
