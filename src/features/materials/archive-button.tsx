import type { Material } from '#shared/contracts/materials.contract.ts';
import { sayError } from '#src/lib/api/error.ts';
import { sayCount } from '#src/lib/say.ts';
import { Button } from '#src/ui/button.tsx';
import { useToast } from '#src/ui/toast.tsx';
import { useArchiveMaterial } from './mutations.ts';

/** Puts a material away, or takes it out again; while a product uses it, it stays. */
export function ArchiveButton({ material }: { material: Material }) {
  const archive = useArchiveMaterial(material.id);
  const toast = useToast();
  const put = (archived: boolean, version: number, isUndo = false) =>
    archive.mutate({ archived, version }, {
      onSuccess: (saved) => toast(archived ? `${saved.tradeName} put away.` : `${saved.tradeName} is back.`, isUndo ? undefined : () => put(!archived, saved.version, true)),
      onError: (error) => toast(sayError(error)),
    });
  if (material.archived) return <Button busy={archive.isPending} onClick={() => put(false, material.version)}>Take out again</Button>;
  const uses = material.usedIn.length;
  return (
    <Button busy={archive.isPending} disabled={uses > 0} title={uses > 0 ? `Used in ${sayCount(uses, 'product')}: take it out there first.` : undefined} onClick={() => put(true, material.version)}>
      Put away
    </Button>
  );
}
