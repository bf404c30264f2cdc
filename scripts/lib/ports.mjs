import { connect, createServer } from 'node:net';
import { pause } from './processes.mjs';

/**
 * A port of the loopback interface that nothing listens on; never 5432.
 *
 * @returns {Promise<number>}
 */
export async function freePort() {
  const port = await listenOnce(0);
  return port === 5432 ? freePort() : port;
}

/** Why a loopback port cannot be listened on (`EADDRINUSE`, `EACCES`), or null where it can. */
export async function portTrouble(port) {
  try {
    await listenOnce(port);
    return null;
  } catch (error) {
    return error.code;
  }
}

/** Whether something answers on a loopback port. */
export function answers(port) {
  return new Promise((resolve) => {
    const socket = connect({ port, host: '127.0.0.1', timeout: 1000 });
    const end = (taken) => {
      socket.destroy();
      resolve(taken);
    };
    socket.on('connect', () => end(true));
    socket.on('error', () => end(false));
    socket.on('timeout', () => end(false));
  });
}

/** Waits until something answers on a loopback port. */
export async function waitForAnswer(port) {
  while (!(await answers(port))) await pause(100);
}

function listenOnce(port) {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.on('error', reject);
    server.listen(port, '127.0.0.1', () => {
      const { port: given } = server.address();
      server.close(() => resolve(given));
    });
  });
}
