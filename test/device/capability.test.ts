import { expect, test } from 'vitest';
import { observed } from '../../src/device/capability.ts';

test('a listener hears the state at once, then every change, then nothing', () => {
  const state = observed('a');
  const heard: string[] = [];
  const stop = state.subscribe((value) => heard.push(value));
  state.set('a');
  state.set('b');
  stop();
  state.set('c');
  expect(heard).toEqual(['a', 'b']);
  expect(state.current).toBe('c');
});

test('one function subscribed twice is released one at a time', () => {
  const state = observed(0);
  let calls = 0;
  const listener = () => void (calls += 1);
  const stop = state.subscribe(listener);
  state.subscribe(listener);
  stop();
  state.set(1);
  expect(calls).toBe(3);
});
