import { useCallback, useEffect, useMemo, useState } from 'react';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import type { Material } from '#shared/contracts/materials.contract.ts';
import type { MarketAssessment } from '#shared/engine/assessment.ts';
import { toDocument, type HouseDefaults } from '#shared/product/to-document.ts';
import { MARKETS, type Market } from '#shared/law/types.ts';
import type { Engine, Names } from './engine.ts';
import { findLawDays, type ProductLawDay } from './law-days.ts';
import { presentView, type MarketView } from './view.ts';

export interface AssessmentInput {
  readonly engine: Engine;
  readonly names: Names;
  readonly draft: ProductDraft;
  readonly materials: readonly Material[];
  readonly house: HouseDefaults;
  readonly market: Market;
  readonly placed: string;
  readonly available: string;
  readonly today: string;
}

export interface LiveAssessment {
  /** The market at hand, judged with the very keystroke; what is costly to draw from it defers it. */
  readonly view: MarketView;
  /** All four markets, a moment later. */
  readonly all: ReadonlyMap<Market, MarketAssessment>;
  readonly isBehind: boolean;
  /** `null` until they are worked out. */
  readonly lawDays: readonly ProductLawDay[] | null;
  /** Judges another draft for the same market and days: for trying a remedy before it is offered. */
  readonly tryWith: (draft: ProductDraft) => MarketAssessment;
}

const NO_MARKETS: ReadonlyMap<Market, MarketAssessment> = new Map();
/** Quiet time before the other markets, and before the law's dates, are worked out. */
const OTHERS_AFTER = 150;
const DATES_AFTER = 700;

/** Runs the engine as someone types: the market at hand first, everything else when there is time. */
export function useAssessment(input: AssessmentInput): LiveAssessment {
  const { engine, names, materials, house, market, placed, available, today } = input;
  const { draft } = input;
  const judge = useMemo(() => engine.withNames(names), [engine, names]);
  const document = useMemo(() => toDocument(draft, materials, house), [draft, materials, house]);
  const view = useMemo(() => {
    const assessment = judge(document, { markets: [market], placed, available, today });
    return presentView(assessment, assessment.results[0]!);
  }, [judge, document, market, placed, available, today]);

  const [all, setAll] = useState<{ of: unknown; results: ReadonlyMap<Market, MarketAssessment> }>({ of: null, results: NO_MARKETS });
  useEffect(() => {
    const timer = setTimeout(() => {
      const { results } = judge(document, { markets: MARKETS, placed, available, today });
      setAll({ of: view, results: new Map(results.map((result) => [result.market, result])) });
    }, OTHERS_AFTER);
    return () => clearTimeout(timer);
  }, [judge, document, placed, available, today, view]);

  const [lawDays, setLawDays] = useState<readonly ProductLawDay[] | null>(null);
  useEffect(() => {
    const stop = new AbortController();
    const since = `${Number(today.slice(0, 4)) - 1}-01-01`;
    const timer = setTimeout(() => {
      void findLawDays(judge, document, market, engine.law, { since, today, signal: stop.signal }).then((days) => {
        if (!stop.signal.aborted) setLawDays((before) => (JSON.stringify(before) === JSON.stringify(days) ? before : days));
      });
    }, DATES_AFTER);
    return () => {
      stop.abort();
      clearTimeout(timer);
    };
  }, [judge, document, market, engine, today]);

  const tryWith = useCallback((other: ProductDraft) => judge(toDocument(other, materials, house), { markets: [market], placed, available, today }).results[0]!, [judge, materials, house, market, placed, available, today]);
  return { view, all: all.results, isBehind: all.of !== view, lawDays, tryWith };
}
