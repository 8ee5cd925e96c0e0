import { queryOptions, useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import type { BodyOf } from '#shared/contract/endpoints.ts';
import type { Project } from '#shared/contract/records.ts';
import { call } from '#client/src/lib/api.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';

export const projectsQuery = () =>
  queryOptions({
    queryKey: queryKeys.projects(),
    queryFn: ({ signal }) => call('listProjects', { signal }),
  });

export const projectQuery = (projectId: string) =>
  queryOptions({
    queryKey: queryKeys.project(projectId),
    queryFn: ({ signal }) => call('getProject', { params: { id: projectId }, signal }),
  });

const keepProject = (client: QueryClient, project: Project) => {
  client.setQueryData(projectQuery(project.id).queryKey, project);
  void client.invalidateQueries({ queryKey: queryKeys.projects() });
};

export function useCreateProject() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyOf<'createProject'>) => call('createProject', { body }),
    onSuccess: (project) => keepProject(client, project),
  });
}

export function useRenameProject(projectId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyOf<'updateProject'>) => call('updateProject', { params: { id: projectId }, body }),
    onSuccess: (project) => keepProject(client, project),
  });
}
