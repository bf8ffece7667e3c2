// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen } from '@testing-library/react';
import { MemoryRouter } from 'react-router';
import { afterEach, describe, expect, it, vi } from 'vitest';

import type { DeskReply } from '#shared/contracts/desk.ts';
import { Desk } from './Desk.tsx';

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function show(reply: unknown, status = 200) {
  vi.stubGlobal('fetch', () => Promise.resolve(Response.json(reply, { status })));
  render(
    <QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}>
      <MemoryRouter>
        <Desk />
      </MemoryRouter>
    </QueryClientProvider>,
  );
}

const waiting: DeskReply = {
  groups: [
    {
      group: 'returnedToMe',
      total: 3,
      entries: [
        {
          path: '/items/12',
          code: 'OD-003',
          title: 'A drop at rest',
          reason: 'returned by a reviewer',
          since: new Date().toISOString(),
          dueOn: '2026-12-24',
        },
      ],
    },
    { group: 'myDrafts', total: 0, entries: [] },
  ],
};

describe('the desk', () => {
  it('shows what waits, why and until when, each leading to its place', async () => {
    show(waiting);
    const link = await screen.findByRole('link');
    expect(link.getAttribute('href')).toBe('/items/12');
    expect(link.textContent).toContain('returned by a reviewer');
    expect(link.textContent).toContain('due 24 Dec 2026');
    expect(screen.getByText('2 more.')).toBeDefined();
  });

  it('leaves out groups in which nothing waits', async () => {
    show(waiting);
    await screen.findByRole('heading', { name: /Returned to me/ });
    expect(screen.queryByRole('heading', { name: /My drafts/ })).toBeNull();
  });

  it('says so when nothing waits', async () => {
    show({ groups: [] });
    expect(await screen.findByText(/Nothing waits for you/)).toBeDefined();
  });

  it('gives the server’s sentence when it fails, and a way to try again', async () => {
    const problem = {
      type: 'urn:graticule:problem:busy',
      title: 'Busy',
      status: 503,
      detail: 'The bank is busy. Try again in a few seconds.',
      code: 'busy',
    };
    show(problem, 503);
    expect((await screen.findByRole('alert')).textContent).toContain('The bank is busy.');
    expect(screen.getByRole('button', { name: 'Try again' })).toBeDefined();
  });
});
