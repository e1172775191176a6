import { expect, test } from 'vitest';
import { rhythms } from '../../src/device/alarm-rhythm.ts';
import { alarmWave, fundamentalHz, harmonics } from '../../src/device/alarm-wave.ts';

const samplesPerSecond = 16_000;
const wave = alarmWave(rhythms.due, samplesPerSecond);
const at = (ms: number) => Math.round((ms / 1000) * samplesPerSecond);

/** Amplitude of one frequency in a stretch of samples (one bin of a discrete Fourier transform). */
function amplitude(samples: Float32Array, hz: number): number {
  let real = 0;
  let imaginary = 0;
  samples.forEach((sample, index) => {
    const angle = (2 * Math.PI * hz * index) / samplesPerSecond;
    real += sample * Math.cos(angle);
    imaginary += sample * Math.sin(angle);
  });
  return (2 * Math.hypot(real, imaginary)) / samples.length;
}

test('one period long, within -1 and 1, loud in a pulse and silent between', () => {
  expect(wave).toHaveLength(at(rhythms.due.periodMs));
  const loudest = (fromMs: number, toMs: number) => Math.max(...wave.subarray(at(fromMs), at(toMs)).map(Math.abs));
  expect(loudest(0, 400)).toBeGreaterThan(0.6);
  expect(loudest(0, 400)).toBeLessThanOrEqual(1);
  expect(loudest(401, 549)).toBe(0);
  expect(loudest(551, 699)).toBeGreaterThan(0.6);
  expect(loudest(1001, 3500)).toBe(0);
});

test('rises and falls without an edge', () => {
  const loudest = (fromMs: number, toMs: number) => Math.max(...wave.subarray(at(fromMs), at(toMs)).map(Math.abs));
  expect(wave[0]).toBe(0);
  expect(loudest(0, 6)).toBeLessThan(0.12);
  expect(loudest(394, 400)).toBeLessThan(0.12);
});

test('fundamental between 500 and 900 Hz with four harmonics below 4 kHz', () => {
  expect(fundamentalHz).toBeGreaterThanOrEqual(500);
  expect(fundamentalHz).toBeLessThanOrEqual(900);
  expect(fundamentalHz * harmonics.length).toBeLessThan(4000);
  // 100 ms of the steady middle: a whole number of turns of every harmonic.
  const steady = wave.subarray(at(100), at(200));
  const sum = harmonics.reduce((total, strength) => total + strength, 0);
  harmonics.forEach((strength, order) => {
    expect(amplitude(steady, fundamentalHz * (order + 1))).toBeCloseTo(strength / sum, 3);
  });
  expect(amplitude(steady, fundamentalHz * 1.5)).toBeLessThan(0.001);
});
