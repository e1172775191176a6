import { expect, test } from 'vitest';
import { loudness, rhythms, vibrationPattern, type Urgency } from '../../src/device/alarm-rhythm.ts';

const urgencies: readonly Urgency[] = ['soon', 'due', 'over'];

test('the number of pulses in the first second and a half tells the urgencies apart', () => {
  const counts = urgencies.map((urgency) => rhythms[urgency].pulses.filter((pulse) => pulse.startMs < 1500).length);
  expect(counts).toEqual([1, 3, 6]);
});

test('the more urgent, the sooner it comes again and the more of the time it sounds', () => {
  const periods = urgencies.map((urgency) => rhythms[urgency].periodMs);
  expect(periods).toEqual([...periods].sort((a, b) => b - a));
  const shares = urgencies.map((urgency) => {
    const { pulses, periodMs } = rhythms[urgency];
    return pulses.reduce((sum, pulse) => sum + pulse.lengthMs, 0) / periodMs;
  });
  expect(shares).toEqual([...shares].sort((a, b) => a - b));
});

test.each(urgencies)('%s: pulses follow each other with gaps, and a longer pause ends the phrase', (urgency) => {
  const { pulses, periodMs } = rhythms[urgency];
  const gaps = pulses.map((pulse, index) => {
    const next = pulses[index + 1]?.startMs ?? periodMs;
    return next - pulse.startMs - pulse.lengthMs;
  });
  const pause = gaps.pop() ?? 0;
  for (const gap of gaps) {
    // Common practice, no source: shorter gaps blur in a reverberant room.
    expect(gap).toBeGreaterThanOrEqual(100);
    expect(pause).toBeGreaterThan(3 * gap);
  }
  expect(pause).toBeGreaterThan(500);
});

test('louder after 30 s and after 2 min', () => {
  expect([0, 29_999, 30_000, 119_999, 120_000, 1e9].map(loudness)).toEqual([0.35, 0.35, 0.65, 0.65, 1, 1]);
});

test('vibration follows the same rhythm', () => {
  expect(vibrationPattern('soon')).toEqual([450]);
  expect(vibrationPattern('due')).toEqual([400, 150, 150, 150, 150]);
  expect(vibrationPattern('over')).toHaveLength(11);
});
