import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { archiveProduct, copyProduct, createProduct, importFormulaDocument } from '#shared/contracts/products.contract.ts';
import { call } from '#src/lib/api/call.ts';
import { productQueries } from './queries.ts';

export type NewProduct = z.input<NonNullable<typeof createProduct.body>>;

function useAskAgain() {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: [...productQueries.all, 'list'] });
}
export function useCreateProduct() {
  const askAgain = useAskAgain();
  return useMutation({ mutationFn: (body: NewProduct) => call(createProduct, { body }), onSuccess: askAgain });
}
/** Creates the product of a formula document, and the materials it lacks. */
export function useImportProduct() {
  const askAgain = useAskAgain();
  return useMutation({ mutationFn: (document: unknown) => call(importFormulaDocument, { body: { document } }), onSuccess: askAgain });
}
export function useCopyProduct() {
  const askAgain = useAskAgain();
  return useMutation({ mutationFn: ({ id, name }: { id: string; name: string }) => call(copyProduct, { params: { id }, body: { name } }), onSuccess: askAgain });
}
export function useArchiveProduct() {
  const askAgain = useAskAgain();
  return useMutation({
    mutationFn: ({ id, archived, version }: { id: string; archived: boolean; version: number }) => call(archiveProduct, { params: { id }, body: { archived, version } }),
    onSuccess: askAgain,
  });
}
