import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { SHEET_PDF_PATH, type BodyOf, type Paper } from '#shared/contract/endpoints.ts';
import { call } from '#client/src/lib/api.ts';
import { apiUrl } from '#client/src/lib/paths.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';

export const sheetValuesQuery = (candidateId: string) =>
  queryOptions({
    queryKey: queryKeys.sheetValues(candidateId),
    queryFn: ({ signal }) => call('listSheetValues', { params: { id: candidateId }, signal }),
  });

export function useSetSheetValue(candidateId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyOf<'setSheetValue'>) =>
      call('setSheetValue', { params: { id: candidateId }, body }),
    onSuccess: (values) => client.setQueryData(queryKeys.sheetValues(candidateId), values),
  });
}

export const sheetPdfUrl = (candidateId: string, paper: Paper): string =>
  `${apiUrl(SHEET_PDF_PATH, { id: candidateId })}?paper=${paper}`;
