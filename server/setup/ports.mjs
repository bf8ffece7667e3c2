import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { connect, createServer } from 'node:net';
import { setTimeout as pause } from 'node:timers/promises';

/** Whether nothing listens on `port` of `host`. */
export function isFree(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const server = createServer();
    server.once('error', () => resolve(false));
    server.listen(port, host, () => server.close(() => resolve(true)));
  });
}

/** A port of 127.0.0.1 that is free now. */
export function freePort() {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once('error', reject);
    server.listen(0, '127.0.0.1', () => {
      const { port } = server.address();
      server.close(() => resolve(port));
    });
  });
}

/** The port noted in `file`; another, noted for the next time, when there is none or someone has taken it. */
export async function keptPort(file) {
  if (existsSync(file)) {
    const port = Number(readFileSync(file, 'utf8'));
    if (Number.isInteger(port) && port > 0 && (await isFree(port))) return port;
  }
  const port = await freePort();
  writeFileSync(file, `${port}\n`);
  return port;
}

/** Whether something on `port` speaks first, as a database server that is ready does. */
function greets(port) {
  return new Promise((resolve) => {
    const socket = connect(port, '127.0.0.1');
    const answer = (greeted) => {
      socket.destroy();
      resolve(greeted);
    };
    socket.setTimeout(1000, () => answer(false));
    socket.once('data', () => answer(true));
    socket.once('error', () => answer(false));
    socket.once('end', () => answer(false));
  });
}

/**
 * Waits until the server on `port` greets. False when `gone()` says that it has ended, or after `patience` ms.
 */
export async function waitForGreeting(port, gone, patience) {
  const limit = Date.now() + patience;
  while (!gone() && Date.now() < limit) {
    if (await greets(port)) return true;
    await pause(50);
  }
  return false;
}
