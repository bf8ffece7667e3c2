// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

import { rememberSession } from '#src/lib/api.ts';
import { SignInForm } from './SignInForm.tsx';

const session = {
  person: {
    id: 1,
    name: 'Writer',
    email: 'writer@team.example',
    roles: ['writer'],
    abilities: ['desk.read'],
  },
  csrfToken: 'new',
};
let reply: () => Response;
const sent: unknown[] = [];

beforeEach(() => {
  sent.length = 0;
  reply = () => Response.json(session);
  rememberSession({ person: null, csrfToken: 'token' });
  vi.stubGlobal('fetch', (_path: string, init: { method: string; body: string }) => {
    sent.push(JSON.parse(init.body));
    return Promise.resolve(reply());
  });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

describe('signing in', () => {
  it('hands on the session that the server gives', async () => {
    const user = userEvent.setup();
    const onSignedIn = vi.fn();
    render(<SignInForm onSignedIn={onSignedIn} />);
    await user.type(screen.getByLabelText('E-mail address'), 'writer@team.example');
    await user.type(screen.getByLabelText('Password'), 'a long word{Enter}');
    await vi.waitFor(() => expect(onSignedIn).toHaveBeenCalledExactlyOnceWith(session));
    expect(sent).toEqual([{ email: 'writer@team.example', password: 'a long word' }]);
  });

  it('asks for what is missing before it sends anything', async () => {
    const user = userEvent.setup();
    render(<SignInForm onSignedIn={vi.fn()} />);
    await user.click(screen.getByRole('button', { name: 'Sign in' }));
    expect(await screen.findByText('Enter your password.')).toBeDefined();
    expect(screen.getByText(/Enter your e-mail address/)).toBeDefined();
    expect(sent).toEqual([]);
  });

  it('tells a refusal, keeps the address and empties the password', async () => {
    const user = userEvent.setup();
    const problem = { type: 'urn:graticule:problem:signInFailed', title: 'Sign-in failed', status: 401 };
    reply = () =>
      Response.json(
        { ...problem, code: 'signInFailed', detail: 'The address or the password is not right.' },
        { status: 401 },
      );
    const onSignedIn = vi.fn();
    render(<SignInForm email="writer@team.example" onSignedIn={onSignedIn} />);
    await user.type(screen.getByLabelText('Password'), 'wrong{Enter}');
    expect((await screen.findByRole('alert')).textContent).toBe('The address or the password is not right.');
    expect(screen.getByLabelText('E-mail address')).toHaveProperty('value', 'writer@team.example');
    expect(screen.getByLabelText('Password')).toHaveProperty('value', '');
    expect(onSignedIn).not.toHaveBeenCalled();
  });
});
