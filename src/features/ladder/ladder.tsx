import { memo, useId, useLayoutEffect, useMemo, useRef, useState } from 'react';
import { layLadder, type LadderGeometry, type LawLine, type Rung } from './geometry.ts';
import { LadderRows } from './ladder-rows.tsx';
import { Loupe } from './loupe.tsx';
import { Plot } from './plot.tsx';
import './ladder.css';

export interface LadderProps {
  readonly rungs: readonly Rung[];
  readonly lines: readonly LawLine[];
  /** Pairs whose order rests on a range, as keys. */
  readonly pairs: readonly (readonly [string, string])[];
  readonly lit: ReadonlySet<string>;
  readonly onLight: (key: string | null) => void;
  /** Moves a free rung to a place within the free zone; absent where nothing may be changed. */
  readonly onMove?: (key: string, place: number) => void;
  readonly onOpen?: (key: string) => void;
}

/** Width of an element, followed as it changes; `fallback` where nothing measures (print, tests). */
function useWidth(fallback: number) {
  const ref = useRef<HTMLDivElement>(null);
  const [width, setWidth] = useState(fallback);
  useLayoutEffect(() => {
    const element = ref.current;
    if (!element) return;
    const measure = () => setWidth((before) => Math.round(element.clientWidth) || before);
    measure();
    if (typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return { ref, width };
}

/** The concentration ladder: every ingredient at its share on a logarithmic scale, with the lines of law across. */
export const Ladder = memo(function Ladder({ rungs, lines, pairs, lit, onLight, onMove, onOpen }: LadderProps) {
  const { ref, width } = useWidth(560);
  const hatchId = useId().replaceAll(':', '');
  const geometry: LadderGeometry = useMemo(() => layLadder(rungs, lines, width), [rungs, lines, width]);
  const placedPairs = useMemo(
    () =>
      pairs.flatMap(([a, b]) => {
        const first = geometry.rungs.find((each) => each.rung.key === a);
        const second = geometry.rungs.find((each) => each.rung.key === b);
        return first && second ? [[first, second] as const] : [];
      }),
    [pairs, geometry],
  );
  return (
    <div className={`ladder ${width < 420 ? 'narrow' : ''}`} ref={ref} style={{ height: geometry.height }}>
      <Plot geometry={geometry} pairs={placedPairs} lit={lit} onLight={onLight} hatchId={hatchId} />
      <LadderRows geometry={geometry} lit={lit} onLight={onLight} onMove={onMove} onOpen={onOpen} />
      {geometry.lines.map((placed) => (
        <Caption key={placed.line.id} geometry={geometry} line={placed.line} y={placed.y} yRight={placed.yRight} />
      ))}
      {placedPairs[0] ? <Loupe geometry={geometry} pair={[placedPairs[0][0].rung, placedPairs[0][1].rung]} hatchId={hatchId} /> : null}
      <LadderKey top={geometry.keyTop} width={geometry.rowWidth - 4} />
    </div>
  );
});

function Caption({ geometry, line, y, yRight }: { geometry: LadderGeometry; line: LawLine; y: number; yRight: number }) {
  if (line.weight === 'zone') {
    if (geometry.width < 420) return null;
    return (
      <span className="cap zone" style={{ top: y + 7, left: geometry.axis + 10 }}>
        <b>{line.caption}</b>
        <br />
        any order
      </span>
    );
  }
  return <span className="cap" style={{ top: yRight + 2, right: 0, maxWidth: geometry.width - geometry.axis - 12 }}>{line.caption}</span>;
}

function LadderKey({ top, width }: { top: number; width: number }) {
  return (
    <div className="ladder-key" style={{ top, width }}>
      <svg viewBox="0 0 24 16" aria-hidden="true">
        <path d="M12 1v14M9 1h6M9 15h6" stroke="var(--ink)" strokeWidth="1.5" />
        <rect x="6" y="6" width="12" height="4" fill="var(--ink)" />
      </svg>
      <span>share, and the supplier’s range</span>
      <svg viewBox="0 0 24 16" aria-hidden="true">
        <path d="M12 3v10" stroke="var(--edge)" strokeDasharray="1 2" />
        <path d="M6 3.5h12M6 12.5h12" stroke="var(--ink)" />
      </svg>
      <span>what each material brings</span>
      <svg viewBox="0 0 24 16" aria-hidden="true">
        <rect x="6" y="5.5" width="12" height="5" fill="var(--paper)" stroke="var(--ink-2)" strokeWidth="1.25" />
      </svg>
      <span>inside an oil, named as allergen</span>
    </div>
  );
}
