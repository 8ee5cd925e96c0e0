import { useNavigate } from 'react-router-dom';
import { NewProjectForm } from '#client/src/features/projects/new-project-form.tsx';
import { paths } from '#client/src/lib/paths.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { PageBody } from '#client/src/ui/page-body.tsx';
import { PageCrumbs } from '#client/src/ui/page-crumbs.tsx';
import { PageHeader } from '#client/src/ui/page-header.tsx';
import { ForbiddenPage } from './not-found-page.tsx';

export function NewProjectPage() {
  const navigate = useNavigate();
  if (!useMay('create-project')) return <ForbiddenPage />;
  return (
    <PageBody isNarrow>
      <PageCrumbs crumbs={[{ label: 'Projects', to: paths.projects() }, { label: 'New project' }]} />
      <PageHeader title="New project" />
      <NewProjectForm onCreated={(project) => void navigate(paths.project(project.id))} />
    </PageBody>
  );
}
