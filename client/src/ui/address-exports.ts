import type { ExportGroup } from './export-menu.tsx';
import { notify } from './toast.tsx';

/** The address of what is shown, to send to a colleague: it opens for whoever may read the project. */
async function copyAddress(): Promise<void> {
  try {
    await navigator.clipboard.writeText(window.location.href);
    notify.done('Address copied');
  } catch {
    throw new Error('The browser did not let the address be copied: take it from the address bar');
  }
}

export const addressExports = (): ExportGroup => ({
  name: 'This page',
  items: [
    { label: 'Copy address', note: 'with what is shown; for members of the project', run: copyAddress },
    { label: 'Print', run: () => window.print() },
  ],
});
