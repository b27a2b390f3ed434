import { useMutation, useQueryClient } from '@tanstack/react-query';
import { importFormulaDocument } from '#shared/contracts/products.contract.ts';
import { call } from '#src/lib/api/call.ts';

/** Creates a product, and the materials it lacks, from an estimate. */
export function useImportEstimate() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: { readonly document: unknown }) => call(importFormulaDocument, { body }),
    onSuccess: () => Promise.all([client.invalidateQueries({ queryKey: ['products'] }), client.invalidateQueries({ queryKey: ['materials'] })]),
  });
}
