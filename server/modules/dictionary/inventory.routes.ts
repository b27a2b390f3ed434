import * as contract from '#shared/contracts/inventory.contract.ts';
import type { Dictionary } from '#shared/dictionary/types.ts';
import { safeFileName } from '#server/http/file-answer.ts';
import type { LogFault } from '#server/http/problem.ts';
import { route, type Call, type Route } from '#server/http/route.ts';
import { noteAct } from '#server/trail/trail-context.ts';
import { beginImport, inventoryStateOf, readExport, removeImport, takeOverChunk } from './inventory.service.ts';

interface Deps {
  readonly dictionary: Dictionary;
  readonly now: () => Date;
  readonly log: LogFault;
}

type House = Pick<Call<unknown, unknown, unknown>, 'actor' | 'inHouse'>;

/** Taking over the official inventory. The work goes on when the browser leaves, and is taken up again at the next question after a restart. */
export function inventoryRoutes({ dictionary, now, log }: Deps): Route[] {
  const atWork = new Set<string>();
  const work = async ({ actor, inHouse }: House) => {
    if (atWork.has(actor.houseId)) return;
    atWork.add(actor.houseId);
    try {
      while ((await inHouse((em) => takeOverChunk(em, actor, dictionary))) === 'more') await new Promise(setImmediate);
    } catch (error) {
      // What was begun stands as it was; the next question takes it up again.
      log({ requestId: 'background', method: 'POST', path: contract.importInventory.path, error });
    } finally {
      atWork.delete(actor.houseId);
    }
  };
  const stateOf = ({ actor, inHouse }: House) => inHouse((em) => inventoryStateOf(em, actor));
  return [
    route(contract.getInventory, { may: ['read', 'materials'] }, async ({ actor, inHouse }) => {
      const state = await stateOf({ actor, inHouse });
      if (state.last?.isRunning) void work({ actor, inHouse });
      return state;
    }),
    route(contract.importInventory, { may: ['edit', 'house'] }, async ({ actor, inHouse, upload }) => {
      const reading = readExport(upload.bytes);
      const fileName = safeFileName(upload.fileName);
      await inHouse(async (em) => {
        await beginImport(em, actor, { reading, fileName, now: now() });
        noteAct(em, act('took over', fileName));
      });
      const state = await stateOf({ actor, inHouse });
      void work({ actor, inHouse });
      return state;
    }),
    route(contract.removeInventory, { may: ['edit', 'house'] }, async ({ actor, inHouse }) => {
      await inHouse(async (em) => {
        await removeImport(em, actor);
        noteAct(em, act('removed', 'Names from the inventory'));
      });
      return stateOf({ actor, inHouse });
    }),
  ];
}

function act(word: string, subject: string) {
  return { act: word, subjectKind: 'inventory', subjectId: null, subject, productId: null, changes: [], recordHash: null };
}
