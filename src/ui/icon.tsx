/** Drawn for this product; always beside a word. */
const drawings = {
  find: <><circle cx="7" cy="7" r="4.5" /><path d="M10.5 10.5 14 14" /></>,
  grip: <path d="M5 4h.01M5 8h.01M5 12h.01M10 4h.01M10 8h.01M10 12h.01" strokeWidth="2" />,
  plus: <path d="M8 3v10M3 8h10" />,
  close: <path d="m4 4 8 8M12 4l-8 8" />,
  down: <path d="m4 6 4 4 4-4" />,
  right: <path d="m6 4 4 4-4 4" />,
  up: <path d="m4 10 4-4 4 4" />,
  sheet: <path d="M4 2h6l3 3v9H4zM10 2v3h3M6 8h5M6 11h5" />,
  lock: <path d="M3.5 7.5h9V14h-9zM5.5 7.5V5a2.5 2.5 0 0 1 5 0v2.5" />,
  scale: <path d="M2 13h12M8 13V9M3 9h10l-1-4H4zM8 5V3" />,
  label: <path d="M2 3h12v10H2zM4 6h5M4 8h8M4 10h6" />,
  clock: <><circle cx="8" cy="8" r="6" /><path d="M8 4.5V8l2.5 1.5" /></>,
  turn: <path d="M3 8c0-2 2.2-3 5-3s5 1 5 3-2.2 3-5 3M9.5 9 8 11l2 1.6" />,
  undo: <path d="M3 6h6.5a3.5 3.5 0 0 1 0 7H6M5.5 3.5 3 6l2.5 2.5" />,
  redo: <path d="M13 6H6.5a3.5 3.5 0 0 0 0 7H10M10.5 3.5 13 6l-2.5 2.5" />,
  check: <path d="m3 8.5 3.3 3.3L13 5" />,
  copy: <path d="M5.5 5.5h8v8h-8zM10.5 5.5v-3h-8v8h3" />,
  away: <path d="M3 5h10M6 5V3h4v2M4.5 5l.7 8.500h5.600L11.500 5M7 7.500v3.500M9 7.500v3.500" />,
  download: <path d="M8 2.5v8M4.500 7.500 8 11l3.500-3.500M3 13.500h10" />,
  upload: <path d="M8 11V3M4.500 6.500 8 3l3.500 3.500M3 13.500h10" />,
  rooms: <path d="M2.500 4h11M2.500 8h11M2.500 12h7" />,
} as const;
export type IconName = keyof typeof drawings;

export function Icon({ name, className = '' }: { name: IconName; className?: string }) {
  return (
    <svg className={`icon ${className}`} viewBox="0 0 16 16" aria-hidden="true">
      {drawings[name]}
    </svg>
  );
}
