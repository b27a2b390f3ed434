/** A paper's life on a scale of years: a year back, two and a half ahead. */
const DAY = 86_400_000;
const at = (day: string) => Date.parse(`${day}T00:00:00Z`);

function span(now: string): { from: number; to: number; years: number[] } {
  const year = Number(now.slice(0, 4));
  return { from: Date.UTC(year - 1, 0, 1), to: Date.UTC(year + 3, 0, 1), years: [year - 1, year, year + 1, year + 2] };
}
function placeIn(now: string) {
  const { from, to } = span(now);
  return (day: string) => `${Math.max(0, Math.min(100, ((at(day) - from) / (to - from)) * 100))}%`;
}

/** Within thirty days, or past. */
export function endsSoon(runsOut: string, now: string): boolean {
  return at(runsOut) - at(now) <= 30 * DAY;
}

export function LifeAxis({ now }: { now: string }) {
  const x = placeIn(now);
  return (
    <svg className="life-axis" aria-hidden="true">
      {span(now).years.map((year) => (
        <g key={year}>
          <text x={x(`${year}-01-01`)} dx="3" y="12" fontSize="12" fill="var(--ink-2)">{year}</text>
          <line x1={x(`${year}-01-01`)} x2={x(`${year}-01-01`)} y1="2" y2="16" stroke="var(--edge)" />
        </g>
      ))}
    </svg>
  );
}

export function LifeLine({ dated, runsOut, now }: { dated: string | null; runsOut: string | null; now: string }) {
  const x = placeIn(now);
  const isSoon = runsOut !== null && endsSoon(runsOut, now);
  const colour = isSoon ? 'var(--amber)' : 'var(--ink-2)';
  return (
    <svg className="life-line" aria-hidden="true">
      {dated ? <line x1={x(dated)} x2={runsOut ? x(runsOut) : '100%'} y1="10" y2="10" stroke={colour} strokeWidth="4" strokeDasharray={runsOut ? undefined : '2 3'} /> : null}
      {runsOut ? <line x1={x(runsOut)} x2={x(runsOut)} y1="4" y2="16" stroke={colour} strokeWidth="2" /> : null}
      <line x1={x(now)} x2={x(now)} y1="-9" y2="29" stroke="var(--bottle)" strokeWidth="1.5" />
    </svg>
  );
}
