import path from 'node:path';
import { afterAll, beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';

const origin = 'http://127.0.0.1:3000';

/** What the worker was set up with, and the files of this version. */
const stored = vi.hoisted(() => ({ options: {} as Record<string, unknown>, files: new Map<string, string>() }));
vi.mock('serwist', () => ({
  Serwist: class {
    constructor(options: Record<string, unknown>) {
      stored.options = options;
    }
    handleInstall = vi.fn();
    handleActivate = vi.fn();
    async matchPrecache(file: string) {
      const text = stored.files.get(file);
      if (text === undefined) return undefined;
      return Object.defineProperty(new Response(text), 'url', { value: `${origin}${file}` });
    }
  },
}));

interface Tab {
  url: string;
  focus: () => Promise<Tab>;
  navigate: (address: string) => Promise<void>;
}
const tabs: Tab[] = [];
const scope = Object.assign(new EventTarget(), {
  location: { origin },
  __SW_MANIFEST: [{ url: '/bench', revision: '1' }],
  skipWaiting: vi.fn(async () => undefined),
  clients: { matchAll: async () => tabs, openWindow: vi.fn(async () => null) },
});
const network = vi.fn<(request: { url: string }) => Promise<Response>>();

beforeAll(async () => {
  vi.stubGlobal('self', scope);
  vi.stubGlobal('fetch', network);
  // By its path: its types are those of a worker, which this project's pages and tests do not know.
  await import(path.resolve('worker/service-worker.ts'));
});
afterAll(() => vi.unstubAllGlobals());
beforeEach(() => {
  stored.files = new Map([
    ['/bench', 'the bench'],
    ['/offline', 'no signal: the bench is here'],
    ['/_next/static/a.js', 'a chunk'],
  ]);
  tabs.length = 0;
  vi.clearAllMocks();
  network.mockImplementation(async () => new Response('from the network'));
});

function noSignal(): void {
  network.mockImplementation(() => Promise.reject(new TypeError('no network')));
}

/** The worker's answer to a request; null when it leaves it to the browser. */
async function answer(address: string, { method = 'GET', mode = 'navigate', destination = 'document' } = {}) {
  let given: Promise<Response> | null = null;
  const request = { url: new URL(address, origin).href, method, mode, destination };
  const respondWith = (response: Promise<Response>) => (given = response);
  scope.dispatchEvent(Object.assign(new Event('fetch'), { request, respondWith }));
  return given as Promise<Response> | null;
}

const told = (type: string, parts: object) => scope.dispatchEvent(Object.assign(new Event(type), parts));

describe('with no signal', () => {
  beforeEach(noSignal);

  it.each(['/bench', '/bench?build=1&view=step&step=rip', '/bench/'])('%s opens the bench', async (address) => {
    expect(await (await answer(address))!.text()).toBe('the bench');
    expect(network).not.toHaveBeenCalled();
  });

  it('a page of the desk says that there is no signal, and where the bench is', async () => {
    expect(await (await answer('/desk'))!.text()).toBe('no signal: the bench is here');
  });

  it('a chunk of this version is there', async () => {
    const chunk = await answer('/_next/static/a.js', { mode: 'no-cors', destination: 'script' });
    expect(await chunk!.text()).toBe('a chunk');
  });

  it('the thread that works out cuts keeps the address that it was asked by', async () => {
    const asked = { mode: 'same-origin', destination: 'worker' };
    expect((await answer('/_next/static/a.js#params', asked))!.url).toBe('');
    expect((await answer('/_next/static/a.js', { ...asked, destination: 'script' }))!.url).toContain('/a.js');
  });

  it('what is not stored fails as without a worker', async () => {
    await expect(answer('/_next/static/b.js', { mode: 'no-cors' })).rejects.toThrow('no network');
  });
});

describe('with a signal', () => {
  it('the bench opens from the phone all the same, of one version with its chunks', async () => {
    expect(await (await answer('/bench'))!.text()).toBe('the bench');
    expect(network).not.toHaveBeenCalled();
  });

  it('the desk comes from the server', async () => {
    expect(await (await answer('/desk'))!.text()).toBe('from the network');
  });

  it('a bench that the browser has cleared away is fetched', async () => {
    stored.files.clear();
    expect(await (await answer('/bench'))!.text()).toBe('from the network');
  });

  it.each([
    ['/api/me', { mode: 'cors' }],
    ['/api/builds/1/log', { method: 'POST', mode: 'cors' }],
    ['/desk?_rsc=1', { mode: 'cors' }],
    ['https://elsewhere.example/bench', {}],
  ])('%s is none of its business', async (address, asked) => {
    expect(await answer(address, asked)).toBeNull();
  });
});

describe('a newer version', () => {
  it('waits, and takes over when it is told to and at nothing else', () => {
    expect(stored.options).toMatchObject({ skipWaiting: false, precacheEntries: scope.__SW_MANIFEST });
    for (const data of [null, 'take-over', { type: 'other' }]) told('message', { data });
    expect(scope.skipWaiting).not.toHaveBeenCalled();
    told('message', { data: { type: 'take-over' } });
    expect(scope.skipWaiting).toHaveBeenCalledOnce();
  });

  it('keeps nothing but its own files: no answer of the server', () => {
    expect(stored.options.runtimeCaching).toEqual([]);
  });
});

describe('a tapped notification', () => {
  async function tap(data: unknown) {
    const close = vi.fn();
    let until: Promise<void> = Promise.resolve();
    told('notificationclick', {
      notification: { close, data },
      waitUntil: (promise: Promise<void>) => (until = promise),
    });
    await until;
    expect(close).toHaveBeenCalled();
  }

  function tab(url: string) {
    const one = { url, focus: vi.fn(async () => one as Tab), navigate: vi.fn(async () => undefined) };
    tabs.push(one);
    return one;
  }

  it('brings the bench that is open to the front, at the glue-up', async () => {
    const desk = tab(`${origin}/desk`);
    const bench = tab(`${origin}/bench?build=1`);
    await tap({ address: '/bench?build=1&view=timers' });
    expect(bench.focus).toHaveBeenCalled();
    expect(bench.navigate).toHaveBeenCalledWith(`${origin}/bench?build=1&view=timers`);
    expect(desk.focus).not.toHaveBeenCalled();
    expect(scope.clients.openWindow).not.toHaveBeenCalled();
  });

  it('opens the bench where none is open', async () => {
    await tap(undefined);
    expect(scope.clients.openWindow).toHaveBeenCalledWith(`${origin}/bench`);
  });
});
