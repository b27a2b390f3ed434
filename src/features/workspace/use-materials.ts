import { useCallback, useMemo, useState } from 'react';
import { useQueryClient } from '@tanstack/react-query';
import { resolveNames } from '#shared/contracts/dictionary.contract.ts';
import { getMaterial, type Material } from '#shared/contracts/materials.contract.ts';
import type { ProductWorkspace } from '#shared/contracts/products.contract.ts';
import { materialNames } from '#shared/product/material-names.ts';
import { call } from '#src/lib/api/call.ts';
import type { Names } from './engine.ts';

interface Added {
  readonly materials: readonly Material[];
  readonly entries: Names['entries'];
  readonly unknown: Names['unknown'];
}

/** The materials at hand and the names in them; more are fetched as lines are added. */
export interface MaterialShelf {
  readonly materials: readonly Material[];
  readonly byId: ReadonlyMap<string, Material>;
  readonly names: Names;
  /** Brings a material with all its names; the line that uses it may be added after. */
  bring(id: string): Promise<void>;
  put(material: Material): Promise<void>;
}

/** What the server sent with the product, and what was brought since. */
export function useMaterialShelf(workspace: ProductWorkspace): MaterialShelf {
  const client = useQueryClient();
  const [added, setAdded] = useState<Added>({ materials: [], entries: [], unknown: [] });
  const materials = useMemo(() => {
    const sent = new Set(workspace.materials.map((material) => material.id));
    return [...workspace.materials, ...added.materials.filter((material) => !sent.has(material.id))];
  }, [workspace.materials, added.materials]);
  const byId = useMemo(() => new Map(materials.map((material) => [material.id, material])), [materials]);
  const names = useMemo<Names>(
    () => ({ entries: [...workspace.entries, ...added.entries], unknown: [...workspace.unknown, ...added.unknown], release: workspace.dictionaryRelease }),
    [workspace.entries, workspace.unknown, workspace.dictionaryRelease, added.entries, added.unknown],
  );
  const put = useCallback(async (material: Material) => {
    const written = materialNames(material).map(({ name, cas }) => ({ name, cas }));
    const resolved = written.length > 0 ? (await call(resolveNames, { body: { names: written } })).items : [];
    setAdded((before) => ({
      materials: [...before.materials.filter((each) => each.id !== material.id), material],
      entries: [...before.entries, ...resolved.flatMap((item) => item.entry ?? [])],
      unknown: [...before.unknown, ...resolved.filter((item) => !item.entry).map((item) => ({ name: item.name, suggestions: item.suggestions.map((entry) => entry.inci) }))],
    }));
  }, []);
  const bring = useCallback(
    async (id: string) => {
      if (byId.has(id)) return;
      await put(await client.fetchQuery({ queryKey: ['materials', 'detail', id], queryFn: () => call(getMaterial, { params: { id } }) }));
    },
    [byId, client, put],
  );
  return { materials, byId, names, bring, put };
}
