import { afterEach, describe, expect, it, vi } from 'vitest';
import { shouldInstallFirst } from '@/lib/device/install-hint';
import { askToNotify, notify, notifyState } from '@/lib/device/notify';
import { askToPersist, storageHealth } from '@/lib/device/storage-health';
import { keepScreenOn } from '@/lib/device/wake-lock';
import { withNavigator } from '../support/browser';

afterEach(() => {
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

describe('keeping the screen on', () => {
  it('tells when it is kept on, and when the phone lets it go', async () => {
    const told: boolean[] = [];
    let released = () => {};
    const lock = {
      addEventListener: (_: string, listener: () => void) => (released = listener),
      release: vi.fn(async () => undefined),
    };
    withNavigator({ wakeLock: { request: async () => lock } });
    const stop = keepScreenOn((on) => told.push(on));
    await expect.poll(() => told).toEqual([true]);
    released();
    expect(told).toEqual([true, false]);
    stop();
    expect(lock.release).toHaveBeenCalled();
  });

  it('asks again when the page is shown again, and holds no lock that nobody lets go', async () => {
    const locks: { released: boolean; addEventListener: () => void; release: () => Promise<void> }[] = [];
    const request = async () => {
      const lock = {
        released: false,
        addEventListener: () => undefined,
        release: async () => {
          lock.released = true;
        },
      };
      locks.push(lock);
      return lock;
    };
    withNavigator({ wakeLock: { request } });
    const shown = () => document.dispatchEvent(new Event('visibilitychange'));
    const held = () => locks.filter(({ released }) => !released).length;
    const stop = keepScreenOn(() => undefined);
    // Shown while it is still being asked for.
    shown();
    await expect.poll(() => locks.length).toBe(2);
    await expect.poll(held).toBe(1);
    // Hiding the page ends the lock.
    for (const lock of locks) lock.released = true;
    shown();
    await expect.poll(() => locks.length).toBe(3);
    expect(held()).toBe(1);
    stop();
    await expect.poll(held).toBe(0);
    shown();
    await Promise.resolve();
    expect(locks).toHaveLength(3);
  });

  it('lets go of a lock that comes only after it was not wanted any more', async () => {
    const release = vi.fn(async () => undefined);
    let give = (_: unknown) => {};
    withNavigator({ wakeLock: { request: () => new Promise((resolve) => (give = resolve)) } });
    keepScreenOn(() => undefined)();
    give({ released: false, addEventListener: () => undefined, release });
    await expect.poll(() => release.mock.calls.length).toBe(1);
  });

  it('says no where the phone refuses, and where there is no such thing', async () => {
    const told: boolean[] = [];
    withNavigator({ wakeLock: { request: () => Promise.reject(new DOMException('battery', 'NotAllowedError')) } });
    keepScreenOn((on) => told.push(on))();
    withNavigator({ wakeLock: undefined });
    keepScreenOn((on) => told.push(on))();
    await expect.poll(() => told).toEqual([false, false]);
  });
});

describe('notifications', () => {
  it('are not asked for again where they were refused, and not shown', async () => {
    const request = vi.fn();
    vi.stubGlobal('Notification', { permission: 'denied', requestPermission: request });
    expect(await askToNotify()).toBe('denied');
    expect(request).not.toHaveBeenCalled();
    expect(await notify({ title: 'Glue', body: '', tag: 't', address: '/bench' })).toBe(false);
  });

  it.each([
    ['granted', 'allowed'],
    ['denied', 'denied'],
    ['default', 'unasked'],
  ])('asked for in a tap, and answered %s, are %s', async (answer, state) => {
    const asked = {
      permission: 'default',
      requestPermission: vi.fn(async () => {
        asked.permission = answer;
        return answer;
      }),
    };
    vi.stubGlobal('Notification', asked);
    expect(notifyState()).toBe('unasked');
    expect(await askToNotify()).toBe(state);
    expect(asked.requestPermission).toHaveBeenCalledOnce();
  });

  it.each([
    ['the browser has no worker', undefined],
    ['none is installed yet', { getRegistration: async () => undefined }],
    [
      'they were forbidden meanwhile',
      { getRegistration: async () => ({ showNotification: () => Promise.reject(new TypeError('no permission')) }) },
    ],
  ])('are not shown where %s, and nothing breaks', async (_, serviceWorker) => {
    vi.stubGlobal('Notification', { permission: 'granted' });
    withNavigator({ serviceWorker });
    expect(await notify({ title: 'Glue', body: '', tag: 't', address: '/bench' })).toBe(false);
  });

  it('are absent in a browser without them', () => {
    vi.stubGlobal('Notification', undefined);
    expect(notifyState()).toBe('absent');
  });

  it('are shown by the worker, with the address they open', async () => {
    vi.stubGlobal('Notification', { permission: 'granted' });
    const showNotification = vi.fn(async () => undefined);
    withNavigator({ serviceWorker: { getRegistration: async () => ({ showNotification }) } });
    expect(await notify({ title: 'Glue', body: 'Due', tag: 't', address: '/bench?build=1' })).toBe(true);
    expect(showNotification).toHaveBeenCalledWith(
      'Glue',
      expect.objectContaining({ data: { address: '/bench?build=1' } }),
    );
  });
});

describe('the phone’s storage', () => {
  it('is low below 100 MB, and unknown where the browser does not say', async () => {
    withNavigator({ storage: { persisted: async () => true, estimate: async () => ({ quota: 2e8, usage: 1.2e8 }) } });
    expect(await storageHealth()).toEqual({ persistent: true, freeBytes: 8e7, low: true });
    withNavigator({ storage: { persisted: async () => false, estimate: async () => ({ quota: 1e8, usage: 2e8 }) } });
    expect(await storageHealth()).toEqual({ persistent: false, freeBytes: 0, low: true });
    withNavigator({ storage: { estimate: async () => ({}) } });
    expect(await storageHealth()).toEqual({ persistent: null, freeBytes: null, low: false });
    withNavigator({ storage: undefined });
    expect(await storageHealth()).toEqual({ persistent: null, freeBytes: null, low: false });
    expect(await askToPersist()).toBeNull();
  });
});

describe('asking the browser to keep it', () => {
  it.each([true, false])('tells its answer: %s', async (answer) => {
    withNavigator({ storage: { persist: async () => answer } });
    expect(await askToPersist()).toBe(answer);
  });
});

describe('installing first', () => {
  const IPHONE =
    'Mozilla/5.0 (iPhone; CPU iPhone OS 18_1 like Mac OS X) AppleWebKit/605.1.15 Version/18.1 Safari/604.1';
  const screen = (installed: boolean) => vi.stubGlobal('matchMedia', () => ({ matches: installed }));

  it('is asked of an iPhone in a tab alone, and of a tablet that calls itself a computer', () => {
    screen(false);
    withNavigator({ userAgent: IPHONE, maxTouchPoints: 5 });
    expect(shouldInstallFirst()).toBe(true);
    withNavigator({ userAgent: 'Mozilla/5.0 (Macintosh; Intel Mac OS X)', maxTouchPoints: 5 });
    expect(shouldInstallFirst()).toBe(true);
    withNavigator({ userAgent: 'Mozilla/5.0 (Macintosh; Intel Mac OS X)', maxTouchPoints: 0 });
    expect(shouldInstallFirst()).toBe(false);
    withNavigator({ userAgent: 'Mozilla/5.0 (Linux; Android 15)', maxTouchPoints: 5 });
    expect(shouldInstallFirst()).toBe(false);
    screen(true);
    withNavigator({ userAgent: IPHONE, maxTouchPoints: 5 });
    expect(shouldInstallFirst()).toBe(false);
  });
});

describe('the alarm’s sound', () => {
  const started: number[] = [];
  class Sound {
    state = 'suspended';
    currentTime = 10;
    destination = {};
    static allowed = true;
    async resume() {
      if (!Sound.allowed) throw new DOMException('a call holds it', 'InvalidStateError');
      this.state = 'running';
    }
    createGain() {
      const ramp = {
        setValueAtTime: () => {},
        linearRampToValueAtTime: () => {},
        exponentialRampToValueAtTime: () => {},
      };
      return { gain: ramp, connect: () => undefined };
    }
    createOscillator() {
      const begin = (at: number) => started.push(at);
      return { frequency: { value: 0 }, connect: (to: unknown) => to, start: begin, stop: () => undefined };
    }
  }
  /** As on a page just opened, where no tap has been. */
  async function fresh() {
    vi.resetModules();
    started.length = 0;
    Sound.allowed = true;
    return import('@/lib/device/alarm-sound');
  }

  it('is silent and says so before a tap has unlocked it', async () => {
    const { playTone, unlockSound } = await fresh();
    expect(playTone('end')).toBe(false);
    vi.stubGlobal('AudioContext', undefined);
    expect(await unlockSound()).toBe(false);
  });

  it('plays at once after a tap, the end unlike the half', async () => {
    vi.stubGlobal('AudioContext', Sound);
    const { playTone, unlockSound } = await fresh();
    expect(await unlockSound()).toBe(true);
    expect(playTone('half')).toBe(true);
    const half = started.splice(0);
    expect(playTone('end')).toBe(true);
    expect(half).toEqual([10, 10.2]);
    expect(started).toHaveLength(3);
  });

  it('says that it is silent while a phone call holds it, and plays after the next tap', async () => {
    vi.stubGlobal('AudioContext', Sound);
    const { playTone, unlockSound } = await fresh();
    Sound.allowed = false;
    expect(await unlockSound()).toBe(false);
    expect(playTone('end')).toBe(false);
    Sound.allowed = true;
    expect(await unlockSound()).toBe(true);
    expect(playTone('end')).toBe(true);
  });
});
