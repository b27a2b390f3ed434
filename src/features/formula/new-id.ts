let count = 0;

/** A mark for a new line, phase or step: different within a draft, whoever adds it. */
export function newId(kind: 'line' | 'phase' | 'step'): string {
  count += 1;
  const random = crypto.getRandomValues(new Uint32Array(2));
  return `${kind}-${[...random].map((part) => part.toString(36)).join('')}-${count.toString(36)}`;
}
