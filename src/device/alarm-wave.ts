import type { Rhythm } from './alarm-rhythm.ts';

/**
 * 700 Hz: between 500 and 900 Hz age costs little hearing, and a small speaker still plays it. The harmonics carry it
 * through noise that masks one band.
 */
export const fundamentalHz = 700;

/** Strength of the fundamental and of the harmonics at 2, 3, 4 and 5 times its frequency. */
export const harmonics: readonly number[] = [1, 0.8, 0.6, 0.45, 0.3];

/** Share of a pulse spent rising, and again falling: a hard edge clicks and hides the rhythm. */
const edge = 0.15;

/** One whole period of a rhythm as samples between -1 and 1, to be looped by the audio thread. */
export function alarmWave(rhythm: Rhythm, samplesPerSecond: number): Float32Array<ArrayBuffer> {
  const samples = new Float32Array(Math.round((rhythm.periodMs / 1000) * samplesPerSecond));
  const sum = harmonics.reduce((total, strength) => total + strength, 0);
  for (const pulse of rhythm.pulses) {
    const first = Math.round((pulse.startMs / 1000) * samplesPerSecond);
    const count = Math.round((pulse.lengthMs / 1000) * samplesPerSecond);
    for (let index = 0; index < count; index += 1) {
      const share = index / count;
      const level = Math.min(1, share / edge, (1 - share) / edge);
      const turns = (fundamentalHz * index) / samplesPerSecond;
      const tone = harmonics.reduce((total, s, order) => total + s * Math.sin(2 * Math.PI * (order + 1) * turns), 0);
      samples[first + index] = (level * tone) / sum;
    }
  }
  return samples;
}
