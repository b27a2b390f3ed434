import { useDeferredValue, useMemo } from 'react';
import { presentResult } from '#shared/engine/present-result.ts';
import { toDocument } from '#shared/product/to-document.ts';
import { buildReport } from '#shared/report/build-report.ts';
import { ReportScreen } from '#src/features/report/report-screen.tsx';
import { useProductPage } from '#src/features/workspace/product-page.ts';
import { Sheet } from '#src/ui/sheet.tsx';

/** The compliance report over the markets the product is sold in, from what stands on the page now. */
export function Component() {
  const { id, desk, shelf, house, engine, asOf, today } = useProductPage();
  const draft = useDeferredValue(desk.draft);
  const { placed, available } = asOf;
  const told = useMemo(() => {
    const document = toDocument(draft, shelf.materials, house);
    const result = presentResult(engine.withNames(shelf.names)(document, { markets: draft.markets, placed, available, today }), { withHeadroom: false });
    return { document, results: result.results, dataRelease: result.dataRelease };
  }, [draft, shelf.materials, shelf.names, house, engine, placed, available, today]);
  return (
    <div className="wrap full">
      <Sheet className="hung">
        <ReportScreen
          productId={id}
          placed={placed}
          available={available}
          isUnsaved={desk.save.kind !== 'saved'}
          build={(showShares) => buildReport({ ...told, house: house.name, lawReadOn: engine.law.readOn, showShares })}
        />
      </Sheet>
    </div>
  );
}
