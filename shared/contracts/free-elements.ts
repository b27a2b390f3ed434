/** Elements of a label that the template sets and a person may set free. */
export const FREE_ELEMENTS = ['brand', 'name', 'function', 'claim', 'net content', 'directions', 'warnings', 'ingredients', 'responsible person', 'durability', 'barcode'] as const;
export type FreeElement = (typeof FREE_ELEMENTS)[number];
