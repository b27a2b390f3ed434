import { describe, expect, test } from 'vitest';
import { judge, law, type Asked } from '../judging.ts';

const told = (asked: Asked): string[] => judge([], asked).notChecked.map(({ rule }) => rule);

describe('duties that nothing entered decides', () => {
  test('are told for their own market alone', () => {
    expect(told({ market: 'CA' })).toContain('ca/duty/notification');
    expect(told({ market: 'UK' })).toContain('uk/duty/notification');
    expect(told({ market: 'US' })).toContain('us/duty/registration');
    for (const market of ['UK', 'US', 'CA'] as const) expect(told({ market }).filter((rule) => rule.includes('/duty/') && !rule.startsWith(`${market.toLowerCase()}/`)), market).toEqual([]);
    expect(told({ market: 'EU' }).filter((rule) => rule.includes('/duty/'))).toEqual([]);
  });

  test('keep to the kind of product', () => {
    expect(told({ market: 'CA', category: 'mouthwash' })).toContain('ca/duty/mouthwash-seal');
    expect(told({ market: 'CA', category: 'body-wash' })).not.toContain('ca/duty/mouthwash-seal');
    expect(told({ market: 'CA', category: 'hair-dye-oxidative' })).toContain('ca/duty/patch-test');
    expect(told({ market: 'CA', category: 'henna-hair-dye' })).not.toContain('ca/duty/patch-test');
  });

  test('keep to their days', () => {
    const on = (placed: string, available: string): boolean => told({ market: 'UK', placed, available }).includes('uk/duty/cmr-2026');
    expect([on('2026-08-14', '2026-08-14'), on('2026-08-15', '2026-08-15'), on('2026-08-16', '2026-08-16')]).toEqual([false, true, true]);
    expect([on('2026-08-14', '2027-02-14'), on('2026-08-14', '2027-02-15'), on('2026-08-14', '2027-02-16')]).toEqual([false, true, true]);
  });

  test('say what is from memory', () => {
    const quebec = judge([], { market: 'CA' }).notChecked.find(({ rule }) => rule === 'ca/duty/quebec')!;
    expect(quebec.words).toMatch(/From memory\.$/);
    expect(law.duties.filter(({ sourcing }) => sourcing === 'memory').length).toBeGreaterThan(3);
  });

  test('say the duty, the reason it is left open and where it stands', () => {
    for (const duty of law.duties) {
      expect([duty.says, duty.because, duty.citation, duty.subject].every((text) => text.trim().length > 3), duty.id).toBe(true);
      expect(law.instruments.has(duty.instrument), duty.id).toBe(true);
    }
  });
});
