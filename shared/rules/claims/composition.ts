import type { Mixture, Substance } from '#shared/engine/types.ts';
import { foldName } from '#shared/law/fold.ts';
import type { ClaimClass } from './claim-tables.ts';
import { foldWord } from './match-words.ts';

/** Ingredients of the product that belong to a class: surely, or only perhaps. */
export interface Members {
  readonly sure: readonly string[];
  readonly perhaps: readonly string[];
}

/** Which ingredients of the product contradict that a class is absent. */
export function findMembers(claimClass: ClaimClass, mixture: Mixture): Members {
  const sure: string[] = [];
  const perhaps: string[] = [];
  for (const substance of mixture.substances) {
    if (!substance.as.ingredient && !(substance.as.hidden && claimClass.id === 'allergen')) continue;
    const properties = propertiesOf(substance);
    const isNamed = claimClass.names?.some((name) => fitsName(name, substance.name)) ?? false;
    const isSure = isNamed || (claimClass.id === 'nano' && substance.nano) || (claimClass.properties?.some((one) => properties.includes(one)) ?? false);
    if (isSure && isOtherwiseUsed(claimClass, substance, properties)) perhaps.push(substance.name);
    else if (isSure) sure.push(substance.name);
    else if (claimClass.perhaps?.some((one) => properties.includes(one)) && !isStatedOther(claimClass, substance)) perhaps.push(substance.name);
  }
  return { sure, perhaps };
}

/** The dictionary's properties, where the engine's mixture carries its entries. */
function propertiesOf(substance: Substance): readonly string[] {
  const { first } = substance as Substance & { readonly first?: { readonly entry?: { readonly properties: readonly string[] } } };
  return first?.entry?.properties ?? [];
}

/** A preservative or colourant that may be there for other work: only its stated purpose makes it sure. */
function isOtherwiseUsed(claimClass: ClaimClass, substance: Substance, properties: readonly string[]): boolean {
  if (claimClass.id !== 'preservative' || substance.purposes.includes('preservative')) return false;
  return substance.purposes.length > 0 || properties.some((one) => one === 'fragrance-substance' || one === 'fragrance-allergen' || one === 'beta-hydroxy-acid');
}

function isStatedOther(claimClass: ClaimClass, substance: Substance): boolean {
  return claimClass.id === 'fragrance' && substance.purposes.length > 0 && !substance.purposes.includes('fragrance');
}

/** `*paraben` ends so, `ci *` begins so, `*milk*` holds it; without a star it is the whole name. */
function fitsName(pattern: string, name: string): boolean {
  const words = foldWord(name).replace(/[^\p{L}\p{N}]+/gu, ' ').trim();
  const core = pattern.replaceAll('*', '');
  if (pattern.startsWith('*') && pattern.endsWith('*')) return words.includes(core);
  if (pattern.startsWith('*')) return words.endsWith(core);
  if (pattern.endsWith('*')) return words.startsWith(core);
  return words === core;
}

/** Whether any ingredient, or any constituent of one, has a name that begins so. */
export function holdsNamed(starts: readonly string[], mixture: Mixture): boolean {
  return mixture.substances.some((substance) => {
    if (!substance.as.ingredient && !substance.as.hidden) return false;
    const key = foldName(substance.name);
    return starts.some((start) => key.startsWith(start));
  });
}
