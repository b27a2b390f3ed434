import type { MarketResult, ResultDocument } from '#shared/contracts/result-document.ts';
import { toDecimal } from '#shared/kernel/rational.ts';
import type { AllergenVerdict } from './allergens.ts';
import type { Assessment, DeclarationEntry, MarketAssessment } from './assessment.ts';
import { rangeText } from './list-findings.ts';

/**
 * The result document of an assessment: exact decimals where they end within 12 places,
 * otherwise rounded half-even to 12. Headroom, the costly part, is left out (empty) where
 * the reader has no use for it.
 */
export function presentResult(assessment: Assessment, { withHeadroom = true } = {}): ResultDocument {
  const totalMass = toDecimal(assessment.totalMass);
  return {
    document: 'result/1',
    dataRelease: assessment.dataRelease,
    results: assessment.results.map((result) => presentMarket(result, totalMass, withHeadroom)),
  };
}

function presentMarket(result: MarketAssessment, totalMass: string, withHeadroom: boolean): MarketResult {
  const { market, placedOnMarket, availableOn, exposure, declaration } = result;
  return {
    market,
    placedOnMarket,
    availableOn,
    exposure,
    totalMass,
    declaration: { heading: declaration.heading, text: declaration.text, entries: declaration.entries.map(presentEntry) },
    allergens: result.allergens.map(presentAllergen),
    findings: result.findings as MarketResult['findings'],
    requiredWording: result.requiredWording as MarketResult['requiredWording'],
    notChecked: [...result.notChecked],
    headroom: withHeadroom ? [...result.headroom()] : [],
  };
}

function presentEntry(entry: DeclarationEntry): MarketResult['declaration']['entries'][number] {
  return {
    name: entry.name,
    inci: entry.inci,
    zone: entry.zone,
    share: rangeText(entry.share),
    sources: [...entry.shares],
    ...(entry.certainty && { certainty: entry.certainty }),
    ...(entry.members && { members: [...entry.members] }),
  };
}

function presentAllergen(verdict: AllergenVerdict): MarketResult['allergens'][number] {
  return {
    name: verdict.name,
    total: rangeText(verdict.total),
    threshold: verdict.threshold,
    disclose: verdict.disclose,
    ...(verdict.certainty && { certainty: verdict.certainty }),
    sources: [...verdict.shares],
    members: verdict.substances.map(({ name }) => name),
    citation: verdict.citation,
  };
}
