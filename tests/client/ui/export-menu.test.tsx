import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, it } from 'vitest';
import { ExportMenu } from '#client/src/ui/export-menu.tsx';
import { ToastRegion } from '#client/src/ui/toast.tsx';

afterEach(cleanup);

it('is worked by the keyboard, busy until the file is there, and says what the service refused', async () => {
  let refuse: (reason: Error) => void = () => undefined;
  const work = new Promise<void>((_resolve, reject) => {
    refuse = reject;
  });
  const groups = [
    {
      name: 'Sections',
      items: [
        { label: 'Front, CSV', run: () => work },
        { label: 'All, CSV', note: 'set a range', isUnavailable: true, run: () => expect.unreachable() },
      ],
    },
  ];
  render(
    <>
      <ExportMenu groups={groups} />
      <ToastRegion />
    </>,
  );
  const user = userEvent.setup();
  screen.getByRole('button', { name: /^Export/ }).focus();
  await user.keyboard('{Enter}');
  expect(screen.getByRole('menuitem', { name: /^All, CSV/ }).getAttribute('aria-disabled')).toBe('true');
  await user.click(screen.getByRole('menuitem', { name: /^Front, CSV/ }));
  expect(screen.getByRole<HTMLButtonElement>('button', { name: /^Export/ }).disabled).toBe(true);
  refuse(new Error('312,400 sections are more than one file takes'));
  await screen.findByText('312,400 sections are more than one file takes');
  expect(screen.getByRole<HTMLButtonElement>('button', { name: /^Export/ }).disabled).toBe(false);
});
