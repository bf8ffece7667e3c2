import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

/** Writes bytes to a file of its own while `use` looks at it. */
export async function withFile<Result>(
  bytes: Uint8Array,
  name: string,
  use: (file: string) => Result | Promise<Result>,
): Promise<Result> {
  const folder = mkdtempSync(path.join(tmpdir(), 'export-'));
  try {
    const file = path.join(folder, name);
    writeFileSync(file, bytes);
    return await use(file);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** A Word document as pandoc (Debian) reads it back: Markdown with equations as LaTeX, without line breaks. */
export function readBack(bytes: Uint8Array): Promise<string> {
  return withFile(bytes, 'export.docx', (file) =>
    execFileSync('pandoc', ['--from=docx', '--to=markdown', '--wrap=none', file], { encoding: 'utf8' }),
  );
}
