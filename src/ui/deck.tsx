import { useEffect, useRef } from 'react';
import type { ReactNode } from 'react';
import { Link, NavLink, useLocation } from 'react-router-dom';

export interface DeckProps {
  readonly title: string;
  /** Short facts above the title, parted by hairlines. */
  readonly facts?: readonly ReactNode[];
  /** Saved state and buttons at the right. */
  readonly acts?: ReactNode;
  /** Between the head and the tabs: the as-of sentence of a product. */
  readonly children?: ReactNode;
  readonly tabs?: ReactNode;
  /** The title of the browser's window; the title itself when absent. */
  readonly windowTitle?: string;
}

/** The page head, etched on the glass. Its title takes the focus when the page is entered. */
export function Deck({ title, facts = [], acts, children, tabs, windowTitle = title }: DeckProps) {
  return (
    <div className={`deck ${tabs ? 'has-tabs' : ''}`}>
      <WindowTitle title={windowTitle} />
      <div className="wrap deck-head">
        <div className="deck-line">
          <div>
            {facts.length > 0 ? <p className="facts">{facts.map((fact, index) => <span key={index}>{fact}</span>)}</p> : null}
            <h1 tabIndex={-1} data-page-title>{title}</h1>
          </div>
          {acts ? <div className="acts">{acts}</div> : null}
        </div>
      </div>
      {children}
      {tabs ? <div className="wrap">{tabs}</div> : null}
    </div>
  );
}

function WindowTitle({ title }: { title: string }) {
  useEffect(() => {
    document.title = `${title} · Colophon`;
  }, [title]);
  return null;
}

export interface TabLink {
  readonly to: string;
  readonly word: string;
  readonly mark?: ReactNode;
  /** Only this very address, not what lies below it. */
  readonly end?: boolean;
  /** Said by the caller where the address alone does not tell: tabs that differ in their search. */
  readonly isCurrent?: boolean;
}
/** Words on the sheet's own edge, each its own address. */
export function TabLinks({ tabs, label }: { tabs: readonly TabLink[]; label: string }) {
  const row = useRef<HTMLElement>(null);
  const { key } = useLocation();
  // On a phone the row runs on past the edge: the tab one is on has to be in sight.
  useEffect(() => {
    const [nav, current] = [row.current, row.current?.querySelector<HTMLElement>('[aria-current="page"]')];
    if (!nav || !current) return;
    const past = current.offsetLeft + current.offsetWidth - (nav.offsetLeft + nav.clientWidth);
    if (past > nav.scrollLeft) nav.scrollLeft = past + 16;
  }, [key]);
  return (
    <nav className="tabs" aria-label={label} ref={row}>
      {tabs.map((tab) =>
        tab.isCurrent === undefined ? (
          <NavLink key={tab.to} to={tab.to} end={tab.end} preventScrollReset>{tab.word}{tab.mark}</NavLink>
        ) : (
          <Link key={tab.to} to={tab.to} aria-current={tab.isCurrent ? 'page' : undefined} preventScrollReset>{tab.word}{tab.mark}</Link>
        ),
      )}
    </nav>
  );
}
