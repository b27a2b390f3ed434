import { useEffect, useState } from 'react';
import { useQueryClient } from '@tanstack/react-query';
import { paths } from '#src/app/paths.ts';
import { Button } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { FieldFault } from '#src/ui/field.tsx';
import { useToast } from '#src/ui/toast.tsx';
import { sessionQueries } from './queries.ts';

/**
 * The session ran out beside unsaved work: sign in again in a window of its own, come back,
 * go on. The page behind stays as it is.
 */
export function SessionEndedDialog({ onSignedIn }: { onSignedIn: () => void }) {
  const client = useQueryClient();
  const toast = useToast();
  const [waiting, setWaiting] = useState(false);
  const [fault, setFault] = useState('');

  const look = async (isAsked: boolean) => {
    try {
      const before = client.getQueryData(sessionQueries.current().queryKey);
      const session = await client.fetchQuery({ ...sessionQueries.current(), staleTime: 0 });
      if (before && before.house.id !== session.house.id) {
        location.assign(paths.today);
        return;
      }
      onSignedIn();
      toast('Signed in again. Go on where you were, and save once more.');
    } catch {
      if (isAsked) setFault('You are not signed in yet. Finish in the other window, then come back.');
    }
  };
  useEffect(() => {
    if (!waiting) return;
    const onFocus = () => void look(false);
    addEventListener('focus', onFocus);
    return () => removeEventListener('focus', onFocus);
  });

  return (
    <Dialog
      title="Please sign in again"
      role="alertdialog"
      isOpen
      onClose={() => undefined}
      foot={
        <>
          <Button onClick={() => void look(true)}>I have signed in</Button>
          <Button
            weight="act"
            onClick={() => {
              setWaiting(true);
              window.open(paths.signInStart(paths.signedIn), 'colophon-sign-in', 'width=520,height=720');
            }}
          >
            Sign in in a new window
          </Button>
        </>
      }
    >
      <p className="quiet">Your session has ended. Nothing is lost: what you typed stays on this page and on this computer. Sign in in another window, then go on here.</p>
      {fault ? <div className="mt-3"><FieldFault>{fault}</FieldFault></div> : null}
    </Dialog>
  );
}
