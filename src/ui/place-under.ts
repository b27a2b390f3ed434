/** Room kept between what floats and the edge of the window, in CSS pixels. */
const EDGE = 8;
/** Between the field and what hangs from it. */
const GAP = 4;
/** As tall as a list is read at a glance. */
const TALLEST = 360;

/**
 * Hangs a floating element from a field: below it, or above where there is more room. It is as
 * wide as the field at least, never past the window's edge. Sizes are CSS pixels of the window.
 */
export function placeUnder(floating: HTMLElement, field: HTMLElement): void {
  const { left, top, bottom, width } = field.getBoundingClientRect();
  const below = window.innerHeight - bottom - GAP - EDGE;
  const above = top - GAP - EDGE;
  const isBelow = below >= Math.min(TALLEST, 200) || below >= above;
  const { style } = floating;
  style.left = `${Math.max(EDGE, left)}px`;
  style.minWidth = `${Math.min(width, window.innerWidth - 2 * EDGE)}px`;
  style.maxWidth = `${Math.min(640, window.innerWidth - Math.max(EDGE, left) - EDGE)}px`;
  style.maxHeight = `${Math.max(96, Math.min(TALLEST, isBelow ? below : above))}px`;
  style.top = isBelow ? `${bottom + GAP}px` : 'auto';
  style.bottom = isBelow ? 'auto' : `${window.innerHeight - top + GAP}px`;
}
