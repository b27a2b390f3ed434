import { describe, expect, test } from 'vitest';
import { judge, said, type Asked } from '../judging.ts';

const retinol = [{ name: 'Retinol', percent: '0.1' }];
const lotion: Asked = { category: 'face-cream' };

describe('required wording', () => {
  test('where no text is held, its place is told and no label is blamed for lacking it', () => {
    const verdict = judge([{ name: 'Glycolic Acid', percent: '5' }], { market: 'CA', category: 'face-cream', particulars: { warnings: [] } });
    expect(said(verdict, 'wording-missing')).toEqual([]);
    expect(said(verdict, 'wording-required')).toEqual(['wording-required Glycolic Acid ca/hotlist/alpha-hydroxy-acids']);
    expect(verdict.requiredWording.map(({ lang, isOfficialText }) => [lang, isOfficialText])).toEqual([['en', false], ['fr', false]]);
  });

  test('the text is given in every language held, official or marked', () => {
    const texts = judge(retinol, lotion).requiredWording;
    expect(texts.map((one) => [one.lang, one.isOfficialText])).toEqual([['en', true], ['de', true]]);
    expect(texts[0]!.text).toBe('Contains Vitamin A. Consider your daily intake before use');
  });

  test('a label in a language without official text gets a pointer', () => {
    const spanish = judge(retinol, { ...lotion, languages: ['es'] }).requiredWording.find((one) => one.lang === 'es')!;
    expect(spanish.isOfficialText).toBe(false);
  });

  test('a label that says it in any language held lacks nothing', () => {
    const says = (text: string): string[] => said(judge(retinol, { ...lotion, particulars: { warnings: [{ text }] } }), 'wording-missing');
    expect(says('CONTAINS VITAMIN A — consider your daily intake before use.')).toEqual([]);
    expect(says('Enthält Vitamin A. Berücksichtigen Sie Ihre tägliche Aufnahme vor der Anwendung')).toEqual([]);
    expect(says('Keep cool')).toEqual(['wording-missing warnings eu/annex-iii/376']);
  });

  test('without particulars nothing is missing', () => {
    expect(said(judge(retinol, lotion), 'wording-missing')).toEqual([]);
  });

  test('a text due above a share only stays away at that share', () => {
    const says = (percent: string): string[] => said(judge([{ name: 'Glutaral', percent }]), 'wording-required');
    expect(says('0.05')).toEqual([]);
    expect(says('0.0501')).toHaveLength(1);
  });

  test('the warning for small children is open where such children might use the product', () => {
    const acid = [{ name: 'Salicylic Acid', percent: '0.4', purpose: 'preservative' as const }];
    expect(judge(acid, { category: 'shampoo' }).findings[0]).toMatchObject({ kind: 'wording-required', severity: 'decide', needs: ['mightBeUsedUnder3'] });
    expect(judge(acid, { category: 'aftershave' }).findings).toEqual([]);
    expect(judge(acid, { category: 'shampoo', facts: { mightBeUsedUnder3: true } }).findings[0]).toMatchObject({ severity: 'note', certainty: 'certain' });
  });
});
