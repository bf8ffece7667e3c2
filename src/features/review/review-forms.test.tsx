// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';

import type { Review } from '#shared/contracts/reviews.ts';
import { itemContentSchema, type Finding } from '#shared/engine/index.ts';
import { AppError } from '#shared/errors/app-error.ts';
import { CommentsPanel } from './CommentsPanel.tsx';
import { DecisionForm } from './DecisionForm.tsx';
import type { PartProgress } from './review-progress.ts';
import { WorkingForm } from './WorkingForm.tsx';

afterEach(cleanup);

const part: PartProgress = {
  partId: 'p',
  letter: 'b',
  unit: 'm s^-1',
  tries: [],
  triesLeft: 2,
  state: 'open',
};
const attempt = (number: number, agrees: boolean): PartProgress['tries'][number] => ({
  partId: 'p',
  attempt: number,
  text: '2 m/s',
  agrees,
  remark: '',
  disputed: false,
  settledReason: null,
  createdAt: '2026-03-02T10:00:00.000Z',
});

describe('the form for one’s own working', () => {
  it('sends the answer as written and asks for one first', async () => {
    const user = userEvent.setup();
    const onTry = vi.fn(() => Promise.resolve());
    render(<WorkingForm part={part} busy={false} onTry={onTry} onDispute={vi.fn()} />);
    await user.click(screen.getByRole('button', { name: 'Compare' }));
    expect((await screen.findByRole('alert')).textContent).toBe('Write your answer with its unit.');
    await user.type(screen.getByLabelText('My answer, with its unit'), '1.8e7 m/s{Enter}');
    expect(onTry).toHaveBeenCalledWith('p', '1.8e7 m/s');
  });

  it('shows a refusal where it was caused', async () => {
    const user = userEvent.setup();
    const onTry = vi.fn(() =>
      Promise.reject(new AppError('invalid', 'Two different values stand in this answer.')),
    );
    render(<WorkingForm part={part} busy={false} onTry={onTry} onDispute={vi.fn()} />);
    await user.type(screen.getByLabelText('My answer, with its unit'), '1 or 2 V{Enter}');
    expect((await screen.findByRole('alert')).textContent).toBe('Two different values stand in this answer.');
  });

  it('closes when no try is left, and lets one hold to the working', async () => {
    const user = userEvent.setup();
    const onDispute = vi.fn();
    const done: PartProgress = {
      ...part,
      tries: [attempt(1, false), attempt(2, false)],
      triesLeft: 0,
      state: 'disagrees',
    };
    render(<WorkingForm part={done} busy={false} onTry={vi.fn()} onDispute={onDispute} />);
    expect(screen.queryByRole('textbox')).toBeNull();
    await user.click(screen.getByRole('button', { name: 'I hold to my working' }));
    expect(onDispute).toHaveBeenCalledWith('p');
  });
});

const caution: Finding = {
  key: 'band.p',
  check: 'band',
  code: 'c',
  severity: 'caution',
  statement: 'The band of (b) is wider than it needs to be.',
  cure: '',
  place: {},
  worstDraw: null,
  otherDraws: [],
  drawCount: 0,
};
const person = { id: 1, name: 'Reader' };
const review: Review = {
  id: 1,
  itemId: 1,
  itemCode: 'EG-001',
  itemTitle: 'Gun',
  topic: { id: 1, code: 'EG', name: 'Guns' },
  revision: 1,
  marks: 3,
  requestedBy: person,
  reviewer: person,
  stage: 'revealed',
  decision: null,
  dueOn: null,
  requestedAt: '2026-03-02T10:00:00.000Z',
  abilities: ['review.decide'],
  note: '',
  draw: 1,
  sheet: null,
  numericParts: [{ partId: 'p', letter: 'b', unit: 'V' }],
  workings: [attempt(1, true)],
  reveal: {
    content: itemContentSchema.parse({ title: 'Gun' }),
    scheme: { title: '', marks: 3, parts: [] },
    report: {
      engineVersion: '1',
      contentHash: '',
      gridSize: 1,
      exhaustive: true,
      drawsAssayed: 1,
      drawsDiscarded: 0,
      coverage: '',
      findings: [caution],
      distributions: [],
      scales: [],
    },
    assayStale: false,
    previous: null,
  },
  comments: [],
  decisionReason: '',
  decidedAt: null,
};

describe('the decision', () => {
  it('can be approval only once every caution has a word of reason', async () => {
    const user = userEvent.setup();
    const decide = vi.fn(() => Promise.resolve());
    render(<DecisionForm review={review} onDecide={decide} />);
    const approve = screen.getByRole<HTMLInputElement>('radio', { name: /Approve/ });
    expect(approve.disabled).toBe(true);
    expect(screen.getByText('One caution has no word of reason yet.')).toBeDefined();
    await user.type(screen.getByLabelText(/wider than it needs/), 'Fine at this level.');
    expect(approve.disabled).toBe(false);
    await user.click(approve);
    await user.click(screen.getByRole('button', { name: 'Approve' }));
    expect(decide).toHaveBeenCalledWith({
      decision: 'approved',
      reason: '',
      acceptedCautions: { 'band.p': 'Fine at this level.' },
    });
  });

  it('needs reasons when the item goes back', async () => {
    const user = userEvent.setup();
    const decide = vi.fn(() => Promise.resolve());
    render(<DecisionForm review={review} onDecide={decide} />);
    await user.click(screen.getByRole('radio', { name: /Return/ }));
    await user.click(screen.getByRole('button', { name: 'Return' }));
    expect((await screen.findByRole('alert')).textContent).toBe('Tell the writer why it comes back.');
    await user.type(screen.getByLabelText('Reasons, for the writer'), 'The stem gives the answer away.');
    await user.click(screen.getByRole('button', { name: 'Return' }));
    expect(decide).toHaveBeenCalledWith({
      decision: 'returned',
      reason: 'The stem gives the answer away.',
      acceptedCautions: {},
    });
  });
});

describe('comments', () => {
  it('go to the place chosen and keep it for the next', async () => {
    const user = userEvent.setup();
    const comment = vi.fn(() => Promise.resolve());
    const anchors = [
      { value: '', name: 'the item as a whole' },
      { value: 'p', name: 'part (b)' },
    ];
    render(<CommentsPanel comments={[]} anchors={anchors} canComment onComment={comment} />);
    await user.selectOptions(screen.getByLabelText('About'), 'p');
    await user.type(screen.getByLabelText('Comment'), 'Which end of the gap?');
    await user.click(screen.getByRole('button', { name: 'Add comment' }));
    expect(comment).toHaveBeenCalledWith('p', 'Which end of the gap?');
    expect(screen.getByLabelText<HTMLTextAreaElement>('Comment').value).toBe('');
    expect(screen.getByLabelText<HTMLSelectElement>('About').value).toBe('p');
  });
});
