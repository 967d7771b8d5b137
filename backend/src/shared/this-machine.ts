import type { Request } from 'express';

const loopback = /^(127\.\d+\.\d+\.\d+|::1|::ffff:127\.\d+\.\d+\.\d+)$/;
const ownName = /^(localhost|127\.\d+\.\d+\.\d+|\[::1\])(:\d+)?$/i;

/**
 * Whether whoever asks sits at the machine the server runs on: by where the connection comes from, by the name in the address
 * (a page elsewhere whose name was made to lead here keeps its own), and with no proxy in between.
 */
export function isFromThisMachine({ socket, headers }: Pick<Request, 'socket' | 'headers'>): boolean {
  const passedOn = headers.forwarded ?? headers['x-forwarded-for'] ?? headers['x-forwarded-host'] ?? headers['x-real-ip'];
  return loopback.test(socket.remoteAddress ?? '') && ownName.test(headers.host ?? '') && passedOn === undefined;
}
