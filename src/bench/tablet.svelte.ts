import { createAlarmSound, type AlarmSound, type SoundState } from '../device/alarm-sound.ts';
import { createAppUpdate, type AppUpdate, type AppUpdateState } from '../device/app-update.ts';
import type { Capability } from '../device/capability.ts';
import { createDisplay, type DisplayState } from '../device/display.ts';
import { createStorageProtection, type StorageProtection, type StorageState } from '../device/storage-protection.ts';
import { createVibration, type Vibration } from '../device/vibration.ts';
import { createWakeLock, type WakeLock, type WakeLockState } from '../device/wake-lock.ts';

/** What the device can do and how it stands, for pages to show. */
export class Tablet {
  readonly wakeLock: WakeLock = createWakeLock();
  readonly alarmSound: AlarmSound = createAlarmSound();
  readonly vibration: Vibration = createVibration();
  readonly storageProtection: StorageProtection = createStorageProtection();
  readonly appUpdate: AppUpdate;
  readonly #display = createDisplay();
  readonly #stops: (() => void)[] = [];
  #askedToProtect = false;

  awake = $state<WakeLockState>('released');
  sound = $state<SoundState>('needs a tap');
  storage = $state.raw<StorageState>({ protection: 'unknown', freeBytes: null });
  display = $state<DisplayState>('tab');
  update = $state<AppUpdateState>('installing');

  constructor(appVersion: string) {
    this.appUpdate = createAppUpdate({ appVersion });
    this.#follow(this.wakeLock, (state) => (this.awake = state));
    this.#follow(this.alarmSound, (state) => (this.sound = state));
    this.#follow(this.storageProtection, (state) => (this.storage = state));
    this.#follow(this.#display, (state) => (this.display = state));
    this.#follow(this.appUpdate, (state) => (this.update = state));
    void this.storageProtection.look();
  }

  /** Asks the browser once a page life not to clear the log when the disk runs full; it answers by how the app is used. */
  async protectOnce(): Promise<void> {
    if (this.#askedToProtect || this.storage.protection === 'protected') return;
    this.#askedToProtect = true;
    await this.storageProtection.ask();
  }

  release(): void {
    for (const stop of this.#stops) stop();
  }

  #follow<State>(capability: Capability<State>, show: (state: State) => void): void {
    const stop = capability.subscribe(show);
    this.#stops.push(() => {
      stop();
      capability.release();
    });
  }
}
