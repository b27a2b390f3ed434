import type { DocumentMaterial, DocumentShare, FormulaDocument } from '#shared/contracts/formula-document.ts';
import type { MaterialFields } from '#shared/contracts/materials.contract.ts';
import type { Phase, ProductDraft } from '#shared/contracts/product-draft.ts';

export interface FromDocumentOptions {
  /** An empty draft of the house: what the document does not say is taken from it. */
  readonly blank: ProductDraft;
  /** The house's material id for each material id of the document. */
  readonly materialIds: ReadonlyMap<string, string>;
}

/**
 * The product draft of a formula document. Lines of one phase are gathered under it in the
 * order in which the phases first appear.
 */
export function fromFormulaDocument(document: FormulaDocument, { blank, materialIds }: FromDocumentOptions): ProductDraft {
  const { product, label, declaration, formula } = document;
  const { particulars, durability } = product;
  return {
    ...blank,
    name: product.name || blank.name,
    brand: product.brand || blank.brand,
    category: product.category,
    markets: product.markets.length > 0 ? [...product.markets] : blank.markets,
    placedOnMarket: product.placedOnMarket ?? null,
    availableOn: product.availableOn ?? null,
    flags: { ...product.flags },
    facts: { ...product.facts },
    readyForUse: product.readyForUse ?? null,
    netContent: product.netContent ?? null,
    durability: durability ? toDraftDurability(durability) : null,
    claims: product.claims.map(({ text, lang }) => ({ text, lang: lang.slice(0, 2) })),
    particulars: {
      ...blank.particulars,
      ...(particulars && {
        responsiblePerson: { ...particulars.responsiblePerson },
        usContact: particulars.usContact ?? '',
        canadaContact: particulars.canadaContact ?? '',
        countryOfOrigin: particulars.countryOfOrigin ?? '',
        batchCode: particulars.batchCode ?? '',
        function: particulars.function ?? '',
        directions: particulars.directions ?? '',
        warnings: particulars.warnings.map(({ text, lang }) => ({ text, lang: lang?.slice(0, 2) ?? 'en' })),
      }),
    },
    mayContain: product.mayContain.map(({ inci }) => ({ inci })),
    formula: { batchSize: formula.batchSize === undefined ? null : { value: formula.batchSize, unit: 'g' }, phases: toPhases(formula.lines, materialIds) },
    declaration: {
      freeOrder: Object.fromEntries(Object.entries(declaration?.freeOrder ?? {}).map(([market, names]) => [market, [...names]])),
      joinedNames: declaration?.joinedNames ?? false,
    },
    label: {
      ...blank.label,
      ...(label?.container && { container: label.container }),
      ...(label?.bleedMm !== undefined && { bleedMm: label.bleedMm }),
      ...(label?.languages && label.languages.length > 0 && { languages: label.languages.slice(0, 4).map((lang) => lang.slice(0, 2)) }),
      ...(label?.market && { market: label.market }),
      ...(label?.barcode && { barcode: label.barcode }),
      press: { standard: label?.press?.standard ?? blank.label.press.standard, condition: label?.press?.condition ?? blank.label.press.condition },
      ...(label?.template !== undefined && { template: label.template }),
      ...(label?.ink !== undefined && { ink: label.ink }),
      ...(label?.byHand && { byHand: label.byHand }),
    },
  };
}

type Durability = NonNullable<ProductDraft['durability']>;

function toDraftDurability(durability: NonNullable<FormulaDocument['product']['durability']>): Durability | null {
  if (durability.kind === 'best-before') return { kind: 'best-before', date: durability.date };
  // The draft counts months in a plain number; only 1 to 120 are known to it.
  const months = MONTHS.find((count) => `${count}` === durability.months);
  return months === undefined ? null : { kind: 'pao', months };
}

const MONTHS = Array.from({ length: 120 }, (_, index) => index + 1);

function toPhases(lines: FormulaDocument['formula']['lines'], materialIds: ReadonlyMap<string, string>): Phase[] {
  const phases = new Map<string, Phase>();
  lines.forEach((line, index) => {
    const name = line.phase.trim().slice(0, 80) || 'Phase';
    let phase = phases.get(name);
    if (!phase) phases.set(name, (phase = { id: `phase-${phases.size + 1}`, name, lines: [], steps: [] }));
    phase.lines.push({ id: `line-${index + 1}`, materialId: materialIds.get(line.material) ?? line.material, amount: line.amount, unit: line.unit });
  });
  return [...phases.values()];
}

/** A document's material as the fields of a house's material. */
export function toMaterialFields(material: DocumentMaterial): MaterialFields {
  return {
    tradeName: material.tradeName.trim().slice(0, 255) || material.id,
    supplier: (material.supplier ?? '').slice(0, 255),
    declareAs: material.declareAs,
    composition: material.composition.map((part) => ({
      inci: part.inci,
      ...(part.cas !== undefined && { cas: part.cas }),
      ...shareOf(part),
      ...(part.nano !== undefined && { nano: part.nano }),
      ...(part.purpose !== undefined && { purpose: part.purpose }),
      ...(part.usName !== undefined && { usName: part.usName }),
      ...(part.role === 'incidental' && { role: part.role }),
    })),
    constituents: material.constituents.map((part) => ({ name: part.name, ...(part.cas !== undefined && { cas: part.cas }), ...shareOf(part) })),
    pricePerKg: null,
    currency: 'EUR',
    notes: '',
    handling: {},
    ...(material.facts && { facts: { ...material.facts } }),
  };
}

function shareOf({ percent, min, typical, max }: DocumentShare): DocumentShare {
  return { ...(percent !== undefined && { percent }), ...(min !== undefined && { min }), ...(typical !== undefined && { typical }), ...(max !== undefined && { max }) };
}
