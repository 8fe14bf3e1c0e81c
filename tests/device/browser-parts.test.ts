import { afterEach, describe, expect, it, vi } from 'vitest';
import { playTone, unlockSound } from '@/lib/device/alarm-sound';
import { shouldInstallFirst } from '@/lib/device/install-hint';
import { askToNotify, notify, notifyState } from '@/lib/device/notify';
import { askToPersist, storageHealth } from '@/lib/device/storage-health';
import { keepScreenOn } from '@/lib/device/wake-lock';

afterEach(() => {
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

/** A navigator with these parts and the rest of the real one. */
function withNavigator(parts: Record<string, unknown>): void {
  const proxied = new Proxy(navigator, {
    get: (target, key) => (key in parts ? parts[key as string] : (target as never)[key]),
    has: (target, key) => (key in parts ? parts[key as string] !== undefined : key in target),
  });
  vi.stubGlobal('navigator', proxied);
}

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
    withNavigator({ storage: undefined });
    expect(await storageHealth()).toEqual({ persistent: null, freeBytes: null, low: false });
    expect(await askToPersist()).toBeNull();
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
  it('is silent and says so before a tap has unlocked it', async () => {
    expect(playTone('end')).toBe(false);
    vi.stubGlobal('AudioContext', undefined);
    expect(await unlockSound()).toBe(false);
  });
});
