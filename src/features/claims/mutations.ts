import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { addEvidence, removeEvidence } from '#shared/contracts/evidence.contract.ts';
import { call } from '#src/lib/api/call.ts';
import { upload } from '#src/lib/api/upload.ts';
import { evidenceQueries } from './queries.ts';

export interface EvidenceInput {
  readonly file: File;
  readonly fields: z.input<NonNullable<typeof addEvidence.body>>;
  readonly onProgress: (share: number) => void;
}

export function useAddEvidence(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ file, fields, onProgress }: EvidenceInput) => upload(addEvidence, { params: { id }, file, body: fields, onProgress }),
    onSuccess: (list) => client.setQueryData(evidenceQueries.ofProduct(id).queryKey, list),
  });
}

export function useRemoveEvidence(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (documentId: string) => call(removeEvidence, { params: { id, documentId } }),
    onSuccess: (list) => client.setQueryData(evidenceQueries.ofProduct(id).queryKey, list),
  });
}
