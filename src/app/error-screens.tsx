import { isRouteErrorResponse, useRouteError } from 'react-router-dom';
import { ApiError, OfflineError, isRefusal } from '#src/lib/api/error.ts';
import { Button, LinkButton } from '#src/ui/button.tsx';
import { Deck } from '#src/ui/deck.tsx';
import { Sheet } from '#src/ui/sheet.tsx';
import { paths } from './paths.ts';

interface Said {
  readonly title: string;
  readonly words: string;
  readonly mayRetry: boolean;
  readonly requestId?: string;
}

function say(error: unknown): Said {
  if (isRefusal(error, 'not-found') || (isRouteErrorResponse(error) && error.status === 404)) return notFound;
  if (isRefusal(error, 'not-allowed')) return { title: 'Not open to you', words: `${error.message} An owner of the house can give you the role for it.`, mayRetry: false };
  if (error instanceof OfflineError) return { title: 'Colophon cannot be reached', words: 'The connection is lost. What you typed is kept on this computer. Try again in a moment.', mayRetry: true };
  if (isRefusal(error, 'unavailable')) return { title: 'Not now', words: error.message, mayRetry: true };
  return {
    title: 'This page could not be shown',
    words: 'The fault is on our side. Nothing you saved is lost, and drafts are kept on this computer.',
    mayRetry: true,
    requestId: error instanceof ApiError ? error.problem.requestId : undefined,
  };
}
const notFound: Said = {
  title: 'Nothing stands here',
  words: 'There is no such page in this house. It may have been put away, or the address may belong to another house or be mistyped.',
  mayRetry: false,
};

/** A fault inside a room: the bar stays, the room says what happened. */
export function PageError() {
  return <ErrorPage said={say(useRouteError())} />;
}
/** An address that leads nowhere. */
export function NotFoundScreen() {
  return <ErrorPage said={notFound} />;
}
/** A fault before the shell could stand. */
export function ErrorScreen() {
  return <main id="main"><ErrorPage said={say(useRouteError())} /></main>;
}

function ErrorPage({ said }: { said: Said }) {
  return (
    <>
      <Deck title={said.title} />
      <div className="wrap full">
        <Sheet className="hung">
          <div className="panel">
            <p className="prose text-15">{said.words}</p>
            {said.requestId ? <p className="hint mt-2">If you write to us, give this number: {said.requestId}</p> : null}
            <p className="mt-4 flex flex-wrap gap-2">
              {said.mayRetry ? <Button weight="act" onClick={() => location.reload()}>Try again</Button> : null}
              <LinkButton to={paths.today}>Go to Today</LinkButton>
              <LinkButton to={paths.products}>Go to Products</LinkButton>
            </p>
          </div>
        </Sheet>
      </div>
    </>
  );
}
