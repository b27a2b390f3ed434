import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { addMaterialDocument, archiveMaterial, createMaterial, removeMaterialDocument, updateMaterial } from '#shared/contracts/materials.contract.ts';
import type { Material, MaterialFields } from '#shared/contracts/materials.contract.ts';
import { call } from '#src/lib/api/call.ts';
import { upload } from '#src/lib/api/upload.ts';
import { materialQueries } from './queries.ts';

/** Puts the server's answer where it is read, and lets lists and products ask again. */
async function keep(client: QueryClient, material: Material): Promise<void> {
  client.setQueryData(materialQueries.detail(material.id).queryKey, material);
  await Promise.all([
    client.invalidateQueries({ queryKey: [...materialQueries.all, 'list'] }),
    // A changed composition changes what every product with it says.
    client.invalidateQueries({ queryKey: ['products'] }),
  ]);
}

export function useCreateMaterial() {
  const client = useQueryClient();
  return useMutation({ mutationFn: (body: MaterialFields) => call(createMaterial, { body }), onSuccess: (material) => keep(client, material) });
}
export function useUpdateMaterial(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: MaterialFields & { version: number }) => call(updateMaterial, { params: { id }, body }),
    onSuccess: (material) => keep(client, material),
  });
}
export function useArchiveMaterial(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: { archived: boolean; version: number }) => call(archiveMaterial, { params: { id }, body }),
    onSuccess: (material) => keep(client, material),
  });
}

export interface DocumentInput {
  readonly file: File;
  readonly fields: z.input<NonNullable<typeof addMaterialDocument.body>>;
  readonly onProgress: (share: number) => void;
}
export function useAddDocument(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ file, fields, onProgress }: DocumentInput) => upload(addMaterialDocument, { params: { id }, file, body: fields, onProgress }),
    onSuccess: (material) => keep(client, material),
  });
}
export function useRemoveDocument(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (documentId: string) => call(removeMaterialDocument, { params: { id, documentId } }),
    onSuccess: (material) => keep(client, material),
  });
}
