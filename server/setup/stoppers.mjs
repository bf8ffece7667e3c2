import { say } from './say.mjs';

/**
 * What has been started and must be stopped again, the last first. Signals stop it all and end the program; the
 * code that started things stops them itself by `stopAll` on every other way out.
 */
export function createStoppers() {
  /** @type {(() => Promise<void>)[]} */
  const stops = [];
  let stopping = null;

  const stopAll = () => {
    stopping ??= (async () => {
      for (const stop of stops.reverse()) await stop();
    })();
    return stopping;
  };

  for (const [signal, number] of Object.entries({ SIGINT: 2, SIGTERM: 15, SIGHUP: 1 })) {
    process.on(signal, async () => {
      if (stopping) return;
      say('Stopping.');
      await stopAll();
      // Ended as asked is no failure at a terminal; other programs see the signal by the usual code.
      process.exit(signal === 'SIGINT' ? 0 : 128 + number);
    });
  }

  return { add: (stop) => stops.push(stop), stopAll, isStopping: () => stopping !== null };
}
