import { expect, test } from 'vitest';
import type { Material } from '#shared/contracts/materials.contract.ts';
import { findMaterialQuestion } from '#src/features/workspace/material-question.ts';
import { uuid } from '../fixtures.ts';

const material = (at: number, inci: string, facts?: Material['facts']): Material => ({
  id: uuid(at), version: 1, savedAt: '2026-11-30T10:00:00.000Z', savedBy: 'Ines Tarrow', archived: false, documents: [], usedIn: [], tradeName: inci, supplier: '', declareAs: 'ingredients',
  composition: [{ inci, percent: '100' }], constituents: [], pricePerKg: null, currency: 'EUR', notes: '', handling: {}, ...(facts ? { facts } : {}),
});
const finding = { subject: 'Paraffinum Liquidum', needs: ['purpose', 'fullRefiningHistory'] };

test('the question goes to the first material that has not answered', () => {
  const oils = [material(1, 'Aqua'), material(2, 'PARAFFINUM LIQUIDUM', { fullRefiningHistory: true }), material(3, 'Paraffinum Liquidum')];
  expect(findMaterialQuestion(finding, oils)).toEqual({ material: oils[2], fact: 'fullRefiningHistory' });
});

test('nothing is asked of materials where none holds it, all have answered, or the product is asked', () => {
  expect(findMaterialQuestion(finding, [material(1, 'Aqua')])).toBeUndefined();
  expect(findMaterialQuestion(finding, [material(2, 'Paraffinum Liquidum', { fullRefiningHistory: false })])).toBeUndefined();
  expect(findMaterialQuestion({ subject: 'Paraffinum Liquidum', needs: ['pH'] }, [material(3, 'Paraffinum Liquidum')])).toBeUndefined();
});

test('members of a sum count as well', () => {
  const wax = material(4, 'Ceresin');
  expect(findMaterialQuestion({ subject: 'Waxes', members: ['Ceresin'], needs: ['benzeneInMaterial'] }, [wax])?.material).toBe(wax);
});
