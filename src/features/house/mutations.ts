import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { updateHouse } from '#shared/contracts/house.contract.ts';
import { call } from '#src/lib/api/call.ts';
import { houseQueries } from './queries.ts';

export function useUpdateHouse() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<NonNullable<typeof updateHouse.body>>) => call(updateHouse, { body }),
    onSuccess: (house) => client.setQueryData(houseQueries.current().queryKey, house),
  });
}
