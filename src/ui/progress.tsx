/** Progress on the measuring rule: `done` of `all`, with words for those who hear it. */
export function Progress({ done, all, label, ticks = 20 }: { done: number; all: number; label: string; ticks?: number }) {
  const share = all > 0 ? Math.min(1, done / all) : 0;
  const marks = Array.from({ length: ticks + 1 }, (_, index) => index);
  return (
    <div className="progress" role="progressbar" aria-label={label} aria-valuemin={0} aria-valuemax={all} aria-valuenow={done}>
      <svg aria-hidden="true">
        <rect width={`${share * 100}%`} y="4" height="9" fill="var(--bottle)" />
        {marks.map((index) => (
          <line key={index} x1={`${(index / ticks) * 100}%`} x2={`${(index / ticks) * 100}%`} y1="14" y2={index % 5 === 0 ? 24 : 19} stroke="var(--edge)" />
        ))}
        <line x1="0" x2="100%" y1="13.5" y2="13.5" stroke="var(--ink)" />
      </svg>
    </div>
  );
}
