/** Puts a fixed element under its anchor, or above it where there is no room, and inside the window [px]. */
export function placeBeside(element: HTMLElement, anchor: Element, align: 'left' | 'right'): void {
  const from = anchor.getBoundingClientRect();
  const { offsetWidth: width, offsetHeight: height } = element;
  const below = from.bottom + 4;
  const top = below + height > window.innerHeight - 8 ? Math.max(8, from.top - 4 - height) : below;
  const left = align === 'left' ? from.left : from.right - width;
  element.style.top = `${top}px`;
  element.style.left = `${Math.max(8, Math.min(left, window.innerWidth - 8 - width))}px`;
}
