import { useId, useState } from 'react';
import type { Scene } from '#shared/artwork/scene.ts';
import { LabelArt } from './label-art.tsx';

/** A slice is three pixels wide, so that its edges fall on pixels. */
const SLICE = 3;
/** Each slice reaches a little under the next, so that no seam shows. */
const REACH = 1.08;
const SHOWN = 150;

/** The label on its container: a wrap turned on its bottle, a flat label on its face. */
export function BottleView({ scene, diameterMm }: { scene: Scene; diameterMm: number }) {
  return scene.shape === 'cylinder' && diameterMm > 0 ? <Round scene={scene} diameter={diameterMm} /> : <Face scene={scene} />;
}

function Round({ scene, diameter }: { scene: Scene; diameter: number }) {
  const id = useId().replace(/:/g, '');
  const [W, H] = [scene.trim.width / 1000, scene.trim.height / 1000];
  const round = W - scene.overlap / 1000;
  const [middle, setMiddle] = useState(50);
  const at = (middle / 100) * round + (W - round) / 2;
  const r = diameter / 2;
  const neck = diameter * 0.38;
  const cap = diameter * 0.34;
  const shoulder = diameter * 0.22;
  const foot = diameter * 0.07;
  const tall = cap + shoulder + H + foot * 2;
  const slices = Math.max(12, 2 * Math.floor((diameter * Math.min(240 / tall, SHOWN / diameter)) / SLICE / 2));
  const scale = (slices * SLICE) / diameter;
  const edge = (i: number): number => -r + (i * 2 * r) / slices;
  const along = (x: number): number => at + Math.asin(Math.max(-1, Math.min(1, x / r))) * (round / (2 * Math.PI));
  const y0 = cap + shoulder;
  return (
    <>
      <div className="bottle">
        <svg width={diameter * scale} height={tall * scale} viewBox={`${-r} 0 ${diameter} ${tall}`} role="img" aria-label="The label on its bottle">
          <defs>
            <g id={`${id}-art`}><LabelArt scene={scene} paper={false} /></g>
            <linearGradient id={`${id}-glass`}><stop offset="0" stopColor="#1d0d03" /><stop offset=".14" stopColor="#6b3710" /><stop offset=".3" stopColor="#8a4c19" /><stop offset=".62" stopColor="#5a2d0c" /><stop offset=".9" stopColor="#2a1405" /><stop offset="1" stopColor="#4a2409" /></linearGradient>
            <linearGradient id={`${id}-cap`}><stop offset="0" stopColor="#0a0d0c" /><stop offset=".3" stopColor="#3b4441" /><stop offset=".6" stopColor="#1a201e" /><stop offset="1" stopColor="#070908" /></linearGradient>
            <linearGradient id={`${id}-shade`}><stop offset="0" stopColor="#000" stopOpacity=".55" /><stop offset=".16" stopColor="#000" stopOpacity=".14" /><stop offset=".34" stopColor="#000" stopOpacity="0" /><stop offset=".6" stopColor="#000" stopOpacity=".05" /><stop offset=".86" stopColor="#000" stopOpacity=".28" /><stop offset="1" stopColor="#000" stopOpacity=".6" /></linearGradient>
          </defs>
          <path fill={`url(#${id}-cap)`} d={`M${-neck / 2 - 1} 0h${neck + 2}v${cap}h${-neck - 2}z`} />
          <path fill={`url(#${id}-glass)`} d={`M${-neck / 2} ${cap}h${neck}C${neck / 2 + shoulder * 0.3} ${cap + shoulder * 0.5} ${r} ${cap + shoulder * 0.3} ${r} ${y0 + foot * 0.4}V${tall - foot}a${foot} ${foot} 0 0 1 ${-foot} ${foot}H${-r + foot}a${foot} ${foot} 0 0 1 ${-foot} ${-foot}V${y0 + foot * 0.4}C${-r} ${cap + shoulder * 0.3} ${-neck / 2 - shoulder * 0.3} ${cap + shoulder * 0.5} ${-neck / 2} ${cap}z`} />
          <rect x={-r + 0.05} y={y0 + foot} width={diameter - 0.1} height={H} fill="#fff" />
          <clipPath id={`${id}-body`}><rect x={-r} y={y0 + foot} width={diameter} height={H} /></clipPath>
          <g clipPath={`url(#${id}-body)`}>
          {Array.from({ length: slices }, (_, i) => {
            const [from, to] = [along(edge(i)), along(edge(i + 1))];
            const shift = from < 0 ? -round : from > round ? round : 0;
            return (
              <svg key={i} x={edge(i)} y={y0 + foot} width={(REACH * 2 * r) / slices} height={H} viewBox={`${from - shift} 0 ${(to - from) * REACH} ${H}`} preserveAspectRatio="none">
                <use href={`#${id}-art`} />
              </svg>
            );
          })}
          </g>
          <rect x={-r} y={y0 + foot} width={diameter} height={H} fill={`url(#${id}-shade)`} />
        </svg>
      </div>
      <label className="turn">
        <span className="quiet">Turn</span>
        <input type="range" min={0} max={100} value={middle} onChange={(event) => setMiddle(Number(event.target.value))} aria-label="Turn the bottle" />
      </label>
    </>
  );
}

function Face({ scene }: { scene: Scene }) {
  const [W, H] = [scene.trim.width / 1000, scene.trim.height / 1000];
  const rim = Math.max(W, H) * 0.07;
  const scale = Math.min(230 / (H + 2 * rim), 260 / (W + 2 * rim));
  return (
    <div className="bottle">
      <svg width={(W + 2 * rim) * scale} height={(H + 2 * rim) * scale} viewBox={`${-rim} ${-rim} ${W + 2 * rim} ${H + 2 * rim}`} role="img" aria-label="The label on its face">
        <rect x={-rim} y={-rim} width={W + 2 * rim} height={H + 2 * rim} rx={rim * 0.8} fill="#6b3710" />
        <rect x={-rim} y={-rim} width={(W + 2 * rim) * 0.14} height={H + 2 * rim} rx={rim * 0.8} fill="#8a4c19" opacity=".6" />
        <LabelArt scene={scene} />
      </svg>
    </div>
  );
}
