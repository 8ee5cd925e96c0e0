import { stableId } from '#server/demo/stable-id.ts';

/** Addresses of the demo office, whose ids are the same in every copy of it. */
const projectPath = (key: string): string => `/projects/${stableId(`project/${key}`)}`;

/** US units, rates, nine beams and the whole shortlist. */
export const LIBRARY = projectPath('library');
/** SI units, bars by ISO 6935, f′c in MPa. */
export const CLINIC = projectPath('clinic');
/** SI units by EN 1992-1-1: a frame of ductility class M that hogs at its columns. */
export const ARCADE = projectPath('arcade');
/** A project that only an admin is a member of. */
export const DEPOT = projectPath('depot');

export const beamId = (project: 'library' | 'clinic', mark: string): string =>
  stableId(`beam/${project}/${mark}`);
export const runPath = (sweep: string, project = LIBRARY): string =>
  `${project}/runs/${stableId(`run/${sweep}`)}`;
export const sweepId = (sweep: string): string => stableId(`sweep/${sweep}`);
export const sweepPath = (sweep: string, project = LIBRARY): string => `${project}/sweeps/${sweepId(sweep)}`;
export const candidateId = (label: string): string => stableId(`candidate/library/${label}`);
export const candidatePath = (label: string, project = 'library'): string =>
  `${projectPath(project)}/candidates/${stableId(`candidate/${project}/${label}`)}`;
