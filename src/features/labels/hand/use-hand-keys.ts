import type { KeyboardEvent } from 'react';
import type { Hand } from './use-hand.ts';

const STEPS: Readonly<Record<string, readonly [number, number]>> = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, -1], ArrowDown: [0, 1] };

/**
 * The keys of the label while it is composed by hand: arrows move by 0.1 mm, with Shift by 1 mm,
 * with Alt they change the size; Delete takes away, Ctrl D copies, Ctrl A chooses all, Escape lets go.
 */
export function handKeys(hand: Hand, isLocked: boolean): (event: KeyboardEvent) => void {
  return (event) => {
    const step = STEPS[event.key];
    const isCommand = event.ctrlKey || event.metaKey;
    const act = (what: () => void): void => {
      event.preventDefault();
      what();
    };
    if (event.key === 'Escape' && hand.chosen.length > 0) return act(() => hand.choose(null));
    if (isCommand && event.key.toLowerCase() === 'a') return act(hand.chooseAll);
    if (hand.chosen.length === 0 || isLocked) return undefined;
    if (isCommand && event.key.toLowerCase() === 'd') return act(hand.copy);
    if (event.key === 'Delete' || event.key === 'Backspace') return act(hand.remove);
    if (!step || isCommand) return undefined;
    const [dx, dy] = step.map((one) => one * (event.shiftKey ? 1000 : 100)) as [number, number];
    if (!event.altKey) return act(() => hand.move(dx, dy));
    const thing = hand.things.find(({ key }) => key === hand.chosen[0]);
    if (!thing || thing.isLocked) return undefined;
    const { frame } = thing;
    return act(() => hand.resize({ ...frame, width: Math.max(500, frame.width + dx), height: Math.max(500, frame.height + dy) }));
  };
}
