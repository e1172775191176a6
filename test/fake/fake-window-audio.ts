import { FakeWindow } from './fake-window.ts';

class FakeNode {
  readonly gain = { value: 1 };
  buffer: unknown = null;
  loop = false;
  running = false;
  connected = true;
  connect<Node>(to: Node): Node {
    return to;
  }
  disconnect(): void {
    this.connected = false;
  }
  start(): void {
    this.running = true;
  }
  stop(): void {
    this.running = false;
  }
}

/** As much of a Web Audio context as the alarm uses; its time goes on with the window's unless it is stuck. */
export class FakeAudioContext extends EventTarget {
  static made: FakeAudioContext[] = [];
  /** How the next context begins; iPads say "suspended" until a tap. */
  static begins: 'running' | 'suspended' = 'running';
  static now: () => number = () => 0;

  state: string = FakeAudioContext.begins;
  stuck = false;
  resumed = 0;
  readonly sampleRate = 8000;
  readonly destination = new FakeNode();
  readonly sources: FakeNode[] = [];
  readonly gains: FakeNode[] = [];
  readonly #bornMs = FakeAudioContext.now();

  constructor() {
    super();
    FakeAudioContext.made.push(this);
  }

  get currentTime(): number {
    return this.stuck ? 0 : (FakeAudioContext.now() - this.#bornMs) / 1000;
  }
  createBuffer(_channels: number, length: number) {
    return { length, copyToChannel: () => undefined };
  }
  createBufferSource(): FakeNode {
    const source = new FakeNode();
    this.sources.push(source);
    return source;
  }
  createGain(): FakeNode {
    const gain = new FakeNode();
    this.gains.push(gain);
    return gain;
  }
  resume(): Promise<void> {
    this.resumed += 1;
    return Promise.resolve();
  }
  close(): Promise<void> {
    this.become('closed');
    return Promise.resolve();
  }
  become(state: string): void {
    this.state = state;
    this.dispatchEvent(new Event('statechange'));
  }
}

export class FakeAudioWindow extends FakeWindow {
  readonly navigator = { audioSession: { type: 'auto' } };
  // The fake has only what the alarm calls, so the type is claimed, not met.
  readonly AudioContext = FakeAudioContext as unknown as new () => AudioContext;

  constructor() {
    super();
    FakeAudioContext.made = [];
    FakeAudioContext.begins = 'running';
    FakeAudioContext.now = () => this.time.monoMs;
  }

  /** The context in use. */
  get latest(): FakeAudioContext {
    const context = FakeAudioContext.made.at(-1);
    if (context === undefined) throw new Error('no audio context was made');
    return context;
  }
}
