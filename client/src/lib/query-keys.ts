/** Keys of everything the client caches; features read and invalidate through them without seeing each other. */
export const queryKeys = {
  session: () => ['session'] as const,
  people: () => ['people'] as const,
  projects: () => ['projects'] as const,
  project: (projectId: string) => ['project', projectId] as const,
  beams: (projectId: string) => ['project', projectId, 'beams'] as const,
  sweeps: (projectId: string) => ['project', projectId, 'sweeps'] as const,
  sweep: (sweepId: string) => ['sweep', sweepId] as const,
  run: (runId: string) => ['run', runId] as const,
  view: (runId: string, x: string, y: string) => ['run', runId, 'view', x, y] as const,
  runSection: (runId: string, index: number) => ['run', runId, 'section', index] as const,
  candidates: (projectId: string) => ['project', projectId, 'candidates'] as const,
  candidate: (candidateId: string) => ['candidate', candidateId] as const,
  sheetValues: (candidateId: string) => ['candidate', candidateId, 'sheet-values'] as const,
  shareLinks: (projectId: string) => ['project', projectId, 'share-links'] as const,
  verification: (engineVersion: string) => ['verification', engineVersion] as const,
  shared: (token: string) => ['shared', token] as const,
};
