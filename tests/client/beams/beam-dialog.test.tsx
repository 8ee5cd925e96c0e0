import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, Link, RouterProvider } from 'react-router-dom';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { BeamInput, Person, Project } from '#shared/contract/records.ts';
import { BeamDialog } from '#client/src/features/beams/beam-dialog.tsx';
import { SessionExpiredDialog } from '#client/src/features/session/session-expired-dialog.tsx';
import { ProjectContext } from '#client/src/lib/project-context.ts';
import { ReaderContext } from '#client/src/lib/reader-context.ts';

const READER: Person = { id: 'r', name: 'An engineer', email: 'engineer@office.example', role: 'engineer' };
const PROJECT = { id: 'p', designBasis: { units: 'us', ruleSet: 'aci318-19' } } as Project;

let answer: (url: string, body: unknown) => Response;
const sent: unknown[] = [];

beforeEach(() => {
  sent.length = 0;
  vi.stubGlobal('fetch', (url: string, init: RequestInit) => {
    const body: unknown = typeof init.body === 'string' ? JSON.parse(init.body) : null;
    if (url === '/api/projects/p/beams') sent.push(body);
    return Promise.resolve(url === '/api/session' ? session() : answer(url, body));
  });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const session = () => Response.json({ person: READER, csrfToken: 'token' });
const refuse = (status: number, code: string, issues: unknown[] = []) =>
  Response.json({ error: { code, message: 'Not so.', issues, requestId: 'r-1' } }, { status });

const onClose = vi.fn();

function open() {
  const page = (
    <ReaderContext value={READER}>
      <ProjectContext value={PROJECT}>
        <BeamDialog beam={null} onClose={onClose} />
        <SessionExpiredDialog />
        <Link to="/elsewhere">Elsewhere</Link>
      </ProjectContext>
    </ReaderContext>
  );
  const router = createMemoryRouter([
    { path: '/', element: page },
    { path: '/elsewhere', element: <p>Another page</p> },
  ]);
  render(
    <QueryClientProvider client={new QueryClient()}>
      <RouterProvider router={router} />
    </QueryClientProvider>,
  );
  return router;
}

const field = (label: string) => screen.getByLabelText<HTMLInputElement>(label);

async function fillIn() {
  await userEvent.type(field('Mark'), 'B-204');
  await userEvent.type(field('Span'), '28');
  await userEvent.type(field('Moment Mu'), '350');
}

describe('a new beam', () => {
  it('is sent in SI, with what was left empty as not asked', async () => {
    answer = () => Response.json({ id: 'b' });
    open();
    await fillIn();
    await userEvent.type(field('Depth cap'), '30{Enter}');
    await waitFor(() => expect(onClose).toHaveBeenCalled());
    const beam = sent[0] as BeamInput;
    expect(beam).toMatchObject({ mark: 'B-204', count: 1, vuN: null, ductilityTarget: null });
    expect(beam.spanMm).toBeCloseTo(28 * 304.8, 6);
    expect(beam.muNmm / 1.355818e6).toBeCloseTo(350, 3);
    expect(beam.depthCapMm).toBeCloseTo(762, 9);
  });

  it('says beside each field what is missing and sends nothing', async () => {
    open();
    await userEvent.type(field('Mark'), 'B-204{Enter}');
    expect(await screen.findByText('Span must be a number')).toBeDefined();
    expect(screen.getByText('Moment Mu must be a number')).toBeDefined();
    expect(field('Span').getAttribute('aria-invalid')).toBe('true');
    expect(sent).toEqual([]);
  });

  it('puts an issue the service found beside its field', async () => {
    answer = () => refuse(409, 'conflict', [{ path: ['mark'], message: 'This mark is taken' }]);
    open();
    await fillIn();
    await userEvent.type(field('Mark'), '{Enter}');
    const message = await screen.findByText('This mark is taken');
    expect(field('Mark').getAttribute('aria-describedby')).toContain(message.parentElement!.id);
    expect(field('Mark').value).toBe('B-204');
  });

  it('outlives an expired session: signs in over the form, then sends what was typed', async () => {
    let isSignedIn = false;
    vi.stubGlobal('fetch', (url: string, init: RequestInit) => {
      if (url === '/api/session') {
        isSignedIn ||= init.method === 'POST';
        return Promise.resolve(session());
      }
      if (!isSignedIn) return Promise.resolve(refuse(401, 'unauthenticated'));
      sent.push(JSON.parse(init.body as string));
      return Promise.resolve(Response.json({ id: 'b' }));
    });
    open();
    await fillIn();
    await userEvent.type(field('Mark'), '{Enter}');
    const dialog = await screen.findByRole('dialog', { name: 'Your session has ended' });
    expect((await within(dialog).findByLabelText<HTMLInputElement>('E-mail')).value).toBe(READER.email);
    await userEvent.type(within(dialog).getByLabelText('Password'), 'a password{Enter}');
    await waitFor(() => expect(sent).toHaveLength(1));
    expect(sent[0]).toMatchObject({ mark: 'B-204' });
  });

  it('asks before an edited form is left', async () => {
    const router = open();
    await userEvent.type(field('Mark'), 'B');
    await router.navigate('/elsewhere');
    const question = await screen.findByRole('dialog', { name: 'Leave without saving?' });
    await userEvent.click(within(question).getByRole('button', { name: 'Stay' }));
    expect(field('Mark').value).toBe('B');
    await router.navigate('/elsewhere');
    await userEvent.click(await screen.findByRole('button', { name: 'Leave and lose the changes' }));
    expect(await screen.findByText('Another page')).toBeDefined();
  });
});
