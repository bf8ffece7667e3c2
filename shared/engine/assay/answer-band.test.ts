import { describe, expect, it } from 'vitest';
import { compileScript } from '../compile/compile-script.ts';
import { evaluateBlock, evaluateDraw } from '../compile/evaluate.ts';
import { dependenciesOf } from '../compile/dependencies.ts';
import { isNumericPart, type Band } from '../item/content.ts';
import { readUnit } from '../units/read-unit.ts';
import { answerBand } from './answer-band.ts';
import { itemWith, plain } from './assay-fixture.ts';
import { bandsOfBlock } from './part-marking.ts';

const SCRIPT = 'Va = draw(150 V, 300 V, 50 V)\nx = Va * 10 m / 1 V';

function partWith(band: Band) {
  const [part] = itemWith(SCRIPT, [{ quantity: 'x', unit: 'km', figures: 3, band }]).parts;
  const { script } = compileScript(SCRIPT);
  if (part === undefined || !isNumericPart(part) || script === null) throw new Error('The item is sound.');
  return { part, script };
}

describe('the accepted interval', () => {
  // By hand: x is 1.5 km on draw 1.
  it.each<[string, Band, number, number, string]>([
    ['a percentage', { kind: 'percent', percent: 2 }, 1470, 1530, '1.470 to 1.530 km'],
    [
      'an amount in another unit',
      { kind: 'absolute', plusMinus: 40, unit: 'm' },
      1460,
      1540,
      '1.460 to 1.540 km',
    ],
    ['units of the last figure', { kind: 'lastFigure', units: 2 }, 1480, 1520, '1.480 to 1.520 km'],
    ['limits', { kind: 'limits', from: 1.6, to: 1.4, unit: 'km' }, 1400, 1600, '1.40 to 1.60 km'],
  ])('by %s', (_name, band, from, to, text) => {
    const { part, script } = partWith(band);
    const accepted = answerBand(script, part, evaluateDraw(script, 1));
    expect(accepted?.fromSI).toBeCloseTo(from, 9);
    expect(accepted?.toSI).toBeCloseTo(to, 9);
    expect(plain(accepted?.text)).toBe(text);
    expect(plain(accepted?.answer.text)).toBe('1.50 km');
  });

  it('is the same for one draw as for a block of draws', () => {
    const bands: Band[] = [
      { kind: 'percent', percent: 2.5 },
      { kind: 'absolute', plusMinus: 0.03, unit: 'km' },
      { kind: 'absolute', plusMinus: 0.03, unit: '' },
      { kind: 'lastFigure', units: 3 },
      { kind: 'limits', from: 1.1, to: 2.9, unit: '' },
    ];
    const unit = readUnit('km');
    for (const band of bands) {
      const { part, script } = partWith(band);
      const info = script.quantities.find(({ name }) => name === 'x');
      if (info === undefined || !unit.ok) throw new Error('The item is sound.');
      const block = evaluateBlock(script, { from: 1, count: 4 });
      const dependencies = dependenciesOf(script, 'x');
      const entry = { part, letter: 'a', index: 0, info, unit: unit.unit, dependencies };
      const bandsThere = bandsOfBlock(entry, block);
      for (let draw = 1; draw <= 4; draw += 1) {
        const single = answerBand(script, part, evaluateDraw(script, draw));
        expect(bandsThere?.from[draw - 1]).toBeCloseTo((single?.fromSI ?? NaN) / 1000, 12);
        expect(bandsThere?.to[draw - 1]).toBeCloseTo((single?.toSI ?? NaN) / 1000, 12);
      }
    }
  });

  it('does not exist where the band’s unit does not fit', () => {
    const { part, script } = partWith({ kind: 'absolute', plusMinus: 1, unit: 's' });
    expect(answerBand(script, part, evaluateDraw(script, 1))).toBeNull();
  });
});
