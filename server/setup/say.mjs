/** A failure the person at the terminal can act on; its sentence is all they are shown. */
export class SetupError extends Error {
  name = 'SetupError';
}

/** One line about what is going on. */
export function say(sentence) {
  process.stdout.write(`${sentence}\n`);
}

/**
 * Runs a whole command. A SetupError ends it with its sentence; anything else is a bug and shows its stack.
 * @param {() => Promise<void>} command
 */
export async function main(command) {
  try {
    await command();
  } catch (error) {
    process.stderr.write(`${error instanceof SetupError ? error.message : (error.stack ?? error)}\n`);
    process.exitCode = 1;
  }
}
