import { describe, expect, it } from 'vitest';
import { decide, isBench } from '@/worker/strategy';

const origin = 'http://127.0.0.1:3000';
const asked = (address: string, { method = 'GET', mode = 'no-cors' } = {}) =>
  decide({ method, mode, url: new URL(address, origin), origin });

describe('what the worker does with a request', () => {
  it.each([
    ['/bench', 'navigate', 'bench'],
    ['/bench?build=1&view=step&step=rip', 'navigate', 'bench'],
    ['/bench/', 'navigate', 'bench'],
    ['/desk', 'navigate', 'page'],
    ['/sign-in?return=%2Fbench', 'navigate', 'page'],
    ['/benches', 'navigate', 'page'],
    ['/_next/static/chunks/a1b2.js', 'no-cors', 'precache'],
    ['/icon-192.png', 'no-cors', 'precache'],
  ] as const)('%s (%s) is answered by: %s', (address, mode, decision) => {
    expect(asked(address, { mode })).toBe(decision);
  });

  it.each([
    ['/api/me', 'GET'],
    ['/api/builds/1/log', 'POST'],
    ['/bench', 'POST'],
    ['/desk?_rsc=abc', 'GET'],
    ['https://elsewhere.example/a.js', 'GET'],
  ])('%s (%s) goes to the network alone, so that nothing of it is kept', (address, method) => {
    expect(asked(address, { method })).toBe('network');
    expect(asked(address, { method, mode: 'navigate' })).toBe('network');
  });

  it('takes only the bench’s own addresses for the bench', () => {
    expect(['/bench', '/bench/x'].every(isBench)).toBe(true);
    expect(['/', '/desk/bench', '/benches', '/benchmark'].some(isBench)).toBe(false);
  });
});
