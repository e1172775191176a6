import { loudness, rhythms, type Urgency } from './alarm-rhythm.ts';
import { alarmWave } from './alarm-wave.ts';
import { observed, tapEvents, type Capability } from './capability.ts';

declare global {
  interface Navigator {
    /** Safari and iPadOS 16.4 and later; not in the DOM types yet. */
    readonly audioSession?: { type: string };
  }
}

export type SoundState = 'ready' | 'needs a tap' | 'absent';

/** The most urgent alarm that nobody has seen yet, and for how long it has been asking. */
export interface Alarm {
  readonly urgency: Urgency;
  readonly heldForMs: number;
}

export interface AlarmSound extends Capability<SoundState> {
  /** Tell it every second what holds; null is silence. The same urgency goes on without a break, and grows louder. */
  sound(alarm: Alarm | null): void;
  /** Plays one phrase at full loudness. */
  test(urgency: Urgency): void;
}

export type AudioContextLike = Pick<
  AudioContext,
  | 'createBuffer'
  | 'createBufferSource'
  | 'createGain'
  | 'currentTime'
  | 'destination'
  | 'resume'
  | 'close'
  | 'sampleRate'
> &
  EventTarget & { readonly state: string };

export interface AlarmSoundWindow extends EventTarget {
  readonly document: EventTarget;
  readonly navigator: { readonly audioSession?: { type: string } };
  readonly performance: { now(): number };
  readonly AudioContext?: new () => AudioContextLike;
}

interface Playing {
  readonly urgency: Urgency;
  readonly source: AudioBufferSourceNode;
  readonly gain: GainNode;
}

/**
 * A phrase is looped by the audio thread, so it keeps its rhythm whatever timers do. No context is made before the first
 * tap, since browsers refuse to run it; and every later tap checks it, because after a lock screen it may be
 * interrupted, or say that it runs while its time stands still. Only a new context helps then.
 */
export function createAlarmSound(window: AlarmSoundWindow = globalThis.window): AlarmSound {
  const Context = window.AudioContext;
  const state = observed<SoundState>(Context === undefined ? 'absent' : 'needs a tap');
  let context: AudioContextLike | null = null;
  let playing: Playing | null = null;
  let wanted: Alarm | null = null;
  let checked = { audioS: 0, pageMs: 0 };
  let resumesTried = 0;

  const play = (from: AudioContextLike, urgency: Urgency, level: number, loop: boolean): Playing => {
    const wave = alarmWave(rhythms[urgency], from.sampleRate);
    const buffer = from.createBuffer(1, wave.length, from.sampleRate);
    buffer.copyToChannel(wave, 0);
    const source = from.createBufferSource();
    source.buffer = buffer;
    source.loop = loop;
    const gain = from.createGain();
    gain.gain.value = level;
    source.connect(gain).connect(from.destination);
    source.start();
    return { urgency, source, gain };
  };

  const silence = () => {
    playing?.source.stop();
    playing?.gain.disconnect();
    playing = null;
  };

  const follow = () => {
    if (context === null || wanted === null || playing?.urgency !== wanted.urgency) silence();
    if (context === null || wanted === null) return;
    const level = loudness(wanted.heldForMs);
    playing ??= play(context, wanted.urgency, level, true);
    playing.gain.gain.value = level;
  };

  const makeContext = (Constructor: NonNullable<AlarmSoundWindow['AudioContext']>) => {
    const old = context;
    playing = null;
    if (old !== null && old.state !== 'closed') void old.close().catch(() => undefined);
    // Without it the mute switch of an iPad silences the alarm.
    if (window.navigator.audioSession !== undefined) window.navigator.audioSession.type = 'playback';
    const made = new Constructor();
    const tell = () => {
      if (context === made) state.set(made.state === 'running' ? 'ready' : 'needs a tap');
    };
    context = made;
    resumesTried = 0;
    checked = { audioS: made.currentTime, pageMs: window.performance.now() };
    made.addEventListener('statechange', tell);
    void made.resume().then(tell, tell);
    tell();
    follow();
  };

  /** Says that it runs, but its time went on less than half as fast as the page's since the last check, 0.5 s ago or more. */
  const stuck = (running: AudioContextLike): boolean => {
    const pageMs = window.performance.now() - checked.pageMs;
    if (running.state !== 'running' || pageMs < 500) return false;
    const audioMs = (running.currentTime - checked.audioS) * 1000;
    checked = { audioS: running.currentTime, pageMs: window.performance.now() };
    return audioMs < pageMs / 2;
  };

  const arm = () => {
    if (Context === undefined) return;
    if (context === null || context.state === 'closed' || context.state === 'interrupted' || stuck(context)) {
      makeContext(Context);
    } else if (context.state === 'suspended') {
      resumesTried += 1;
      if (resumesTried > 1) makeContext(Context);
      else void context.resume().catch(() => undefined);
    } else {
      resumesTried = 0;
    }
  };

  const stop = new AbortController();
  for (const type of tapEvents) window.addEventListener(type, arm, { signal: stop.signal, capture: true });
  window.document.addEventListener(
    'visibilitychange',
    () => {
      // A context may stand still while hidden: time away says nothing about whether it is stuck now.
      if (context === null) return;
      checked = { audioS: context.currentTime, pageMs: window.performance.now() };
      if (context.state !== 'running' && context.state !== 'closed') void context.resume().catch(() => undefined);
    },
    { signal: stop.signal },
  );

  return {
    get current() {
      return state.current;
    },
    subscribe: state.subscribe,
    sound(alarm) {
      wanted = alarm;
      follow();
    },
    test(urgency) {
      arm();
      if (context !== null) play(context, urgency, 1, false);
    },
    release() {
      stop.abort();
      silence();
      if (context !== null && context.state !== 'closed') void context.close().catch(() => undefined);
      context = null;
    },
  };
}
