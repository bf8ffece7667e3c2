import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { assayReportSchema, type ItemContent, itemContentSchema } from '#shared/engine/index.ts';
import { sampleContent } from '#tests/support/factories.ts';

import { createEngine } from './engine.ts';

const engine = createEngine({
  threads: 1,
  report: (error) => {
    throw error;
  },
});
/** The sample asks for W = eV; its first draw has V = 150 V. */
const content = sampleContent();
// A thread that runs from the sources takes some seconds to start.
beforeAll(() => engine.viewDraw(content, 1), 60_000);
afterAll(() => engine.close());

const edited = (changes: Partial<ItemContent>): ItemContent =>
  itemContentSchema.parse({ ...content, ...changes });

describe('viewing a draw', () => {
  it('gives the sheet and the quantities with their printed values', async () => {
    const view = await engine.viewDraw(content, 1);
    expect(view).toMatchObject({ draw: 1, kept: true, gridSize: 16, open: false, diagnostics: [] });
    expect(JSON.stringify(view.sheet.blocks)).toContain('150\u202FV');
    // e × 150 V with the exact e of the SI (2019), 1.602176634e-19 C.
    expect(view.quantities).toMatchObject([
      { name: 'Va', kind: 'drawn', dimension: 'potential difference (V)', unit: 'V', value: '150\u202FV' },
      {
        name: 'W',
        kind: 'computed',
        dimension: 'energy (J)',
        unit: 'J',
        value: '2.40\u202F×\u202F10⁻¹⁷\u202FJ',
      },
    ]);
    expect(view.scheme.parts[0]?.answer?.text).toBe('2.40\u202F×\u202F10⁻¹⁷\u202FJ');
  });

  it('says nothing of the answer on the sheet', async () => {
    const { sheet } = await engine.viewDraw(content, 1);
    expect(JSON.stringify(sheet)).not.toContain('2.40');
  });

  it('takes the first kept draw when none is asked for or the one asked for is beyond the grid', async () => {
    const picky = edited({ script: `${content.script}\nrequire(Va > 200 V)` });
    // 150 V, 160 V … 210 V: the seventh draw is the first above 200 V.
    expect(await engine.viewDraw(picky, null)).toMatchObject({ draw: 7, kept: true });
    expect(await engine.viewDraw(picky, 17)).toMatchObject({ draw: 7, kept: true });
    expect(await engine.viewDraw(picky, 2)).toMatchObject({ draw: 2, kept: false });
  });

  it('places a mistake in the script and still shows the sheet', async () => {
    const view = await engine.viewDraw(
      edited({ script: 'Va = draw(150 V, 300 V, 10 V)\nW = Va + 1 m' }),
      null,
    );
    expect(view.diagnostics[0]).toMatchObject({ severity: 'error', field: '', span: { line: 2 } });
    expect(view.sheet.parts).toHaveLength(1);
  });

  it('places a hole that names nothing', async () => {
    const view = await engine.viewDraw(edited({ stem: 'First line.\nIt is {{Vb}}.' }), 1);
    expect(view.diagnostics).toMatchObject([
      { field: 'stem', code: 'unknownHole', span: { start: 18, end: 24, line: 2, column: 7 } },
    ]);
    expect(view.diagnostics[0]?.message).toContain('The script has no quantity “Vb”');
  });

  it('places what is wrong with an answer and its slips', async () => {
    const [part] = content.parts;
    if (part?.kind !== 'numeric') throw new Error('The sample has lost its part.');
    const slips = [{ id: 's', name: 'forgets e', expression: 'Va', guidance: '', marks: 0 }];
    const parts = [{ ...part, answer: { ...part.answer, unit: 'joule-ish', quantity: 'X', slips } }];
    const wrong = await engine.viewDraw(edited({ parts }), 1);
    expect(wrong.diagnostics.map(({ field }) => field)).toEqual([
      'parts.0.answer.quantity',
      'parts.0.answer.unit',
    ]);
    const misfit = await engine.viewDraw(
      edited({ parts: [{ ...part, answer: { ...part.answer, slips } }] }),
      1,
    );
    expect(misfit.diagnostics.map(({ field }) => field)).toEqual(['parts.0.answer.slips.0.expression']);
  });
});

describe('assaying', () => {
  it('gives a report that the schema takes, the same every time', async () => {
    const report = await engine.assay(content);
    expect(assayReportSchema.parse(report)).toEqual(report);
    expect(report).toMatchObject({
      gridSize: 16,
      exhaustive: true,
      drawsAssayed: 16,
      coverage: 'all 16 draws',
    });
    expect(report.findings.filter((finding) => finding.severity === 'blocker')).toEqual([]);
    expect(await engine.assay(content)).toEqual(report);
  });

  it('finds a script that does not compile', async () => {
    const { findings } = await engine.assay(edited({ script: 'Va = 1 V + 1 m' }));
    expect(findings[0]).toMatchObject({ severity: 'blocker', place: { span: { line: 1 } } });
  });

  it('leaves the live sheet free while it works', async () => {
    // A million draws, which take a good part of a second or more.
    const large = edited({
      script: 'Va = draw(100 V, 10099 V, 1 V)\nk = whole(1, 100)\nW = e * Va * k / k',
    });
    let done = false;
    const assay = engine.assay(large).finally(() => (done = true));
    await engine.viewDraw(content, 1);
    expect(done).toBe(false);
    expect((await assay).drawsAssayed).toBe(1_000_000);
  }, 30_000);
});

describe('marking a reviewer’s working', () => {
  const mark = (text: string) => engine.markWorking({ content, partId: 'a', draw: 1, text });

  it.each(['2.40e-17 J', '2.403 × 10^-17 J', '24.03 aJ', '2.40e-17', '150 eV'])(
    'agrees with %s',
    async (text) => {
      expect((await mark(text)).agrees).toBe(true);
    },
  );

  it.each(['2.50e-17 J', '4.81e-17 J', '2.40e-16 J', '-2.40e-17 J'])(
    'disagrees with %s without telling the answer',
    async (text) => {
      const marked = await mark(text);
      expect(marked.agrees).toBe(false);
      expect(marked.remark).toBe('Your working does not agree with the checker.');
    },
  );

  it.each(['2.40e-17 V', '9.99 V'])(
    'says that the unit of %s does not fit, whatever the number',
    async (text) => {
      const marked = await mark(text);
      expect(marked).toMatchObject({ agrees: false, comparable: false });
      expect(marked.remark).toBe('The unit V does not measure what is asked for.');
    },
  );

  it('does not tell that a number is right in another unit of the same kind', async () => {
    expect((await mark('2.40e-17 eV')).remark).toBe('Your working does not agree with the checker.');
  });

  it('asks for a readable answer', async () => {
    const marked = await mark('quite a lot');
    expect(marked).toMatchObject({ agrees: false, comparable: false, verdict: { kind: 'notRead' } });
    expect(marked.remark).toMatch(/could not be read/);
  });
});

describe('the usual cautions', () => {
  const quantities = [{ name: 'Va', unit: 'kV', role: 'acceleratingPd' }];
  const gun = (script: string, stem = 'A gun.') =>
    engine.cautions(itemContentSchema.parse({ title: 'Gun', stem, script, quantities }));

  it('come from the greatest value over the draws, and defer to local rules', async () => {
    // X-rays from beams above about 5 kV: common practice.
    const cautions = await gun('Va = draw(1 kV, 6 kV, 1 kV)');
    expect(cautions.some((line) => line.includes('X-rays'))).toBe(true);
    expect(cautions.at(-1)).toMatch(/competent person’s risk assessment/);
    const mild = await gun('Va = draw(1 kV, 6 kV, 1 kV)\nrequire(Va < 5 kV)');
    expect(mild.some((line) => line.includes('X-rays'))).toBe(false);
    expect(mild.some((line) => line.includes('High-tension'))).toBe(true);
  });

  it('come from the words alone while the script does not compile', async () => {
    expect(await gun('Va = ', 'A radioactive source ionises the air.')).toHaveLength(2);
    expect(await gun('Va = ')).toEqual([]);
  });
});

describe('choosing a draw', () => {
  it('chooses by chance among the draws that are kept', async () => {
    const picky = edited({ script: `${content.script}\nrequire(Va > 280 V)` });
    // Only 290 V and 300 V are kept, the last two of sixteen.
    for (const chance of [0, 0.5, 0.93, 0.999]) {
      const { draw } = await engine.chooseDraw(picky, chance);
      expect([15, 16]).toContain(draw);
    }
    expect((await engine.chooseDraw(content, 0.999)).draw).toBe(16);
  });

  it('finds none where none is kept or the script does not compile', async () => {
    const none = edited({ script: `${content.script}\nrequire(Va > 1 kV)` });
    expect((await engine.chooseDraw(none, 0.3)).draw).toBeNull();
    expect((await engine.chooseDraw(edited({ script: 'x = ' }), 0.3)).draw).toBeNull();
  });
});

describe('building a paper', () => {
  it('puts every item at its draw, in order, and adds the marks up', async () => {
    const front = {
      organisation: 'Invented Board',
      code: 'P-1',
      title: 'Paper',
      subtitle: '',
      durationMinutes: 60,
      instructions: 'Answer all.',
      sealHash: null,
    };
    const item = { content, figures: [] };
    const built = await engine.buildPaper({
      front,
      items: [
        { ...item, code: 'A-1', draw: 1 },
        { ...item, code: 'A-2', draw: 16 },
      ],
    });
    const beyond = await engine.buildPaper({ front, items: [{ ...item, code: 'A-1', draw: 17 }] });
    expect(beyond.draws).toMatchObject([{ exists: false }]);
    expect(built.sheet.marks).toBe(4);
    expect(built.sheet.items.map(({ number, code }) => [number, code])).toEqual([
      [1, 'A-1'],
      [2, 'A-2'],
    ]);
    expect(JSON.stringify(built.sheet.items[1])).toContain('300\u202FV');
    expect(built.scheme.items[1]?.scheme.parts[0]?.answer?.text).toBe('4.81\u202F×\u202F10⁻¹⁷\u202FJ');
    const draw = { gridSize: 16, open: false, exists: true, kept: true, compiles: true };
    expect(built.draws).toEqual([draw, draw]);
    // 300 V printed; e × 300 V with a band of 2 %.
    expect(built.facts[1]?.printed).toMatchObject([{ text: '300\u202FV', valueSI: 300 }]);
    const [answer] = built.facts[1]?.answers ?? [];
    expect(answer).toMatchObject({ partId: 'a', letter: 'a', text: '4.81\u202F×\u202F10⁻¹⁷\u202FJ' });
    expect((answer?.fromSI ?? 0) / 4.8065e-17).toBeCloseTo(0.98, 4);
    expect((answer?.toSI ?? 0) / 4.8065e-17).toBeCloseTo(1.02, 4);
    expect(built.facts.flatMap((facts) => facts.undefinedParts)).toEqual([]);
  });
});
