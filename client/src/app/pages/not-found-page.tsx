import { paths } from '#client/src/lib/paths.ts';
import { ButtonLink } from '#client/src/ui/button.tsx';
import { PageBody } from '#client/src/ui/page-body.tsx';
import { PageCrumbs } from '#client/src/ui/page-crumbs.tsx';
import { PageHeader } from '#client/src/ui/page-header.tsx';

export function NotFoundPage({ what = 'page' }: { readonly what?: string }) {
  return (
    <PageBody isNarrow>
      <PageCrumbs crumbs={[{ label: 'Not found' }]} />
      <PageHeader
        title={`There is no such ${what}`}
        lead="The address may be mistyped, it may have been deleted, or it belongs to a project you are not a member of."
      />
      <ButtonLink to={paths.projects()}>To the projects</ButtonLink>
    </PageBody>
  );
}

export function ForbiddenPage() {
  return (
    <PageBody isNarrow>
      <PageCrumbs crumbs={[{ label: 'Not allowed' }]} />
      <PageHeader
        title="Your role does not allow this"
        lead="Ask an admin of the office for the role you need, or someone who has it to do this for you."
      />
      <ButtonLink to={paths.projects()}>To the projects</ButtonLink>
    </PageBody>
  );
}
