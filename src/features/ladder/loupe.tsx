import { findLoupeSpot, type LadderGeometry, type Rung } from './geometry.ts';
import { layLoupe } from './loupe-geometry.ts';

/** The doubtful pair on a straight scale of its own, where the rows leave room. */
export function Loupe({ geometry, pair, hatchId }: { geometry: LadderGeometry; pair: readonly [Rung, Rung]; hatchId: string }) {
  const spot = findLoupeSpot(geometry);
  if (!spot) return null;
  const { bars, shared, ticks } = layLoupe(pair, spot.width);
  return (
    <svg className="loupe" aria-hidden="true" width={spot.width} height="76" style={{ left: spot.left, top: spot.top }}>
      <rect x={shared.from} y="19" width={shared.width} height="29" fill={`url(#${hatchId})`} />
      <path d={`M4 51.5H${spot.width - 4}`} stroke="var(--edge)" />
      {ticks.map((tick) => (
        <g key={tick.x}>
          <path d={`M${tick.x.toFixed(1)} 52v${tick.label ? 7 : 4}`} stroke="var(--edge)" />
          {tick.label ? <text x={tick.x} y="71" textAnchor="middle">{tick.label}</text> : null}
        </g>
      ))}
      {bars.map((bar) => (
        <g key={bar.key}>
          {bar.isRange ? <path d={`M${bar.from} ${bar.y}H${bar.to}M${bar.from} ${bar.y - 4}v8M${bar.to} ${bar.y - 4}v8`} stroke="var(--ink)" strokeWidth="1.5" fill="none" /> : null}
          <rect x={bar.at - 2.5} y={bar.y - 6} width="5" height="12" fill="var(--ink)" />
          <text x={bar.labelX} y={bar.labelY} textAnchor={bar.anchor} className="halo">{bar.name}</text>
        </g>
      ))}
    </svg>
  );
}
