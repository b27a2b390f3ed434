import { useState } from 'react';
import { useSuspenseQuery } from '@tanstack/react-query';
import { useNavigate, useSearchParams } from 'react-router-dom';
import type { Finding } from '#shared/engine/types.ts';
import { parsePlainDate } from '#shared/kernel/plain-date.ts';
import type { LawBook } from '#shared/law/law-book.ts';
import { MARKETS, type Market } from '#shared/law/types.ts';
import { can } from '#shared/policies/can.ts';
import { explainFinding } from '#shared/report/explain.ts';
import type { PageLoader } from '#src/app/page.ts';
import { paths } from '#src/app/paths.ts';
import { namesQuery } from '#src/features/reading/queries.ts';
import { ReadingRoom } from '#src/features/reading/reading-room.tsx';
import { replaceName } from '#src/features/reading/replace-name.ts';
import { StartProduct } from '#src/features/reading/start-product.tsx';
import { useReading } from '#src/features/reading/use-reading.ts';
import { useSession } from '#src/features/session/queries.ts';
import { Ledger } from '#src/features/verdicts/ledger.tsx';
import { countFindings, mergeFindings } from '#src/features/verdicts/merge.ts';
import { engineQuery } from '#src/features/workspace/queries.ts';
import { useDraftStore } from '#src/lib/drafts.ts';
import { today as readToday } from '#src/lib/say.ts';
import { Deck } from '#src/ui/deck.tsx';
import { Sheet } from '#src/ui/sheet.tsx';
import { useToast } from '#src/ui/toast.tsx';

export const loader: PageLoader = (client) => Promise.all([client.ensureQueryData(engineQuery), client.ensureQueryData(namesQuery)]);

const FIRST_CATEGORY = 'body-wash';
const isText = (value: unknown): value is string => typeof value === 'string';

/** Reads a pasted ingredient list in the browser. */
export function Component() {
  const { house, dataRelease } = useSession();
  const { law } = useSuspenseQuery(engineQuery).data;
  const dictionary = useSuspenseQuery(namesQuery).data;
  const [search, setSearch] = useSearchParams();
  const store = useDraftStore(house.id, 'reading', 'list', isText);
  const [text, setText] = useState(() => store.read()?.value ?? '');
  const [isKept, setKept] = useState(true);
  const navigate = useNavigate();
  const toast = useToast();

  const market: Market = MARKETS.find((each) => each === search.get('market')) ?? 'EU';
  const category = law.categories.get(search.get('category') ?? '') ?? law.categories.get(FIRST_CATEGORY)!;
  const day = parsePlainDate(search.get('on') ?? '') ?? readToday();
  const { reading, isBehind } = useReading({ text, market, category, day }, law, dictionary);

  const write = (next: string) => {
    setText(next);
    if (next === '') store.clear();
    else setKept(store.keep(next, 0));
  };
  const ask = (key: string, value: string) => setSearch((before) => { before.set(key, value); return before; }, { replace: true, preventScrollReset: true });
  const mayEdit = can(house, 'edit', 'products');
  return (
    <>
      <Deck title="Read a list" facts={[house.name, `data release ${dataRelease}`]} />
      <div className="wrap full">
        <Sheet className="hung">
          <ReadingRoom
            text={text}
            market={market}
            category={category.slug}
            day={day}
            covered={{ from: law.coveredFrom, until: law.coveredUntil }}
            categories={[...law.categories.values()]}
            reading={reading}
            isBehind={isBehind}
            isKept={isKept}
            onText={write}
            onAsk={ask}
            onChoose={(written, inci) => write(replaceName(text, written, inci))}
            verdicts={(findings) => <ListVerdicts findings={findings} market={market} law={law} />}
            start={mayEdit && reading && !('mistake' in reading) ? (
              <StartProduct
                names={reading.names}
                market={market}
                category={category}
                onCreated={(product) => {
                  toast(`${product.draft.name} created from the list.`);
                  void navigate(paths.product(product.id));
                }}
              />
            ) : <p className="quiet">You may read lists here; only owners and formulators begin products.</p>}
          />
        </Sheet>
        <p className="foot">A list tells less than its formula: a limit is judged only where the order alone proves it exceeded. The list is read on this computer; nothing is sent until you start a product from it. Colophon advises and does not certify.</p>
      </div>
    </>
  );
}

function ListVerdicts({ findings, market, law }: { findings: readonly Finding[]; market: Market; law: LawBook }) {
  return (
    <Ledger
      findings={mergeFindings([{ market, findings }])}
      counts={new Map([[market, countFindings(findings)]])}
      sold={[market]}
      release={law.release}
      explain={(finding, where) => explainFinding(finding, where, law)}
      nameOf={(from) => from}
      actOf={() => null}
      waysOf={() => []}
      isWorking={false}
    />
  );
}
