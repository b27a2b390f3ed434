import type { Material as MaterialShape, MaterialSummary } from '#shared/contracts/materials.contract.ts';
import { decimal, toDecimal } from '#shared/kernel/rational.ts';
import type { MaterialDocument } from './material-document.entity.ts';
import type { Material } from './material.entity.ts';
import type { MaterialView } from './materials.service.ts';

/** A material as its contract shows it. */
export function presentMaterial({ material, documents, usedIn }: MaterialView): MaterialShape {
  return {
    id: material.id,
    version: material.version,
    savedAt: material.savedAt.toISOString(),
    savedBy: material.savedBy,
    archived: material.archived,
    tradeName: material.tradeName,
    supplier: material.supplier,
    declareAs: material.declareAs,
    composition: material.composition,
    constituents: material.constituents,
    pricePerKg: presentPrice(material.pricePerKg),
    currency: material.currency,
    notes: material.notes,
    handling: material.handling,
    facts: material.facts,
    documents: documents.map(presentDocument),
    usedIn: usedIn.map((one) => ({ ...one })),
  };
}

/** A material as a row of the list. */
export function presentMaterialSummary(material: Material): MaterialSummary {
  return {
    id: material.id,
    version: material.version,
    tradeName: material.tradeName,
    supplier: material.supplier,
    declareAs: material.declareAs,
    parts: material.composition.length,
    constituents: material.constituents.length,
    inci: material.composition.map((line) => line.inci),
  };
}

function presentDocument(document: MaterialDocument): MaterialShape['documents'][number] {
  return {
    id: document.id,
    kind: document.kind,
    fileName: document.fileName,
    mediaType: document.mediaType,
    bytes: document.bytes,
    sha256: document.sha256,
    dated: document.dated ?? null,
    runsOut: document.runsOut ?? null,
    addedAt: document.addedAt.toISOString(),
    addedBy: document.addedBy,
  };
}

/** The price as short as it is exact. */
function presentPrice(price: string | null | undefined): string | null {
  return price === null || price === undefined ? null : toDecimal(decimal(price), 30);
}
