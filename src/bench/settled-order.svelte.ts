/** Rows never move under a finger: not within this many ms of a touch. */
export const settleMs = 3000;

/**
 * The order in which rows are shown: the wanted one, but held still for 3 s after every touch. A row that moved tells
 * so by another `movedAt`, so that it takes no tap in its new place for a moment.
 */
export function settledOrder(wanted: () => readonly string[]) {
  let shown = $state.raw<readonly string[]>(wanted());
  let touches = $state(0);
  const moves = new Map<string, number>();
  let timer: ReturnType<typeof setTimeout> | undefined;
  let stillUntil = 0;

  const apply = (next: readonly string[]): void => {
    next.forEach((id, place) => {
      if (shown[place] !== id) moves.set(id, (moves.get(id) ?? 0) + 1);
    });
    shown = next;
  };

  $effect(() => {
    const next = wanted();
    void touches;
    const known = new Set(next);
    const sameRows = next.length === shown.length && shown.every((id) => known.has(id));
    const wait = stillUntil - performance.now();
    clearTimeout(timer);
    if (next.every((id, place) => shown[place] === id) && sameRows) return;
    // A batch that is new or gone is shown so at once, in its old neighbours' order.
    if (wait > 0 && sameRows) timer = setTimeout(() => (touches += 1), wait);
    else if (wait > 0) apply([...shown.filter((id) => known.has(id)), ...next.filter((id) => !shown.includes(id))]);
    else apply(next);
    return () => clearTimeout(timer);
  });

  return {
    get ids() {
      return shown;
    },
    movedAt: (id: string) => `${id} ${moves.get(id) ?? 0}`,
    touched: () => {
      stillUntil = performance.now() + settleMs;
    },
  };
}
