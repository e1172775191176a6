import { expect, test } from 'vitest';
import { createVibration } from '../../src/device/vibration.ts';

test('one phrase of the rhythm, and silence at the end', () => {
  const asked: number[][] = [];
  const vibration = createVibration({
    navigator: {
      vibrate: (pattern) => {
        asked.push(pattern);
        return true;
      },
    },
  });
  expect([vibration.current, vibration.vibrate('soon')]).toEqual(['present', true]);
  vibration.release();
  expect(asked).toEqual([[450], []]);
});

test('absent on tablets without it', () => {
  const vibration = createVibration({ navigator: {} });
  expect([vibration.current, vibration.vibrate('over')]).toEqual(['absent', false]);
});
