import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { addPicture, listPictures, removePicture, type Picture } from '#shared/contracts/pictures.contract.ts';
import { call } from '#src/lib/api/call.ts';
import { upload } from '#src/lib/api/upload.ts';

/** The house's pictures, by name. */
export const picturesQuery = queryOptions({ queryKey: ['pictures'] as const, queryFn: async ({ signal }) => (await call(listPictures, {}, signal)).items, staleTime: 60_000 });

export function useAddPicture() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ file, onProgress }: { file: File; onProgress: (share: number) => void }) => upload(addPicture, { params: {}, file, body: {}, onProgress }),
    onSuccess: (picture: Picture) => client.setQueryData(picturesQuery.queryKey, (before: Picture[] = []) => [...before, picture].sort((a, b) => a.name.localeCompare(b.name))),
  });
}
export function useRemovePicture() {
  const client = useQueryClient();
  return useMutation({ mutationFn: (id: string) => call(removePicture, { params: { id } }), onSuccess: ({ items }) => client.setQueryData(picturesQuery.queryKey, items) });
}
