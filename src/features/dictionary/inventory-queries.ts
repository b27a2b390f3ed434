import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { getInventory, importInventory, removeInventory, type InventoryState } from '#shared/contracts/inventory.contract.ts';
import { call } from '#src/lib/api/call.ts';
import { upload } from '#src/lib/api/upload.ts';
import { dictionaryQueries } from './queries.ts';

/** How taking over the inventory stands; asked again every second while the work runs. */
export const inventoryQuery = queryOptions({
  queryKey: ['inventory'] as const,
  queryFn: ({ signal }) => call(getInventory, {}, signal),
  refetchInterval: (query) => (query.state.data?.last?.isRunning ? 1000 : false),
});

function useKeep() {
  const client = useQueryClient();
  return (state: InventoryState) => {
    client.setQueryData(inventoryQuery.queryKey, state);
    void client.invalidateQueries({ queryKey: dictionaryQueries.all });
  };
}
export function useImportInventory() {
  const keep = useKeep();
  return useMutation({ mutationFn: (file: File) => upload(importInventory, { params: {}, file, body: {} }), onSuccess: keep });
}
export function useRemoveInventory() {
  const keep = useKeep();
  return useMutation({ mutationFn: () => call(removeInventory, {}), onSuccess: keep });
}
