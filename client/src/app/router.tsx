import { createBrowserRouter, Navigate, type RouteObject } from 'react-router-dom';
import { paths } from '#client/src/lib/paths.ts';
import { AppShell } from './app-shell.tsx';
import { ForbiddenPage, NotFoundPage } from './pages/not-found-page.tsx';
import { ProjectScope } from './project-scope.tsx';
import { RequireSession } from './require-session.tsx';
import { RouteError } from './route-error.tsx';
import { RoutePending } from './route-pending.tsx';

/** Pages arrive when they are opened, so that the first script stays small. */
const page = (load: () => Promise<React.ComponentType>): Pick<RouteObject, 'lazy'> => ({
  lazy: async () => ({ Component: await load() }),
});

const projectTabs: RouteObject[] = [
  { path: 'beams', ...page(async () => (await import('./pages/beams-page.tsx')).BeamsPage) },
  { path: 'sweeps', ...page(async () => (await import('./pages/sweeps-page.tsx')).SweepsPage) },
  { path: 'shortlist', ...page(async () => (await import('./pages/shortlist-page.tsx')).ShortlistPage) },
  { path: 'basis', ...page(async () => (await import('./pages/basis-page.tsx')).BasisPage) },
  { path: 'prices', ...page(async () => (await import('./pages/prices-page.tsx')).PricesPage) },
  { path: 'people', ...page(async () => (await import('./pages/people-page.tsx')).PeoplePage) },
];

const projectRoutes: RouteObject = {
  path: 'projects/:projectId',
  Component: ProjectScope,
  children: [
    { index: true, element: <Navigate to="beams" replace /> },
    {
      ...page(async () => (await import('./project-layout.tsx')).ProjectLayout),
      children: projectTabs,
    },
    {
      path: 'beams/:beamId/sweeps/new',
      ...page(async () => (await import('./pages/sweep-page.tsx')).SweepPage),
    },
    { path: 'sweeps/:sweepId', ...page(async () => (await import('./pages/sweep-page.tsx')).SweepPage) },
    {
      path: 'runs/:runId/against/:baselineId',
      ...page(async () => (await import('./pages/difference-page.tsx')).DifferencePage),
    },
    { path: 'runs/:runId', ...page(async () => (await import('./pages/run-page.tsx')).RunPage) },
    { path: 'section', ...page(async () => (await import('./pages/section-page.tsx')).SectionPage) },
    {
      path: 'candidates/:candidateId',
      ...page(async () => (await import('./pages/candidate-page.tsx')).CandidatePage),
    },
    {
      path: 'candidates/:candidateId/sheet',
      ...page(async () => (await import('./pages/sheet-page.tsx')).SheetPage),
    },
    { path: '*', Component: NotFoundPage },
  ],
};

const routes: RouteObject[] = [
  {
    errorElement: <RouteError />,
    HydrateFallback: RoutePending,
    children: [
      { path: 'sign-in', ...page(async () => (await import('./pages/sign-in-page.tsx')).SignInPage) },
      { path: 'shared/:token', ...page(async () => (await import('./pages/shared-page.tsx')).SharedPage) },
      {
        Component: RequireSession,
        children: [
          {
            Component: AppShell,
            children: [
              {
                errorElement: <RouteError />,
                children: [
                  { index: true, element: <Navigate to={paths.projects()} replace /> },
                  {
                    path: 'projects',
                    ...page(async () => (await import('./pages/projects-page.tsx')).ProjectsPage),
                  },
                  {
                    path: 'projects/new',
                    ...page(async () => (await import('./pages/new-project-page.tsx')).NewProjectPage),
                  },
                  projectRoutes,
                  {
                    path: 'office-standards',
                    ...page(
                      async () => (await import('./pages/office-standards-page.tsx')).OfficeStandardsPage,
                    ),
                  },
                  ...['office-standards/new', 'office-standards/:standardId'].map((path) => ({
                    path,
                    ...page(
                      async () => (await import('./pages/office-standard-page.tsx')).OfficeStandardPage,
                    ),
                  })),
                  {
                    path: 'verification',
                    ...page(async () => (await import('./pages/verification-page.tsx')).VerificationPage),
                  },
                  {
                    path: 'operations',
                    ...page(async () => (await import('./pages/operations-page.tsx')).OperationsPage),
                  },
                  { path: 'forbidden', Component: ForbiddenPage },
                  { path: '*', Component: NotFoundPage },
                ],
              },
            ],
          },
        ],
      },
    ],
  },
];

export const createRouter = () => createBrowserRouter(routes);
