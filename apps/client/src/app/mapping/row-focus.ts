const TRIES = 20;

/** Puts the keyboard on the first element that a selector finds and brings it into sight; false where it is not drawn. */
export function focusNow(host: HTMLElement, selector: string): boolean {
  const element = host.querySelector<HTMLElement>(selector);
  element?.focus({ preventScroll: true });
  element?.scrollIntoView({ block: 'nearest' });
  return element !== null;
}

/** The same, frame by frame until virtual scrolling has drawn it. */
export function focusSoon(host: HTMLElement, selector: string, tries = TRIES): void {
  if (tries > 0) requestAnimationFrame(() => focusNow(host, selector) || focusSoon(host, selector, tries - 1));
}
