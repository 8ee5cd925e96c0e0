/** Every address of the client, in one place. */
export const PROJECT_TABS = ['beams', 'sweeps', 'shortlist', 'basis', 'prices', 'people'] as const;
export type ProjectTab = (typeof PROJECT_TABS)[number];

export const paths = {
  home: () => '/',
  signIn: (returnTo?: string) =>
    returnTo === undefined || returnTo === '/' ? '/sign-in' : `/sign-in?to=${encodeURIComponent(returnTo)}`,
  projects: () => '/projects',
  newProject: () => '/projects/new',
  project: (projectId: string, tab: ProjectTab = 'beams') => `/projects/${projectId}/${tab}`,
  newSweep: (projectId: string, beamId: string) => `/projects/${projectId}/beams/${beamId}/sweeps/new`,
  sweep: (projectId: string, sweepId: string) => `/projects/${projectId}/sweeps/${sweepId}`,
  run: (projectId: string, runId: string) => `/projects/${projectId}/runs/${runId}`,
  /** One run set against another, which is the baseline. */
  difference: (projectId: string, runId: string, baselineId: string) =>
    `/projects/${projectId}/runs/${runId}/against/${baselineId}`,
  section: (projectId: string) => `/projects/${projectId}/section`,
  candidate: (projectId: string, candidateId: string) => `/projects/${projectId}/candidates/${candidateId}`,
  verification: () => '/verification',
  operations: () => '/operations',
  officeStandards: () => '/office-standards',
  newOfficeStandard: () => '/office-standards/new',
  officeStandard: (standardId: string) => `/office-standards/${standardId}`,
  sheet: (projectId: string, candidateId: string) => `/projects/${projectId}/candidates/${candidateId}/sheet`,
  shared: (token: string) => `/shared/${token}`,
};

/** Address on the service of one endpoint's path with its parameters filled in. */
export function apiUrl(path: string, params: Readonly<Record<string, string | number>> = {}): string {
  const filled = path.replace(/:(\w+)/g, (_, key: string) => encodeURIComponent(String(params[key] ?? '')));
  return `/api${filled}`;
}
