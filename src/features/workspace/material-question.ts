import type { Material } from '#shared/contracts/materials.contract.ts';
import type { Finding } from '#shared/engine/types.ts';
import { foldName } from '#shared/law/fold.ts';
import { isMaterialFact } from '#shared/law/material-facts.ts';

/** A question that a material answers for every product that uses it. */
export interface MaterialQuestion {
  readonly material: Material;
  readonly fact: string;
}

/** The first of these materials that brings what a verdict speaks of and has not answered what it waits for. */
export function findMaterialQuestion(finding: Pick<Finding, 'needs' | 'subject' | 'members'>, materials: readonly Material[]): MaterialQuestion | undefined {
  const wanted = new Set([finding.subject, ...(finding.members ?? [])].map(foldName));
  const bringing = materials.filter(({ composition, constituents }) => [...composition.map(({ inci }) => inci), ...constituents.map(({ name }) => name)].some((name) => wanted.has(foldName(name))));
  for (const fact of (finding.needs ?? []).filter(isMaterialFact)) {
    const material = bringing.find(({ facts }) => facts?.[fact] === undefined);
    if (material) return { material, fact };
  }
  return undefined;
}
