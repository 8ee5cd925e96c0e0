import { useQuery } from '@tanstack/react-query';
import { projectsQuery } from '#client/src/features/projects/api.ts';
import { ProjectIndex } from '#client/src/features/projects/project-index.tsx';
import { paths } from '#client/src/lib/paths.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { ButtonLink } from '#client/src/ui/button.tsx';
import { EmptyState } from '#client/src/ui/empty-state.tsx';
import { ErrorState } from '#client/src/ui/error-state.tsx';
import { PageBody } from '#client/src/ui/page-body.tsx';
import { PageCrumbs } from '#client/src/ui/page-crumbs.tsx';
import { PageHeader } from '#client/src/ui/page-header.tsx';
import { Skeleton } from '#client/src/ui/skeleton.tsx';

export function ProjectsPage() {
  const projects = useQuery(projectsQuery());
  const mayCreate = useMay('create-project');
  const create = mayCreate ? (
    <ButtonLink look="solid" to={paths.newProject()}>
      New project
    </ButtonLink>
  ) : null;
  return (
    <PageBody>
      <PageCrumbs crumbs={[{ label: 'Projects' }]} />
      <PageHeader title="Projects" actions={create} />
      {projects.isPending ? (
        <Skeleton lines={6} />
      ) : projects.isError ? (
        <ErrorState
          error={projects.error}
          title="The projects could not be loaded"
          onRetry={() => void projects.refetch()}
        />
      ) : projects.data.length === 0 ? (
        <EmptyState title="No projects yet" action={create}>
          {mayCreate
            ? 'A project holds its design basis, beams and shortlist. Start with its name and units.'
            : 'You see a project here once someone makes you a member of it.'}
        </EmptyState>
      ) : (
        <ProjectIndex projects={projects.data} />
      )}
    </PageBody>
  );
}
