// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';

import type { Paper } from '#shared/contracts/papers.ts';
import { AppError } from '#shared/errors/app-error.ts';
import { paperCalls } from './api.ts';
import { PaperActions } from './PaperActions.tsx';
import { PaperAside } from './PaperAside.tsx';

afterEach(cleanup);

const paper: Paper = {
  id: 1,
  code: 'P-001',
  title: 'Fields and particles',
  subtitle: '',
  targetMarks: 60,
  durationMinutes: 75,
  instructions: '',
  state: 'assembling',
  version: 3,
  createdBy: { id: 1, name: 'Setter One' },
  proposedBy: null,
  places: [],
  marks: 52,
  marksByTopic: [],
  findings: [],
  seal: null,
  abilities: [],
};
const proposed: Paper = { ...paper, state: 'proposed', proposedBy: { id: 1, name: 'Setter One' } };

function show(shown: Paper) {
  const calls = paperCalls(shown.id);
  const onChanged = vi.fn();
  render(<PaperActions paper={shown} calls={calls} onChanged={onChanged} />);
  return { calls, onChanged };
}

describe('the next steps of a paper', () => {
  it('offers only what the server allows in this state', () => {
    show({ ...paper, abilities: ['paper.seal', 'paper.release'] });
    expect(screen.queryAllByRole('button')).toEqual([]);
    cleanup();
    show({ ...proposed, abilities: ['paper.propose', 'paper.return', 'paper.seal'] });
    expect(screen.getAllByRole('button').map((button) => button.textContent)).toEqual([
      'Return to assembling',
      'Confirm and seal',
    ]);
  });

  it('names who must confirm when this person may not', () => {
    show({ ...proposed, abilities: ['paper.return'] });
    expect(screen.getByText(/Proposed by Setter One. A second setter or a moderator/)).toBeDefined();
  });

  it('seals only after the question is answered, and with the version on show', async () => {
    const user = userEvent.setup();
    const { calls, onChanged } = show({ ...proposed, abilities: ['paper.seal'] });
    const sealed: Paper = { ...proposed, state: 'sealed' };
    const seal = vi.spyOn(calls, 'seal').mockResolvedValue(sealed);
    await user.click(screen.getByRole('button', { name: 'Confirm and seal' }));
    expect(seal).not.toHaveBeenCalled();
    await user.click(screen.getByRole('button', { name: 'Seal it' }));
    expect(seal).toHaveBeenCalledExactlyOnceWith(3);
    expect(onChanged).toHaveBeenCalledExactlyOnceWith(sealed);
    expect(screen.queryByRole('dialog')).toBeNull();
  });

  it('returns a paper with the reason', async () => {
    const user = userEvent.setup();
    const { calls } = show({ ...proposed, abilities: ['paper.return'] });
    const giveBack = vi.spyOn(calls, 'giveBack').mockResolvedValue(paper);
    await user.click(screen.getByRole('button', { name: 'Return to assembling' }));
    await user.type(screen.getByLabelText('Why'), 'Question 2 repeats question 1.');
    await user.click(screen.getByRole('button', { name: 'Return it' }));
    expect(giveBack).toHaveBeenCalledExactlyOnceWith(3, 'Question 2 repeats question 1.');
  });

  it('says why a step failed and stays where it is', async () => {
    const user = userEvent.setup();
    const { calls, onChanged } = show({ ...paper, abilities: ['paper.propose'] });
    vi.spyOn(calls, 'propose').mockRejectedValue(new AppError('notPossible', 'The total is 8 marks short.'));
    await user.click(screen.getByRole('button', { name: 'Propose for sealing' }));
    await user.click(screen.getByRole('button', { name: 'Propose' }));
    expect((await screen.findByRole('alert')).textContent).toBe('The total is 8 marks short.');
    expect(onChanged).not.toHaveBeenCalled();
  });
});

describe('what stands beside the running order', () => {
  it('tells the total against the plan and each finding as a sentence', () => {
    render(
      <PaperAside
        paper={{
          ...paper,
          findings: [
            {
              code: 'paper.total',
              severity: 'blocker',
              statement: 'The paper has 52 marks and should have 60.',
              cure: 'Add items worth 8 marks.',
              placeIds: [],
            },
          ],
        }}
        onShowOrder={() => undefined}
      />,
    );
    expect(screen.getByText('8 marks short')).toBeDefined();
    expect(screen.getByRole('listitem').textContent).toContain('Blocker The paper has 52 marks');
  });

  it('warns when sealed content no longer has its hash', () => {
    const seal = {
      sha256: 'ab'.repeat(32),
      intact: false,
      proposedBy: { id: 1, name: 'Setter One' },
      confirmedBy: { id: 2, name: 'Moderator' },
      sealedAt: '2026-03-02T10:00:00.000Z',
    };
    render(<PaperAside paper={{ ...paper, state: 'sealed', seal }} onShowOrder={() => undefined} />);
    expect(screen.getByText(/no longer has the hash/)).toBeDefined();
    cleanup();
    render(
      <PaperAside
        paper={{ ...paper, state: 'sealed', seal: { ...seal, intact: true } }}
        onShowOrder={() => undefined}
      />,
    );
    expect(screen.queryByText(/no longer has the hash/)).toBeNull();
    expect(screen.getByText(`SHA-256 ${seal.sha256}`)).toBeDefined();
  });
});
