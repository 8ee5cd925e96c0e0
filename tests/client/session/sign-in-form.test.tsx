import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { SignInForm } from '#client/src/features/session/sign-in-form.tsx';

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const onSignedIn = vi.fn();

const open = () =>
  render(
    <QueryClientProvider client={new QueryClient()}>
      <SignInForm onSignedIn={onSignedIn} />
    </QueryClientProvider>,
  );

describe('signing in', () => {
  it('keeps the e-mail and says what is wrong when the credentials are', async () => {
    vi.stubGlobal('fetch', (_url: string, init: RequestInit) =>
      Promise.resolve(
        init.method === 'POST'
          ? Response.json(
              {
                error: {
                  code: 'wrong-credentials',
                  message: 'E-mail or password is wrong.',
                  issues: [],
                  requestId: 'r',
                },
              },
              { status: 401 },
            )
          : Response.json({ person: null, csrfToken: 't' }),
      ),
    );
    open();
    await userEvent.type(screen.getByLabelText('E-mail'), 'someone@office.example');
    await userEvent.type(screen.getByLabelText('Password'), 'wrong{Enter}');
    expect((await screen.findByRole('alert')).textContent).toBe('E-mail or password is wrong.');
    expect(screen.getByLabelText<HTMLInputElement>('E-mail').value).toBe('someone@office.example');
    expect(onSignedIn).not.toHaveBeenCalled();
  });

  it('says which of the two is missing', async () => {
    open();
    await userEvent.type(screen.getByLabelText('E-mail'), 'someone@office.example{Enter}');
    expect(await screen.findByText('Password is missing')).toBeDefined();
  });
});
