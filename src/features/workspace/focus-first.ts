/** As a `ref`: the field someone just asked for takes the focus, once. */
export function focusFirst(element: HTMLElement | null): void {
  element?.focus();
}
