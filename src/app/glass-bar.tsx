import { Link, NavLink } from 'react-router-dom';
import { useSession } from '#src/features/session/queries.ts';
import { useTheme } from '#src/lib/theme.ts';
import { Icon } from '#src/ui/icon.tsx';
import { HouseMenu, RoomsMenu } from './bar-menus.tsx';
import { paths, rooms } from './paths.ts';

const isApple = typeof navigator !== 'undefined' && /Mac|iPhone|iPad/.test(navigator.userAgent);

/** The one dark band: rooms, the palette, the theme, the house. */
export function GlassBar({ onFind }: { onFind: () => void }) {
  const session = useSession();
  const { theme, turn } = useTheme();
  return (
    <header className="glass">
      <a className="skip" href="#main" onClick={(event) => { event.preventDefault(); document.getElementById('main')?.focus(); }}>Go to the content</a>
      <div className="wrap">
        <Link className="brandmark" to={paths.today} aria-label="Colophon, to Today">
          <ColophonMark />
          <span>Colophon</span>
        </Link>
        <RoomsMenu />
        <nav className="rooms" aria-label="Rooms">
          {rooms.map((room) => <NavLink key={room.to} to={room.to} end={room.end}>{room.word}</NavLink>)}
        </nav>
        <div className="end">
          <button type="button" className="find" aria-keyshortcuts="Control+K Meta+K" onClick={onFind}>
            <Icon name="find" />
            <span className="sr-only">Find</span>
            <span>Name, INCI or CAS</span>
            <kbd aria-hidden="true">{isApple ? '⌘ K' : 'Ctrl K'}</kbd>
          </button>
          <button type="button" className="plain" onClick={turn} aria-label={theme === 'dark' ? 'Turn to the light theme' : 'Turn to the dark theme'}>{theme === 'dark' ? 'Light' : 'Dark'}</button>
          <HouseMenu session={session} />
        </div>
      </div>
    </header>
  );
}

/** The product's mark: a page with its colophon at the foot. */
export function ColophonMark() {
  return (
    <svg viewBox="0 0 18 22" fill="none" stroke="currentColor" strokeWidth="1.5" aria-hidden="true">
      <path d="M1 1h16v20H1z" />
      <path d="M4 5.5h10M4 8.5h7.5M4 11.5h5.5" />
      <path d="M1 14.25h16" strokeWidth="1" />
      <path d="M4 17.5h3M9.5 17.5h1.5" />
    </svg>
  );
}
