import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { registerServiceWorker, shellIsReady } from '@/lib/device/service-worker';
import { withNavigator } from '../support/browser';

/** A worker as the page sees it. */
class Worker extends EventTarget {
  readonly told: unknown[] = [];
  postMessage(message: unknown) {
    this.told.push(message);
  }
}

class Registration extends EventTarget {
  installing: Worker | null = null;
  waiting: Worker | null = null;
  active: Worker | null = null;
}

class Container extends EventTarget {
  controller: Worker | null = null;
  readonly registration = new Registration();
  ready: Promise<Registration> = Promise.resolve(this.registration);
  readonly register = vi.fn(async () => this.registration);

  /** A newer version was found, and its files are stored. */
  install(worker = new Worker()): Worker {
    this.registration.installing = worker;
    this.registration.dispatchEvent(new Event('updatefound'));
    this.registration.installing = null;
    this.registration.waiting = worker;
    worker.dispatchEvent(new Event('statechange'));
    return worker;
  }
}

let container: Container;
let reload: ReturnType<typeof vi.spyOn>;
beforeEach(() => {
  vi.stubEnv('NODE_ENV', 'production');
  container = new Container();
  withNavigator({ serviceWorker: container });
  reload = vi.spyOn(location, 'reload').mockImplementation(() => undefined);
});
afterEach(() => {
  vi.useRealTimers();
  vi.unstubAllEnvs();
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

/** Registers, and gives what the page was told. */
async function registered() {
  const told: (() => void)[] = [];
  await registerServiceWorker((takeOver) => told.push(takeOver));
  return told;
}

describe('the offline program on this phone', () => {
  it('is asked for afresh, past the browser’s own cache', async () => {
    await registered();
    expect(container.register).toHaveBeenCalledWith('/sw.js', { updateViaCache: 'none' });
  });

  it('put there for the first time is no update, and reloads nothing', async () => {
    const told = await registered();
    container.install();
    container.dispatchEvent(new Event('controllerchange'));
    expect(told).toEqual([]);
    expect(reload).not.toHaveBeenCalled();
  });

  it('in a newer version waits until the person says so, then the page loads anew', async () => {
    container.controller = new Worker();
    const told = await registered();
    const newer = container.install();
    expect(told).toHaveLength(1);
    expect(newer.told).toEqual([]);
    told[0]!();
    expect(newer.told).toEqual([{ type: 'take-over' }]);
    expect(reload).not.toHaveBeenCalled();
    container.dispatchEvent(new Event('controllerchange'));
    expect(reload).toHaveBeenCalledOnce();
  });

  it('that waited since an earlier opening is told at this one', async () => {
    container.controller = new Worker();
    container.registration.waiting = new Worker();
    expect(await registered()).toHaveLength(1);
  });

  it('gives way to the newest one, though an older one was told of', async () => {
    container.controller = new Worker();
    const told = await registered();
    const [older, newest] = [container.install(), container.install()];
    told[0]!();
    expect([older.told, newest.told]).toEqual([[], [{ type: 'take-over' }]]);
  });

  it('taken over for another tab does not reload this one in the middle of something', async () => {
    container.controller = new Worker();
    await registered();
    container.install();
    container.dispatchEvent(new Event('controllerchange'));
    expect(reload).not.toHaveBeenCalled();
  });

  it('is left out where the browser has no such thing, and while it is being developed', async () => {
    withNavigator({ serviceWorker: undefined });
    expect(await registered()).toEqual([]);
    withNavigator({ serviceWorker: container });
    vi.stubEnv('NODE_ENV', 'development');
    await registered();
    expect(container.register).not.toHaveBeenCalled();
  });
});

describe('whether the bench opens with no signal', () => {
  it('is so once its program is stored whole', async () => {
    container.registration.active = new Worker();
    expect(await shellIsReady()).toBe(true);
  });

  it('is not so when storing it takes too long, and the wait has an end', async () => {
    vi.useFakeTimers();
    container.ready = new Promise(() => undefined);
    const ready = shellIsReady();
    await vi.advanceTimersByTimeAsync(30_000);
    expect(await ready).toBe(false);
  });

  it('is not so in a browser without workers', async () => {
    withNavigator({ serviceWorker: undefined });
    expect(await shellIsReady()).toBe(false);
  });
});
