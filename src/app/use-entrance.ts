import { useEffect, useRef } from 'react';
import { useLocation } from 'react-router-dom';
import { announce } from '#src/ui/announcer.tsx';

/** On entering another page: its title takes the focus and is read out. Not on the first load, and not for filters. */
export function useEntrance(): void {
  const { pathname } = useLocation();
  const before = useRef(pathname);
  useEffect(() => {
    if (before.current === pathname) return;
    const isTab = sameThing(before.current, pathname);
    before.current = pathname;
    const title = document.querySelector<HTMLElement>('[data-page-title]');
    announce(document.title.replace(' · Colophon', ''));
    // Between the tabs of one thing the focus stays on the tab.
    if (!isTab) title?.focus({ preventScroll: true });
  }, [pathname]);
}

/** `/products/7` and `/products/7/label`, or two materials beside the same list. */
function sameThing(from: string, to: string): boolean {
  const [, room, id] = from.split('/');
  const [, nextRoom, nextId] = to.split('/');
  return room === nextRoom && room !== '' && (id === nextId || room === 'materials');
}
