import { useCallback, useEffect, useMemo } from 'react';
import { useSuspenseQuery } from '@tanstack/react-query';
import { Outlet, useParams, useSearchParams } from 'react-router-dom';
import type { ProductWorkspace } from '#shared/contracts/products.contract.ts';
import { can } from '#shared/policies/can.ts';
import { judgeHandling } from '#shared/product/handling.ts';
import type { PageLoader } from '#src/app/page.ts';
import { paths } from '#src/app/paths.ts';
import { AsOfControl } from '#src/features/asof/as-of-control.tsx';
import { readAsOf, writeAsOf, type AsOf } from '#src/features/asof/as-of.ts';
import { houseQueries } from '#src/features/house/queries.ts';
import { productQueries } from '#src/features/products/queries.ts';
import { useSession } from '#src/features/session/queries.ts';
import { countFindings } from '#src/features/verdicts/merge.ts';
import { ConflictDialog } from '#src/features/workspace/conflict-dialog.tsx';
import { KeptDraft } from '#src/features/workspace/kept-draft.tsx';
import { engineQuery } from '#src/features/workspace/queries.ts';
import type { ProductPage } from '#src/features/workspace/product-page.ts';
import { SaveWords } from '#src/features/workspace/save-words.tsx';
import { useAssessment } from '#src/features/workspace/use-assessment.ts';
import { isDraft, useDraftDesk } from '#src/features/workspace/use-draft.ts';
import { useMaterialShelf } from '#src/features/workspace/use-materials.ts';
import { useUndoKeys } from '#src/features/workspace/use-undo-keys.ts';
import '#src/features/workspace/product.css';
import { useDraftStore } from '#src/lib/drafts.ts';
import { today as readToday } from '#src/lib/say.ts';
import { IconButton } from '#src/ui/button.tsx';
import { Deck, TabLinks } from '#src/ui/deck.tsx';
import { VerdictMark } from '#src/ui/verdict-mark.tsx';

export const loader: PageLoader = (client, { params }) =>
  Promise.all([client.ensureQueryData(productQueries.detail(params.id!)), client.ensureQueryData(engineQuery), client.ensureQueryData(houseQueries.current())]);

export function Component() {
  const { id = '' } = useParams();
  const { data } = useSuspenseQuery({ ...productQueries.detail(id), refetchInterval: 20_000 });
  // Another product is another desk: nothing of the first may stay.
  return <ProductDesk key={id} id={id} workspace={data} />;
}

function ProductDesk({ id, workspace }: { id: string; workspace: ProductWorkspace }) {
  const session = useSession();
  const engine = useSuspenseQuery(engineQuery).data;
  const house = useSuspenseQuery(houseQueries.current()).data;
  const store = useDraftStore(session.house.id, 'product', id, isDraft);
  const isReadOnly = !can({ roles: session.house.roles }, 'edit', 'products') || workspace.product.archived;
  const isLabelLocked = !can({ roles: session.house.roles }, 'edit', 'labels') || workspace.product.archived;
  const desk = useDraftDesk(workspace.product, productQueries.detail(id).queryKey, store);
  const shelf = useMaterialShelf(workspace);
  const { draft } = desk;
  const today = readToday();
  const [search, setSearch] = useSearchParams();
  const defaults = { markets: draft.markets, placed: draft.placedOnMarket, available: draft.availableOn, today };
  const asOf = readAsOf(search, defaults);
  const setAsOf = (next: AsOf) => setSearch(writeAsOf(search, next, defaults), { replace: true, preventScrollReset: true });
  const live = useAssessment({ engine, names: shelf.names, draft, materials: shelf.materials, house, ...asOf, today });
  const handling = useMemo(() => judgeHandling(draft, shelf.materials), [draft, shelf.materials]);
  const nameOf = useCallback((materialId: string) => shelf.byId.get(materialId)?.tradeName ?? 'A material that is not loaded', [shelf.byId]);
  useUndoKeys(desk);
  useMissingMaterials(desk.draft, shelf);

  const page: ProductPage = { id, desk, shelf, house, engine, live, asOf, today, isReadOnly, isLabelLocked, handling, nameOf, search: search.size > 0 ? `?${search}` : '' };
  const category = engine.law.categories.get(draft.category);
  const facts = [
    house.name,
    category ? `${category.title}, ${category.exposure}` : draft.category,
    ...(draft.netContent ? [`${draft.netContent.value} ${draft.netContent.unit}`] : []),
    ...(draft.formula.batchSize ? [`Batch of ${draft.formula.batchSize.value} g`] : []),
    ...(workspace.product.archived ? ['Archived'] : []),
  ];
  return (
    <>
      <Deck
        title={draft.name || 'Product without a name'}
        facts={facts}
        acts={
          <>
            <SaveWords save={desk.save} version={desk.version} onRetry={desk.saveNow} />
            {isLabelLocked ? null : (
              <span className="undo-pair">
                <IconButton icon="undo" word="Undo (Ctrl Z)" disabled={!desk.canUndo} onClick={desk.undo} />
                <IconButton icon="redo" word="Redo (Ctrl Shift Z)" disabled={!desk.canRedo} onClick={desk.redo} />
              </span>
            )}
            <a className="btn" href={`/api/products/${id}/weigh-out.pdf`} target="_blank" rel="noreferrer">Weigh-out sheet</a>
          </>
        }
        tabs={<ProductTabs page={page} />}
      >
        <AsOfControl
          asOf={asOf}
          sold={draft.markets}
          today={today}
          changes={live.lawDays}
          covered={{ from: engine.law.coveredFrom, until: engine.law.coveredUntil }}
          release={engine.law.release}
          onChange={setAsOf}
        />
      </Deck>
      {desk.kept && !isLabelLocked ? <KeptDraft kept={desk.kept} version={workspace.product.version} onTake={desk.takeKept} onDrop={desk.dropKept} /> : null}
      {desk.save.kind === 'conflict' ? <ConflictDialog base={desk.base()} mine={draft} theirs={desk.save.theirs} nameOf={nameOf} onResolve={desk.resolve} /> : null}
      <Outlet context={page} />
      <p className="wrap product-foot">
        Law data {engine.law.release}, dictionary {shelf.names.release}. Shares are masses as added over their sum; no loss is assumed. Colophon advises and does not certify.
      </p>
    </>
  );
}

/** The parts of a product as words, with the weightiest count beside Verdicts. */
function ProductTabs({ page }: { page: ProductPage }) {
  const { id, live, search } = page;
  const counts = countFindings(live.view.result.findings);
  const weight = counts.stop > 0 ? 'stop' : counts.decide > 0 ? 'decide' : null;
  const mark = weight ? (
    <span className={`weight ${weight}`}>
      <VerdictMark weight={weight} />
      {counts[weight]}
    </span>
  ) : null;
  const tabs = [
    { to: paths.product(id) + search, word: 'Formula', end: true },
    { to: paths.declaration(id) + search, word: 'Declaration' },
    { to: paths.verdicts(id) + search, word: 'Verdicts', mark },
    { to: paths.label(id) + search, word: 'Label' },
    { to: paths.report(id) + search, word: 'Report' },
    { to: paths.productTrail(id) + search, word: 'Trail' },
  ];
  return <TabLinks label="Parts of the product" tabs={tabs} />;
}

/** A draft taken up again, or merged with someone else's, may use materials that were not sent along. */
function useMissingMaterials(draft: ProductWorkspace['product']['draft'], shelf: ReturnType<typeof useMaterialShelf>) {
  const missing = [...new Set(draft.formula.phases.flatMap((phase) => phase.lines.map((line) => line.materialId)))].filter((each) => !shelf.byId.has(each));
  const first = missing[0];
  const { bring } = shelf;
  useEffect(() => {
    // One after the other; one that is gone stays a line without a name.
    if (first !== undefined) void bring(first).catch(() => undefined);
  }, [first, bring]);
}
