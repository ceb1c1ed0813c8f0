// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { SessionView } from '#shared/schemas/people.ts';
import { SignInForm } from '#src/features/sign-in/components/sign-in-form.tsx';
import { sessionQuery } from '#src/lib/session.ts';

const SIGNED_OUT: SessionView = {
  needsSetUp: false,
  trial: true,
  demoSignIns: [
    { role: 'yard', name: 'Joel Mbeki', email: 'joel@harrowbend.example', password: 'a-long-password' },
  ],
  shop: null,
  person: null,
  can: {},
};

const sent: { url: string; body: unknown }[] = [];
let status = 200;

beforeEach(() => {
  sent.length = 0;
  status = 200;
  vi.stubGlobal('fetch', (url: string, init: { body?: string }) => {
    if (url === '/api/session') return Promise.resolve(Response.json(SIGNED_OUT));
    sent.push({ url, body: JSON.parse(init.body ?? 'null') as unknown });
    return Promise.resolve(Response.json({ message: 'Invalid email or password' }, { status }));
  });
  const client = new QueryClient();
  client.setQueryData(sessionQuery.queryKey, SIGNED_OUT);
  render(
    <QueryClientProvider client={client}>
      <SignInForm />
    </QueryClientProvider>,
  );
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const email = () => screen.getByLabelText<HTMLInputElement>('E-mail');
const password = () => screen.getByLabelText<HTMLInputElement>('Password');

describe('SignInForm', () => {
  it('signs in with what was typed', async () => {
    fireEvent.change(email(), { target: { value: ' ruth@harrowbend.example ' } });
    fireEvent.change(password(), { target: { value: 'another long one' } });
    fireEvent.click(screen.getByRole('button', { name: 'Sign in' }));
    await waitFor(() =>
      expect(sent).toEqual([
        {
          url: '/api/auth/sign-in/email',
          body: { email: 'ruth@harrowbend.example', password: 'another long one' },
        },
      ]),
    );
  });

  it('fills in and signs in as a person of the demo shop by one click', async () => {
    fireEvent.click(screen.getByRole('button', { name: /Yard hand/ }));
    expect(email().value).toBe('joel@harrowbend.example');
    await waitFor(() =>
      expect(sent[0]?.body).toEqual({ email: 'joel@harrowbend.example', password: 'a-long-password' }),
    );
  });

  it('asks for both fields at once and sends nothing', async () => {
    fireEvent.click(screen.getByRole('button', { name: 'Sign in' }));
    expect(await screen.findAllByRole('alert')).toHaveLength(2);
    expect(sent).toEqual([]);
  });

  it('does not tell a wrong address from a wrong password', async () => {
    status = 401;
    fireEvent.change(email(), { target: { value: 'ruth@harrowbend.example' } });
    fireEvent.change(password(), { target: { value: 'wrong' } });
    fireEvent.click(screen.getByRole('button', { name: 'Sign in' }));
    expect((await screen.findByRole('alert')).textContent).toContain('E-mail address or password is wrong');
    expect(email().value).toBe('ruth@harrowbend.example');
  });
});
