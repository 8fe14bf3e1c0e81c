import { subscribe } from 'node:diagnostics_channel';
import type { IncomingMessage } from 'node:http';
import { ADDRESS_HEADER, addressBehind, trustAddressHeader } from './client-address';

/**
 * Writes each request's address into a header of ours before anything else sees the request, replacing whatever the
 * client sent under that name.
 *
 * A route handler has no socket, and the framework keeps an X-Forwarded-For that the client made up; Node publishes every
 * incoming request with its socket on this channel (Node.js documentation, "diagnostics_channel", http.server.request.start).
 */
export function watchAddresses(trustedProxies: number): void {
  subscribe('http.server.request.start', (message) => {
    const { request } = message as { request: IncomingMessage };
    const forwardedFor = request.headers['x-forwarded-for'];
    request.headers[ADDRESS_HEADER] = addressBehind(
      request.socket.remoteAddress,
      Array.isArray(forwardedFor) ? forwardedFor.join(',') : forwardedFor,
      trustedProxies,
    );
  });
  trustAddressHeader();
}
