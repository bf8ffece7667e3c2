import { execFileSync } from 'node:child_process';
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { assayItem, compileScript, evaluateBlock } from '#shared/engine/index.ts';
import { benchItem } from './bench-item.ts';
import { BENCH_DRAWS, BENCH_SCRIPT, longScript } from './bench-script.ts';

/** Best time of a run and what it found, by which the three programs are shown to do the same work. */
interface Run {
  milliseconds: number;
  checksum: number;
  kept: number;
}

/** The bundle stands in .bench, one level below the project. */
const ROOT = fileURLToPath(new URL('..', import.meta.url));
const HERE = join(ROOT, 'tests', 'bench');

function best(rounds: number, work: () => void): number {
  let least = Infinity;
  for (let round = 0; round < rounds; round += 1) {
    const start = performance.now();
    work();
    least = Math.min(least, performance.now() - start);
  }
  return least;
}

function runEngine(): Run {
  const { script } = compileScript(BENCH_SCRIPT);
  if (script?.grid.size !== BENCH_DRAWS) throw new Error('The bench script does not compile to its grid.');
  let values = evaluateBlock(script, { from: 1, count: BENCH_DRAWS });
  const milliseconds = best(7, () => {
    values = evaluateBlock(script, { from: 1, count: BENCH_DRAWS }, { into: values });
  });
  const answers = values.columns.get('sc') ?? new Float64Array();
  let checksum = 0;
  let kept = 0;
  for (const [index, keep] of values.kept.entries()) {
    if (keep === 1) {
      checksum += answers[index] ?? NaN;
      kept += 1;
    }
  }
  return { milliseconds, checksum, kept };
}

function readRun(output: string): Run {
  const [milliseconds = NaN, checksum = NaN, kept = NaN] = output.trim().split(/\s+/).map(Number);
  return { milliseconds, checksum, kept };
}

/** Runs a program of another language; null, with a sentence, where it is not installed. */
function runOther(name: string, work: () => string): Run | null {
  try {
    return readRun(work());
  } catch (error) {
    const first = error instanceof Error ? error.message.split('\n')[0] : String(error);
    process.stdout.write(`${name} is left out: ${first}\n`);
    return null;
  }
}

function runNumpy(): Run | null {
  return runOther('NumPy', () => {
    const script = join(HERE, 'numpy_bench.py');
    for (const python of ['/usr/bin/python3', 'python3']) {
      try {
        execFileSync(python, ['-c', 'import numpy'], { stdio: 'ignore' });
      } catch {
        continue;
      }
      return execFileSync(python, [script], { encoding: 'utf8' });
    }
    throw new Error('python3 with numpy was not found (Debian: python3-numpy).');
  });
}

function runC(): Run | null {
  return runOther('C', () => {
    const folder = mkdtempSync(join(tmpdir(), 'bench-'));
    try {
      const program = join(folder, 'c_bench');
      execFileSync('cc', ['-O2', '-o', program, join(HERE, 'c_bench.c'), '-lm'], { stdio: 'pipe' });
      return execFileSync(program, { encoding: 'utf8' });
    } finally {
      rmSync(folder, { recursive: true });
    }
  });
}

/** Median of repeated compiles, warm. */
function compileTime(): number {
  const source = longScript(60);
  const times: number[] = [];
  for (let round = 0; round < 300; round += 1) {
    const start = performance.now();
    if (compileScript(source).script === null) throw new Error('The long script does not compile.');
    times.push(performance.now() - start);
  }
  return times.slice(100).sort((a, b) => a - b)[100] ?? NaN;
}

/** Median time of a full assay of a typical item, warm, and over how many draws. */
function assayTime(): { milliseconds: number; draws: number } {
  const item = benchItem();
  const times: number[] = [];
  let draws = 0;
  for (let round = 0; round < 15; round += 1) {
    const start = performance.now();
    const { report, diagnostics } = assayItem(item);
    times.push(performance.now() - start);
    if (diagnostics.length > 0) throw new Error('The bench item does not compile.');
    draws = report.drawsAssayed;
  }
  return { milliseconds: times.slice(4).sort((a, b) => a - b)[5] ?? NaN, draws };
}

function checkSame(engine: Run, other: Run | null, name: string): void {
  if (other === null) return;
  if (other.kept !== engine.kept || Math.abs(other.checksum / engine.checksum - 1) > 1e-9) {
    throw new Error(
      `${name} found ${other.kept} draws, ${other.checksum}; the engine ${engine.kept}, ${engine.checksum}.`,
    );
  }
}

/** The better of two runs of one program. */
function better(a: Run | null, b: Run | null): Run | null {
  return a !== null && (b === null || a.milliseconds <= b.milliseconds) ? a : b;
}

// Three rounds side by side, best of each, so that whatever else the machine does weighs on all alike.
let engine = runEngine();
let numpy = runNumpy();
let c = runC();
for (let round = 1; round < 3; round += 1) {
  engine = better(engine, runEngine()) ?? engine;
  if (numpy !== null) numpy = better(numpy, runNumpy());
  if (c !== null) c = better(c, runC());
}
checkSame(engine, numpy, 'NumPy');
checkSame(engine, c, 'C');
const assay = assayTime();
const figures = {
  engineMs: engine.milliseconds,
  numpyMs: numpy?.milliseconds ?? null,
  cMs: c?.milliseconds ?? null,
  vsNumPy: numpy === null ? null : engine.milliseconds / numpy.milliseconds,
  vsC: c === null ? null : engine.milliseconds / c.milliseconds,
  compileMs: compileTime(),
  assayMs: assay.milliseconds,
};
const text = (value: number | null, unit: string): string =>
  value === null ? 'not run' : `${value.toPrecision(3)} ${unit}`;
process.stdout.write(
  [
    `One million draws of a script of 12 statements, best of three times seven (${engine.kept} draws kept)`,
    `  engine               ${text(figures.engineMs, 'ms')}`,
    `  NumPy                ${text(figures.numpyMs, 'ms')}`,
    `  C, -O2               ${text(figures.cMs, 'ms')}`,
    `  engine over NumPy    ${text(figures.vsNumPy, '')}`,
    `  engine over C        ${text(figures.vsC, '')}`,
    `Compile of a script of 60 statements, warm  ${text(figures.compileMs, 'ms')}`,
    `Full assay of an item of 3 parts over ${assay.draws} draws  ${text(figures.assayMs, 'ms')}`,
    '',
  ].join('\n'),
);
mkdirSync(join(ROOT, '.bench'), { recursive: true });
writeFileSync(join(ROOT, '.bench', 'engine.json'), `${JSON.stringify(figures, null, 2)}\n`);
