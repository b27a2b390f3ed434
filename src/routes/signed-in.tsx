import { useEffect } from 'react';

/** Where the window of a second sign-in ends: it closes itself, or says that it may be closed. */
export function Component() {
  useEffect(() => {
    document.title = 'Signed in · Colophon';
    window.close();
  }, []);
  return (
    <main id="main" className="wrap py-12">
      <h1>You are signed in</h1>
      <p className="mt-2 text-15">Close this window and go on where you were.</p>
    </main>
  );
}
