// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router';
import { afterEach, describe, expect, it, vi } from 'vitest';

import type { Paper, PaperPlace } from '#shared/contracts/papers.ts';
import { RunningOrder } from './RunningOrder.tsx';

afterEach(cleanup);

const place = (itemId: number, position: number, newerRevision: number | null = null): PaperPlace => ({
  id: itemId * 10,
  position,
  itemId,
  itemCode: `EG-00${itemId}`,
  title: `Item ${itemId}`,
  topic: { id: 1, code: 'EG', name: 'Electron guns' },
  revision: 1,
  newerRevision,
  marks: 6,
  draw: 100 + itemId,
  gridSize: 500,
});

const paperOf = (places: PaperPlace[]): Paper => ({
  id: 1,
  code: 'P-001',
  title: 'Fields and particles',
  subtitle: '',
  targetMarks: 60,
  durationMinutes: 75,
  instructions: '',
  state: 'assembling',
  version: 3,
  createdBy: { id: 1, name: 'Setter' },
  proposedBy: null,
  places,
  marks: 18,
  marksByTopic: [],
  findings: [],
  seal: null,
  abilities: ['paper.edit'],
});

/** Shows the order; `onSave` sees every order that is sent. */
function show(places: PaperPlace[], readOnly = false) {
  const onSave = vi.fn();
  const onTakeOff = vi.fn();
  const view = (shown: PaperPlace[], busy: boolean) => (
    <MemoryRouter>
      <RunningOrder
        paper={paperOf(shown)}
        readOnly={readOnly}
        busy={busy}
        onSave={onSave}
        onTakeOff={onTakeOff}
      />
    </MemoryRouter>
  );
  const { rerender } = render(view(places, false));
  const answer = (shown: PaperPlace[]) => {
    rerender(view(places, true));
    rerender(view(shown, false));
  };
  return { onSave, onTakeOff, answer };
}

describe('the running order', () => {
  it('sends the whole order when a row is moved by keys, and keeps the cursor on that row', async () => {
    const user = userEvent.setup();
    const { onSave, answer } = show([place(1, 1), place(2, 2), place(3, 3)]);
    screen.getByRole('button', { name: 'Move EG-001 down' }).focus();
    await user.keyboard('{Alt>}{ArrowDown}{/Alt}');
    expect(onSave).toHaveBeenCalledWith([
      { itemId: 2, draw: 102 },
      { itemId: 1, draw: 101 },
      { itemId: 3, draw: 103 },
    ]);
    answer([place(2, 1), place(1, 2), place(3, 3)]);
    expect(document.activeElement).toBe(screen.getByRole('button', { name: 'Move EG-001 down' }));
    expect(screen.getByRole('status').textContent).toBe('EG-001 moves to place 2 of 3.');
  });

  it('goes on with the other direction when the row has reached the end', async () => {
    const user = userEvent.setup();
    const { answer } = show([place(1, 1), place(2, 2)]);
    await user.click(screen.getByRole('button', { name: 'Move EG-001 down' }));
    answer([place(2, 1), place(1, 2)]);
    expect(document.activeElement).toBe(screen.getByRole('button', { name: 'Move EG-001 up' }));
  });

  it('moves nothing beyond the ends', async () => {
    const user = userEvent.setup();
    const { onSave } = show([place(1, 1), place(2, 2)]);
    screen.getByRole('link', { name: 'EG-001' }).focus();
    await user.keyboard('{Alt>}{ArrowUp}{/Alt}');
    expect(onSave).not.toHaveBeenCalled();
  });

  it('takes a typed draw within the grid and passes over one outside it', async () => {
    const user = userEvent.setup();
    const { onSave } = show([place(1, 1)]);
    const field = screen.getByRole('textbox', { name: 'Draw of EG-001, 1 to 500' });
    await user.clear(field);
    await user.type(field, '501{Enter}');
    expect(onSave).not.toHaveBeenCalled();
    await user.clear(field);
    await user.type(field, '27{Enter}');
    expect(onSave).toHaveBeenCalledExactlyOnceWith([{ itemId: 1, draw: 27 }]);
  });

  it('lets the server choose another draw, and takes a newer revision with a draw of its own', async () => {
    const user = userEvent.setup();
    const { onSave } = show([place(1, 1, 4)]);
    await user.click(screen.getByRole('button', { name: 'Choose a draw of EG-001 for me' }));
    expect(onSave).toHaveBeenLastCalledWith([{ itemId: 1, draw: null }]);
    await user.click(screen.getByRole('button', { name: 'take it' }));
    expect(onSave).toHaveBeenLastCalledWith([{ itemId: 1, draw: null, takeNewest: true }]);
  });

  it('steps to the draw before and the draw after', async () => {
    const user = userEvent.setup();
    const { onSave } = show([place(1, 1)]);
    await user.click(screen.getByRole('button', { name: 'Next draw of EG-001' }));
    expect(onSave).toHaveBeenLastCalledWith([{ itemId: 1, draw: 102 }]);
    await user.click(screen.getByRole('button', { name: 'Previous draw of EG-001' }));
    expect(onSave).toHaveBeenLastCalledWith([{ itemId: 1, draw: 100 }]);
  });

  it('puts a dragged row where it is dropped', () => {
    const { onSave } = show([place(1, 1), place(2, 2), place(3, 3)]);
    const rows = screen.getAllByRole('row').slice(1);
    const grip = screen.getByRole('cell', { name: '3' });
    fireEvent.dragStart(grip, { dataTransfer: {} });
    fireEvent.dragOver(rows[0] ?? grip);
    fireEvent.drop(rows[0] ?? grip);
    expect(onSave).toHaveBeenCalledExactlyOnceWith([
      { itemId: 3, draw: 103 },
      { itemId: 1, draw: 101 },
      { itemId: 2, draw: 102 },
    ]);
  });

  it('asks for an item to be taken off', async () => {
    const user = userEvent.setup();
    const { onSave, onTakeOff } = show([place(1, 1), place(2, 2)]);
    await user.click(screen.getByRole('button', { name: 'Take EG-002 off the paper' }));
    expect(onTakeOff).toHaveBeenCalledExactlyOnceWith(2);
    expect(onSave).not.toHaveBeenCalled();
  });

  it('offers no change when the paper may not be changed', () => {
    show([place(1, 1, 4), place(2, 2)], true);
    expect(screen.queryAllByRole('button')).toEqual([]);
    expect(screen.queryAllByRole('textbox')).toEqual([]);
    expect(screen.getByText('101')).toBeDefined();
  });
});
