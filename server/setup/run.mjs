import { spawn } from 'node:child_process';

import { root } from './places.mjs';
import { SetupError } from './say.mjs';

/**
 * Runs a program to its end and hands back its exit code and output; nothing is thrown for a code other than 0.
 * @param {string} program
 * @param {readonly string[]} args
 * @param {{ env?: NodeJS.ProcessEnv, cwd?: string, input?: string, show?: boolean, tee?: boolean }} [options]
 *   `show` lets the program write to the terminal itself; `tee` both shows and keeps its output.
 * @returns {Promise<{ code: number, output: string }>}
 */
export function attempt(
  program,
  args,
  { env = process.env, cwd = root, input, show = false, tee = false } = {},
) {
  return new Promise((resolve, reject) => {
    const out = show ? 'inherit' : 'pipe';
    const child = spawn(program, args, {
      env,
      cwd,
      stdio: [input === undefined ? 'ignore' : 'pipe', out, out],
    });
    let output = '';
    for (const stream of [child.stdout, child.stderr]) {
      stream?.on('data', (piece) => {
        output += piece;
        if (tee) process.stdout.write(piece);
      });
    }
    child.on('error', reject);
    child.on('close', (code, signal) => resolve({ code: code ?? (signal ? 1 : 0), output }));
    child.stdin?.end(input);
  });
}

/**
 * Runs a program that must succeed; hands back its output.
 * @param {string} program
 * @param {readonly string[]} args
 * @param {Parameters<typeof attempt>[2]} [options]
 */
export async function run(program, args, options) {
  const { code, output } = await attempt(program, args, options);
  if (code === 0) return output;
  // The frames of a stack say little to whoever starts the product.
  const lines = output.split('\n').filter((line) => line.trim() !== '' && !/^ +at /.test(line));
  const end = lines.slice(-15).join('\n');
  throw new SetupError(`${program} ${args.slice(0, 3).join(' ')} failed with code ${code}.\n${end}`);
}
