import { readFile } from 'node:fs/promises';
import { parseArgs } from 'node:util';
import { z } from 'zod';

import { assayItem, itemContentSchema, type ItemContent, worstSeverity } from '#shared/engine/index.ts';

import { assayReportText } from './assay-report-text.ts';

const USAGE = `npm run assay -- item.json [more.json ...]

Checks items in their JSON form and prints each report.

  --json    print the reports as JSON, one a line
  --schema  print the JSON schema of an item and stop
  --help    print this and stop

Exit status: 0 when no item has a blocker, 1 when one has, 2 when a file cannot be read as an item.
`;

const EXIT = { passed: 0, blocked: 1, unreadable: 2 } as const;

/** The item in a file, or the sentence that says why there is none. */
async function readItem(path: string): Promise<ItemContent | string> {
  let text: string;
  try {
    text = await readFile(path, 'utf8');
  } catch (error) {
    const code = error instanceof Error && 'code' in error ? String(error.code) : '';
    return code === 'ENOENT' ? 'There is no such file.' : `The file cannot be read (${code}).`;
  }
  let data: unknown;
  try {
    data = JSON.parse(text);
  } catch (error) {
    if (!(error instanceof SyntaxError)) throw error;
    return `This is not JSON: ${error.message}.`;
  }
  const parsed = itemContentSchema.safeParse(data);
  if (parsed.success) return parsed.data;
  const [issue] = parsed.error.issues;
  return `This is not an item: ${issue?.path.join('.') || 'the whole'}: ${issue?.message ?? ''}`;
}

async function assayFile(path: string, json: boolean): Promise<number> {
  const item = await readItem(path);
  if (typeof item === 'string') {
    process.stderr.write(`${path}: ${item}\n`);
    return EXIT.unreadable;
  }
  const { report } = assayItem(item);
  const output = json
    ? JSON.stringify({ file: path, title: item.title, report })
    : assayReportText(`${item.title} (${path})`, report);
  process.stdout.write(`${output}\n`);
  return worstSeverity(report.findings) === 'blocker' ? EXIT.blocked : EXIT.passed;
}

/** Runs the command with its arguments; gives the exit status. */
async function run(args: readonly string[]): Promise<number> {
  let parsed;
  try {
    parsed = parseArgs({
      args: [...args],
      allowPositionals: true,
      options: {
        json: { type: 'boolean', default: false },
        schema: { type: 'boolean', default: false },
        help: { type: 'boolean', default: false },
      },
    });
  } catch (error) {
    if (!(error instanceof TypeError)) throw error;
    process.stderr.write(`${error.message}\n\n${USAGE}`);
    return EXIT.unreadable;
  }
  const { values, positionals } = parsed;
  if (values.help) {
    process.stdout.write(USAGE);
    return EXIT.passed;
  }
  if (values.schema) {
    process.stdout.write(`${JSON.stringify(z.toJSONSchema(itemContentSchema, { io: 'input' }), null, 2)}\n`);
    return EXIT.passed;
  }
  if (positionals.length === 0) {
    process.stderr.write(USAGE);
    return EXIT.unreadable;
  }
  let worst: number = EXIT.passed;
  for (const path of positionals) worst = Math.max(worst, await assayFile(path, values.json));
  return worst;
}

process.exitCode = await run(process.argv.slice(2));
