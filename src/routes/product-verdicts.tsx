import { useCallback, useEffect, useMemo, useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { MARKETS, type Market } from '#shared/law/types.ts';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import type { HeadroomLine, MarketAssessment } from '#shared/engine/assessment.ts';
import { setGrams } from '#src/features/formula/recipes.ts';
import { weighFormula } from '#src/features/formula/weigh.ts';
import { paths } from '#src/app/paths.ts';
import { ClaimsSection } from '#src/features/claims/claims-section.tsx';
import { explainFinding, nameRule } from '#shared/report/explain.ts';
import { findAllergenNotes } from '#src/features/verdicts/allergen-notes.tsx';
import { findHeadroomNote } from '#src/features/verdicts/headroom-note.tsx';
import { evidenceQueries } from '#src/features/claims/queries.ts';
import { Ledger } from '#src/features/verdicts/ledger.tsx';
import { countFindings, mergeFindings, type Counts, type MergedFinding } from '#src/features/verdicts/merge.ts';
import type { LedgerNote } from '#src/features/verdicts/note-row.tsx';
import { NotChecked } from '#src/features/verdicts/not-checked.tsx';
import { RoomLeft } from '#src/features/verdicts/room-left.tsx';
import { findMaterialQuestion } from '#src/features/workspace/material-question.ts';
import { factAnchor } from '#src/features/materials/certificate-fields.tsx';
import { sayFact } from '#src/features/workspace/fact-words.ts';
import { useProductPage } from '#src/features/workspace/product-page.ts';
import { useRemedies } from '#src/features/workspace/use-remedies.ts';
import { Button } from '#src/ui/button.tsx';
import { Sheet } from '#src/ui/sheet.tsx';

/** Every verdict in every market: what to do, why, the arithmetic, the citation. */
export function Component() {
  const page = useProductPage();
  const { desk, live, isReadOnly, nameOf, shelf, asOf, handling } = page;
  const { draft, change } = desk;
  const results = useMemo(() => MARKETS.flatMap((market) => live.all.get(market) ?? []), [live.all]);
  const merged = useMemo(() => mergeFindings(results), [results]);
  const lines = draft.formula.phases.flatMap((phase) => phase.lines);
  const used = useMemo(() => [...new Set(draft.formula.phases.flatMap((phase) => phase.lines.map(({ materialId }) => materialId)))].flatMap((id) => shelf.byId.get(id) ?? []), [draft.formula, shelf]);
  const remedies = useRemedies(draft, live, isReadOnly);
  const headroom = useHeadroom(live.view.result.headroom);
  const { law } = page.engine;
  const sayRule = useCallback((rule: string) => nameRule(rule, asOf.market, law), [asOf.market, law]);
  const notes = useNotes({ results, draft, market: asOf.market, headroom, nameOf, sayRule });

  const counts = useMemo(() => new Map(results.map((result) => [result.market, withNotes(countFindings(result.findings), notes, result.market)])), [results, notes]);

  const evidence = useQuery(evidenceQueries.ofProduct(page.id));
  const papersOf = (claim: string) => (evidence.data?.items ?? []).filter((paper) => paper.claim === claim).length;

  const remedyOf = (finding: MergedFinding) => {
    const own = finding.markets.get(asOf.market);
    // The other markets are judged apart: the same finding of the market at hand is found by its rule.
    const same = own && [...remedies.keys()].find((each) => each.rule === own.rule && each.subject === own.subject && each.kind === own.kind);
    return same ? remedies.get(same) : undefined;
  };
  const actOf = (finding: MergedFinding) => {
    const remedy = remedyOf(finding);
    if (remedy) return <Button small weight="act" onClick={() => change(setGrams(remedy.lineId, remedy.grams))}>Set {remedy.grams} g of {nameOf(remedy.materialId)}</Button>;
    const asked = finding.lead.needs ?? [];
    if (finding.lead.kind === 'claim-evidence' && asked.length === 0) return <a className="btn small" href="#claims">{sayPapers(papersOf(finding.lead.subject))}</a>;
    const question = asked.length > 0 ? findMaterialQuestion(finding.lead, used) : undefined;
    if (question) return <Link className="btn small" to={`${paths.material(question.material.id)}#${factAnchor(question.fact)}`}>Answer with {question.material.tradeName}: {sayFact(question.fact)}</Link>;
    return asked.length > 0 ? <Link className="btn small" to={`${paths.product(page.id)}${page.search}#particulars`}>Answer: {asked.map(sayFact).join(', ')}</Link> : null;
  };
  const waysOf = (finding: MergedFinding) => {
    const remedy = remedyOf(finding);
    return remedy ? [<>At most <b>{remedy.grams} g</b> of {nameOf(remedy.materialId)} keeps the limit, with everything else as it is.</>] : [];
  };
  const nameOfSource = (from: string) => shelf.byId.get(from)?.tradeName ?? from;

  if (results.length === 0) return <div className="wrap full"><Sheet className="hung"><p className="ledger-none" aria-busy="true">Working out four markets …</p></Sheet></div>;
  return (
    <div className="wrap full">
      <Sheet className="hung">
        {lines.length === 0 ? (
          <p className="ledger-none">Nothing to judge yet: the formula has no line.</p>
        ) : (
          <Ledger findings={merged} counts={counts} sold={draft.markets} release={page.engine.law.release} nameOf={nameOfSource} actOf={actOf} waysOf={waysOf} explain={(finding, market) => explainFinding(finding, market, law)} notes={notes} isWorking={live.isBehind} />
        )}
        <ClaimsSection
          productId={page.id}
          draft={draft}
          results={results}
          isReadOnly={isReadOnly}
          editLink={isReadOnly ? null : <Link to={`${paths.product(page.id)}${page.search}#particulars`}>Write one with the particulars</Link>}
        />
        <RoomLeft market={asOf.market} headroom={headroom} lines={lines.map((line) => nameOf(line.materialId))} nameRule={sayRule} />
        <NotChecked memory={merged.filter((finding) => finding.lead.sourcing === 'memory').length} handling={handling} results={results.filter(({ market }) => draft.markets.includes(market))} />
      </Sheet>
    </div>
  );
}

/** The way to a claim's papers, saying how many there are. */
function sayPapers(count: number): string {
  return count === 0 ? 'Attach evidence' : `Look at ${count === 1 ? 'the paper' : `the ${count} papers`} attached`;
}

/** Headroom takes some tens of milliseconds: it is worked out once the page stands. */
function useHeadroom(work: () => readonly HeadroomLine[]): readonly HeadroomLine[] | null {
  const [found, setFound] = useState<{ of: unknown; lines: readonly HeadroomLine[] } | null>(null);
  useEffect(() => {
    const timer = setTimeout(() => setFound({ of: work, lines: work() }), 400);
    return () => clearTimeout(timer);
  }, [work]);
  return found && found.of === work ? found.lines : null;
}

interface NotesInput {
  readonly results: readonly MarketAssessment[];
  readonly draft: ProductDraft;
  readonly market: Market;
  readonly headroom: readonly HeadroomLine[] | null;
  readonly nameOf: (materialId: string) => string;
  readonly sayRule: (rule: string) => string;
}

/** What is worth knowing besides the findings: allergens named and unnamed, and the line with the least room. */
function useNotes({ results, draft, market, headroom, nameOf, sayRule }: NotesInput): readonly LedgerNote[] {
  const allergens = useMemo(() => findAllergenNotes(results), [results]);
  return useMemo(() => {
    const lines = [...weighFormula(draft.formula).lines.values()];
    const room = headroom?.map((each) => ({ ...each, share: lines.find(({ index }) => index === each.line)?.share ?? '0' })) ?? null;
    return [...allergens, ...findHeadroomNote(market, room, (index) => nameOf(lines.find((one) => one.index === index)!.line.materialId), sayRule)];
  }, [allergens, draft.formula, headroom, market, nameOf, sayRule]);
}

function withNotes(counts: Counts, notes: readonly LedgerNote[], market: Market): Counts {
  return { ...counts, note: counts.note + notes.filter(({ cells }) => cells.has(market)).length };
}
