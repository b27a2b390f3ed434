import type { AddedElement, ByHand, FreedElement, HandFrame, HandStyle } from './by-hand.ts';
import { isAbsent, type DocumentWalk } from './document-walk.ts';
import { FREE_ELEMENTS } from './free-elements.ts';

const FAR = 2_000_000;
const KINDS = ['text', 'rule', 'box', 'oval', 'code', 'picture'] as const;
const MOST_ADDED = 80;

/** Reads `/label/byHand` of a document: the same shape as the contract `byHand`, with its faults at their places. */
export function readByHand(walk: DocumentWalk, value: unknown): ByHand | undefined {
  const at = '/label/byHand';
  const object = walk.object(value, at);
  if (!object) return undefined;
  const freed = list(walk, object['freed'], `${at}/freed`).flatMap((item, index) => readFreed(walk, item, `${at}/freed/${index}`) ?? []);
  const added = list(walk, object['added'], `${at}/added`).flatMap((item, index) => readAdded(walk, item, `${at}/added/${index}`) ?? []);
  if (new Set(freed.map(({ element }) => element)).size < freed.length) return walk.fault(`${at}/freed`, 'Each element is set free once.');
  if (new Set(added.map(({ id }) => id)).size < added.length) return walk.fault(`${at}/added`, 'Each has a name of its own.');
  return { freed, added };
}

function list(walk: DocumentWalk, value: unknown, at: string): readonly unknown[] {
  return isAbsent(value) ? [] : walk.list(value, at, MOST_ADDED);
}

function whole(walk: DocumentWalk, value: unknown, at: string, [least, most]: readonly [number, number]): number | undefined {
  if (isAbsent(value)) return undefined;
  return typeof value === 'number' && value % 1 === 0 && value >= least && value <= most ? value : walk.fault(at, `This has to be a whole number from ${least} to ${most}.`);
}

function readFrame(walk: DocumentWalk, value: unknown, at: string): HandFrame | undefined {
  const object = walk.object(value, at);
  if (!object) return walk.fault(at, 'The frame is missing.');
  const [x, y] = [whole(walk, object['x'], `${at}/x`, [-FAR, FAR]), whole(walk, object['y'], `${at}/y`, [-FAR, FAR])];
  const [width, height] = [whole(walk, object['width'], `${at}/width`, [100, FAR]), whole(walk, object['height'], `${at}/height`, [100, FAR])];
  if (x === undefined || y === undefined || width === undefined || height === undefined) return walk.fault(at, 'A frame has x, y, width and height in micrometres.');
  return { x, y, width, height };
}

function readStyle(walk: DocumentWalk, value: unknown, at: string): HandStyle {
  const object = isAbsent(value) ? undefined : walk.object(value, at);
  if (!object) return {};
  const figure = (key: string, range: readonly [number, number]): number | undefined => whole(walk, object[key], `${at}/${key}`, range);
  const [size, tracking, leading, columns] = [figure('size', [500, 200_000]), figure('tracking', [-30, 400]), figure('leading', [900, 3000]), figure('columns', [1, 4])];
  const weight = WEIGHTS.find((one) => one === object['weight']);
  if (!isAbsent(object['weight']) && weight === undefined) walk.fault(`${at}/weight`, `Choose one of ${WEIGHTS.join(', ')}.`);
  const align = walk.choice(object['align'], `${at}/align`, ['left', 'centre', 'right'] as const);
  const ink = walk.choice(object['ink'], `${at}/ink`, ['black', 'ink', 'tint', 'light'] as const);
  const style = { size, weight, align, tracking, leading, ink, columns, ...(object['capitals'] === true && { capitals: true }) };
  return Object.fromEntries(Object.entries(style).filter(([, one]) => one !== undefined));
}
const WEIGHTS = [300, 400, 500, 600, 700] as const;

function readCommon(walk: DocumentWalk, object: Readonly<Record<string, unknown>>, at: string) {
  const frame = readFrame(walk, object['frame'], `${at}/frame`);
  const group = walk.text(object['group'], `${at}/group`, { most: 40 });
  return frame && { frame, style: readStyle(walk, object['style'], `${at}/style`), ...(object['locked'] === true && { locked: true }), ...(group && { group }) };
}

function readFreed(walk: DocumentWalk, value: unknown, at: string): FreedElement | undefined {
  const object = walk.object(value, at);
  const element = object && walk.choice(object['element'], `${at}/element`, FREE_ELEMENTS, true);
  const common = object && readCommon(walk, object, at);
  return element && common && { element, ...common };
}

function readAdded(walk: DocumentWalk, value: unknown, at: string): AddedElement | undefined {
  const object = walk.object(value, at);
  const kind = object && walk.choice(object['kind'], `${at}/kind`, KINDS, true);
  const id = object && walk.text(object['id'], `${at}/id`, { most: 40, isNeeded: true });
  const common = object && readCommon(walk, object, at);
  if (!object || !kind || !id || !common) return undefined;
  if (kind === 'rule') return { kind, id, ...common };
  if (kind === 'picture') {
    const picture = walk.text(object['picture'], `${at}/picture`, { most: 40, isNeeded: true });
    return picture === undefined ? undefined : { kind, id, picture, ...common };
  }
  if (kind === 'text' || kind === 'code') {
    const text = walk.text(object['text'], `${at}/text`, { most: kind === 'text' ? 500 : 300, isNeeded: true });
    return text === undefined ? undefined : { kind, id, text: text.trim(), ...common };
  }
  const stroke = whole(walk, object['stroke'], `${at}/stroke`, [80, 20_000]);
  return { kind, id, ...common, ...(stroke !== undefined && { stroke }) };
}
