import { useQuery } from '@tanstack/react-query';
import { Outlet, useParams } from 'react-router-dom';
import { projectQuery } from '#client/src/features/projects/api.ts';
import { ProjectContext } from '#client/src/lib/project-context.ts';
import { RoutePending } from './route-pending.tsx';
import { LoadFailure } from './load-failure.tsx';

/** Loads the project of the address once for every page below it. */
export function ProjectScope() {
  const { projectId = '' } = useParams();
  const project = useQuery(projectQuery(projectId));
  if (project.data === undefined)
    return project.isError ? (
      <LoadFailure error={project.error} what="project" onRetry={() => void project.refetch()} />
    ) : (
      <RoutePending />
    );
  return (
    <ProjectContext value={project.data}>
      <Outlet />
    </ProjectContext>
  );
}
