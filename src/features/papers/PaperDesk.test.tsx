// @vitest-environment jsdom
import { QueryClient, QueryClientProvider, useQuery } from '@tanstack/react-query';
import { cleanup, render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

import type { Paper, PaperPlace } from '#shared/contracts/papers.ts';
import { AppError, ERROR_STATUS, ERROR_TITLES } from '#shared/errors/app-error.ts';
import { Notices } from '#src/components/ui/Notices.tsx';
import { paperQuery } from './api.ts';
import { PaperDesk } from './PaperDesk.tsx';

const place = (itemId: number, position: number): PaperPlace => ({
  id: itemId * 10,
  position,
  itemId,
  itemCode: `EG-00${itemId}`,
  title: `Item ${itemId}`,
  topic: { id: 1, code: 'EG', name: 'Electron guns' },
  revision: 1,
  newerRevision: null,
  marks: 6,
  draw: 100 + itemId,
  gridSize: 500,
});

const paper: Paper = {
  id: 1,
  code: 'P-001',
  title: 'Fields and particles',
  subtitle: 'Mock',
  targetMarks: 60,
  durationMinutes: 75,
  instructions: 'Answer all questions.',
  state: 'assembling',
  version: 3,
  createdBy: { id: 1, name: 'Setter' },
  proposedBy: null,
  places: [place(1, 1), place(2, 2)],
  marks: 12,
  marksByTopic: [],
  findings: [],
  seal: null,
  abilities: ['paper.edit'],
};

interface Sent {
  path: string;
  body: Record<string, unknown>;
}

/** The paper as the server holds it; each change must come with its version. */
let held: Paper;
const sent: Sent[] = [];

/** Stands for the server at the boundary of the browser: takes changes of the version that it holds. */
function server(path: string, init?: RequestInit): Response {
  if (path === '/api/session') return Response.json({ person: null, csrfToken: 'token' });
  if (init?.method === 'GET' || init === undefined) return Response.json(held);
  const body = JSON.parse(typeof init.body === 'string' ? init.body : '{}') as Record<string, unknown>;
  sent.push({ path, body });
  if (body['version'] !== held.version) {
    const { code, message } = new AppError('conflict', 'Somebody else changed this paper.');
    const status = ERROR_STATUS[code];
    return Response.json(
      { type: 'about:blank', title: ERROR_TITLES[code], status, detail: message, code, current: held },
      { status },
    );
  }
  const { version: _version, places, ...details } = body;
  const order = (places ?? held.places) as { itemId: number; draw: number }[];
  held = {
    ...held,
    ...details,
    version: held.version + 1,
    places: order.map(({ itemId, draw }, index) => ({ ...place(itemId, index + 1), draw })),
  };
  return Response.json(held);
}

function Shown() {
  const { data } = useQuery(paperQuery(1));
  return data === undefined ? null : (
    <PaperDesk paper={data} renderSheet={() => 'sheet'} renderScheme={() => 'scheme'} />
  );
}

beforeEach(() => {
  held = paper;
  sent.length = 0;
  vi.stubGlobal('fetch', (path: string, init?: RequestInit) => Promise.resolve(server(path, init)));
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

async function show() {
  render(
    <QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}>
      <MemoryRouter>
        <Shown />
        <Notices />
      </MemoryRouter>
    </QueryClientProvider>,
  );
  await screen.findByRole('table', { name: 'Running order of P-001' });
}

const codes = () => screen.getAllByRole('link').map((link) => link.textContent);

describe('a paper that two people change', () => {
  it('shows both running orders, and puts mine in place of the other when I say so', async () => {
    const user = userEvent.setup();
    await show();
    held = { ...paper, version: 4, places: [place(2, 1), place(1, 2), place(3, 3)] };
    await user.click(screen.getByRole('button', { name: 'Next draw of EG-001' }));

    const alert = await screen.findByRole('alert');
    const [stored, mine] = within(alert)
      .getAllByRole('list')
      .map((list) =>
        within(list)
          .getAllByRole('listitem')
          .map((item) => item.textContent),
      );
    expect(stored).toEqual(['EG-002 Item 2, draw 102', 'EG-001 Item 1, draw 101', 'EG-003 Item 3, draw 103']);
    expect(mine).toEqual(['EG-001 Item 1, draw 102', 'EG-002 Item 2, draw 102']);

    await user.click(within(alert).getByRole('button', { name: 'Put mine in its place' }));
    await screen.findByRole('table', { name: 'Running order of P-001' });
    expect(codes()).toEqual(['EG-001', 'EG-002']);
    expect(sent.at(-1)?.body).toEqual({
      version: 4,
      places: [
        { itemId: 1, draw: 102 },
        { itemId: 2, draw: 102 },
      ],
    });
  });

  it('keeps what was typed into the details beside what was stored meanwhile', async () => {
    const user = userEvent.setup();
    await show();
    await user.click(screen.getByRole('button', { name: 'Change the details' }));
    held = { ...paper, version: 4, title: 'Fields, waves and particles', subtitle: 'Resit' };
    const title = screen.getByLabelText('Title');
    await user.clear(title);
    await user.type(title, 'Particles');
    await user.click(screen.getByRole('button', { name: 'Save the details' }));

    expect(await screen.findByText('Fields, waves and particles', { selector: 'form span' })).toBeDefined();
    expect(title).toHaveProperty('value', 'Particles');
    const subtitle = screen.getByText('Resit').closest('p');
    if (subtitle === null) throw new Error('The stored subtitle stands nowhere.');
    await user.click(within(subtitle).getByRole('button', { name: 'Take this' }));
    await user.click(screen.getByRole('button', { name: 'Save the details' }));
    await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull());
    expect(held).toMatchObject({ title: 'Particles', subtitle: 'Resit', version: 5 });
  });
});

describe('taking an item off', () => {
  it('can be undone, with the draw that it had', async () => {
    const user = userEvent.setup();
    await show();
    await user.click(screen.getByRole('button', { name: 'Take EG-001 off the paper' }));
    await user.click(await screen.findByRole('button', { name: 'Put it back' }));
    await screen.findByRole('link', { name: 'EG-001' });
    expect(held.places.map(({ itemId, draw }) => ({ itemId, draw }))).toEqual([
      { itemId: 1, draw: 101 },
      { itemId: 2, draw: 102 },
    ]);
    expect(held.version).toBe(5);
  });
});

describe('a dialog with typed text', () => {
  it('asks before it is closed, and once more closes', async () => {
    const user = userEvent.setup();
    await show();
    await user.click(screen.getByRole('button', { name: 'Change the details' }));
    await user.type(screen.getByLabelText('Title'), ' again');
    await user.keyboard('{Escape}');
    expect(screen.getByRole('dialog')).toBeDefined();
    await user.click(screen.getByRole('button', { name: 'Close without saving' }));
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(sent).toEqual([]);
  });
});
