import type { z } from 'zod';
import type { dictionaryEntry } from '#shared/contracts/dictionary.contract.ts';
import type { ProductWorkspace } from '#shared/contracts/products.contract.ts';
import type { Dictionary, DictionaryEntry } from '#shared/dictionary/types.ts';
import { materialNames } from '#shared/product/material-names.ts';
import type { Dossier } from './dossier.ts';

const SUGGESTIONS = 5;

/** Everything the browser needs to judge the product by itself: the product, its materials, and what the dictionary knows of every name in them. */
export function presentWorkspace({ product, materials }: Dossier, dictionary: Dictionary): ProductWorkspace {
  const entries = new Map<string, DictionaryEntry>();
  const unknown = new Map<string, string[]>();
  const look = (name: string, cas: string | undefined, isListed: boolean) => {
    const found = dictionary.resolve(name, cas);
    if (found) keep(found.entry);
    else if (isListed && !unknown.has(name)) unknown.set(name, dictionary.suggest(name, SUGGESTIONS).map((entry) => entry.inci));
  };
  const keep = (entry: DictionaryEntry) => {
    if (entries.has(entry.id)) return;
    entries.set(entry.id, entry);
    // A former name is shown with its successor.
    const successor = entry.supersededBy === undefined ? undefined : dictionary.resolve(entry.supersededBy);
    if (successor) keep(successor.entry);
  };
  for (const material of materials) for (const { name, cas, isListed } of materialNames(material)) look(name, cas, isListed);
  for (const { inci } of product.draft.mayContain) look(inci, undefined, true);
  return {
    product,
    materials: [...materials],
    entries: [...entries.values()].map(presentEntry),
    unknown: [...unknown].map(([name, suggestions]) => ({ name, suggestions })),
    dictionaryRelease: dictionary.release,
  };
}

function presentEntry(entry: DictionaryEntry): z.input<typeof dictionaryEntry> {
  const { names, ...rest } = entry;
  return {
    ...rest,
    cas: [...entry.cas],
    ec: [...entry.ec],
    functions: [...entry.functions],
    names: { ...names, ...(names.usColours ? { usColours: [...names.usColours] } : {}) } as z.input<typeof dictionaryEntry>['names'],
    synonyms: [...entry.synonyms],
    commonNames: [...entry.commonNames],
    properties: [...entry.properties],
  } as z.input<typeof dictionaryEntry>;
}
