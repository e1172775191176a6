import { vibrationPattern, type Urgency } from './alarm-rhythm.ts';

export interface Vibration {
  /** Present says that the browser has it, not that the tablet has a motor. iPads have none. */
  readonly current: 'present' | 'absent';
  /** One phrase of the alarm's rhythm; false when the browser refused, as it does before the first tap. */
  vibrate(urgency: Urgency): boolean;
  release(): void;
}

export interface VibrationWindow {
  readonly navigator: { vibrate?(pattern: number[]): boolean };
}

export function createVibration(window: VibrationWindow = globalThis.window): Vibration {
  const { navigator } = window;
  return {
    current: typeof navigator.vibrate === 'function' ? 'present' : 'absent',
    vibrate: (urgency) => navigator.vibrate?.(vibrationPattern(urgency)) ?? false,
    release: () => void navigator.vibrate?.([]),
  };
}
