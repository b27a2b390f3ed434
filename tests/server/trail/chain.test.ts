import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { BEGINNING, canonicalJson, seal, TrailVerifier, type TrailEntry } from '#server/trail/chain.ts';
import { sayChanges } from '#server/trail/say-changes.ts';

const HOUSE = '00000000-0000-4000-8000-000000000001';
const OTHER = '00000000-0000-4000-8000-000000000002';

function chainOf(count: number, houseId = HOUSE): TrailEntry[] {
  const entries: TrailEntry[] = [];
  let hashBefore = BEGINNING;
  for (let place = 1; place <= count; place += 1) {
    const entry = seal({
      houseId, place, at: new Date(Date.UTC(2026, 10, 1, 0, 0, place)).toISOString(), actorId: null, actor: 'Ines Tarrow', act: 'saved', subjectKind: 'product', subjectId: null, subject: `Wash ${place}`, productId: null,
      changes: [{ where: 'Batch size, value', before: String(place), after: String(place + 1) }], recordHash: 'a'.repeat(64), hashBefore,
    });
    entries.push(entry);
    hashBefore = entry.hash;
  }
  return entries;
}
const verify = (entries: readonly TrailEntry[], known?: { place: number; hash: string }) => {
  const verifier = new TrailVerifier(HOUSE, known);
  entries.forEach((entry) => verifier.take(entry));
  return verifier.finish();
};

describe('H-03 a house’s chain', () => {
  const whole = chainOf(40);

  test('that nobody touched is whole', () => {
    expect(verify(whole)).toEqual({ isWhole: true, entries: 40, head: whole.at(-1)!.hash });
  });

  test('shows every one of 600 tamperings at its place', () => {
    const foreign = chainOf(40, OTHER);
    const texts = ['at', 'actor', 'act', 'subject', 'hash', 'hashBefore', 'recordHash'] as const;
    const kinds = {
      edit: (at: number, pick: number) => whole.map((entry, i) => (i === at ? { ...entry, [texts[pick % texts.length]!]: `${entry[texts[pick % texts.length]!] ?? ''}x` } : entry)),
      'edit a change': (at: number) => whole.map((entry, i) => (i === at ? { ...entry, changes: [{ ...entry.changes[0]!, after: 'tampered' }] } : entry)),
      remove: (at: number) => whole.filter((_, i) => i !== at),
      insert: (at: number) => [...whole.slice(0, at), seal({ ...whole[at]!, subject: 'slipped in' }), ...whole.slice(at)],
      swap: (at: number) => whole.map((entry, i) => (i === at ? whole[at + 1]! : i === at + 1 ? whole[at]! : entry)),
      'another house’s': (at: number) => whole.map((entry, i) => (i === at ? foreign[at]! : entry)),
      // Sealed anew, but the entry after it is chained to the old seal.
      reseal: (at: number) => whole.map((entry, i) => (i === at ? seal({ ...entry, actor: 'Someone else' }) : entry)),
    };
    let found = 0;
    fc.assert(fc.property(fc.constantFrom(...Object.entries(kinds)), fc.integer({ min: 0, max: 38 }), fc.nat(100), ([, tamper], at, pick) => {
      const verdict = verify(tamper(at, pick));
      expect(verdict.isWhole).toBe(false);
      // The first bad entry, or the one that shows that its predecessor was changed.
      expect(verdict.isWhole ? 0 : verdict.place - (at + 1)).toBeOneOf([0, 1]);
      found += 1;
    }), { numRuns: 600 });
    expect(found).toBe(600);
  });

  test('whose tail was cut off is found out by an earlier export alone', () => {
    const cut = whole.slice(0, 30);
    expect(verify(cut).isWhole).toBe(true);
    expect(verify(cut, { place: 40, hash: whole[39]!.hash })).toMatchObject({ isWhole: false, place: 31, why: 'is missing: an earlier export holds 40 entries' });
  });

  test('rewritten from some entry on is found out by an earlier export', () => {
    const rewritten: TrailEntry[] = [];
    let hashBefore = BEGINNING;
    for (const { hash: _, ...entry } of whole) {
      const next = seal({ ...entry, hashBefore, ...(entry.place === 20 && { actor: 'Someone else' }) });
      rewritten.push(next);
      hashBefore = next.hash;
    }
    expect(verify(rewritten).isWhole).toBe(true);
    expect(verify(rewritten, { place: 25, hash: whole[24]!.hash })).toMatchObject({ isWhole: false, place: 25 });
  });

  test('of 100,000 entries is gone along in under 10 s', () => {
    const long = chainOf(100_000);
    const from = performance.now();
    expect(verify(long).isWhole).toBe(true);
    expect(performance.now() - from).toBeLessThan(10_000);
  });
});

test('canonical JSON is the same whichever way keys stand', () => {
  fc.assert(fc.property(fc.dictionary(fc.string(), fc.jsonValue()), (value) => {
    const turned = Object.fromEntries(Object.entries(value).reverse());
    expect(canonicalJson(turned)).toBe(canonicalJson(value));
  }));
});

describe('changes in words', () => {
  test('a line is found by its own mark, however it moved', () => {
    const line = (id: string, amount: string) => ({ id, materialId: id, amount, unit: 'g' });
    const draft = (lines: object[]) => ({ formula: { phases: [{ id: 'p', name: 'Water', lines }] } });
    expect(sayChanges(draft([line('a', '1'), line('b', '2')]), draft([line('b', '2'), line('a', '3')]))).toEqual([
      { where: 'Formula, phase, “Water”, line, 2, amount', before: '1', after: '3' },
      { where: 'Formula, phase, “Water”, line, order', before: 'as it was', after: 'changed' },
    ]);
  });

  test('what was added and what went is told with its values', () => {
    expect(sayChanges({ claims: [] }, { claims: [{ text: 'Softens', lang: 'en' }] })).toEqual([{ where: 'Claim, 1', before: 'nothing', after: 'text Softens, lang en' }]);
    expect(sayChanges({ durability: { kind: 'pao', months: 12 } }, { durability: null })).toEqual([{ where: 'Durability', before: 'kind pao, months 12', after: 'nothing' }]);
  });

  test('what keeps house for the database is not told', () => {
    expect(sayChanges({ version: 1, savedAt: 'a', searchText: 'x', name: 'Wash' }, { version: 2, savedAt: 'b', searchText: 'y', name: 'Wash' })).toEqual([]);
  });

  test('no two states that differ are told as the same, and a long list is counted', () => {
    const many = (by: string) => Object.fromEntries(Array.from({ length: 100 }, (_, i) => [`key${i}`, `${by}${i}`]));
    const told = sayChanges(many('a'), many('b'));
    expect(told).toHaveLength(61);
    expect(told.at(-1)!.where).toBe('40 more changes');
  });
});
