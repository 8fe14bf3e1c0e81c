import { createServer, request as httpRequest, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ADDRESS_HEADER, addressBehind, clientAddress } from '@/lib/server/request/client-address';
import { watchAddresses } from '@/lib/server/request/watch-addresses';

describe('addressBehind', () => {
  it.each([
    [
      'the socket alone counts with no proxy, whatever the client claims',
      '198.51.100.7',
      '203.0.113.1',
      0,
      '198.51.100.7',
    ],
    ['the last hop counts with one proxy', '10.0.0.1', '203.0.113.1, 198.51.100.9', 1, '198.51.100.9'],
    ['the second last counts with two', '10.0.0.1', '6.6.6.6, 198.51.100.9, 10.0.0.2', 2, '198.51.100.9'],
    ['fewer hops than proxies is nobody known', '10.0.0.1', '198.51.100.9', 2, 'unknown'],
    ['no header behind a proxy is nobody known', '10.0.0.1', undefined, 1, 'unknown'],
    ['words are nobody known', '10.0.0.1', 'localhost', 1, 'unknown'],
    ['an IPv4 address in IPv6 form is the IPv4 address', '::ffff:198.51.100.7', undefined, 0, '198.51.100.7'],
    ['an IPv6 address counts by its first half', '2001:db8:1:2:3:4:5:6', undefined, 0, '2001:db8:1:2::/64'],
    ['short forms too', '2001:db8::1', undefined, 0, '2001:db8:0:0::/64'],
    ['and with leading zeros', '2001:0db8:0001:0000::9', undefined, 0, '2001:db8:1:0::/64'],
    ['the loopback', '::1', undefined, 0, '0:0:0:0::/64'],
    ['a zone is dropped', 'fe80::1%eth0', undefined, 0, 'fe80:0:0:0::/64'],
    ['no socket', undefined, undefined, 0, 'unknown'],
  ])('%s', (_what, socket, forwarded, proxies, expected) => {
    expect(addressBehind(socket, forwarded, proxies)).toBe(expected);
  });
});

describe('watchAddresses', () => {
  let server: Server;
  const told = (headers: Record<string, string>) =>
    new Promise<string>((resolve, reject) => {
      const { port } = server.address() as AddressInfo;
      httpRequest({ port, host: '127.0.0.1', headers }, (answer) => {
        answer.setEncoding('utf8').on('data', resolve);
      })
        .on('error', reject)
        .end();
    });

  beforeAll(async () => {
    server = createServer((request, response) => {
      const headers = new Headers({ [ADDRESS_HEADER]: String(request.headers[ADDRESS_HEADER] ?? '') });
      response.end(clientAddress(new Request('http://127.0.0.1/', { headers })));
    });
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  });
  afterAll(() => server.close());

  it('until it watches, takes nobody at their word', async () => {
    expect(await told({ [ADDRESS_HEADER]: '203.0.113.5' })).toBe('unknown');
  });

  it('then tells the socket address and drops what a client made up', async () => {
    watchAddresses(0);
    expect(await told({})).toBe('127.0.0.1');
    expect(await told({ [ADDRESS_HEADER]: '203.0.113.5', 'x-forwarded-for': '203.0.113.6' })).toBe('127.0.0.1');
  });
});
