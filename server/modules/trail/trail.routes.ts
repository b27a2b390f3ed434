import { exportTrail, listTrail as listContract, verifyTrail as verifyContract } from '#shared/contracts/trail.contract.ts';
import { FileAnswer } from '#server/http/file-answer.ts';
import { route, type Route } from '#server/http/route.ts';
import { listTrail, verifyTrail, walkTrail } from './trail.service.ts';

/** The trail: read, verified and taken away. Nothing here writes. */
export function trailRoutes({ now }: { readonly now: () => Date }): Route[] {
  return [
    route(listContract, { may: ['read', 'trail'] }, ({ query, actor, inHouse }) =>
      inHouse(async (em) => {
        const { items, ...next } = await listTrail(em, actor, query);
        return { items: items.map((entry) => ({ ...entry, changes: [...entry.changes] })), ...next };
      }),
    ),
    route(verifyContract, { may: ['read', 'trail'] }, ({ actor, inHouse }) => inHouse((em) => verifyTrail(em, actor.houseId))),
    route(exportTrail, { may: ['read', 'trail'] }, async ({ actor, inHouse }) => {
      const lines = await inHouse(async (em) => {
        const all: string[] = [];
        for await (const entry of walkTrail(em, actor.houseId)) all.push(JSON.stringify(entry));
        return all;
      });
      return new FileAnswer({ bytes: Buffer.from(lines.map((line) => `${line}\n`).join('')), mediaType: 'application/x-ndjson', fileName: `trail-${now().toISOString().slice(0, 10)}.jsonl` });
    }),
  ];
}
