/** A screen that has just changed takes no touch for so long: a drip or a second tap meant the old one. */
export const freshMs = 300;

export interface PressRules {
  readonly onpress: () => void;
  /** True while a press must do nothing. */
  readonly blocked?: (() => boolean) | undefined;
  /** When what is under the finger last changed, on the clock of event.timeStamp. */
  readonly changedAt?: (() => number) | undefined;
}

/**
 * Acts when one finger that went down on the element comes up inside it, however far it slid in between (a glove
 * rolls). A second finger anywhere spoils the press. Keys and assistive technology arrive as clicks.
 */
export function press(rules: PressRules): (node: HTMLElement) => () => void {
  return (node) => {
    let pointer: { id: number; good: boolean } | null = null;
    let lastUpAt = Number.NEGATIVE_INFINITY;

    const isFresh = (event: Event): boolean =>
      event.timeStamp - (rules.changedAt?.() ?? Number.NEGATIVE_INFINITY) < freshMs;
    const act = (): void => {
      if (rules.blocked?.() !== true) rules.onpress();
    };
    const isInside = (event: PointerEvent): boolean => {
      const box = node.getBoundingClientRect();
      const { clientX: x, clientY: y } = event;
      return x >= box.left && x <= box.right && y >= box.top && y <= box.bottom;
    };

    const down = (event: PointerEvent): void => {
      if (pointer !== null || event.button !== 0) return;
      pointer = { id: event.pointerId, good: event.isPrimary && !isFresh(event) };
    };
    const anyDown = (event: PointerEvent): void => {
      if (pointer !== null && event.pointerId !== pointer.id) pointer.good = false;
    };
    const up = (event: PointerEvent): void => {
      if (pointer === null || event.pointerId !== pointer.id) return;
      const { good } = pointer;
      pointer = null;
      lastUpAt = event.timeStamp;
      if (!good || !isInside(event)) return;
      if (view) swallowStrayClick(view, node);
      act();
    };
    const cancel = (event: PointerEvent): void => {
      if (pointer?.id === event.pointerId) pointer = null;
    };
    const click = (event: MouseEvent): void => {
      const followsPointer = event.detail > 0 && event.timeStamp - lastUpAt < 1000;
      if (!followsPointer && pointer === null) act();
    };

    const { defaultView: view } = node.ownerDocument;
    node.addEventListener('pointerdown', down);
    node.addEventListener('click', click);
    view?.addEventListener('pointerdown', anyDown, true);
    view?.addEventListener('pointerup', up, true);
    view?.addEventListener('pointercancel', cancel, true);
    return () => {
      node.removeEventListener('pointerdown', down);
      node.removeEventListener('click', click);
      view?.removeEventListener('pointerdown', anyDown, true);
      view?.removeEventListener('pointerup', up, true);
      view?.removeEventListener('pointercancel', cancel, true);
    };
  };
}

/**
 * A touch is followed by a click at the same place. What the press took away, a sheet for one, no longer catches it;
 * whatever has come to light there must not take it for a press of its own. A further touch, or a click without one,
 * is meant.
 */
function swallowStrayClick(view: Window, node: HTMLElement): void {
  const over = new AbortController();
  const click = (event: MouseEvent): void => {
    over.abort();
    const meant = event.detail === 0 || (event.target instanceof Node && node.contains(event.target));
    if (meant) return;
    event.preventDefault();
    event.stopImmediatePropagation();
  };
  const once = { capture: true, signal: over.signal };
  view.addEventListener('click', click, once);
  view.addEventListener('pointerdown', () => over.abort(), once);
}
