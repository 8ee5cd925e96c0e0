import { lazy, Suspense, useCallback, useMemo, useState } from 'react';
import { Link, Outlet, ScrollRestoration, useNavigation } from 'react-router-dom';
import { CrumbsContext } from '#client/src/lib/crumbs-context.ts';
import { hasSeenFirstSteps, rememberFirstSteps } from '#client/src/lib/first-steps-seen.ts';
import { paths } from '#client/src/lib/paths.ts';
import { useReader } from '#client/src/lib/reader-context.ts';
import { Wordmark } from '#client/src/ui/wordmark.tsx';
import { ShortcutsDialog } from './shortcuts-dialog.tsx';
import { useShortcuts } from './use-shortcuts.ts';

/** Its floating part weighs as much as the rest of the shell; until it is there the bar shows the name alone. */
const AccountMenu = lazy(async () => ({
  default: (await import('#client/src/features/session/account-menu.tsx')).AccountMenu,
}));

const CommandPalette = lazy(async () => ({
  default: (await import('./command-palette.tsx')).CommandPalette,
}));
const FirstSteps = lazy(async () => ({ default: (await import('./first-steps.tsx')).FirstSteps }));

/** What lies over the page: at most one dialog, and the first steps beside it. */
function useOverlays(personId: string) {
  const [dialog, setDialog] = useState<'help' | 'palette' | null>(null);
  const [areStepsOpen, setStepsOpen] = useState(() => !hasSeenFirstSteps(personId));
  const close = useCallback(() => setDialog(null), []);
  const openHelp = useCallback(() => setDialog('help'), []);
  const openPalette = useCallback(() => setDialog('palette'), []);
  const openSteps = useCallback(() => setStepsOpen(true), []);
  const closeSteps = useCallback(() => {
    rememberFirstSteps(personId);
    setStepsOpen(false);
  }, [personId]);
  return { dialog, areStepsOpen, close, openHelp, openPalette, openSteps, closeSteps };
}

/** The top bar on every page of the office: name, trail, person. The page fills what is below. */
export function AppShell() {
  const [crumbsSlot, setCrumbsSlot] = useState<HTMLElement | null>(null);
  const reader = useReader();
  const { dialog, areStepsOpen, ...overlays } = useOverlays(reader.id);
  const isArriving = useNavigation().state === 'loading';
  useShortcuts(overlays.openHelp, overlays.openPalette);
  const everywhere = useMemo(
    () => [
      { name: 'Keyboard shortcuts', key: '?', act: overlays.openHelp },
      { name: 'First steps', act: overlays.openSteps },
    ],
    [overlays.openHelp, overlays.openSteps],
  );
  return (
    <CrumbsContext value={crumbsSlot}>
      <div className="flex min-h-dvh flex-col">
        <a
          href="#main"
          className="sr-only z-50 bg-ink px-4 py-2 text-paper focus:not-sr-only focus:absolute focus:top-1 focus:left-1"
        >
          Skip to the page
        </a>
        <header className="relative flex min-h-[46px] flex-wrap items-center gap-x-5 border-b border-ink px-4 sm:px-5 print:hidden">
          <Link to={paths.projects()} aria-label="Fairweight, to the projects" className="no-underline">
            <Wordmark />
          </Link>
          <nav
            aria-label="Trail"
            className="order-last -mx-4 min-h-8 min-w-0 basis-[calc(100%+2rem)] border-t border-rule px-4 py-1.5 md:order-none md:mx-0 md:min-h-0 md:flex-1 md:basis-0 md:border-0 md:p-0"
          >
            <ol ref={setCrumbsSlot} className="flex min-w-0 items-baseline gap-2" />
          </nav>
          <span className="ml-auto" />
          <Suspense fallback={<span className="px-1">{reader.name}</span>}>
            <AccountMenu
              onPalette={overlays.openPalette}
              onShortcuts={overlays.openHelp}
              onFirstSteps={overlays.openSteps}
            />
          </Suspense>
          {isArriving && <span className="arriving" aria-hidden="true" />}
        </header>
        <main id="main" tabIndex={-1} className="flex min-w-0 flex-1 flex-col outline-none">
          <Outlet />
        </main>
      </div>
      <ShortcutsDialog isOpen={dialog === 'help'} onClose={overlays.close} />
      <Suspense fallback={null}>
        {areStepsOpen && <FirstSteps onClose={overlays.closeSteps} />}
        {dialog === 'palette' && <CommandPalette onClose={overlays.close} everywhere={everywhere} />}
      </Suspense>
      <ScrollRestoration />
    </CrumbsContext>
  );
}
