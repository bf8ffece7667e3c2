import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';

import { createApp } from './app.ts';
import { readSettings } from './config/settings.ts';
import { createContext } from './context.ts';
import { startHousekeeping } from './jobs/housekeeping.ts';

/** Requests that still run at the end are given so long, ms. */
const DRAIN = 10_000;

function listen(server: Server, port: number, host: string): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, host, () => {
      server.off('error', reject);
      resolve();
    });
  });
}

function drain(server: Server): Promise<void> {
  return new Promise((resolve) => {
    const cut = setTimeout(() => server.closeAllConnections(), DRAIN);
    server.close(() => {
      clearTimeout(cut);
      resolve();
    });
    server.closeIdleConnections();
  });
}

/** Serves until a signal asks for the end, then stops in order: requests, jobs, threads, database. */
async function serve(): Promise<void> {
  const settings = readSettings(process.env);
  const context = createContext(settings);
  const { app } = createApp(context);
  const server = createServer(app);
  // Longer than a proxy in front keeps its connections, so that none is cut under a request.
  server.keepAliveTimeout = 65_000;
  try {
    await listen(server, settings.port, settings.host);
  } catch (error) {
    await context.close();
    throw error;
  }
  const stopHousekeeping = startHousekeeping(context);
  const { port } = server.address() as AddressInfo;
  context.logger.info({ host: settings.host, port }, 'the server is ready');

  let stopping = false;
  const stop = async (signal: string) => {
    if (stopping) return;
    stopping = true;
    context.logger.info({ signal }, 'the server is stopping');
    await drain(server);
    await stopHousekeeping();
    await context.close();
  };
  for (const signal of ['SIGINT', 'SIGTERM'] as const) process.on(signal, () => void stop(signal));
}

try {
  await serve();
} catch (error) {
  console.error(`The server could not start. ${error instanceof Error ? error.message : String(error)}`);
  process.exitCode = 1;
}
