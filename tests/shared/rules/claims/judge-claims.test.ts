import { describe, expect, test } from 'vitest';
import type { FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { Market } from '#shared/law/types.ts';
import type { Finding } from '#shared/engine/types.ts';
import { formula, inside, judge, line, material, part } from '#tests/support/engine.ts';
import { claimed, type FormulaKey } from './claims-formulas.ts';

function findingsOf(document: FormulaDocument, market: Market = 'EU'): Finding[] {
  return judge(document, { markets: [market] }).results[0]!.findings.filter(({ kind }) => kind.startsWith('claim-'));
}
const judged = (key: FormulaKey, text: string, market: Market = 'EU', lang = 'en'): Finding[] => findingsOf(claimed(key, [{ text, lang }]), market);
const named = (key: FormulaKey, name: string, market: Market = 'EU'): Finding[] => findingsOf(claimed(key, [], { name }), market);
const kinds = (findings: readonly Finding[]): string[] => findings.map(({ kind }) => kind);

describe('what a verdict says', () => {
  test('it quotes the words as written, whatever their case and marks', () => {
    expect(judged('rich', 'Pure care — PARABEN‑FREE!')[0]).toMatchObject({ kind: 'claim-contradicted', severity: 'stop', subject: 'Pure care — PARABEN‑FREE!', members: ['PARABEN‑FREE'] });
    expect(judged('cream', 'Traité contre l’eczéma', 'EU', 'fr')[0]!.members!.join()).toContain('eczéma');
  });
  test('it names the ingredients that contradict the claim', () => {
    expect(judged('rich', 'Free from parabens and silicones')[0]!.message).toBe('“Free from parabens”, “Free from parabens and silicones”: The product holds parabens: Methylparaben. The product holds silicones: Dimethicone.');
  });
  test.each([
    ['gel', 'Cures eczema', 'EU', 'Directive 2001/83/EC'],
    ['gel', 'Cures eczema', 'US', 'FD&C Act, section 201(g)'],
    ['gel', 'Cures eczema', 'CA', 'Food and Drugs Act'],
    ['gel', 'Cures eczema', 'UK', 'Human Medicines Regulations 2012'],
    ['cream', 'SPF 30', 'US', '21 CFR 700.35'],
    ['cream', 'SPF 30', 'EU', 'criterion 3 (evidential support)'],
    ['gel', 'Paraben-free', 'EU', 'criterion 5 (fairness)'],
    ['rich', 'Paraben-free', 'EU', 'criterion 2 (truthfulness)'],
    ['gel', 'EU approved', 'EU', 'criterion 1 (legal compliance)'],
    ['gel', 'For eczema-prone skin', 'EU', 'criterion 4 (honesty)'],
    ['gel', 'Not tested on animals', 'EU', 'Article 20(3)'],
    ['gel', 'Non-toxic', 'CA', 'Cosmetic Regulations, C.R.C., c. 869, s. 21'],
    ['gel', 'Argan oil shower', 'US', '21 CFR 701.1(b)'],
  ] as const)('%s: "%s" in %s cites %s', (key, text, market, citation) => {
    expect(judged(key, text, market).map((finding) => finding.citation).join('; ')).toContain(citation);
  });
  test('what rests on memory or a secondary page says so', () => {
    expect(judged('gel', 'Cures eczema', 'EU')[0]!.sourcing).toBe('memory');
    expect(judged('gel', 'Hypoallergenic', 'EU')[0]!.sourcing).toBe('secondary');
    expect(judged('gel', 'Non-toxic', 'CA')[0]!.sourcing).toBeUndefined();
  });
  test('what to do names the words', () => {
    expect(judged('gel', 'Dermatologically tested')[0]).toMatchObject({ kind: 'claim-evidence', severity: 'decide', remedy: 'Attach evidence for “Dermatologically tested”, or leave it out.' });
  });
  test('a pH that is not given is asked for', () => {
    expect(judged('cream', 'pH-balanced')[0]!.needs).toEqual(['pH']);
    expect(judged('gel', 'Dermatologically tested')[0]!.needs).toBeUndefined();
  });
  test('evidence is not asked for in a claim that stops sale on the same words', () => {
    expect(kinds(judged('gel', 'Clinically proven to cure eczema'))).toEqual(['claim-medicinal']);
    expect(kinds(judged('rich', '100 % natural'))).toEqual(['claim-contradicted']);
  });
  test('one claim can be contradicted and need evidence', () => {
    expect(kinds(judged('rich', 'Silicone-free and hypoallergenic'))).toEqual(['claim-contradicted', 'claim-evidence']);
  });
  test('a claim in a language without tables is left to a person, not called clean', () => {
    expect(judged('gel', 'Hypoallergeen', 'EU', 'nl')).toMatchObject([{ kind: 'claim-evidence', severity: 'decide', rule: 'claims/language', remedy: 'Have “Hypoallergeen” read by someone who knows the language.' }]);
    expect(judged('gel', 'Soft', 'EU', 'en-GB')).toEqual([]);
  });
});

describe('denials', () => {
  test.each([
    ['Not intended to treat, cure or prevent any disease', []],
    ['Not only softens but heals', ['claim-medicinal']],
    ['No parabens, cures eczema', ['claim-medicinal', 'claim-evidence']],
    ['Not greasy: heals wounds', ['claim-medicinal']],
    ['It is not vegan', []],
    ['Never suffer from eczema again', ['claim-medicinal']],
    ['Does not contain parabens', ['claim-evidence']],
    ['If irritation occurs, stop use', []],
  ] as const)('"%s"', (text, expected) => {
    const found = kinds(judged('gel', text));
    expect(expected.includes('claim-medicinal' as never) ? found.filter((kind) => kind === 'claim-medicinal') : found).toEqual(expected.includes('claim-medicinal' as never) ? ['claim-medicinal'] : expected);
  });
});

describe('shares that are claimed', () => {
  test('a share is compared exactly with what is in the product', () => {
    const of = (claim: string, share: string): string[] => kinds(findingsOf(formula([material('m', [part('Aqua', `${share === '5' ? '95' : '95.0000000001'}`), part('Glycerin', share)])], [line('m', '100 g')], { product: { claims: [{ text: claim, lang: 'en' }] } })));
    expect(of('With 5 % glycerin', '5')).toEqual([]);
    expect(of('With 5 % glycerin', '4.9999999999')).toEqual(['claim-contradicted']);
    expect(of('With 2,5 % glycerin', '5')).toEqual([]);
    expect(of('With 5.01 % glycerin', '5')).toEqual(['claim-contradicted']);
  });
  test('a range that only partly reaches the claim is a question', () => {
    const document = formula([material('m', [part('Aqua', '90-96'), part('Glycerin', '4-10')])], [line('m', '100 g')], { product: { claims: [{ text: '8 % glycerin', lang: 'en' }] } });
    expect(kinds(findingsOf(document))).toEqual(['claim-evidence']);
  });
  test('figures of the formula stand in the arithmetic alone', () => {
    const [finding] = judged('cream', 'With 10 % glycerin');
    expect(finding!.message).toBe('“10 % glycerin”: It claims 10 % glycerin; less than that is in it.');
    expect(finding!.arithmetic).toEqual([{ step: 'Claimed, glycerin', figure: '10 %' }, { step: 'Glycerin', figure: '4 %' }]);
  });
});

describe('unknown composition', () => {
  test('a perfume of unknown composition leaves open whether a class is absent', () => {
    expect(judged('cream', 'Free from essential oils')[0]!.message).toContain('What Parfum consists of is not known here');
    expect(kinds(judged('gel', 'Free from essential oils'))).toEqual([]);
  });
  test('a name that the dictionary does not hold leaves it open too', () => {
    const document = formula([material('m', [part('Aqua', '90'), part('Brackenmere Secretum', '10')])], [line('m', '100 g')], { product: { claims: [{ text: 'Silicone-free', lang: 'en' }] } });
    expect(findingsOf(document).map(({ kind, message }) => `${kind} ${message.includes('Brackenmere Secretum')}`)).toEqual(['claim-evidence true']);
  });
  test('a constituent of an oil is not an ingredient that a claim could miss', () => {
    const document = formula([material('m', [part('Simmondsia Chinensis Seed Oil', '100')], { constituents: [inside('Linalool', '1')] })], [line('m', '100 g')], { product: { claims: [{ text: 'Fragrance-free', lang: 'en' }] } });
    expect(findingsOf(document)).toEqual([]);
  });
});

describe('the name of the product', () => {
  test('a name that calls to mind what is not in it is a question', () => {
    expect(named('gel', 'Juniper & Oat Body Wash')[0]).toMatchObject({ kind: 'claim-evidence', severity: 'decide', subject: 'Juniper & Oat Body Wash', members: ['Juniper'] });
  });
  test('a name that names the substance itself is contradicted', () => {
    expect(kinds(named('gel', 'Argan Oil Wash'))).toEqual(['claim-contradicted']);
  });
  test('a name true to the formula is innocent', () => {
    expect(named('gel', 'Oat Body Wash')).toEqual([]);
    expect(named('rich', 'Lavender Shampoo')).toEqual([]);
  });
  test('a disease in the name stops sale, in other languages too', () => {
    expect(kinds(named('cream', 'Eczema Balm'))).toEqual(['claim-medicinal']);
    expect(kinds(named('cream', 'Neurodermitis Creme'))).toEqual(['claim-medicinal']);
  });
  test('the shades of decorative cosmetics are colours', () => {
    const of = (category: string): string[] => kinds(findingsOf(formula([material('m', [part('Ricinus Communis Seed Oil', '90'), part('CI 77491', '10', { purpose: 'colourant' })])], [line('m', '100 g')], { product: { name: 'Rose', category } })));
    expect(of('lipstick')).toEqual([]);
    expect(of('body-oil')).toEqual(['claim-evidence']);
  });
});

test('a product without claims and with a plain name has nothing to judge', () => {
  expect(named('gel', 'No. 4')).toEqual([]);
  expect(named('gel', '')).toEqual([]);
});
