import { useEffect } from 'react';
import { paths } from '#src/app/paths.ts';
import './sign-in.css';

/** One button: the house's identity service knows who one is. */
export function SignInSheet({ to }: { to: string }) {
  // Only addresses of this app: a link from elsewhere cannot send anyone away after sign-in.
  const back = /^\/(?![/\\])/.test(to) ? to : paths.today;
  useEffect(() => {
    document.title = 'Sign in · Colophon';
  }, []);
  return (
    <main id="main" className="sign-in">
      <div className="sign-in-label">
        <svg viewBox="0 0 18 22" fill="none" stroke="currentColor" strokeWidth="1.25" aria-hidden="true">
          <path d="M1 1h16v20H1z" />
          <path d="M4 5.5h10M4 8.5h7.5M4 11.5h5.5" />
          <path d="M1 14.25h16" strokeWidth="1" />
          <path d="M4 17.5h3M9.5 17.5h1.5" />
        </svg>
        <h1>Colophon</h1>
        <p>From a formula to a lawful, print-ready label, and the evidence behind it.</p>
        <a className="btn act" href={paths.signInStart(back)}>Sign in through your house</a>
        <hr />
        <p className="small">Your house’s identity service asks who you are; Colophon never sees a password.</p>
        <p className="small">Colophon advises; it does not certify. Who places a product on the market stays responsible for it.</p>
      </div>
    </main>
  );
}
