import { describe, expect, it } from 'vitest';
import { compileScript, evaluateDraw } from '#shared/engine/index.ts';
import { fuzz } from './fuzzing.ts';

describe('mutated scripts', () => {
  it('each compile or are told a positioned mistake, 4,000 of them', { timeout: 120_000 }, () => {
    const outcome = fuzz(4_000, 20_260_101);
    expect(outcome.sound + outcome.faulty).toBe(4_000);
    expect(outcome.sound).toBeGreaterThan(200);
  });
});

describe('hostile scripts', () => {
  it.each([
    ['20,001 characters', 'x'.repeat(20_001), 'script-too-long'],
    ['201 statements', Array.from({ length: 201 }, (_, i) => `x${i} = 1`).join('\n'), 'too-many-statements'],
    ['41 brackets deep', `x = ${'('.repeat(41)}1${')'.repeat(41)}`, 'nesting-too-deep'],
    ['a very long statement', `x = 1${' + 1'.repeat(600)}`, 'statement-too-long'],
    ['9,000 minus signs', `x = ${'-'.repeat(900)}1`, 'nesting-too-deep'],
    ['a tower of powers', `x = 2${'^2'.repeat(200)}`, 'nesting-too-deep'],
    ['65 values in a list', `x = [${Array.from({ length: 65 }, () => '1').join(', ')}]`, 'series-too-long'],
  ])('over a limit by %s are told so', (_, source, code) => {
    const { script, diagnostics } = compileScript(source);
    expect(script).toBeNull();
    expect(diagnostics.map((diagnostic) => diagnostic.code)).toContain(code);
  });

  it.each([
    ['40 brackets deep', `x = ${'('.repeat(39)}1${')'.repeat(39)}`],
    ['a long sum', `x = 1${' + 1'.repeat(490)}`],
    ['nested choices', `x = ${'1 < 2 ? 1 : '.repeat(90)}2`],
    ['nested min', `x = ${'min(1, '.repeat(38)}2${')'.repeat(38)}`],
  ])('within the limits still run: %s', (_, source) => {
    const { script } = compileScript(source);
    expect(script && Number.isFinite(evaluateDraw(script, 1).values['x'])).toBe(true);
  });

  it('reach nothing of the host language by name', () => {
    for (const name of [
      'constructor',
      '__proto__',
      'prototype',
      'hasOwnProperty',
      'this',
      'globalThis',
      'process',
      'require',
      'Function',
      'eval',
    ]) {
      for (const source of [
        `x = ${name}`,
        `x = ${name}(1)`,
        `x = sqrt(${name})`,
        `x = 1 ${name}`,
        `x = [1][${name}]`,
      ]) {
        expect(compileScript(source).script).toBeNull();
      }
    }
  });
});
