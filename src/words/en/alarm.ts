import type { ClockAbout } from '../../core/timer/clock.ts';
import type { Urgency } from '../../core/timer/alarm.ts';

const subject = (about: ClockAbout['type']): string =>
  ({ cure: 'Cure', wait: 'Cool-down', polish: 'Film', 'working life': 'Working life' })[about];

export const alarm = {
  seen: 'Seen',
  seenNote: 'quiets this clock only',
  goTo: 'Go to the batch',
  sentence: (about: ClockAbout['type'], urgency: Urgency): string => {
    if (urgency === 'over') return about === 'cure' ? 'Cure past its longest dose' : `${subject(about)} over`;
    if (urgency === 'due') return about === 'cure' ? 'Cure done. Take the tray out.' : `${subject(about)} done`;
    return about === 'working life' ? 'Working life nearly over' : `${subject(about)} soon done`;
  },
  late: (span: string) => `It has called for ${span}.`,
  others: (count: number) => (count === 1 ? '1 more clock calls.' : `${count} more clocks call.`),
};
