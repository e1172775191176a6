import { describe, expect, test } from 'vitest';
import { alarms, type Raised } from '../../../src/core/timer/alarm.ts';
import type { Clock } from '../../../src/core/timer/clock.ts';
import { aim, atLeast, atMost, second } from './clock-like.ts';

const urgencyAt = (clock: Clock, seconds: number) => alarms([clock], second(seconds), {}).alarms[0]?.urgency ?? null;

describe('an alarm', () => {
  test('calls soon, due and over', () => {
    const cure = atLeast(1200, 3600);
    expect([0, 1139, 1140, 1200, 3600].map((one) => urgencyAt(cure, one))).toEqual([null, null, 'soon', 'due', 'over']);
    expect([44, 45, 55, 60, 65, 65.001].map((one) => urgencyAt(aim(60, 5), one))).toEqual([
      null,
      'soon',
      'soon',
      'due',
      'due',
      'over',
    ]);
  });

  test('of a working life goes from soon to over, since it is never just due', () => {
    expect([3200, 3240, 3599, 3600].map((one) => urgencyAt(atMost(3600), one))).toEqual([null, 'soon', 'soon', 'over']);
  });

  test('of a cure that nothing makes due does not call', () => {
    expect(urgencyAt(atLeast(null), 1e6)).toBeNull();
  });

  test('is fresh once for every stage', () => {
    const cure = atLeast(1200, 3600);
    let raised: Raised = {};
    const fresh = [1150, 1160, 1200, 1201, 3600, 3601].map((one) => {
      const looked = alarms([cure], second(one), raised);
      raised = looked.raised;
      return looked.alarms[0]?.fresh;
    });
    expect(fresh).toEqual([true, false, true, false, true, false]);
  });

  test('that should have sounded while the page slept says how late it is', () => {
    const [late] = alarms([atLeast(1200)], second(1500), {}).alarms;
    expect(late).toMatchObject({ urgency: 'due', fresh: true, lateMs: 300_000 });
  });

  test('is forgotten once it no longer calls, so that it can sound anew', () => {
    const { raised } = alarms([atLeast(1200)], second(1200), {});
    const moved = alarms([atLeast(2400)], second(1300), raised);
    expect(moved).toEqual({ alarms: [], raised: {} });
    expect(alarms([atLeast(2400)], second(2400), moved.raised).alarms[0]?.fresh).toBe(true);
  });
});

describe('"seen"', () => {
  test('quiets one clock and no other', () => {
    const seen = atLeast(1200, 3600, 1210);
    const other = { ...atLeast(1200, 3600), id: 'cure:l2:b1' };
    expect(alarms([seen, other], second(1300), {}).alarms.map(({ clock }) => clock.id)).toEqual(['cure:l2:b1']);
  });

  test('said when soon does not quiet due, said when due does not quiet over', () => {
    expect(urgencyAt(atLeast(1200, 3600, 1150), 1190)).toBeNull();
    expect(urgencyAt(atLeast(1200, 3600, 1150), 1200)).toBe('due');
    expect(urgencyAt(atLeast(1200, 3600, 1210), 3599)).toBeNull();
    expect(urgencyAt(atLeast(1200, 3600, 1210), 3600)).toBe('over');
    expect(urgencyAt(atLeast(1200, 3600, 3700), 9999)).toBeNull();
  });

  test('said of a due moment that a reading has moved on since does not quiet the new one', () => {
    expect(urgencyAt(atLeast(2400, 7200, 1210), 2400)).toBe('due');
  });
});
