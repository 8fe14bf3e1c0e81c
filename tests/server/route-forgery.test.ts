import { readdirSync } from 'node:fs';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { beforeAll, describe, expect, it } from 'vitest';
import { ownRequest, routeContext } from '../support/request';

type Handler = (request: Request, context: unknown) => Promise<Response>;
interface Change {
  name: string;
  method: string;
  handle: Handler;
}

const CHANGING = ['POST', 'PUT', 'PATCH', 'DELETE'];
const api = path.resolve('app/api');
const changes: Change[] = [];

beforeAll(async () => {
  const files = readdirSync(api, { recursive: true, encoding: 'utf8' }).filter((name) => /(^|\/)route\.ts$/.test(name));
  for (const file of files) {
    const handlers = (await import(pathToFileURL(path.join(api, file)).href)) as Record<string, Handler>;
    for (const method of CHANGING) {
      const handle = handlers[method];
      if (handle) changes.push({ name: `${method} /api/${path.dirname(file)}`, method, handle });
    }
  }
});

const forged: [string, Record<string, string>][] = [
  ['another site, by Origin', { origin: 'https://elsewhere.example', 'sec-fetch-site': 'cross-site' }],
  ['another site that claims to be ours in one of the two', { origin: 'https://elsewhere.example' }],
  ['a sandboxed page (Origin: null)', { origin: 'null' }],
  ['a page on a sister host', { 'sec-fetch-site': 'same-site' }],
  ['an address typed in or a bookmark', { 'sec-fetch-site': 'none' }],
  ['our host on another port', { origin: 'http://127.0.0.1:3001' }],
  ['our host as another scheme', { origin: 'ftp://127.0.0.1:3000' }],
  ['words for an Origin', { origin: 'elsewhere' }],
];
const refusedAs = async (change: Change, request: Request) => {
  const response = await change.handle(request, routeContext({}));
  const { code } = (await response.json()) as { code: string };
  return { at: change.name, code, status: response.status };
};

describe('a request that changes something', () => {
  it('finds the routes', () => {
    expect(changes.map(({ name }) => name)).toContain('POST /api/accounts/sign-up');
    expect(changes.length).toBeGreaterThan(10);
  });

  it.each(forged)('is refused from %s, on every route', async (_from, headers) => {
    for (const change of changes) {
      const request = ownRequest('/api/x', { method: change.method, body: {}, headers });
      expect(await refusedAs(change, request)).toEqual({ at: change.name, code: 'foreign-request', status: 403 });
    }
  });

  it.each(['x-holdfast', 'both'])('is refused without proof (%s missing), on every route', async (missing) => {
    for (const change of changes) {
      const request = ownRequest('/api/x', { method: change.method, body: {} });
      const dropped = missing === 'both' ? ['origin', 'sec-fetch-site'] : [missing];
      for (const name of dropped) request.headers.delete(name);
      expect(await refusedAs(change, request)).toEqual({ at: change.name, code: 'foreign-request', status: 403 });
    }
  });

  it.each([
    'text/plain',
    'application/x-www-form-urlencoded',
    'multipart/form-data; boundary=x',
    'application/json; q=1',
  ])('is refused as %s, on every route', async (type) => {
    for (const change of changes) {
      const request = ownRequest('/api/x', { method: change.method, body: {}, headers: { 'content-type': type } });
      expect(await refusedAs(change, request)).toEqual({ at: change.name, code: 'wrong-type', status: 415 });
    }
  });

  it('is let past the proof from our own page, by either sign alone where a browser sends no more', async () => {
    for (const change of changes) {
      for (const missing of ['origin', 'sec-fetch-site']) {
        const request = ownRequest('/api/x', { method: change.method, body: {} });
        request.headers.delete(missing);
        const { code } = await refusedAs(change, request);
        expect(code).not.toBe('foreign-request');
      }
    }
  });

  it('is let past the proof from another address that this server is reached by', async () => {
    for (const change of changes) {
      const headers = { host: '192.168.0.9:3000', origin: 'http://192.168.0.9:3000' };
      const request = ownRequest('/api/x', { method: change.method, body: {}, headers });
      request.headers.delete('sec-fetch-site');
      const { code } = await refusedAs(change, request);
      expect(code).not.toBe('foreign-request');
    }
  });
});
