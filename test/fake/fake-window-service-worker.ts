import type { Registrar, RegistrationLike, WorkerLike } from '../../src/device/app-update.ts';
import type { ServiceWorkerMessage } from '../../src/device/service-worker-message.ts';
import { FakeWindow } from './fake-window.ts';

export class FakeWorker extends EventTarget implements WorkerLike {
  state = 'installing';
  /** How it answers a stock-taking; null is silence. */
  missing: number | null = 0;
  readonly asked: ServiceWorkerMessage[] = [];

  postMessage(message: ServiceWorkerMessage, transfer: MessagePort[]): void {
    this.asked.push(message);
    if (this.missing !== null) transfer[0]?.postMessage({ missing: this.missing });
    transfer[0]?.close();
  }
  become(state: string): void {
    this.state = state;
    this.dispatchEvent(new Event('statechange'));
  }
}

class FakeRegistration extends EventTarget implements RegistrationLike {
  installing: FakeWorker | null = null;
  waiting: FakeWorker | null = null;
  active: FakeWorker | null = null;
}

/** The browser's side of a registration, moved by hand through the life of its workers. */
export class ServiceWorkerFakeWindow extends FakeWindow {
  readonly registration = new FakeRegistration();
  readonly container = Object.assign(new EventTarget(), { controller: null as FakeWorker | null });
  readonly navigator: { readonly serviceWorker?: EventTarget & { readonly controller: FakeWorker | null } } = {
    serviceWorker: this.container,
  };
  reloads = 0;
  readonly location = { reload: () => void (this.reloads += 1) };
  readonly scripts: string[] = [];
  refuses = false;
  updates = 0;
  skips = 0;

  readonly connect = (scriptUrl: string): Promise<Registrar> => {
    this.scripts.push(scriptUrl);
    return Promise.resolve({
      register: () => (this.refuses ? Promise.reject(new Error('no')) : Promise.resolve(this.registration)),
      update: () => {
        this.updates += 1;
        return this.refuses ? Promise.reject(new TypeError('offline')) : Promise.resolve();
      },
      messageSkipWaiting: () => void (this.skips += 1),
    });
  };

  /** A tablet that has the app already. */
  withActive(worker = new FakeWorker()): FakeWorker {
    worker.state = 'activated';
    this.registration.active = worker;
    this.container.controller = worker;
    return worker;
  }
  install(worker = new FakeWorker()): FakeWorker {
    this.registration.installing = worker;
    this.registration.dispatchEvent(new Event('updatefound'));
    return worker;
  }
  installed(worker: FakeWorker): void {
    this.registration.installing = null;
    this.registration.waiting = worker;
    worker.become('installed');
  }
  installFails(worker: FakeWorker): void {
    this.registration.installing = null;
    worker.become('redundant');
  }
  activate(worker: FakeWorker): void {
    this.registration.waiting = null;
    this.registration.active = worker;
    worker.become('activating');
    this.container.controller = worker;
    this.container.dispatchEvent(new Event('controllerchange'));
    worker.become('activated');
  }
}
