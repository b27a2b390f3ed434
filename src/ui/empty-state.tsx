import type { ReactNode } from 'react';

/** Nothing here yet: says what would stand here and how to begin. */
export function EmptyState({ title, children, acts }: { title: string; children: ReactNode; acts?: ReactNode }) {
  return (
    <div className="empty">
      <p><b>{title}</b></p>
      <p className="quiet">{children}</p>
      {acts ? <div className="do">{acts}</div> : null}
    </div>
  );
}
