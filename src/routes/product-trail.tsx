import { Link } from 'react-router-dom';
import { paths } from '#src/app/paths.ts';
import { TrailList } from '#src/features/trail/trail-list.tsx';
import { useProductPage } from '#src/features/workspace/product-page.ts';
import { Panel, Sheet } from '#src/ui/sheet.tsx';

/** What was done to this product and to the materials in it. */
export function Component() {
  const { id } = useProductPage();
  return (
    <div className="wrap full">
      <Sheet className="hung">
        <Panel title="What was done to it and to its materials" end={<Link to={paths.trail}>The whole house’s trail</Link>}>
          <TrailList product={id} />
        </Panel>
      </Sheet>
    </div>
  );
}
