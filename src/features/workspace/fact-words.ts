import { isMaterialFact, MATERIAL_FACTS } from '#shared/law/material-facts.ts';

/** A fact that conditions of the law turn on, in the words of the bench. */
export interface FactWords {
  readonly label: string;
  readonly kind: 'figure' | 'yes-no' | 'form' | 'place' | 'text';
  readonly hint?: string;
}

/** Every fact that a row of the law can ask for, but what is worked out and what the material says. */
export const FACT_WORDS: Readonly<Record<string, FactWords>> = {
  pH: { label: 'pH', kind: 'figure' },
  physicalForm: { label: 'Physical form', kind: 'form' },
  releasedFormaldehyde: { label: 'Formaldehyde released, measured', kind: 'figure', hint: 'in percent' },
  fromAge: { label: 'For use from the age of', kind: 'figure', hint: 'in years' },
  particleSizeNm: { label: 'Particle size', kind: 'figure', hint: 'in nanometres' },
  inhalable: { label: 'Can be breathed in when used', kind: 'yes-no' },
  loosePowder: { label: 'Loose powder', kind: 'yes-no' },
  antiperspirant: { label: 'Antiperspirant', kind: 'yes-no' },
  adultsOnly: { label: 'For adults only', kind: 'yes-no' },
  mightBeUsedUnder3: { label: 'Might be used on children under 3', kind: 'yes-no' },
  addedAsSuch: { label: 'The substance is added as such', kind: 'yes-no', hint: 'not only inside an oil or extract' },
  exfoliatingAcid: { label: 'The acid is there to exfoliate', kind: 'yes-no' },
  plasticParticlesAsExfoliant: { label: 'Plastic particles that scrub', kind: 'yes-no' },
  flameProjectionCm: { label: 'Flame projection of the aerosol', kind: 'figure', hint: 'in centimetres, 0 where there is none' },
  flashback: { label: 'The flame runs back to the pack', kind: 'yes-no' },
  packHolds5MlMethylAlcohol: { label: 'One pack holds 5 mL or more of methyl alcohol', kind: 'yes-no' },
  packHoldsBromateLimit: { label: 'One pack holds 600 mg of sodium bromate or 50 mg of potassium bromate', kind: 'yes-no', hint: 'or more' },
};

/** Answers that the particulars of a label turn on: asked of the product, whatever is in it. */
export const LABEL_FACTS: Readonly<Record<string, FactWords>> = {
  madeIn: { label: 'Made in', kind: 'place', hint: 'decides where it is imported' },
  imported: { label: 'Imported', kind: 'yes-no', hint: 'where it was made is not said' },
  madeByNamedFirm: { label: 'The firm on the label made it', kind: 'yes-no', hint: 'for the US' },
  functionClearFromPresentation: { label: 'Its look makes plain what it is', kind: 'yes-no', hint: 'then its function need not be printed' },
  minimumDurabilityMonths: { label: 'Keeps unopened', kind: 'figure', hint: 'in months; up to 30 it bears a date' },
  durabilityNotRelevant: { label: 'Does not spoil once opened, or is never opened', kind: 'yes-no', hint: 'single use, aerosol' },
  freeSample: { label: 'Free sample', kind: 'yes-no' },
  singleApplication: { label: 'For one application', kind: 'yes-no' },
  numberPlainToSee: { label: 'Sold by number', kind: 'yes-no', hint: 'singly, or the number is plain to see' },
  netContent: { label: 'Content of a pack that does not print it', kind: 'figure', hint: 'in g or ml' },
  usualMeasure: { label: 'The trade sells it in this measure', kind: 'yes-no', hint: 'g where the law says ml, or the other way round' },
  panelAreaSqCm: { label: 'Principal display panel', kind: 'figure', hint: 'in cm²; without it the label is measured' },
  netContentHeightMm: { label: 'Height of the content’s figures', kind: 'figure', hint: 'in mm, on a label set elsewhere' },
  netContentInBottom30: { label: 'Content stands in the bottom 30 %', kind: 'yes-no', hint: 'of the panel, for the US' },
  eMark: { label: 'The e stands beside the content', kind: 'yes-no' },
  eMarkHeightMm: { label: 'Height of the e', kind: 'figure', hint: 'in mm' },
  destinations: { label: 'Sold in these Member States', kind: 'text', hint: 'by code, such as DE, FR' },
  enclosedInformation: { label: 'A leaflet, tag or card bears a part', kind: 'yes-no' },
  notPrepacked: { label: 'Packed at the point of sale', kind: 'yes-no' },
  storageMatters: { label: 'It keeps only in certain conditions', kind: 'yes-no' },
};

/** What is asked of the product; what a substance is for, and what certificates say, is said with its material. */
export function isProductFact(key: string): boolean {
  return key !== 'purpose' && !isMaterialFact(key);
}

/** The words of a fact, wherever it is asked. */
export function wordsOf(key: string): FactWords | undefined {
  return FACT_WORDS[key] ?? LABEL_FACTS[key] ?? MATERIAL_FACTS[key];
}

/** Words for a fact's key, also for one that no one has named yet: `bodyPart` as `body part`. */
export function sayFact(key: string): string {
  if (key === 'purpose') return 'what the substance is for, with its material';
  return wordsOf(key)?.label ?? key.replace(/([a-z])([A-Z])/g, '$1 $2').toLowerCase();
}
