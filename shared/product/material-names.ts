/** A name that the engine will look up for a material. */
export interface WrittenName {
  readonly name: string;
  readonly cas?: string | undefined;
  /** A constituent is matched against the law alone and need not be in the dictionary. */
  readonly isListed: boolean;
}

interface Named {
  readonly declareAs: 'ingredients' | 'parfum' | 'aroma';
  readonly composition: readonly { readonly inci: string; readonly cas?: string | undefined }[];
  readonly constituents: readonly { readonly name: string; readonly cas?: string | undefined }[];
}

/** What a material that is declared as one entry is listed as. */
export const COLLECTIVE_NAMES = { parfum: 'Parfum', aroma: 'Aroma' } as const;

/** Every name of a material that a dictionary must know for the engine to judge it as the server does. */
export function materialNames(material: Named): WrittenName[] {
  return [
    ...(material.declareAs === 'ingredients' ? [] : [{ name: COLLECTIVE_NAMES[material.declareAs], isListed: true }]),
    ...material.composition.map(({ inci, cas }) => ({ name: inci, cas, isListed: true })),
    ...material.constituents.map(({ name, cas }) => ({ name, cas, isListed: false })),
  ];
}
