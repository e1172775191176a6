import type { Batch, Bench } from '../core/batch/types.ts';
import type { Command } from '../core/command/commands.ts';
import { alarms, type Alarm, type Raised } from '../core/timer/alarm.ts';
import { clocks } from '../core/timer/clocks.ts';
import { byAttention } from '../core/timer/order.ts';
import { readClock, type Reading } from '../core/timer/reading.ts';
import type { Clock } from '../core/timer/clock.ts';
import type { Moment } from '../core/unit/moment.ts';
import type { Answer, BenchLog, NotSaved } from './bench-log.ts';
import { ShiftSoFar } from './shift-so-far.svelte.ts';

/** Whether what was tapped is on the disk. */
export type Saving =
  { readonly state: 'saved' } | { readonly state: 'saving' } | ({ readonly state: 'not saved' } & NotSaved);

/** The bench as pages see it: what the log says, read at `now`. One object a page life; nothing in it is stored. */
export class BenchState {
  readonly #log: BenchLog;
  #raised: Raised = {};
  bench = $state.raw<Bench>() as Bench;
  now = $state.raw<Moment>() as Moment;
  saving = $state.raw<Saving>({ state: 'saved' });
  /** Wall time of the last entry on the disk, in ms. */
  savedWallMs = $state(0);
  calling = $state.raw<readonly Alarm[]>([]);

  readonly openBatches: readonly Batch[] = $derived(Object.values(this.bench.batches).filter((batch) => !batch.closed));
  readonly clocks: readonly Clock[] = $derived(clocks(this.bench));
  /** All running clocks, the most urgent first. */
  readonly readings: readonly Reading[] = $derived(byAttention(this.clocks.map((clock) => readClock(clock, this.now))));

  readonly #soFar: ShiftSoFar;

  /** Whether this page life has written any work. */
  wrote = false;
  readonly #beforeAsking: () => void;

  /** `beforeAsking` puts on record what the clocks did, before an entry rests on them. */
  constructor(log: BenchLog, beforeAsking: () => void = () => {}) {
    this.#log = log;
    this.#beforeAsking = beforeAsking;
    this.#look();
    log.subscribe(() => this.#look());
    this.#soFar = new ShiftSoFar(this);
  }

  /** Of the shift that runs, from open and closed batches; null until they are read. */
  get shiftSoFar(): { readonly passed: number; readonly sentBack: number } | null {
    return this.#soFar.numbers;
  }

  get log(): BenchLog {
    return this.#log;
  }

  /** Reads the time again, and with it which clocks call; answers with the alarms that are new. */
  tick(): readonly Alarm[] {
    this.now = this.#log.now;
    return this.#lookAtClocks();
  }

  #lookAtClocks(): readonly Alarm[] {
    const looked = alarms(this.clocks, this.now, this.#raised);
    this.#raised = looked.raised;
    if (looked.alarms.length > 0 || this.calling.length > 0) this.calling = looked.alarms;
    return looked.alarms.filter(({ fresh }) => fresh);
  }

  async ask(command: Command): Promise<Answer> {
    this.#beforeAsking();
    this.saving = { state: 'saving' };
    const answer = await this.#log.ask(command);
    this.wrote ||= answer.ok;
    this.#settle(answer);
    return answer;
  }

  async note(drafts: Parameters<BenchLog['write']>[0]): Promise<Answer> {
    const answer = await this.#log.write(drafts);
    this.#settle(answer);
    return answer;
  }

  readingsOf(batch: string): readonly Reading[] {
    return this.readings.filter(({ clock }) => clock.batch === batch);
  }

  #settle(answer: Answer): void {
    this.saving =
      !answer.ok && answer.error.code === 'not saved' ? { state: 'not saved', ...answer.error } : { state: 'saved' };
    // The time was read with the news; read again, everything that shows it would be made twice.
    this.#lookAtClocks();
  }

  #look(): void {
    this.bench = this.#log.bench;
    this.now = this.#log.now;
    this.savedWallMs = this.#log.head?.wall ?? 0;
  }
}
