import { cleanup, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { ApiError } from '#client/src/lib/api-error.ts';
import { sweepDraft } from '#client/src/features/sweep-form/sweep-draft.ts';
import { firstSweepForm } from '#client/src/features/sweep-form/sweep-form-defaults.ts';
import { SweepForm, type SweepFormProps } from '#client/src/features/sweep-form/sweep-form.tsx';
import { BEAM, PROJECT } from './office-project.ts';

afterEach(() => {
  cleanup();
  sessionStorage.clear();
});

function show(changed: Partial<SweepFormProps> = {}) {
  const props: SweepFormProps = {
    project: PROJECT,
    initial: firstSweepForm(PROJECT, BEAM),
    runs: [],
    isBusy: false,
    refusal: null,
    presets: null,
    mayRun: true,
    onEdit: vi.fn(),
    onSave: vi.fn(),
    onRun: vi.fn(),
    ...changed,
  };
  const view = render(<SweepForm {...props} />);
  return { props, ...view, user: userEvent.setup() };
}
const field = (name: string) => screen.getByLabelText(name);
async function retype(user: ReturnType<typeof userEvent.setup>, name: string, text: string) {
  await user.clear(field(name));
  await user.type(field(name), text);
}

describe('the sweep form', () => {
  it('prints the exact number of sections and, a moment later, what cannot fit', async () => {
    show();
    expect(screen.getByText('103,740')).toBeTruthy();
    await waitFor(() => expect(screen.getByText('4.29 %')).toBeTruthy(), { timeout: 3000 });
  });

  it('counts anew with every change', async () => {
    const { user } = show();
    await retype(user, 'Width b to', '14');
    expect(screen.getByText('41,496')).toBeTruthy();
  });

  it('runs on Enter with what is typed, in SI', async () => {
    const { user, props } = show();
    await retype(user, 'Depth h by', '2{Enter}');
    expect(props.onRun).toHaveBeenCalledOnce();
    const input = vi.mocked(props.onRun).mock.calls[0]![0];
    expect(input.definition.space.depth).toMatchObject({ step: expect.closeTo(50.8, 9) });
  });

  it('says what is wrong beside the field, points there instead of running, and keeps the text', async () => {
    const { user, props } = show();
    await retype(user, 'Width b from', 'wide{Enter}');
    expect(props.onRun).not.toHaveBeenCalled();
    expect(screen.getByText('“wide” is not a number')).toBeTruthy();
    expect(document.activeElement).toBe(field('Width b from'));
    expect(field('Width b from')).toHaveProperty('value', 'wide');
  });

  it('says limits in the units that are typed', async () => {
    const { user } = show();
    await retype(user, 'Width b to', '900');
    expect(screen.getByText(/must be at most 196.9 in/)).toBeTruthy();
  });

  it('refuses a space too large with its count, at the range to coarsen', async () => {
    const { user, props } = show();
    await retype(user, 'Depth h by', '0.01');
    await retype(user, 'Width b by', '0.01');
    expect(screen.getByText(/can be evaluated one by one/)).toBeTruthy();
    await retype(user, 'Concrete f′c by', '0.002');
    expect(screen.getByText(/are more than the 200,000,000,000/)).toBeTruthy();
    expect(field('Depth h by').getAttribute('aria-invalid')).toBe('true');
    await user.click(screen.getByRole('button', { name: 'Run' }));
    expect(props.onRun).not.toHaveBeenCalled();
  });

  it('puts what the service objects to beside its field until that is changed', async () => {
    const refusal = new ApiError({
      code: 'invalid-input',
      message: 'The sweep cannot be run',
      status: 400,
      issues: [
        { path: ['definition', 'space', 'width', 'to'], message: 'Width b: too wide for this office' },
      ],
    });
    const { user, rerender, props } = show();
    await user.click(screen.getByRole('button', { name: 'Run' }));
    rerender(<SweepForm {...props} refusal={refusal} />);
    expect(screen.getByText('Width b: too wide for this office')).toBeTruthy();
    expect(screen.getByText('The sweep cannot be run')).toBeTruthy();
    await retype(user, 'Width b to', '18');
    expect(screen.queryByText('Width b: too wide for this office')).toBeNull();
  });

  it('hands every edit over, so that a draft outlives the page', async () => {
    const onEdit = (form: SweepFormProps['initial']) => sweepDraft.write('b', form);
    const { user } = show({ onEdit });
    await retype(user, 'Name of the sweep', 'Deeper');
    expect(sweepDraft.read('b')?.name).toBe('Deeper');
    sweepDraft.drop('b');
    expect(sweepDraft.read('b')).toBeNull();
  });

  it('takes the top steel along when the bottom steel becomes plain areas', async () => {
    const { user } = show();
    await user.click(screen.getAllByRole('radio', { name: 'Areas' })[0]!);
    expect(screen.getAllByLabelText('areas, parted by commas')[1]).toHaveProperty('value', '0');
  });

  it('offers no run to a reader who may not', () => {
    show({ mayRun: false });
    expect(screen.queryByRole('button', { name: 'Run' })).toBeNull();
    expect(screen.queryByRole('button', { name: 'Save' })).toBeNull();
  });
});
