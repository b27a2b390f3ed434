import type { Context } from '../context.ts';
import type { NotChecked } from '../outcome.ts';

/** Words of conditions that a certificate of the material can show: purity, impurities, what it was stabilised with. */
const SHOWN_BY_CERTIFICATE = /purity|nitros|amines|impurit|peroxide|residual|trace|free from|free allyl|ethylene glycol|terthienyl|stabilised|ppm/i;

/**
 * Conditions on a material's purity that nothing entered decides, with the materials named whose
 * certificate was seen. They stay open: that a paper was seen is the house's word, and what it
 * says is for the assessor.
 */
export function withCertificates(notChecked: readonly NotChecked[], context: Context): NotChecked[] {
  const { materialFacts } = context.facts;
  if (!materialFacts) return [...notChecked];
  const names = new Map(context.document.materials.map(({ id, tradeName }) => [id, tradeName]));
  return notChecked.map((one) => {
    if (!SHOWN_BY_CERTIFICATE.test(one.words)) return one;
    const substance = context.mixture.substances.find(({ name }) => name === one.subject);
    const ids = [...new Set(substance?.sources.map(({ materialId }) => materialId))];
    if (ids.length === 0 || !ids.every((id) => materialFacts.get(id)?.['certificateSeen'] === true)) return one;
    return { ...one, words: `${one.words} For the purity of ${ids.map((id) => names.get(id) ?? id).join(', ')} the house has seen a certificate.` };
  });
}
