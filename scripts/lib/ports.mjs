import { connect, createServer } from 'node:net';

/** A port of the loopback interface that nothing listens on; never 5432. */
export function freePort() {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.on('error', reject);
    server.listen(0, '127.0.0.1', () => {
      const { port } = server.address();
      server.close(() => (port === 5432 ? freePort().then(resolve, reject) : resolve(port)));
    });
  });
}

/** Whether something answers on a loopback port. */
export function portTaken(port) {
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
