import { useEffect } from 'react';
import { paths } from '#src/app/paths.ts';
import { Banner } from '#src/ui/banner.tsx';
import './sign-in.css';

const PROBLEMS: Readonly<Record<string, string>> = {
  refused: 'The sign-in was not finished. Try once more.',
  'no-house': 'You are known, but no house has you as a member yet. Ask an owner to add you.',
  expired: 'The sign-in took too long and was set aside. Begin again.',
};

/** One button: the house's identity service knows who one is. */
export function SignInSheet({ to, problem }: { to: string; problem: string | null }) {
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
        {problem ? <Banner weight="decide" title="Not signed in.">{PROBLEMS[problem] ?? PROBLEMS.refused}</Banner> : null}
        <a className="btn act" href={paths.signInStart(back)}>Sign in through your house</a>
        <hr />
        <p className="small">Your house’s identity service asks who you are; Colophon never sees a password.</p>
        <p className="small">Colophon advises; it does not certify. Who places a product on the market stays responsible for it.</p>
      </div>
    </main>
  );
}
