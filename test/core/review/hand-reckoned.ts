import { DayBook } from './day-book.ts';
import { hashOf, takenRecipes } from './tiny-recipe.ts';

/** Ms since 1970 of "HH:MM" on 2026-03-02, UTC. */
export function clockMs(text: string): number {
  const [hours = 0, minutes = 0] = text.split(':').map(Number);
  return Date.UTC(2026, 2, 2, hours, minutes);
}

/**
 * One batch of 4, opened at 08:00: one rework (number 3, scratch), one scrap (number 4, crack), closed at 09:15.
 * `until` leaves out what is written later.
 */
export function batchOfFour(until = '23:59'): DayBook {
  const book = new DayBook('batch-1', takenRecipes(['tiny']));
  const all = [1, 2, 3, 4];
  const minutes = (count: number) => ({ gap: count * 60 });
  const at = (time: string, fact: Parameters<DayBook['write']>[1]) => {
    if (clockMs(time) <= clockMs(until)) book.write({ benchMs: clockMs(time), wallMs: clockMs(time) }, fact);
  };
  const v = 1 as const;
  const connectors = all;
  at('08:00', {
    type: 'batchOpened',
    v,
    data: { tag: 2, workOrder: 'WO 17', recipe: hashOf('tiny'), connectors: all.map(() => ({})) },
  });
  at('08:04', { type: 'stepFinished', v, data: { step: 'mix', connectors, mix: 'mix-1', ...minutes(4) } });
  at('08:11', { type: 'clockSeen', v, data: { clock: 'life:mix-1:batch-1', lateS: 30 } });
  at('08:12', {
    type: 'stepFinished',
    v,
    data: { step: 'fill', connectors, overrun: { lateS: 90, reason: 'phone' }, ...minutes(8) },
  });
  at('08:14', {
    type: 'loadStarted',
    v,
    data: { load: 'load-1', step: 'cure', connectors, station: 'oven-1', ...minutes(2) },
  });
  at('08:44', { type: 'loadEnded', v, data: { load: 'load-1', verdict: 'in time', lateS: 0, dose: 1, ...minutes(2) } });
  at('08:44', { type: 'loadStarted', v, data: { load: 'load-2', step: 'cool', connectors, station: 'tray', gap: 0 } });
  at('08:52', { type: 'clockSeen', v, data: { clock: 'wait:load-2:batch-1', lateS: 180 } });
  at('08:54', { type: 'loadEnded', v, data: { load: 'load-2', verdict: 'in time', lateS: 300, ...minutes(9) } });
  at('08:56', {
    type: 'loadStarted',
    v,
    data: { load: 'load-3', step: 'polish', connectors, station: 'disc', ...minutes(2) },
  });
  at('09:00', { type: 'loadEnded', v, data: { load: 'load-3', verdict: 'in time', lateS: 0, ...minutes(4) } });
  at('09:02', { type: 'judged', v, data: { step: 'inspect', connectors: [1, 2], verdict: 'pass', ...minutes(2) } });
  at('09:04', {
    type: 'judged',
    v,
    data: { step: 'inspect', connectors: [3, 4], verdict: 'fail', defect: 'scratch', ...minutes(2) },
  });
  at('09:04', { type: 'sentBack', v, data: { connectors: [3], to: 'polish', defect: 'scratch', attempt: 'same' } });
  at('09:04', { type: 'scrapped', v, data: { connectors: [4], defect: 'crack' } });
  at('09:08', {
    type: 'loadStarted',
    v,
    data: { load: 'load-4', step: 'polish', connectors: [3], station: 'disc', ...minutes(4) },
  });
  at('09:10', {
    type: 'loadEnded',
    v,
    data: { load: 'load-4', verdict: 'early', lateS: -120, reason: 'light scratch', ...minutes(2) },
  });
  at('09:12', { type: 'judged', v, data: { step: 'inspect', connectors: [3], verdict: 'pass', ...minutes(2) } });
  at('09:15', { type: 'batchClosed', v, data: { how: 'complete' } });
  return book;
}
