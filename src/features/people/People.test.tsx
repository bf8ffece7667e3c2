// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

import type { Person } from '#shared/contracts/people.ts';
import { Notices } from '#src/components/ui/Notices.tsx';
import { rememberSession } from '#src/lib/api.ts';
import { People } from './People.tsx';

const person: Person = {
  id: 4,
  name: 'Somebody Here',
  email: 'somebody@team.example',
  roles: ['writer'],
  active: true,
  createdAt: '2026-03-02T10:00:00.000Z',
  lastSeenAt: null,
  version: 6,
};

/** The bodies of all changing requests. */
const changes: unknown[] = [];
let refusal: string | null = null;
let held = person;

beforeEach(() => {
  changes.length = 0;
  refusal = null;
  held = person;
  rememberSession({ person: null, csrfToken: 'token' });
  vi.stubGlobal('fetch', (_path: string, init: { method: string; body: string }) => {
    if (init.method === 'GET') return Promise.resolve(Response.json({ people: [held] }));
    changes.push(JSON.parse(init.body));
    if (refusal === null) return Promise.resolve(Response.json(person));
    const problem = { type: 'urn:graticule:problem:notPossible', title: 'Not possible', status: 409 };
    return Promise.resolve(
      Response.json({ ...problem, detail: refusal, code: 'notPossible' }, { status: 409 }),
    );
  });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function show(me = 1) {
  render(
    <QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}>
      <People me={me} />
      <Notices />
    </QueryClientProvider>,
  );
}

describe('the people of the team', () => {
  it('shows who holds which role and what each role is for', async () => {
    show();
    expect(await screen.findByRole('checkbox', { name: 'Somebody Here: writer' })).toHaveProperty(
      'checked',
      true,
    );
    expect(screen.getByRole('checkbox', { name: 'Somebody Here: setter' })).toHaveProperty('checked', false);
    expect(screen.getByText('Works each item independently, then approves or returns it.')).toBeDefined();
  });

  it('gives a further role with the version that was read', async () => {
    const user = userEvent.setup();
    show();
    await user.click(await screen.findByRole('checkbox', { name: 'Somebody Here: setter' }));
    await waitFor(() => expect(changes).toEqual([{ version: 6, roles: ['writer', 'setter'] }]));
  });

  it('says beside the person why a change was refused', async () => {
    const user = userEvent.setup();
    refusal = 'The team needs an administrator.';
    show();
    await user.click(await screen.findByRole('checkbox', { name: 'Somebody Here: writer' }));
    expect((await screen.findByRole('alert')).textContent).toBe('The team needs an administrator.');
    expect(screen.getByRole('checkbox', { name: 'Somebody Here: writer' })).toHaveProperty('checked', true);
  });

  it('tells a change and takes it back when asked', async () => {
    const user = userEvent.setup();
    show();
    await user.click(await screen.findByRole('checkbox', { name: 'Somebody Here: setter' }));
    await user.click(await screen.findByRole('button', { name: 'Take it back' }));
    await waitFor(() => expect(changes.at(-1)).toEqual({ version: 6, roles: ['writer'] }));
  });

  it('asks before an administrator gives up that role', async () => {
    const user = userEvent.setup();
    held = { ...person, roles: ['writer', 'administrator'] };
    show(person.id);
    await user.click(await screen.findByRole('checkbox', { name: 'Somebody Here: administrator' }));
    expect(changes).toEqual([]);
    await user.click(screen.getByRole('button', { name: 'Give it up' }));
    await waitFor(() => expect(changes).toEqual([{ version: 6, roles: ['writer'] }]));
  });
});
