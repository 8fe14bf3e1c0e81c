import { createConnection, createServer } from 'node:net';

const HOST = '127.0.0.1';

/** @returns {Promise<number>} a port of the loopback that nothing listens on */
export function freePort() {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.on('error', reject);
    server.listen(0, HOST, () => {
      const { port } = /** @type {import('node:net').AddressInfo} */ (server.address());
      server.close(() => resolve(port));
    });
  });
}

/** @param {number} port @returns {Promise<boolean>} */
export function isTaken(port) {
  return new Promise((resolve) => {
    const socket = createConnection({ host: HOST, port });
    const end = (/** @type {boolean} */ taken) => {
      socket.destroy();
      resolve(taken);
    };
    socket.setTimeout(1_000, () => end(true));
    socket.on('connect', () => end(true));
    socket.on('error', () => end(false));
  });
}
