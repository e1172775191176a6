type Granted = (lock: Lock | null) => unknown;

interface Request {
  readonly granted: Granted;
  readonly resolve: (value: unknown) => void;
  readonly reject: (reason: unknown) => void;
}

const aborted = () => new DOMException('planned by a test', 'AbortError');

/** Exclusive Web Locks of one origin, as far as the writer uses them: a queue, ifAvailable, steal, signal. */
export function fakeLocks(): Pick<LockManager, 'request'> {
  const held = new Map<string, Request>();
  const queues = new Map<string, Request[]>();

  const queueOf = (name: string): Request[] => {
    const queue = queues.get(name) ?? [];
    queues.set(name, queue);
    return queue;
  };

  function grant(name: string, request: Request): void {
    held.set(name, request);
    Promise.resolve(request.granted({ name, mode: 'exclusive' })).then(
      (value) => {
        if (held.get(name) !== request) return;
        held.delete(name);
        request.resolve(value);
        next(name);
      },
      () => {},
    );
  }

  function next(name: string): void {
    const first = queueOf(name).shift();
    if (first !== undefined) grant(name, first);
  }

  const request = (name: string, options: LockOptions, granted: Granted): Promise<unknown> =>
    new Promise((resolve, reject) => {
      const asked = { granted, resolve, reject };
      queueMicrotask(() => {
        if (options.signal?.aborted === true) return reject(aborted());
        const holder = held.get(name);
        if (holder !== undefined && options.steal === true) {
          holder.reject(aborted());
          return grant(name, asked);
        }
        if (holder === undefined && queueOf(name).length === 0) return grant(name, asked);
        if (options.ifAvailable === true) return resolve(granted(null));
        queueOf(name).push(asked);
        options.signal?.addEventListener('abort', () => {
          const queue = queueOf(name);
          if (!queue.includes(asked)) return;
          queue.splice(queue.indexOf(asked), 1);
          reject(aborted());
        });
      });
    });

  return { request: request as LockManager['request'] };
}

type Channel = Pick<BroadcastChannel, 'postMessage' | 'addEventListener' | 'close'>;

/** One broadcast channel: each call of the result joins it, as one window does. */
export function fakeChannel(): () => Channel {
  const members = new Set<EventTarget>();
  return () => {
    const own = new EventTarget();
    members.add(own);
    return {
      postMessage: (data: unknown) => {
        for (const other of members) {
          if (other !== own) queueMicrotask(() => other.dispatchEvent(new MessageEvent('message', { data })));
        }
      },
      addEventListener: own.addEventListener.bind(own) as Channel['addEventListener'],
      close: () => members.delete(own),
    };
  };
}
