import { useMutation, useQueryClient } from '@tanstack/react-query';
import { endSession, switchHouse } from '#shared/contracts/session.contract.ts';
import { call } from '#src/lib/api/call.ts';
import { sessionQueries } from './queries.ts';

/** Signs out and goes where the server says. Drafts on this computer stay. */
export function useSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call(endSession, {}),
    onSuccess: (answer) => {
      client.clear();
      location.assign(answer.next);
    },
  });
}

/** Goes over to another house of the same person; nothing of the first stays in memory. */
export function useSwitchHouse() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (houseId: string) => call(switchHouse, { body: { houseId } }),
    onSuccess: (session) => {
      client.clear();
      client.setQueryData(sessionQueries.current().queryKey, session);
      location.assign('/');
    },
  });
}
