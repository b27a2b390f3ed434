/** A fact about a bought material, from its certificate or its supplier, in the words of the bench. */
export interface MaterialFact {
  readonly label: string;
  readonly kind: 'figure' | 'yes-no';
  readonly hint?: string;
  /** Names, as folded, that a material must hold for it to be asked without a verdict waiting; absent: any material. */
  readonly about?: RegExp;
}

const PETROLEUM = /petrol|paraffin|mineral oil|ceresin|cera microcristallina|microcrystalline|ozokerite|butane|isobutane|propane/i;

/**
 * What conditions of the law ask of a material: kept with the material, so that every product
 * that uses it is answered at once.
 */
export const MATERIAL_FACTS: Readonly<Record<string, MaterialFact>> = {
  certificateSeen: { label: 'A certificate of its purity was seen', kind: 'yes-no', hint: 'one that names the limits the law sets for it' },
  fullRefiningHistory: { label: 'Its full refining history is known', kind: 'yes-no', hint: 'and its feedstock is no carcinogen', about: PETROLEUM },
  butadieneInMaterial: { label: 'Butadiene', kind: 'figure', hint: 'in percent of the material', about: PETROLEUM },
  benzeneInMaterial: { label: 'Benzene', kind: 'figure', hint: 'in percent of the material', about: PETROLEUM },
  benzoPyreneInMaterial: { label: 'Benzo[a]pyrene', kind: 'figure', hint: 'in percent of the material', about: PETROLEUM },
  dmsoExtractOfMaterial: { label: 'DMSO extract, IP 346', kind: 'figure', hint: 'in percent of the material', about: PETROLEUM },
  peanutProteinPpm: { label: 'Peanut protein', kind: 'figure', hint: 'in ppm of the oil', about: /arachis|peanut/i },
  wheatPeptideKilodalton: { label: 'Average size of the wheat protein’s peptides', kind: 'figure', hint: 'in kilodalton', about: /wheat|triticum/i },
  laurelOilFromSeeds: { label: 'The laurel oil is pressed from the seeds', kind: 'yes-no', about: /laurus/i },
  titaniumDioxideCoatedWithManganeseDioxide: { label: 'Titanium dioxide coated with manganese dioxide', kind: 'yes-no', about: /titanium dioxide|ci 77891/i },
};

/** Whether a fact is the material's, not the product's. */
export function isMaterialFact(key: string): boolean {
  return Object.hasOwn(MATERIAL_FACTS, key);
}
