import type { Clock } from '../../../src/core/timer/clock.ts';
import type { Moment } from '../../../src/core/unit/moment.ts';

const startMs = 1_000_000_000_000;

/** A moment so many seconds after the clocks below began. */
export const second = (seconds: number, log = 'tablet-a'): Moment => ({
  log,
  bench: startMs + seconds * 1000,
  wall: startMs + seconds * 1000,
});

const base = { batch: 'b1', tag: 1, step: 3, from: second(0), earliest: null, uncertain: false } as const;
const seenFields = (seenS: number | null) => ({
  seen: seenS !== null,
  seenAt: seenS === null ? null : second(seenS),
});

export const atLeast = (dueS: number | null, overS: number | null = null, seenS: number | null = null): Clock => ({
  ...base,
  id: 'cure:l1:b1',
  kind: 'at least',
  about: { type: 'cure', load: 'l1', station: 'o1', why: { kind: 'set point', temperatureC: 100 } },
  due: dueS === null ? null : second(dueS),
  over: overS === null ? null : second(overS),
  ...seenFields(seenS),
});

export const atMost = (dueS: number, seenS: number | null = null): Clock => ({
  ...base,
  id: 'life:m1:b1',
  kind: 'at most',
  about: { type: 'working life', mix: 'm1', lot: 'L1', connectors: 4, limitStep: 2 },
  due: second(dueS),
  over: second(dueS),
  ...seenFields(seenS),
});

export const aim = (aimS: number, toleranceS: number, seenS: number | null = null): Clock => ({
  ...base,
  id: 'polish:l1:b1',
  kind: 'aim',
  about: { type: 'polish', load: 'l1', filmUm: 1 },
  due: second(aimS),
  over: second(aimS + toleranceS),
  earliest: second(aimS - toleranceS),
  ...seenFields(seenS),
});
