import { useQuery } from '@tanstack/react-query';
import type { ShareLink } from '#shared/contract/records.ts';
import { messageOf } from '#client/src/lib/api-error.ts';
import { formatDate } from '#shared/print/format-quantity.ts';
import { paths } from '#client/src/lib/paths.ts';
import { useProject } from '#client/src/lib/project-context.ts';
import { Button } from '#client/src/ui/button.tsx';
import { Dialog } from '#client/src/ui/dialog.tsx';
import { ErrorState } from '#client/src/ui/error-state.tsx';
import { FormError } from '#client/src/ui/form-error.tsx';
import { Skeleton } from '#client/src/ui/skeleton.tsx';
import { notify } from '#client/src/ui/toast.tsx';
import { shareLinksQuery, useCreateShareLink, useRevokeShareLink } from './api.ts';

export function ShareDialog({ onClose }: { readonly onClose: () => void }) {
  const project = useProject();
  const links = useQuery(shareLinksQuery(project.id));
  const create = useCreateShareLink(project.id);
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title="Share the shortlist"
      description="Whoever has the link reads the shortlist without signing in: sections, checks and quantities. Rates, costs and comments are never shown."
      isWide
    >
      {links.isPending ? (
        <Skeleton lines={2} />
      ) : links.isError ? (
        <ErrorState error={links.error} onRetry={() => void links.refetch()} />
      ) : links.data.length === 0 ? (
        <p className="text-muted">No link yet.</p>
      ) : (
        <ul className="grid">
          {links.data.map((link) => (
            <LinkRow key={link.id} link={link} projectId={project.id} />
          ))}
        </ul>
      )}
      <FormError message={create.isError ? messageOf(create.error) : null} />
      <div className="mt-5">
        <Button look="solid" isBusy={create.isPending} onClick={() => create.mutate()}>
          Create a link
        </Button>
      </div>
    </Dialog>
  );
}

function LinkRow({ link, projectId }: { readonly link: ShareLink; readonly projectId: string }) {
  const revoke = useRevokeShareLink(projectId);
  const address = new URL(paths.shared(link.token), window.location.origin).href;
  const copy = () =>
    navigator.clipboard.writeText(address).then(
      () => notify.done('Link copied.'),
      () => notify.failed('The browser did not allow copying. Select the address and copy it by hand.'),
    );
  return (
    <li className="grid gap-1 border-t border-rule py-3">
      <span className="flex items-center gap-3">
        <input
          readOnly
          aria-label="Address of the link"
          className="ruled num min-w-0 flex-1"
          value={address}
          onFocus={(event) => event.target.select()}
        />
        <Button onClick={() => void copy()}>Copy</Button>
      </span>
      <span className="flex flex-wrap items-baseline justify-between gap-2 text-xs text-muted">
        <span>
          Created by {link.createdBy} on {formatDate(link.createdAt)}, valid to {formatDate(link.expiresAt)}
        </span>
        <Button look="text" isBusy={revoke.isPending} onClick={() => revoke.mutate(link.id)}>
          Revoke
        </Button>
      </span>
      <FormError message={revoke.isError ? messageOf(revoke.error) : null} />
    </li>
  );
}
