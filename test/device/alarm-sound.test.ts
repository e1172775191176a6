import { expect, test } from 'vitest';
import { createAlarmSound } from '../../src/device/alarm-sound.ts';
import { FakeWindow, settle } from '../fake/fake-window.ts';
import { FakeAudioContext, FakeAudioWindow } from '../fake/fake-window-audio.ts';

const running = (context: FakeAudioContext) => context.sources.filter((source) => source.running);

test('no context before the first tap, then ready and playing over the mute switch', () => {
  const window = new FakeAudioWindow();
  const sound = createAlarmSound(window);
  sound.sound({ urgency: 'due', heldForMs: 0 });
  expect([sound.current, FakeAudioContext.made.length]).toEqual(['needs a tap', 0]);
  window.tap();
  expect([sound.current, window.navigator.audioSession.type]).toEqual(['ready', 'playback']);
  expect(running(window.latest)).toHaveLength(1);
});

test('a browser without it says so', () => {
  const window = Object.assign(new FakeWindow(), { navigator: {} });
  const sound = createAlarmSound(window);
  window.tap();
  sound.sound({ urgency: 'over', heldForMs: 0 });
  sound.test('soon');
  expect(sound.current).toBe('absent');
});

test('goes on without a break while it holds, louder with time, and stops', () => {
  const window = new FakeAudioWindow();
  const sound = createAlarmSound(window);
  window.tap();
  for (const heldForMs of [0, 1000, 30_000, 120_000]) sound.sound({ urgency: 'due', heldForMs });
  expect(window.latest.sources).toHaveLength(1);
  expect(window.latest.sources[0]?.loop).toBe(true);
  expect(window.latest.gains[0]?.gain.value).toBe(1);
  sound.sound({ urgency: 'due', heldForMs: 500 });
  expect(window.latest.gains[0]?.gain.value).toBe(0.35);
  sound.sound(null);
  expect(running(window.latest)).toHaveLength(0);
  expect(window.latest.gains[0]?.connected).toBe(false);
});

test('another urgency replaces the phrase', () => {
  const window = new FakeAudioWindow();
  const sound = createAlarmSound(window);
  window.tap();
  sound.sound({ urgency: 'soon', heldForMs: 0 });
  sound.sound({ urgency: 'over', heldForMs: 0 });
  expect(window.latest.sources.map((source) => source.running)).toEqual([false, true]);
});

test.each(['interrupted', 'closed'])('%s: the next tap makes a new context and the alarm goes on', (state) => {
  const window = new FakeAudioWindow();
  const sound = createAlarmSound(window);
  window.tap();
  sound.sound({ urgency: 'due', heldForMs: 0 });
  const old = window.latest;
  old.become(state);
  expect(sound.current).toBe('needs a tap');
  window.tap();
  expect(window.latest).not.toBe(old);
  expect([sound.current, running(window.latest).length, old.state]).toEqual(['ready', 1, 'closed']);
});

test('says it runs but its time stands: the next tap makes a new context', () => {
  const window = new FakeAudioWindow();
  createAlarmSound(window);
  window.tap();
  window.time.pass(2000);
  window.tap();
  expect(FakeAudioContext.made).toHaveLength(1);
  window.latest.stuck = true;
  window.time.pass(2000);
  window.tap();
  expect(FakeAudioContext.made).toHaveLength(2);
});

test('time away is no sign of being stuck', () => {
  const window = new FakeAudioWindow();
  createAlarmSound(window);
  window.tap();
  window.show('hidden');
  window.latest.stuck = true;
  window.time.pass(600_000);
  window.show('visible');
  window.latest.stuck = false;
  window.tap();
  expect(FakeAudioContext.made).toHaveLength(1);
});

test('suspended: one tap resumes, and if that did nothing the next makes a new context', async () => {
  const window = new FakeAudioWindow();
  const sound = createAlarmSound(window);
  window.tap();
  const old = window.latest;
  old.become('suspended');
  const before = old.resumed;
  window.tap();
  await settle();
  expect([sound.current, old.resumed - before, FakeAudioContext.made.length]).toEqual(['needs a tap', 1, 1]);
  window.tap();
  expect([sound.current, FakeAudioContext.made.length]).toEqual(['ready', 2]);
});

test('a context that begins suspended is ready when it says so', () => {
  const window = new FakeAudioWindow();
  FakeAudioContext.begins = 'suspended';
  const sound = createAlarmSound(window);
  window.tap();
  expect(sound.current).toBe('needs a tap');
  window.latest.become('running');
  expect(sound.current).toBe('ready');
});

test('an old context has no more say', () => {
  const window = new FakeAudioWindow();
  const sound = createAlarmSound(window);
  window.tap();
  const old = window.latest;
  old.become('interrupted');
  window.tap();
  old.become('suspended');
  expect(sound.current).toBe('ready');
});

test('the test sound is one phrase at full loudness, also without an alarm', () => {
  const window = new FakeAudioWindow();
  const sound = createAlarmSound(window);
  sound.test('over');
  expect(window.latest.sources.map((source) => [source.running, source.loop])).toEqual([[true, false]]);
  expect(window.latest.gains[0]?.gain.value).toBe(1);
});

test('release silences and closes', () => {
  const window = new FakeAudioWindow();
  const sound = createAlarmSound(window);
  window.tap();
  sound.sound({ urgency: 'due', heldForMs: 0 });
  sound.release();
  window.tap();
  expect([window.latest.state, running(window.latest).length, FakeAudioContext.made.length]).toEqual(['closed', 0, 1]);
});
