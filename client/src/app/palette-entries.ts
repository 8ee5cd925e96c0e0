import { useQuery } from '@tanstack/react-query';
import { useNavigate, useParams } from 'react-router-dom';
import { beamsQuery } from '#client/src/features/beams/api.ts';
import { projectsQuery } from '#client/src/features/projects/api.ts';
import { candidatesQuery } from '#client/src/features/shortlist/api.ts';
import { sweepsQuery } from '#client/src/features/sweeps/api.ts';
import { type PageAction, pageActions } from '#client/src/lib/page-actions.ts';
import { paths, type ProjectTab } from '#client/src/lib/paths.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { candidateStateLabel, runStateLabel } from '#client/src/lib/state-labels.ts';
import { setTheme, THEMES } from '#client/src/lib/theme.ts';
import { GO_TO } from './use-shortcuts.ts';

/** One line of the list: what it is called, what else tells it from others, and what choosing it does. */
export interface PaletteEntry {
  readonly id: string;
  readonly name: string;
  readonly note?: string;
  readonly keys?: readonly string[];
  readonly act: () => void;
}

export interface PaletteGroup {
  readonly title: string;
  readonly entries: readonly PaletteEntry[];
}

const PAGES_OF_A_PROJECT: readonly (readonly [ProjectTab, string])[] = [
  ['beams', 'Beams'],
  ['sweeps', 'Sweeps'],
  ['shortlist', 'Shortlist'],
  ['basis', 'Design basis'],
  ['prices', 'Price book'],
  ['people', 'People'],
];

const THEME_ACTION = { system: 'Paper as the system', light: 'Light paper', dark: 'Dark paper' } as const;

type Go = (to: string) => () => void;

function useGo(): Go {
  const navigate = useNavigate();
  return (to) => () => void navigate(to);
}

const keysTo = (tab: ProjectTab | null): { keys?: readonly string[] } => {
  const known = GO_TO.find((goal) => goal.tab === tab);
  return known === undefined ? {} : { keys: ['g', known.key] };
};

function usePages(projectId: string | undefined, go: Go): readonly PaletteEntry[] {
  const maySeeStandards = useMay('see-standards');
  const mayOperate = useMay('operate');
  const ofProject =
    projectId === undefined
      ? []
      : [
          ...PAGES_OF_A_PROJECT.map(([tab, name]) => ({
            name,
            note: 'this project',
            to: paths.project(projectId, tab),
            ...keysTo(tab),
          })),
          { name: 'One section by hand', note: 'this project', to: paths.section(projectId) },
        ];
  const pages = [
    ...ofProject,
    { name: 'All projects', to: paths.projects(), ...keysTo(null) },
    { name: 'Verification book', to: paths.verification() },
    ...(maySeeStandards ? [{ name: 'Office standards', to: paths.officeStandards() }] : []),
    ...(mayOperate ? [{ name: 'Workers and queue', to: paths.operations() }] : []),
  ];
  return pages.map(({ to, ...page }) => ({ id: `page ${to}`, act: go(to), ...page }));
}

/** Beams, sweeps, runs and candidates of the project that is open; of none without one. */
function useRecords(projectId: string | undefined, go: Go): readonly PaletteGroup[] {
  const id = projectId ?? '';
  const enabled = projectId !== undefined;
  const beams = useQuery({ ...beamsQuery(id), enabled }).data ?? [];
  const sweeps = useQuery({ ...sweepsQuery(id), enabled }).data ?? [];
  const candidates = useQuery({ ...candidatesQuery(id), enabled }).data ?? [];
  return [
    {
      title: 'Beams',
      entries: beams.map((beam) => ({
        id: `beam ${beam.id}`,
        name: `Beam ${beam.mark}`,
        note: beam.location,
        act: go(`${paths.project(id, 'beams')}#beam-${beam.id}`),
      })),
    },
    {
      title: 'Sweeps',
      entries: sweeps.map((sweep) => ({
        id: `sweep ${sweep.id}`,
        name: sweep.name,
        note: `sweep of ${sweep.beamMark}`,
        act: go(paths.sweep(id, sweep.id)),
      })),
    },
    {
      title: 'Runs',
      entries: sweeps.flatMap((sweep) =>
        sweep.runs.map((run) => ({
          id: `run ${run.id}`,
          name: `${sweep.name}, run ${run.number}`,
          note: `${sweep.beamMark}, ${runStateLabel(run.state).word.toLowerCase()}`,
          act: go(paths.run(id, run.id)),
        })),
      ),
    },
    {
      title: 'Candidates',
      entries: candidates.map((candidate) => ({
        id: `candidate ${candidate.id}`,
        name: `Candidate ${candidate.label}`,
        note: `${candidate.beam.mark}, ${candidateStateLabel(candidate.state).word.toLowerCase()}`,
        act: go(paths.candidate(id, candidate.id)),
      })),
    },
  ];
}

const entryOf = ({ name, key, act }: PageAction): PaletteEntry => ({
  id: `action ${name}`,
  name,
  act,
  ...(key === undefined ? {} : { keys: [key] }),
});

/** All that can be gone to and done from where one is, what is done most first. */
export function usePaletteGroups(everywhere: readonly PageAction[]): readonly PaletteGroup[] {
  const { projectId } = useParams();
  const go = useGo();
  const projects = useQuery(projectsQuery()).data ?? [];
  const pages = usePages(projectId, go);
  const records = useRecords(projectId, go);
  const themes = THEMES.map((theme) => ({ name: THEME_ACTION[theme], act: () => setTheme(theme) }));
  return [
    { title: 'On this page', entries: pageActions().map(entryOf) },
    { title: 'Pages', entries: pages },
    ...records,
    {
      title: 'Projects',
      entries: projects.map((project) => ({
        id: `project ${project.id}`,
        name: project.name,
        note: `project ${project.number}`,
        act: go(paths.project(project.id)),
      })),
    },
    { title: 'Everywhere', entries: [...everywhere, ...themes].map(entryOf) },
  ].filter(({ entries }) => entries.length > 0);
}
