import { DropdownMenu } from 'radix-ui';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { paths } from '#client/src/lib/paths.ts';
import { isAllowed } from '#client/src/lib/permissions.ts';
import { useReader } from '#client/src/lib/reader-context.ts';
import { roleLabel } from '#client/src/lib/state-labels.ts';
import { currentTheme, setTheme, THEMES, type Theme } from '#client/src/lib/theme.ts';
import { notify } from '#client/src/ui/toast.tsx';
import { useSignOut } from './api.ts';

const THEME_NAME: Readonly<Record<Theme, string>> = {
  system: 'As the system',
  light: 'Light paper',
  dark: 'Dark paper',
};

const item =
  'flex cursor-pointer items-center gap-2 px-3 py-1.5 outline-none data-highlighted:bg-concrete data-highlighted:text-ink';

interface AccountMenuProps {
  readonly onPalette: () => void;
  readonly onShortcuts: () => void;
  readonly onFirstSteps: () => void;
}

/** Who is signed in, the page's light, and the way out. */
export function AccountMenu({ onPalette, onShortcuts, onFirstSteps }: AccountMenuProps) {
  const reader = useReader();
  const signOut = useSignOut();
  const [theme, setChosen] = useState(currentTheme);
  const choose = (next: Theme) => {
    setTheme(next);
    setChosen(next);
  };
  return (
    <DropdownMenu.Root modal={false}>
      <DropdownMenu.Trigger className="flex min-h-8 items-center gap-2 px-1 whitespace-nowrap hover:underline">
        <span className="max-w-40 truncate">{reader.name}</span>
        <span className="hidden text-muted sm:inline">{roleLabel(reader.role)}</span>
        <span aria-hidden="true" className="text-2xs text-muted">
          ▾
        </span>
      </DropdownMenu.Trigger>
      <DropdownMenu.Content
        align="end"
        sideOffset={6}
        className="z-50 min-w-56 border border-ink bg-sheet py-1 text-base"
      >
        <DropdownMenu.Label className="px-3 py-1 text-xs text-muted">{reader.email}</DropdownMenu.Label>
        <DropdownMenu.Separator className="my-1 border-t border-rule" />
        <DropdownMenu.RadioGroup value={theme} onValueChange={(value) => choose(value as Theme)}>
          {THEMES.map((name) => (
            <DropdownMenu.RadioItem
              key={name}
              value={name}
              className={item}
              onSelect={(e) => e.preventDefault()}
            >
              <span className="inline-block w-3">
                <DropdownMenu.ItemIndicator>●</DropdownMenu.ItemIndicator>
              </span>
              {THEME_NAME[name]}
            </DropdownMenu.RadioItem>
          ))}
        </DropdownMenu.RadioGroup>
        <DropdownMenu.Separator className="my-1 border-t border-rule" />
        <DropdownMenu.Item className={item} asChild>
          <Link to={paths.verification()}>Verification book</Link>
        </DropdownMenu.Item>
        {isAllowed(reader.role, 'see-standards') && (
          <DropdownMenu.Item className={item} asChild>
            <Link to={paths.officeStandards()}>Office standards</Link>
          </DropdownMenu.Item>
        )}
        {isAllowed(reader.role, 'operate') && (
          <DropdownMenu.Item className={item} asChild>
            <Link to={paths.operations()}>Workers and queue</Link>
          </DropdownMenu.Item>
        )}
        <DropdownMenu.Item className={item} onSelect={onPalette}>
          Go to, or do
          <kbd className="num ml-auto text-muted">Ctrl K</kbd>
        </DropdownMenu.Item>
        <DropdownMenu.Item className={item} onSelect={onFirstSteps}>
          First steps
        </DropdownMenu.Item>
        <DropdownMenu.Item className={item} onSelect={onShortcuts}>
          Keyboard shortcuts
          <kbd className="num ml-auto text-muted">?</kbd>
        </DropdownMenu.Item>
        <DropdownMenu.Item
          className={item}
          onSelect={() =>
            signOut.mutate(undefined, {
              onError: () => notify.failed('You could not be signed out. Try again.'),
            })
          }
        >
          Sign out
        </DropdownMenu.Item>
      </DropdownMenu.Content>
    </DropdownMenu.Root>
  );
}
