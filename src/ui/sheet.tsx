import { useId } from 'react';
import type { ReactNode } from 'react';

/** White paper on the bench; its panels are parted by hairlines. */
export function Sheet({ children, className = '' }: { children: ReactNode; className?: string }) {
  return <div className={`sheet ${className}`}>{children}</div>;
}

export interface PanelProps {
  readonly title: ReactNode;
  /** Small words beside the title. */
  readonly aside?: ReactNode;
  /** Links and buttons at the right end of the head. */
  readonly end?: ReactNode;
  readonly children: ReactNode;
  readonly className?: string;
  readonly id?: string;
}
/** One part of a sheet, named by its head. */
export function Panel({ title, aside, end, children, className = '', id }: PanelProps) {
  const headId = useId();
  return (
    <section className={`panel ${className}`} aria-labelledby={headId} id={id}>
      <div className="panel-head">
        <h2 id={headId}>{title}</h2>
        {aside ? <span className="quiet">{aside}</span> : null}
        {end ? <span className="end">{end}</span> : null}
      </div>
      {children}
    </section>
  );
}
