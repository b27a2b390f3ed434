import { scaleLinear } from 'd3-scale';
import type { Severity } from '#shared/engine/types.ts';

export interface GaugeProps {
  readonly measured: string;
  readonly range?: { readonly min: string; readonly max: string };
  readonly limit: string;
  readonly unit: string;
  readonly severity: Severity;
}

const WIDTH = 300;
const COLOUR: Readonly<Record<Severity, string>> = { stop: 'var(--stop)', decide: 'var(--amber)', note: 'var(--ink-2)' };

/** The measured share against its limit, on a measuring rule. */
export function Gauge({ measured, range, limit, unit, severity }: GaugeProps) {
  const value = Number(range?.max ?? measured);
  const most = Number(limit);
  if (!Number.isFinite(value) || !Number.isFinite(most) || (value <= 0 && most <= 0)) return null;
  const scale = scaleLinear().domain([0, Math.max(value, most) * 1.15]).range([0, WIDTH]);
  const anchor = (x: number) => (x > WIDTH - 60 ? 'end' : x < 60 ? 'start' : 'middle');
  return (
    <svg className="gauge" viewBox={`0 0 ${WIDTH} 72`} role="img" aria-label={`${measured} ${unit}, limit ${limit} ${unit}`}>
      <text x={scale(value)} y="12" textAnchor={anchor(scale(value))} fill={COLOUR[severity]} className="strong">{range && range.min !== range.max ? `${range.min} to ${range.max}` : measured} {unit}</text>
      <rect x="0" y="20" width={scale(value)} height="9" fill={COLOUR[severity]} />
      {scale.ticks(20).map((tick, index) => <path key={tick} d={`M${scale(tick)} 30v${index % 5 === 0 ? 9 : 5}`} stroke="var(--edge)" />)}
      <path d={`M0 29.5H${WIDTH}`} stroke="var(--ink)" />
      <path d={`M${scale(most)} 14V44`} stroke="var(--ink)" strokeWidth="2" />
      <text x={scale(most)} y="60" textAnchor={anchor(scale(most))} fill="var(--ink)" className="strong">limit {limit} {unit}</text>
    </svg>
  );
}
