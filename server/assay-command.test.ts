import { execFile } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { assayItem, itemContentSchema } from '#shared/engine/index.ts';

const ROOT = fileURLToPath(new URL('..', import.meta.url));
/** Starting from sources takes its time on a busy machine, ms. */
const TIMEOUT = 60_000;

interface Outcome {
  status: number;
  output: string;
  complaint: string;
}

function assay(...args: string[]): Promise<Outcome> {
  return new Promise((resolve) => {
    const command = ['--import', 'tsx', 'server/assay-command.ts', ...args];
    execFile(process.execPath, command, { cwd: ROOT }, (error, output, complaint) => {
      resolve({ status: typeof error?.code === 'number' ? error.code : 0, output, complaint });
    });
  });
}

const sound = 'tests/corpus/items/fine-beam-tube.json';
const faulty = 'tests/corpus/items/deflected-beam.json';

describe('the assay command', { timeout: TIMEOUT }, () => {
  let folder = '';
  beforeAll(() => {
    folder = mkdtempSync(path.join(tmpdir(), 'assay-'));
  });
  afterAll(() => rmSync(folder, { recursive: true }));

  it('passes sound items and blocks faulty ones', async () => {
    const [passed, blocked] = await Promise.all([assay(sound), assay(sound, faulty)]);
    expect(passed.status).toBe(0);
    expect(passed.output).toContain('0 blockers, 0 cautions, 0 notes');
    expect(blocked.status).toBe(1);
    expect(blocked.output).toContain('the given values cancel');
  });

  it('gives as JSON the very report that the engine gives in this process', async () => {
    const { output } = await assay('--json', faulty);
    const { title, report } = JSON.parse(output) as { title: string; report: unknown };
    expect(title).toBe('A beam that comes back to its own constant');
    const content = itemContentSchema.parse(JSON.parse(readFileSync(path.join(ROOT, faulty), 'utf8')));
    expect(report).toEqual(JSON.parse(JSON.stringify(assayItem(content).report)));
  });

  it('says what it cannot read, and goes on with the rest', async () => {
    const broken = path.join(folder, 'broken.json');
    const strange = path.join(folder, 'strange.json');
    writeFileSync(broken, '{ "title": ');
    writeFileSync(strange, '{ "title": "A title", "parts": [{ "kind": "riddle" }] }');
    const { status, output, complaint } = await assay(broken, strange, 'no-such-file.json', sound);
    expect(status).toBe(2);
    expect(complaint).toMatch(/broken\.json: This is not JSON/);
    expect(complaint).toMatch(/strange\.json: This is not an item: parts\.0/);
    expect(complaint).toContain('no-such-file.json: There is no such file.');
    expect(output).toContain('Radius and period in a fine-beam tube');
  });

  it('publishes the schema of an item', async () => {
    const { status, output } = await assay('--schema');
    expect(status).toBe(0);
    expect(Object.keys((JSON.parse(output) as { properties: object }).properties)).toContain('script');
  });
});
