import { useCallback } from 'react';
import { Link } from 'react-router-dom';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import type { Market } from '#shared/law/types.ts';
import { toDocument } from '#shared/product/to-document.ts';
import { paths } from '#src/app/paths.ts';
import { TrailList } from '#src/features/trail/trail-list.tsx';
import { VersionsPanel } from '#src/features/versions/versions-panel.tsx';
import { useProductPage } from '#src/features/workspace/product-page.ts';
import { Panel, Sheet } from '#src/ui/sheet.tsx';

/** What was done to this product and to the materials in it, and any two of its states compared. */
export function Component() {
  const { id, desk, shelf, house, engine, asOf, today, isReadOnly, nameOf } = useProductPage();
  const judge = useCallback(
    (draft: ProductDraft, market: Market) => engine.withNames(shelf.names)(toDocument(draft, shelf.materials, house), { markets: [market], placed: asOf.placed, available: asOf.available, today }).results[0]!,
    [engine, shelf.names, shelf.materials, house, asOf.placed, asOf.available, today],
  );
  return (
    <div className="wrap full">
      <Sheet className="hung">
        <Panel title="Versions">
          <VersionsPanel id={id} draft={desk.draft} version={desk.version} nameOf={nameOf} judge={judge} onTakeUp={isReadOnly ? undefined : (draft) => desk.change(() => draft)} />
        </Panel>
        <Panel title="What was done to it and to its materials" end={<Link to={paths.trail}>The whole house’s trail</Link>}>
          <TrailList product={id} />
        </Panel>
      </Sheet>
    </div>
  );
}
