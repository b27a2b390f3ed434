import { endSession as endSessionContract, getSession, switchHouse, type Session } from '#shared/contracts/session.contract.ts';
import type { AuthDeps } from '#server/auth/auth-deps.ts';
import { endSession } from '#server/auth/auth-router.ts';
import type { AppSession } from '#server/auth/session.types.ts';
import { moveSession } from '#server/auth/sessions.ts';
import { AppError } from '#server/http/app-error.ts';
import { route, type Route } from '#server/http/route.ts';

/** Who is signed in, signing out, and choosing among one's houses. */
export function sessionRoutes({ auth, dataRelease }: { readonly auth: AuthDeps; readonly dataRelease: string }): Route[] {
  return [
    route(getSession, { may: 'signed-in' }, ({ session }) => Promise.resolve(presentSession(session, session.houseId, dataRelease))),
    route(endSessionContract, { may: 'signed-in' }, ({ session, res }) => endSession(auth, session, res)),
    route(switchHouse, { may: 'signed-in' }, async ({ session, body }) => {
      const next = presentSession(session, body.houseId.toLowerCase(), dataRelease);
      await moveSession(auth.query, session.id, next.house.id);
      return next;
    }),
  ];
}

/** A session as its contract shows it. @throws AppError `not-found` for a house that is not the person's */
function presentSession(session: AppSession, houseId: string, dataRelease: string): Session {
  const house = session.houses.find((one) => one.houseId === houseId);
  if (!house) throw new AppError('not-found');
  return {
    person: { ...session.person },
    house: { id: house.houseId, name: house.houseName, roles: [...house.roles] },
    houses: session.houses.map((one) => ({ id: one.houseId, name: one.houseName })),
    csrfToken: session.csrfToken,
    dataRelease,
  };
}
