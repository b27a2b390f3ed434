import { memo } from 'react';
import { LOWEST, ladderTicks, leaderPath, type LadderGeometry, type Placed } from './geometry.ts';

export interface PlotProps {
  readonly geometry: LadderGeometry;
  readonly pairs: readonly (readonly [Placed, Placed])[];
  readonly lit: ReadonlySet<string>;
  readonly onLight: (key: string | null) => void;
  readonly hatchId: string;
}

/** The drawing itself; those who read rather than look have the rows and the table. */
export function Plot({ geometry, pairs, lit, onLight, hatchId }: PlotProps) {
  return (
    <svg className="plot" viewBox={`0 0 ${geometry.width} ${geometry.height}`} aria-hidden="true">
      <defs>
        <pattern id={hatchId} width="4" height="4" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <rect width="4" height="4" fill="var(--amber-wash)" />
          <path d="M0 0V4" stroke="var(--amber)" strokeWidth="1.2" />
        </pattern>
      </defs>
      <Ground geometry={geometry} />
      {pairs.map(([a, b]) => (
        <Overlap key={`${a.rung.key}|${b.rung.key}`} geometry={geometry} a={a} b={b} hatchId={hatchId} />
      ))}
      {geometry.rungs.map((placed) => (
        <Leader key={placed.rung.key} path={leaderPath(geometry, placed)} isLit={lit.has(placed.rung.key)} isUnsure={placed.rung.isUnsure} />
      ))}
      {geometry.rungs.map((placed) => (
        <RungMark key={placed.rung.key} geometry={geometry} placed={placed} isLit={lit.has(placed.rung.key)} onLight={onLight} />
      ))}
    </svg>
  );
}

/** Axis, ticks, the ground of the free zone and the lines of law. */
const Ground = memo(function Ground({ geometry }: { geometry: LadderGeometry }) {
  const { axis, width, rowLeft, yOf } = geometry;
  const zone = geometry.lines.find((each) => each.line.weight === 'zone');
  const floor = geometry.lines.find((each) => each.line.weight !== 'zone');
  const bend = (y: number, yRight: number) => `H${rowLeft - 14}L${rowLeft} ${yRight}H${width}`.replace(/^/, `M${axis} ${y}`);
  const bottom = floor ?? { y: yOf(LOWEST), yRight: geometry.keyTop - 8 };
  return (
    <>
      {zone ? (
        <path d={`${bend(zone.y, zone.yRight)}V${bottom.yRight}H${rowLeft}L${rowLeft - 14} ${bottom.y}H${axis}Z`} fill="var(--tray)" />
      ) : null}
      {ladderTicks(yOf).map((tick, index) => {
        const y = Math.round(tick.y) + 0.5;
        return (
          <g key={index}>
            <path d={`M${axis} ${y}h${tick.length}`} stroke={tick.label ? 'var(--ink)' : 'var(--edge)'} />
            {tick.label ? (
              <text x={axis - 6} y={y + 4} textAnchor="end" className={tick.label === '1' ? 'one' : ''}>
                {tick.label}
              </text>
            ) : null}
          </g>
        );
      })}
      <path d={`M${axis + 0.5} ${yOf(100)}V${yOf(LOWEST)}`} stroke="var(--ink)" />
      {geometry.lines.map(({ line, y, yRight }) => (
        <path
          key={line.id}
          d={bend(Math.round(y) + 0.5, Math.round(yRight) + 0.5)}
          fill="none"
          stroke={line.weight === 'zone' ? 'var(--bottle)' : line.weight === 'binding' ? 'var(--ink-2)' : 'var(--edge)'}
          strokeWidth={line.weight === 'zone' ? 1.5 : 1}
          strokeDasharray={line.weight === 'zone' ? undefined : line.weight === 'binding' ? '6 3' : '1 4'}
        />
      ))}
    </>
  );
});

/** Amber hatching where the order of two neighbours rests on a range. */
function Overlap({ geometry, a, b, hatchId }: { geometry: LadderGeometry; a: Placed; b: Placed; hatchId: string }) {
  const left = Math.min(a.x, b.x) - geometry.step / 2;
  const right = Math.max(a.x, b.x) + geometry.step / 2;
  const top = Math.min(a.y, b.y, geometry.yOf(Math.min(a.rung.max, b.rung.max))) - 5;
  const foot = Math.max(a.y, b.y, geometry.yOf(Math.max(a.rung.min, b.rung.min))) + 5;
  return <rect x={left} y={top} width={right - left} height={foot - top} fill={`url(#${hatchId})`} stroke="var(--amber)" />;
}

const Leader = memo(function Leader({ path, isLit, isUnsure }: { path: string; isLit: boolean; isUnsure: boolean }) {
  const stroke = isLit ? 'var(--bottle)' : isUnsure ? 'var(--amber)' : 'var(--hair)';
  return <path d={path} fill="none" stroke={stroke} strokeWidth={isLit ? 1.5 : 1} />;
});

interface RungMarkProps {
  readonly geometry: LadderGeometry;
  readonly placed: Placed;
  readonly isLit: boolean;
  readonly onLight: (key: string | null) => void;
}
/** Four marks, four meanings: solid rung, whisker, thin tick, hollow rung. */
const RungMark = memo(function RungMark({ geometry, placed, isLit, onLight }: RungMarkProps) {
  const { rung, x, y, half, yMax, yMin, isCut } = placed;
  const ink = isLit ? 'var(--bottle)' : rung.isUnsure ? 'var(--amber)' : rung.isInside ? 'var(--ink-2)' : 'var(--ink)';
  const cap = Math.min(3, half);
  const shown = rung.parts.length > 1 ? rung.parts.filter((part) => part.share >= LOWEST) : [];
  const lowestPart = Math.min(...shown.map((part) => part.share));
  return (
    <g onPointerEnter={() => onLight(rung.key)} onPointerLeave={() => onLight(null)}>
      {rung.max > rung.min ? (
        <path
          d={`M${x} ${yMax}V${yMin}M${x - cap} ${yMax}h${cap * 2}${isCut ? `M${x - cap} ${yMin - 4}l${cap} 4 ${cap}-4` : `M${x - cap} ${yMin}h${cap * 2}`}`}
          fill="none"
          stroke={ink}
          strokeWidth="1.5"
        />
      ) : null}
      {shown.map((part) => (
        <path key={part.line} d={`M${x - half} ${geometry.yOf(part.share)}h${half * 2}`} stroke={ink} />
      ))}
      {shown.length > 0 ? <path d={`M${x} ${y}V${geometry.yOf(lowestPart)}`} stroke="var(--edge)" strokeDasharray="1 2" /> : null}
      <rect
        x={x - half}
        y={y - 2.5}
        width={half * 2}
        height="5"
        fill={rung.isInside ? 'var(--paper)' : ink}
        stroke={rung.isInside ? ink : 'none'}
        strokeWidth="1.25"
      />
      <rect x={x - geometry.step / 2} y={yMax - 8} width={geometry.step} height={Math.min(40, yMin - yMax) + 16} fill="transparent" />
    </g>
  );
});
