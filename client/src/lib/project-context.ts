import { createContext, useContext } from 'react';
import type { Project } from '#shared/contract/records.ts';

/** The project every page below /projects/:projectId belongs to. */
export const ProjectContext = createContext<Project | null>(null);

export function useProject(): Project {
  const project = useContext(ProjectContext);
  if (project === null) throw new Error('This part of the page needs a project around it');
  return project;
}
