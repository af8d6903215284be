// @ts-check
/** Ports of this machine's loopback address. */
import net from 'node:net';

/** @returns {Promise<number>} a port nobody listens on now */
export function freePort() {
  return new Promise((resolve, reject) => {
    const server = net.createServer();
    server.once('error', reject);
    server.listen(0, '127.0.0.1', () => {
      const address = server.address();
      const port = typeof address === 'object' && address !== null ? address.port : 0;
      server.close(() => { resolve(port); });
    });
  });
}

/** @param {number} port @returns {Promise<boolean>} */
export function isPortFree(port) {
  return new Promise((resolve) => {
    const server = net.createServer();
    server.once('error', () => { resolve(false); });
    server.listen(port, '127.0.0.1', () => { server.close(() => { resolve(true); }); });
  });
}
