import { queryOptions, useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import type { BodyOf } from '#shared/contract/endpoints.ts';
import type { Candidate } from '#shared/contract/records.ts';
import { call } from '#client/src/lib/api.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';

export const candidatesQuery = (projectId: string) =>
  queryOptions({
    queryKey: queryKeys.candidates(projectId),
    queryFn: ({ signal }) => call('listCandidates', { params: { id: projectId }, signal }),
  });

export const candidateQuery = (candidateId: string) =>
  queryOptions({
    queryKey: queryKeys.candidate(candidateId),
    queryFn: ({ signal }) => call('getCandidate', { params: { id: candidateId }, signal }),
  });

export const shareLinksQuery = (projectId: string) =>
  queryOptions({
    queryKey: queryKeys.shareLinks(projectId),
    queryFn: ({ signal }) => call('listShareLinks', { params: { id: projectId }, signal }),
  });

export const sharedShortlistQuery = (token: string) =>
  queryOptions({
    queryKey: queryKeys.shared(token),
    queryFn: ({ signal }) => call('getSharedShortlist', { params: { token }, signal }),
  });

const keepCandidate = (client: QueryClient, candidate: Candidate) => {
  client.setQueryData(queryKeys.candidate(candidate.id), candidate);
  void client.invalidateQueries({ queryKey: queryKeys.project(candidate.projectId) });
};

export function useMoveCandidate(candidateId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyOf<'moveCandidate'>) =>
      call('moveCandidate', { params: { id: candidateId }, body }),
    onSuccess: (candidate) => keepCandidate(client, candidate),
  });
}

/** Takes back a pin just made; it stays on record as superseded. */
export function useWithdraw(projectId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (candidateId: string) =>
      call('moveCandidate', { params: { id: candidateId }, body: { to: 'superseded', note: '' } }),
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.project(projectId) }),
  });
}

export function useComment(candidateId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (text: string) => call('commentOnCandidate', { params: { id: candidateId }, body: { text } }),
    onSuccess: (candidate) => keepCandidate(client, candidate),
  });
}

export function useCreateShareLink(projectId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call('createShareLink', { params: { id: projectId }, body: {} }),
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.shareLinks(projectId) }),
  });
}

export function useRevokeShareLink(projectId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (linkId: string) => call('revokeShareLink', { params: { id: linkId } }),
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.shareLinks(projectId) }),
  });
}
