import { createServer } from 'node:net';

/**
 * @param {number} port 0 lets the system choose
 * @param {string} host
 * @returns {Promise<number | undefined>} the port, or undefined when it cannot be had
 */
function tryPort(port, host) {
  return new Promise((resolve) => {
    const server = createServer();
    server.once('error', () => resolve(undefined));
    server.listen({ port, host, exclusive: true }, () => {
      const address = server.address();
      server.close(() => resolve(address !== null && typeof address === 'object' ? address.port : undefined));
    });
  });
}

/**
 * @param {number} port
 * @param {string} [host]
 * @returns {Promise<boolean>} whether a server could listen there now
 */
export const isFree = async (port, host = '127.0.0.1') => (await tryPort(port, host)) !== undefined;

/**
 * @param {string} [host]
 * @returns {Promise<number>} a port that was free a moment ago
 */
export async function freePort(host = '127.0.0.1') {
  const port = await tryPort(0, host);
  if (port === undefined) throw new Error(`No free port on ${host}.`);
  return port;
}
