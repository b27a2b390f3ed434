import { useEffect, useRef, useState } from 'react';

/**
 * The text of a find field whose place is the address. The address follows a keystroke only once
 * the room's loader has answered, so the field keeps its own text meanwhile; it follows the
 * address again when that changes by other means: back, forward, "show all".
 * @param found what the address says
 * @param onFind tells the address
 */
export function useFindText(found: string, onFind: (text: string) => void): readonly [string, (text: string) => void] {
  const [typed, setTyped] = useState(found);
  const underway = useRef<string[]>([]);
  useEffect(() => {
    const place = underway.current.lastIndexOf(found);
    if (place < 0) setTyped(found);
    // What was sent before it was overtaken and does not come any more.
    underway.current.splice(0, place + 1);
  }, [found]);
  const type = (text: string): void => {
    setTyped(text);
    underway.current.push(text);
    onFind(text);
  };
  return [typed, type];
}
