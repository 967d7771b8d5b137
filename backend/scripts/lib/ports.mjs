/** Ports on the loopback address. */
import net from 'node:net';
import { Problem } from './house.mjs';
import { capture } from './processes.mjs';

/** @param {number} port @param {string} host @returns {Promise<boolean>} whether we could listen there now */
export function isFree(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const server = net.createServer();
    server.once('error', () => resolve(false));
    server.listen({ port, host, exclusive: true }, () => server.close(() => resolve(true)));
  });
}

/** @returns {Promise<number>} a port nobody listens on, chosen by the system */
export function freePort(host = '127.0.0.1') {
  return new Promise((resolve, reject) => {
    const server = net.createServer();
    server.once('error', reject);
    server.listen({ port: 0, host }, () => {
      const { port } = /** @type {net.AddressInfo} */ (server.address());
      server.close(() => resolve(port));
    });
  });
}

/** @returns {Promise<boolean>} whether something accepts connections there */
export function answers(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const socket = net.connect({ port, host, timeout: 1000 });
    const end = (result) => {
      socket.destroy();
      resolve(result);
    };
    socket.once('connect', () => end(true));
    socket.once('error', () => end(false));
    socket.once('timeout', () => end(false));
  });
}

/**
 * Reads a port from the environment.
 * @param {string} name environment variable @param {number} fallback
 * @returns {number}
 */
export function portFrom(name, fallback) {
  const text = process.env[name];
  if (text === undefined || text === '') return fallback;
  const port = Number(text);
  if (!Number.isInteger(port) || port < 1 || port > 65_535) {
    throw new Problem(`${name} is “${text}”. A port is a whole number from 1 to 65535; for example ${name}=${fallback}.`);
  }
  return port;
}

/** @returns {Promise<string>} “ by node (process 12)” where the system tells, otherwise nothing */
export async function holderOf(port) {
  const { out } = await capture('ss', ['-Hltnp', `sport = :${port}`]).catch(() => ({ out: '' }));
  const found = /users:\(\("([^"]+)",pid=(\d+)/.exec(out);
  return found ? ` by ${found[1]} (process ${found[2]})` : '';
}
