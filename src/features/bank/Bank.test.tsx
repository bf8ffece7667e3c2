// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter, useLocation } from 'react-router';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

import { itemQuerySchema, type ItemRow } from '#shared/contracts/items.ts';
import { readBankQuery } from './api.ts';
import { Bank } from './Bank.tsx';

const row: ItemRow = {
  id: 12,
  code: 'OD-003',
  title: 'A drop at rest',
  topic: { id: 5, code: 'OD', name: 'Oil drops' },
  state: 'approved',
  owner: { id: 1, name: 'Writer' },
  marks: 8,
  parts: 3,
  revision: 2,
  approvedRevision: 2,
  worstFinding: 'caution',
  assayed: 'stale',
  usedOn: null,
  updatedAt: '2026-03-02T10:00:00.000Z',
};

/** Every address that the bank asks the server for. */
const asked: string[] = [];
let rows: ItemRow[] = [];

beforeEach(() => {
  asked.length = 0;
  rows = [row];
  localStorage.clear();
  vi.stubGlobal('fetch', (path: string) => {
    asked.push(path);
    const reply = path.startsWith('/api/items')
      ? { rows, total: rows.length === 0 ? 0 : 120, page: 1, pageSize: 50 }
      : path.startsWith('/api/topics')
        ? { topics: [row.topic] }
        : { people: [{ id: 1, name: 'Writer', roles: ['writer'] }] };
    return Promise.resolve(Response.json(reply));
  });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function Address() {
  const { search } = useLocation();
  return <output aria-label="address">{search}</output>;
}

function show(address = '/bank', mayWrite = false) {
  render(
    <QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}>
      <MemoryRouter initialEntries={[address]}>
        <Bank mayWrite={mayWrite} />
        <Address />
      </MemoryRouter>
    </QueryClientProvider>,
  );
}

const address = () => new URLSearchParams(screen.getByLabelText('address').textContent ?? '');
const lastAsked = () =>
  new URL(asked.filter((path) => path.startsWith('/api/items')).at(-1) ?? '', 'http://bank.example')
    .searchParams;

describe('the bank', () => {
  it('asks the server for what the address says', async () => {
    show('/bank?state=approved&sort=marks&direction=ascending&page=2');
    await screen.findByRole('link', { name: 'OD-003' });
    expect(Object.fromEntries(lastAsked())).toMatchObject({
      state: 'approved',
      sort: 'marks',
      direction: 'ascending',
      page: '2',
    });
    expect(screen.getByRole('columnheader', { name: /Marks/ }).getAttribute('aria-sort')).toBe('ascending');
  });

  it('puts a filter into the address and goes back to the first page', async () => {
    const user = userEvent.setup();
    show('/bank?page=3');
    await screen.findByRole('link', { name: 'OD-003' });
    await user.selectOptions(screen.getByRole('combobox', { name: 'State' }), 'approved');
    expect(address().get('state')).toBe('approved');
    expect(address().has('page')).toBe(false);
    await waitFor(() => expect(lastAsked().get('state')).toBe('approved'));
  });

  it('turns the order round when the same column is chosen again', async () => {
    const user = userEvent.setup();
    show();
    await user.click(await screen.findByRole('button', { name: 'Code' }));
    expect(address().get('direction')).toBe('ascending');
    await user.click(await screen.findByRole('button', { name: /^Code/ }));
    expect(address().get('direction')).toBe('descending');
  });

  it('leads to the item from its row and says that its assay is stale', async () => {
    show();
    const link = await screen.findByRole('link', { name: 'OD-003' });
    expect(link.getAttribute('href')).toBe('/items/12');
    expect(link.closest('tr')?.textContent).toContain('Caution, stale');
  });

  it('hides a column and remembers that', async () => {
    const user = userEvent.setup();
    show();
    await screen.findByRole('columnheader', { name: 'Owner' });
    await user.click(screen.getByRole('button', { name: 'Columns' }));
    await user.click(await screen.findByRole('checkbox', { name: 'Owner' }));
    expect(screen.queryByRole('columnheader', { name: 'Owner', hidden: true })).toBeNull();
    cleanup();
    show();
    await screen.findByRole('columnheader', { name: 'Topic' });
    expect(screen.queryByRole('columnheader', { name: 'Owner' })).toBeNull();
  });

  it('tells an empty bank from a search that finds nothing', async () => {
    rows = [];
    show();
    expect(await screen.findByText(/The bank is empty/)).toBeDefined();
    cleanup();
    show('/bank?search=nothing');
    expect(await screen.findByText(/No item fits/)).toBeDefined();
  });

  it('offers a new item to those who may write, and asks for title and topic', async () => {
    const user = userEvent.setup();
    show('/bank');
    await screen.findByRole('link', { name: 'OD-003' });
    expect(screen.queryByRole('button', { name: 'New item' })).toBeNull();
    cleanup();
    show('/bank', true);
    await user.click(screen.getByRole('button', { name: 'New item' }));
    await user.click(screen.getByRole('button', { name: 'Begin the item' }));
    expect(await screen.findByText('Choose a topic.')).toBeDefined();
    expect(screen.getByText('Give the item a title.')).toBeDefined();
  });
});

describe('reading the address of the bank', () => {
  it('passes over what it cannot mean and keeps the rest', () => {
    const query = readBankQuery(new URLSearchParams('state=boiled&marks=3&page=-2&sort=code'));
    expect(query).toEqual(itemQuerySchema.parse({ sort: 'code' }));
  });
});
