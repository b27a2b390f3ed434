import { useSuspenseQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import type { PageLoader } from '#src/app/page.ts';
import { NotFoundScreen } from '#src/app/error-screens.tsx';
import { paths } from '#src/app/paths.ts';
import { EntrySheet } from '#src/features/dictionary/entry-sheet.tsx';
import { dictionaryQueries } from '#src/features/dictionary/queries.ts';
import { sessionQueries } from '#src/features/session/queries.ts';
import { LinkButton } from '#src/ui/button.tsx';
import { Deck } from '#src/ui/deck.tsx';
import { Sheet } from '#src/ui/sheet.tsx';

export const loader: PageLoader = async (client, { params }) => {
  // The names are sent in a body, so the session's token has to be there first.
  await client.ensureQueryData(sessionQueries.current());
  return client.ensureQueryData(dictionaryQueries.entry(params.inci!));
};

export function Component() {
  const { inci = '' } = useParams();
  const entry = useSuspenseQuery(dictionaryQueries.entry(inci)).data;
  if (!entry) return <NotFoundScreen />;
  return (
    <>
      <Deck title={entry.inci} facts={['Dictionary', ...entry.functions.slice(0, 3)]} acts={<LinkButton to={paths.dictionary}>All ingredients</LinkButton>} />
      <div className="wrap full"><Sheet className="hung"><EntrySheet entry={entry} /></Sheet></div>
    </>
  );
}
