import type { AddedElement, HandStyle } from '#shared/contracts/by-hand.ts';
import type { HandKey } from '#shared/artwork/hand/elements.ts';
import { plexMetrics } from '#shared/artwork/plex-metrics.ts';
import type { Scene, Text, Weight } from '#shared/artwork/scene.ts';
import { fitInto } from '#shared/artwork/hand/draw-picture.ts';
import { keyOf } from '#shared/artwork/hand/elements.ts';
import { Button, TextButton } from '#src/ui/button.tsx';
import { AreaField, CheckField, SelectField } from '#src/ui/field.tsx';
import { Icon } from '#src/ui/icon.tsx';
import { Panel } from '#src/ui/sheet.tsx';
import { thingOf, type Alignment } from './edit-hand.ts';
import { PictureShelf } from './picture-shelf.tsx';
import { FigureField } from './figure-field.tsx';
import { holdsType } from './things.ts';
import type { Chosen, Hand } from './use-hand.ts';

export interface HandPanelProps {
  readonly hand: Hand;
  readonly scene: Scene;
  readonly isLocked: boolean;
}

/** Everything about composing by hand: what stands on the label, and the chosen thing's figures. */
export function HandPanel({ hand, scene, isLocked }: HandPanelProps) {
  const count = hand.byHand.freed.length + hand.byHand.added.length;
  return (
    <Panel title="By hand" className="hand-panel" end={count > 0 && !isLocked ? <TextButton mini onClick={hand.reset}>All back to the template</TextButton> : null}>
      <AddRow hand={hand} scene={scene} isLocked={isLocked} />
      <PictureShelf isLocked={isLocked} onPlace={(picture) => hand.add((id) => ({ id, kind: 'picture', picture: picture.id, frame: pictureFrame(scene, picture), style: {} }))} />
      <ul className="hand-list" aria-label="On the label">
        {hand.things.map((thing) => <ThingRow key={thing.key} thing={thing} hand={hand} />)}
      </ul>
      {hand.chosen.length === 0
        ? <p className="hint">Choose something here or on the label. Drag it, pull at its handles, or press the arrow keys: 0.1 mm, with Shift 1 mm, with Alt its size.</p>
        : <ChosenFields hand={hand} scene={scene} isLocked={isLocked} />}
    </Panel>
  );
}

function ThingRow({ thing, hand }: { thing: Chosen; hand: Hand }) {
  const isOn = hand.chosen.includes(thing.key);
  return (
    <li>
      <button type="button" aria-pressed={isOn} onClick={(event) => (isOn && hand.chosen.length === 1 ? hand.choose(null) : hand.choose(thing.key, event.shiftKey || event.ctrlKey || event.metaKey))}>
        <span>{hand.nameOf(thing.key)}</span>
        {thing.isLocked ? <Icon name="lock" /> : null}
        <span className="quiet">{thing.isFree ? (thing.isLocked ? 'locked' : 'by hand') : 'template'}</span>
      </button>
    </li>
  );
}

/** A picture begins with its longer side at 30 mm, or what the label has, in the middle of the safe room. */
function pictureFrame({ safe }: Scene, { width, height }: { readonly width: number; readonly height: number }) {
  const box = fitInto({ x: safe.x, y: safe.y, width: Math.min(30_000, safe.width), height: Math.min(30_000, safe.height) }, width, height);
  return { ...box, x: safe.x + Math.round((safe.width - box.width) / 2), y: safe.y + Math.round((safe.height - box.height) / 2), width: Math.max(100, box.width), height: Math.max(100, box.height) };
}

/** New things stand in the middle of the safe room, where they are seen at once. */
function AddRow({ hand, scene, isLocked }: HandPanelProps) {
  const { safe } = scene;
  const frame = (width: number, height: number) => ({ x: safe.x + Math.round((safe.width - width) / 2), y: safe.y + Math.round((safe.height - height) / 2), width, height });
  const kinds: readonly (readonly [string, (id: string) => AddedElement])[] = [
    ['Text', (id) => ({ id, kind: 'text', text: 'Your words', frame: frame(Math.min(safe.width, 40_000), 5000), style: { size: 4200 } })],
    ['Line', (id) => ({ id, kind: 'rule', frame: frame(Math.min(safe.width, 40_000), 300), style: {} })],
    ['Box', (id) => ({ id, kind: 'box', stroke: 300, frame: frame(Math.min(safe.width, 30_000), 15_000), style: {} })],
    ['Oval', (id) => ({ id, kind: 'oval', stroke: 300, frame: frame(20_000, 20_000), style: {} })],
    ['QR code', (id) => ({ id, kind: 'code', text: 'https://', frame: frame(18_000, 18_000), style: {} })],
  ];
  return (
    <div className="hand-add" role="group" aria-label="Add to the label">
      {kinds.map(([word, make]) => <Button key={word} small icon="plus" disabled={isLocked} onClick={() => hand.add(make)}>{word}</Button>)}
    </div>
  );
}

const ALIGNMENTS: readonly (readonly [Alignment, string])[] = [['left', 'Left'], ['centre', 'Centre'], ['right', 'Right'], ['top', 'Top'], ['middle', 'Middle'], ['bottom', 'Bottom']];

function ChosenFields({ hand, scene, isLocked }: HandPanelProps) {
  const { chosen, byHand } = hand;
  const things = hand.things.filter(({ key }) => chosen.includes(key));
  const isHeld = isLocked || things.some((thing) => thing.isLocked);
  const isOwn = chosen.every((key) => key.startsWith('own:'));
  const isGrouped = chosen.length > 1 && new Set(chosen.map((key) => thingOf(byHand, key)?.group ?? key)).size === 1;
  const single = things.length === 1 ? things[0] : undefined;
  return (
    <section className="hand-chosen" aria-label="Chosen">
      <h3>{single ? hand.nameOf(single.key) : `${chosen.length} things`}</h3>
      {single ? <FrameFields thing={single} hand={hand} isHeld={isHeld} /> : null}
      {single ? <OwnFields thing={single} hand={hand} isHeld={isHeld} /> : null}
      <TypeFields keys={chosen} hand={hand} scene={scene} isHeld={isHeld} />
      <div className="hand-tools" role="group" aria-label={chosen.length > 1 ? 'Line up with each other' : 'Line up with the safe room'}>
        {ALIGNMENTS.map(([how, word]) => <Button key={how} small disabled={isHeld} onClick={() => hand.align(how)}>{word}</Button>)}
      </div>
      <div className="hand-tools">
        {chosen.length > 2 ? <><Button small disabled={isHeld} onClick={() => hand.spread('x')}>Spread across</Button><Button small disabled={isHeld} onClick={() => hand.spread('y')}>Spread down</Button></> : null}
        {chosen.length > 1 ? <Button small disabled={isLocked} onClick={() => hand.group(!isGrouped)}>{isGrouped ? 'Ungroup' : 'Group'}</Button> : null}
        <Button small icon="lock" disabled={isLocked} aria-pressed={things.every((thing) => thing.isLocked)} onClick={() => hand.lock(!things.every((thing) => thing.isLocked))}>{things.every((thing) => thing.isLocked) ? 'Unlock' : 'Lock'}</Button>
        {isOwn ? <><Button small disabled={isHeld} onClick={() => hand.order('front')}>To the front</Button><Button small disabled={isHeld} onClick={() => hand.order('back')}>To the back</Button><Button small icon="copy" disabled={isLocked} onClick={hand.copy}>Copy</Button></> : null}
        {things.some((thing) => thing.isFree) ? <Button small icon={isOwn ? 'away' : 'undo'} disabled={isHeld} onClick={hand.remove}>{isOwn ? 'Remove' : 'Back to the template'}</Button> : null}
      </div>
    </section>
  );
}

function FrameFields({ thing, hand, isHeld }: { thing: Chosen; hand: Hand; isHeld: boolean }) {
  const { frame } = thing;
  const field = (label: string, key: keyof typeof frame, least: number) => (
    <FigureField label={label} value={frame[key]} least={least} most={2_000_000} disabled={isHeld} onCommit={(value) => value !== undefined && hand.resize({ ...frame, [key]: value })} />
  );
  return <div className="hand-figures">{field('From left, mm', 'x', -2_000_000)}{field('From top, mm', 'y', -2_000_000)}{field('Width, mm', 'width', 100)}{field('Height, mm', 'height', 100)}</div>;
}

function OwnFields({ thing, hand, isHeld }: { thing: Chosen; hand: Hand; isHeld: boolean }) {
  const own = thingOf(hand.byHand, thing.key);
  if (!own || !('kind' in own)) return null;
  if (own.kind === 'text' || own.kind === 'code') {
    return <AreaField label={own.kind === 'text' ? 'Words' : 'Address the code leads to'} rows={2} value={own.text} disabled={isHeld} error={own.text.trim() === '' ? 'Write something, or remove it.' : undefined} onChange={(event) => hand.text(event.target.value)} />;
  }
  if (own.kind === 'rule' || own.kind === 'picture') return null;
  return <CheckField label="Outline only" checked={own.stroke !== undefined} disabled={isHeld} onChange={(event) => hand.stroke(event.target.checked ? 300 : undefined)} />;
}

const WEIGHTS: readonly (readonly [Weight, string])[] = [[300, 'Light'], [400, 'Regular'], [500, 'Medium'], [600, 'Semibold'], [700, 'Bold']];
const INKS = [['black', 'Black'], ['ink', 'House ink'], ['tint', 'Its tint'], ['light', 'Its light']] as const;

/** Height of a small letter of the set type, in words. */
function letterWords(scene: Scene, key: HandKey): string | undefined {
  const text = scene.items.find((item): item is Text => item.kind === 'text' && keyOf(item) === key);
  if (!text) return undefined;
  const height = (text.size * plexMetrics.face(text.weight).xHeight) / 1_000_000;
  return `Set at ${((text.size / 1000) * (72 / 25.4)).toFixed(1)} pt, small letters ${height.toFixed(2)} mm.`;
}

function TypeFields({ keys, hand, scene, isHeld }: { keys: readonly HandKey[]; hand: Hand; scene: Scene; isHeld: boolean }) {
  const { byHand } = hand;
  const style: HandStyle = keys[0] ? hand.styleOf(keys[0]) : {};
  const isType = keys.every((key) => holdsType(byHand, key));
  const isText = isType && keys.every((key) => key !== 'net content' && key !== 'durability');
  const ink = (
    <SelectField label="Ink" value={style.ink ?? ''} disabled={isHeld} onChange={(event) => hand.style({ ink: (event.target.value || undefined) as HandStyle['ink'] })}>
      <option value="">as drawn</option>
      {INKS.map(([value, word]) => <option key={value} value={value}>{word}</option>)}
    </SelectField>
  );
  if (!isType) return keys.every((key) => key !== 'barcode') ? <div className="hand-figures">{ink}</div> : null;
  const size = (
    <FigureField
      label="Size, pt" value={style.size === undefined ? undefined : Math.round((style.size * 7.2) / 25.4) * 10} least={1500} most={500_000} step={100} disabled={isHeld} whenEmpty="fills the frame"
      hint={keys.length === 1 ? letterWords(scene, keys[0]!) : undefined}
      onCommit={(value) => hand.style({ size: value === undefined ? undefined : Math.round((value * 25.4) / 72) })}
    />
  );
  return (
    <div className="hand-figures">
      {size}
      <SelectField label="Stands" value={style.align ?? 'left'} disabled={isHeld} onChange={(event) => hand.style({ align: event.target.value as HandStyle['align'] })}>
        <option value="left">left</option><option value="centre">in the middle</option><option value="right">right</option>
      </SelectField>
      {isText ? (
        <>
          <SelectField label="Weight" value={style.weight ?? ''} disabled={isHeld} onChange={(event) => hand.style({ weight: event.target.value === '' ? undefined : (Number(event.target.value) as Weight) })}>
            <option value="">as drawn</option>
            {WEIGHTS.map(([value, word]) => <option key={value} value={value}>{word}</option>)}
          </SelectField>
          {ink}
          <FigureField label="Tracking, ‰ of the em" value={(style.tracking ?? 0) * 1000} least={-30_000} most={400_000} step={5000} disabled={isHeld} onCommit={(value) => hand.style({ tracking: value === undefined || value === 0 ? undefined : Math.round(value / 1000) })} />
          <FigureField label="Line to line, em" value={style.leading} least={900} most={3000} step={20} whenEmpty="as drawn" disabled={isHeld} onCommit={(value) => hand.style({ leading: value })} />
          {keys.length === 1 && keys[0] === 'ingredients' ? (
            <SelectField label="Columns" value={style.columns ?? 1} disabled={isHeld} onChange={(event) => hand.style({ columns: event.target.value === '1' ? undefined : Number(event.target.value) })}>
              {[1, 2, 3, 4].map((count) => <option key={count} value={count}>{count}</option>)}
            </SelectField>
          ) : null}
          <CheckField label="In capitals" checked={style.capitals ?? false} disabled={isHeld} onChange={(event) => hand.style({ capitals: event.target.checked || undefined })} />
        </>
      ) : ink}
    </div>
  );
}
