import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import type { Session } from '#shared/contracts/session.contract.ts';
import { getSession } from '#shared/contracts/session.contract.ts';
import { call } from '#src/lib/api/call.ts';
import { setCsrfToken } from '#src/lib/api/session-token.ts';

export const sessionQueries = {
  all: ['session'] as const,
  current: () =>
    queryOptions({
      queryKey: [...sessionQueries.all, 'current'] as const,
      queryFn: async ({ signal }) => {
        const session = await call(getSession, {}, signal);
        setCsrfToken(session.csrfToken);
        return session;
      },
      staleTime: 5 * 60_000,
    }),
};

/** Who is signed in, in which house. */
export function useSession(): Session {
  return useSuspenseQuery(sessionQueries.current()).data;
}
