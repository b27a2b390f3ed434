import type { ReactNode } from 'react';
import { VerdictMark } from './verdict-mark.tsx';
import type { VerdictWeight } from './verdict-mark.tsx';

/** A note in its place: what is wrong or worth knowing here, and what can be done at once. */
export function Banner({ weight, title, children, acts }: { weight: VerdictWeight; title: ReactNode; children?: ReactNode; acts?: ReactNode }) {
  return (
    <div className={`banner ${weight}`} role={weight === 'stop' ? 'alert' : 'status'}>
      <VerdictMark weight={weight} />
      <div>
        <b>{title}</b> {children}
        {acts ? <div className="do">{acts}</div> : null}
      </div>
    </div>
  );
}
