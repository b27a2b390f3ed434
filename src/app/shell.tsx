import { Suspense, lazy, useState } from 'react';
import { Outlet, ScrollRestoration, useNavigation } from 'react-router-dom';
import { useOnline } from '#src/lib/online.ts';
import { Announcer } from '#src/ui/announcer.tsx';
import { ToastProvider } from '#src/ui/toast.tsx';
import { VerdictMark } from '#src/ui/verdict-mark.tsx';
import { GlassBar } from './glass-bar.tsx';
import { useEntrance } from './use-entrance.ts';
import { useFindKey } from './use-find-key.ts';
import { useSessionEnded } from './use-session-ended.ts';

const Palette = lazy(() => import('./palette.tsx').then((module) => ({ default: module.Palette })));
const SessionEndedDialog = lazy(() => import('#src/features/session/session-ended-dialog.tsx').then((module) => ({ default: module.SessionEndedDialog })));

/** What stands around every room: the bar, the notices, the palette. */
export function Shell() {
  const [finding, setFinding] = useState(false);
  const ended = useSessionEnded();
  const busy = useNavigation().state !== 'idle';
  useEntrance();
  useFindKey(() => setFinding(true));
  return (
    <ToastProvider>
      <GlassBar onFind={() => setFinding(true)} />
      <OfflineNotice />
      <main id="main" className="page" tabIndex={-1} aria-busy={busy || undefined}>
        <Outlet />
      </main>
      <Announcer />
      <Suspense fallback={null}>
        {finding ? <Palette onClose={() => setFinding(false)} /> : null}
        {ended.has ? <SessionEndedDialog onSignedIn={ended.forget} /> : null}
      </Suspense>
      <ScrollRestoration />
    </ToastProvider>
  );
}

function OfflineNotice() {
  if (useOnline()) return null;
  return (
    <div className="offline" role="status">
      <div className="wrap">
        <VerdictMark weight="decide" silent />
        <span><b>No connection.</b> Go on working: what you type is kept on this computer and saved when the connection is back.</span>
      </div>
    </div>
  );
}
