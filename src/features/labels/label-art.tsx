import { memo, useId } from 'react';
import './artwork-fonts.css';
import type { FrontView } from '#shared/artwork/crop-to-front.ts';
import type { Box, Item, PathStep, PictureItem, Scene, Text } from '#shared/artwork/scene.ts';

const mm = (micrometres: number): number => micrometres / 1000;

/** Steps as an SVG path, in millimetres. */
export function pathData(steps: readonly PathStep[]): string {
  return steps.map(([command, ...figures]) => command + figures.map(mm).join(' ')).join('');
}
function boxData(box: Box): string {
  return `M${mm(box.x)} ${mm(box.y)}h${mm(box.width)}v${mm(box.height)}h${mm(-box.width)}z`;
}

/** Where each character of a run stands, in millimetres: the same sums as the press file makes. */
export function characterPlaces(item: Text): number[] {
  return item.offsets.map((offset) => mm(item.x + (offset * item.size) / 1000));
}

function ArtText({ item, fill }: { item: Text; fill: string }) {
  const font = { fontSize: mm(item.size), fontWeight: item.weight, fill };
  if (item.places) return <text {...font} x={item.places.map(({ x }) => mm(x)).join(' ')} y={item.places.map(({ y }) => mm(y)).join(' ')} rotate={item.places.map(({ degrees }) => degrees).join(' ')}>{item.text}</text>;
  if (item.turn === 0) return <text {...font} x={characterPlaces(item).join(' ')} y={mm(item.y)}>{item.text}</text>;
  const along = item.offsets.map((offset) => mm((offset * item.size) / 1000)).join(' ');
  return <text {...font} x={along} y={0} transform={`translate(${mm(item.x)} ${mm(item.y)}) rotate(${item.turn})`}>{item.text}</text>;
}

function ArtPicture({ item: { box, picture, degrees = 0 } }: { item: PictureItem }) {
  const turn = degrees === 0 ? undefined : `rotate(${degrees} ${mm(box.x + box.width / 2)} ${mm(box.y + box.height / 2)})`;
  return <image href={`/api/pictures/${picture}/preview`} x={mm(box.x)} y={mm(box.y)} width={mm(box.width)} height={mm(box.height)} preserveAspectRatio="none" transform={turn} />;
}

function ArtItem({ item, scene, clipOf }: { item: Item; scene: Scene; clipOf: (box: Box) => string }) {
  const fill = scene.inks[item.ink]!.screen;
  const clipPath = item.clip ? `url(#${clipOf(item.clip)})` : undefined;
  if (item.kind === 'picture') return <ArtPicture item={item} />;
  if (item.kind === 'text') return <ArtText item={item} fill={fill} />;
  if (item.kind === 'boxes') return <path d={item.boxes.map(boxData).join('')} fill={fill} clipPath={clipPath} shapeRendering={item.element === 'barcode' ? 'crispEdges' : undefined} />;
  return item.stroke === undefined
    ? <path d={pathData(item.steps)} fill={fill} fillRule={item.evenOdd ? 'evenodd' : undefined} clipPath={clipPath} />
    : <path d={pathData(item.steps)} fill="none" stroke={fill} strokeWidth={mm(item.stroke)} strokeLinecap="round" strokeLinejoin="round" clipPath={clipPath} />;
}

export interface LabelArtProps {
  readonly scene: Scene;
  /** Show what will be cut away. */
  readonly bleed?: boolean;
  /** Lay the white stock under it. */
  readonly paper?: boolean;
}

/** The printed label as an SVG group in millimetres, 0 0 at the upper left corner of the trim. */
export const LabelArt = memo(function LabelArt({ scene, bleed = false, paper = true }: LabelArtProps) {
  const id = useId().replace(/:/g, '');
  const over = bleed ? scene.bleed : 0;
  const sheet: Box = { x: -over, y: -over, width: scene.trim.width + 2 * over, height: scene.trim.height + 2 * over };
  const clips = scene.items.flatMap((item) => item.clip ?? []);
  const clipOf = (box: Box): string => `${id}-${clips.indexOf(box)}`;
  return (
    <g className="label-art">
      <clipPath id={`${id}-sheet`}><path d={boxData(sheet)} /></clipPath>
      {clips.map((clip, index) => <clipPath key={index} id={`${id}-${index}`}><path d={boxData(clip)} /></clipPath>)}
      <g clipPath={`url(#${id}-sheet)`}>
        {paper ? <path d={boxData(sheet)} fill="#ffffff" /> : null}
        {scene.items.map((item, index) => <ArtItem key={index} item={item} scene={scene} clipOf={clipOf} />)}
      </g>
    </g>
  );
});

/** The front of a label, drawn small inside a box of so many pixels. */
export function LabelThumbnail({ front: { scene, view }, width, height, name }: { front: FrontView; width: number; height: number; name: string }) {
  const scale = Math.min(width / view.width, height / view.height);
  return (
    <svg role="img" aria-label={`Label of ${name}`} width={Math.round(view.width * scale)} height={Math.round(view.height * scale)} viewBox={`${mm(view.x)} ${mm(view.y)} ${mm(view.width)} ${mm(view.height)}`}>
      <LabelArt scene={scene} />
    </svg>
  );
}
