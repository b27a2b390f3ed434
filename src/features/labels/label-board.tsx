import { useEffect, useRef, useState, type KeyboardEvent, type ReactNode } from 'react';
import type { Misfit } from '#shared/artwork/misfits.ts';
import { plexMetrics } from '#shared/artwork/plex-metrics.ts';
import { inMillimetres } from '#shared/artwork/lengths.ts';
import type { Box, Scene } from '#shared/artwork/scene.ts';
import { inkBox } from '#shared/artwork/verify.ts';
import { LabelArt, pathData } from './label-art.tsx';

export interface Shown {
  readonly die: boolean;
  readonly bleed: boolean;
  readonly panels: boolean;
  readonly rings: boolean;
}
export interface LabelBoardProps {
  readonly scene: Scene;
  readonly misfits: readonly Misfit[];
  readonly shown: Shown;
  /** Pixels per millimetre at true size. */
  readonly pixelsPerMm: number;
  /** 1 is true size; 0 fits the board. */
  readonly zoom: number;
  /** Laid over the label; `px` is the millimetres of one pixel. */
  readonly over?: (px: number) => ReactNode;
  readonly onKeyDown?: (event: KeyboardEvent) => void;
  /** A press on nothing. */
  readonly onEmptyPress?: () => void;
}

const PAD = 12;
const RULER = 8;

/** Width of the board in pixels, followed as the window changes. */
function useWidth(): [React.RefObject<HTMLDivElement | null>, number] {
  const ref = useRef<HTMLDivElement>(null);
  const [width, setWidth] = useState(900);
  useEffect(() => {
    const board = ref.current;
    if (!board || typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(() => setWidth(board.clientWidth));
    observer.observe(board);
    return () => observer.disconnect();
  }, []);
  return [ref, width];
}

/** The label unrolled on the bench, with rulers, cut line, bleed, panels and rings. */
export function LabelBoard({ scene, misfits, shown, pixelsPerMm, zoom, over, onKeyDown, onEmptyPress }: LabelBoardProps) {
  const [ref, width] = useWidth();
  const [W, H, bleed] = [scene.trim.width / 1000, scene.trim.height / 1000, scene.bleed / 1000];
  const need = W + 2 * bleed + 2 * PAD + RULER;
  const scale = zoom === 0 ? Math.max(0.5, width / need) : pixelsPerMm * zoom;
  const across = Math.max(need, width / scale);
  const left = -bleed - PAD - RULER - (across - need) / 2;
  const top = -bleed - PAD - 2;
  const down = H + 2 * bleed + 2 * PAD + 2;
  const px = 1 / scale;
  const percent = Math.round((scale / pixelsPerMm) * 100);
  return (
    // The board scrolls sideways when the label is wider than the window: the keyboard must reach it.
    // While it is composed by hand, its keys move what is chosen.
    // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex, jsx-a11y/no-noninteractive-element-interactions
    <div className="board" ref={ref} tabIndex={0} role="region" aria-label={`Label, unrolled, at ${percent} % of true size`} onKeyDown={onKeyDown} onPointerDown={onEmptyPress}>
      <svg width={across * scale} height={down * scale} viewBox={`${left} ${top} ${across} ${down}`}>
        <LabelArt scene={scene} bleed={shown.bleed} />
        {shown.bleed ? <Bleed scene={scene} W={W} H={H} bleed={bleed} px={px} /> : null}
        {shown.panels ? <Panels scene={scene} px={px} bleed={bleed} /> : null}
        {shown.die ? <path d={pathData(scene.dieLine.steps)} fill="none" stroke={scene.dieLine.ink.screen} strokeWidth={Math.max(scene.dieLine.stroke / 1000, px)} /> : null}
        {shown.rings ? <Rings scene={scene} misfits={misfits} px={px} /> : null}
        {over?.(px)}
        <Rulers left={left} top={top} across={across} down={down} px={px} H={H} />
      </svg>
    </div>
  );
}

function Bleed({ scene, W, H, bleed, px }: { scene: Scene; W: number; H: number; bleed: number; px: number }) {
  const corners: readonly (readonly [number, number, number, number])[] = [[0, 0, -1, -1], [W, 0, 1, -1], [0, H, -1, 1], [W, H, 1, 1]];
  return (
    <g>
      <path fillRule="evenodd" fill="var(--tray)" fillOpacity=".62" d={`M${-bleed} ${-bleed}h${W + 2 * bleed}v${H + 2 * bleed}h${-(W + 2 * bleed)}Z${pathData(scene.dieLine.steps)}`} />
      <rect x={-bleed} y={-bleed} width={W + 2 * bleed} height={H + 2 * bleed} fill="none" stroke="var(--edge)" strokeWidth={px} strokeDasharray={`${3 * px} ${3 * px}`} />
      <path stroke="var(--ink)" strokeWidth={px} d={corners.map(([x, y, a, b]) => `M${x + a * (bleed + 1)} ${y}h${a * 5}M${x} ${y + b * (bleed + 1)}v${b * 5}`).join('')} />
    </g>
  );
}

function Panels({ scene, px, bleed }: { scene: Scene; px: number; bleed: number }) {
  const H = scene.trim.height / 1000;
  const overlap = scene.overlap / 1000;
  const W = scene.trim.width / 1000;
  const stacked = scene.panels.every((panel) => panel.x === 0) && scene.panels.length > 1;
  const y = -bleed - 3.6;
  const size = 12 * px;
  return (
    <g>
      {overlap > 0 && scene.shape === 'cylinder' ? <rect x={W - overlap} width={overlap} height={H} fill="#6F7E77" fillOpacity=".13" /> : null}
      {scene.panels.map((panel) => {
        const [a, b] = [panel.x / 1000, (panel.x + panel.width) / 1000];
        const words = panel.name === 'Front' ? `Front, ${inMillimetres(panel.width)} mm` : panel.name;
        const half = words.length * size * 0.28;
        return (
          <g key={panel.name} fill="none" stroke="#6F7E77" strokeWidth={px}>
            <path d={stacked ? `M0 ${(panel.y + panel.height) / 1000}H${W}` : `M${a} 0V${H}M${b} 0V${H}`} strokeDasharray={`${2 * px} ${3 * px}`} />
            {stacked || half * 2 > b - a ? null : (
              <>
                <path d={`M${a} ${y - 1}v2M${b} ${y - 1}v2M${a} ${y}H${b}`} stroke="var(--edge)" />
                <rect x={(a + b) / 2 - half} y={y - size * 0.7} width={half * 2} height={size * 1.4} fill="var(--tray)" stroke="none" />
                <text x={(a + b) / 2} y={y + size * 0.35} textAnchor="middle" fontSize={size} fill="var(--ink-2)" stroke="none">{words}</text>
              </>
            )}
          </g>
        );
      })}
    </g>
  );
}

function unionOf(boxes: readonly Box[]): Box | null {
  if (boxes.length === 0) return null;
  const x = Math.min(...boxes.map((box) => box.x));
  const y = Math.min(...boxes.map((box) => box.y));
  return { x, y, width: Math.max(...boxes.map((box) => box.x + box.width)) - x, height: Math.max(...boxes.map((box) => box.y + box.height)) - y };
}

/** What has no place is ringed where it stands, with what is missing. */
function Rings({ scene, misfits, px }: { scene: Scene; misfits: readonly Misfit[]; px: number }) {
  const size = 12 * px;
  return misfits.filter((misfit, index) => misfits.findIndex((other) => other.element === misfit.element) === index).map((misfit) => {
    const box = unionOf(scene.items.filter((item) => item.element === misfit.element).flatMap((item) => inkBox(item, { metrics: plexMetrics }) ?? []));
    if (!box) return null;
    const [x, y, w, h] = [box.x, box.y, box.width, box.height].map((figure) => figure / 1000) as [number, number, number, number];
    const words = misfit.direction === 'place' ? (misfit.missing > 0 ? `${inMillimetres(misfit.missing)} mm in the way` : 'dark on dark') : misfit.missing > 0 ? `needs ${inMillimetres(misfit.missing)} mm more ${misfit.direction}` : 'letters missing';
    const length = words.length * size * 0.54;
    return (
      <g key={misfit.element}>
        <rect x={x - 1.6} y={y - 1.6} width={w + 3.2} height={h + 3.2} rx="3" fill="none" stroke="var(--slip-amber)" strokeWidth={1.5 * px} />
        <rect x={x - 1.6} y={y + h + 1.6} width={length + size} height={size * 1.4} fill="#FBEED5" />
        <text x={x - 1.6 + size / 2} y={y + h + 1.6 + size} fontSize={size} fontWeight="500" fill="#8A5200">{words}</text>
      </g>
    );
  });
}

function Rulers({ left, top, across, down, px, H }: { left: number; top: number; across: number; down: number; px: number; H: number }) {
  const deep = Math.max(6.2, 24 * px);
  const wide = Math.max(RULER, 30 * px);
  const [y, x] = [top + deep, left + wide];
  const tick = (i: number): number => (i % 10 === 0 ? 3 : i % 5 === 0 ? 2 : 1.1) * Math.min(1, deep / 6.2);
  const range = (from: number, to: number): number[] => Array.from({ length: Math.max(0, Math.floor(to) - Math.ceil(from) + 1) }, (_, i) => Math.ceil(from) + i);
  // Where a millimetre is less than three pixels only every fifth is drawn.
  const step = px > 0.34 ? 5 : 1;
  const every = px > 0.34 ? 20 : 10;
  const columns = range(x, left + across).filter((i) => i % step === 0);
  const rows = range(y, top + down).filter((i) => i % step === 0);
  const size = 11 * px;
  return (
    <g aria-hidden="true">
      <rect x={left} y={top} width={across} height={deep} fill="var(--paper)" />
      <rect x={left} y={top} width={wide} height={down} fill="var(--paper)" />
      <path stroke="var(--edge)" strokeWidth={px} fill="none" d={`M${left} ${y}H${left + across}M${x} ${top}V${top + down}${columns.map((i) => `M${i} ${y}v${-tick(i)}`).join('')}${rows.map((i) => `M${x} ${i}h${-tick(i)}`).join('')}`} />
      <g fill="var(--ink-2)" fontSize={size}>
        {columns.filter((i) => i % every === 0 && i > x + 2).map((i) => <text key={i} x={i + 0.6} y={y - deep * 0.52} textAnchor="middle">{i}</text>)}
        {rows.filter((i) => i % every === 0 && i >= 0 && i <= H).map((i) => <text key={i} x={x - 3.4} y={i + size * 0.35} textAnchor="end">{i}</text>)}
        <text x={left + px * 4} y={y - deep * 0.3}>mm</text>
      </g>
    </g>
  );
}
