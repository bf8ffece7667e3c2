// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { afterEach, describe, expect, it, vi } from 'vitest';

import { itemContentSchema, type Finding, type Part, type SchemeLine } from '#shared/engine/index.ts';
import { blankPart } from './draft/blank-parts.ts';
import { FindingsList } from './findings/FindingsList.tsx';
import { findingTarget } from './findings/group-findings.ts';
import { asMaths, inserted } from './inputs/insert-text.ts';
import { NumberInput } from './inputs/NumberInput.tsx';
import { readTypedNumber } from './inputs/read-number.ts';
import { SchemeLinesEditor } from './parts/SchemeLinesEditor.tsx';
import { RoleField } from './quantities/RoleField.tsx';

afterEach(cleanup);

describe('a number field', () => {
  it('reads numbers as people write them', () => {
    expect(['2', '0,5', '−3', '1.2e-3', '3 × 10^-4', '.5'].map(readTypedNumber)).toEqual([
      2, 0.5, -3, 0.0012, 3e-4, 0.5,
    ]);
    expect(['', '2 %', 'two', '1..2', 'Infinity', '1e999'].map(readTypedNumber)).toEqual([
      null,
      null,
      null,
      null,
      null,
      null,
    ]);
  });

  it('keeps what is half typed, says what is wrong, and hands on only what is allowed', async () => {
    const user = userEvent.setup();
    const change = vi.fn();
    render(<NumberInput label="Marks" value={3} least={0} most={40} whole onChange={change} />);
    const field = screen.getByLabelText('Marks');
    await user.clear(field);
    expect(screen.getByRole('alert').textContent).toBe('Give a number.');
    await user.type(field, '99');
    expect(screen.getByRole('alert').textContent).toBe('At most 40.');
    expect(change).toHaveBeenCalledTimes(1);
    expect(change).toHaveBeenCalledWith(9);
  });
});

describe('putting things into a text', () => {
  it('wraps a selection as maths, or opens a place for it', () => {
    expect(asMaths('v = 2', 0, 1)).toEqual({ text: '$v$ = 2', cursor: 3 });
    expect(asMaths('v', 1, 1)).toEqual({ text: 'v$$', cursor: 2 });
    expect(inserted('ab', 1, 1, '{{Va}}')).toEqual({ text: 'a{{Va}}b', cursor: 7 });
  });
});

describe('the lines of a mark scheme', () => {
  it('change places by keys and say when they do not add up', async () => {
    const user = userEvent.setup();
    function Editor() {
      const [scheme, setScheme] = useState<SchemeLine[]>([
        { text: 'first', marks: 1 },
        { text: 'second', marks: 1 },
      ]);
      const part: Part = { ...blankPart('numeric', 'p'), marks: 3, scheme };
      return <SchemeLinesEditor part={part} readOnly={false} onChange={(lines) => setScheme(lines)} />;
    }
    render(<Editor />);
    expect(screen.getByText(/1 mark short of the part’s 3/)).toBeDefined();
    screen.getByLabelText('Mark scheme line 2').focus();
    await user.keyboard('{Alt>}{ArrowUp}{/Alt}');
    expect(screen.getByLabelText<HTMLTextAreaElement>('Mark scheme line 1').value).toBe('second');
    await user.click(screen.getByRole('button', { name: 'Add a line' }));
    expect(screen.getByText('The lines add up to 3 marks.')).toBeDefined();
  });
});

describe('choosing what a value stands for', () => {
  const options = [
    { id: 'speed', name: 'speed', description: 'how fast a particle goes' },
    { id: 'plateSeparation', name: 'plate separation', description: 'gap between two plates' },
  ];

  it('is found by typing and taken by keys', async () => {
    const user = userEvent.setup();
    const change = vi.fn();
    render(
      <RoleField
        label="What d stands for"
        role={null}
        options={options}
        disabled={false}
        onChange={change}
      />,
    );
    const field = screen.getByRole('combobox', { name: 'What d stands for' });
    await user.click(field);
    await user.keyboard('gap pl{Enter}');
    expect(change).toHaveBeenCalledWith('plateSeparation');
  });

  it('can be taken back to none', async () => {
    const user = userEvent.setup();
    const change = vi.fn();
    render(
      <RoleField
        label="What v stands for"
        role="speed"
        options={options}
        disabled={false}
        onChange={change}
      />,
    );
    await user.click(screen.getByRole('combobox', { name: 'What v stands for' }));
    await user.keyboard('{Enter}');
    expect(change).toHaveBeenCalledWith(null);
  });
});

const finding = (key: string, severity: Finding['severity'], more: Partial<Finding> = {}): Finding => ({
  key,
  check: 'limits',
  code: 'c',
  severity,
  statement: `Statement ${key}.`,
  cure: '',
  place: {},
  worstDraw: null,
  otherDraws: [],
  drawCount: 0,
  ...more,
});
const content = itemContentSchema.parse({
  title: 'Gun',
  parts: [blankPart('numeric', 'p1'), blankPart('written', 'p2')],
});

describe('findings', () => {
  it('stand in order of severity, lead to their place and to their worst draw', async () => {
    const user = userEvent.setup();
    const visit = vi.fn();
    const draw = vi.fn();
    render(
      <FindingsList
        findings={[
          finding('n', 'note'),
          finding('b', 'blocker', { place: { partId: 'p2' }, worstDraw: 17, drawCount: 4 }),
        ]}
        content={content}
        canAccept
        onVisit={visit}
        onVisitDraw={draw}
        onAccept={vi.fn()}
      />,
    );
    expect(screen.getAllByRole('heading').map((heading) => heading.textContent)).toEqual([
      'Blockers 1',
      'Notes 1',
    ]);
    await user.click(screen.getByRole('button', { name: 'Go to part (b)' }));
    expect(visit).toHaveBeenCalledWith({ kind: 'part', partId: 'p2', label: 'part (b)' });
    await user.click(screen.getByRole('button', { name: 'Worst draw 17' }));
    expect(draw).toHaveBeenCalledWith(17);
  });

  it('let a caution stand only with a reason', async () => {
    const user = userEvent.setup();
    const accept = vi.fn();
    render(
      <FindingsList
        findings={[finding('c', 'caution')]}
        content={content}
        canAccept
        onVisit={vi.fn()}
        onVisitDraw={vi.fn()}
        onAccept={accept}
      />,
    );
    await user.click(screen.getByRole('button', { name: 'Accept with a reason' }));
    expect(screen.getByRole<HTMLButtonElement>('button', { name: 'Accept' }).disabled).toBe(true);
    await user.keyboard('Meant so.{Enter}');
    expect(accept).toHaveBeenCalledWith('c', 'Meant so.');
  });

  it('point at a part by its field, at a line by its span, at a quantity by its name', () => {
    const span = { start: 3, end: 8, line: 2, column: 1 };
    expect(
      findingTarget(finding('a', 'note', { place: { field: 'parts.1.text', span } }), content),
    ).toMatchObject({ partId: 'p2' });
    expect(findingTarget(finding('a', 'note', { place: { span } }), content)).toMatchObject({
      kind: 'script',
      start: 3,
    });
    expect(findingTarget(finding('a', 'note', { place: { quantity: 'v' } }), content)).toMatchObject({
      name: 'v',
    });
    expect(findingTarget(finding('a', 'note'), content)).toBeNull();
  });
});
