import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useParams } from 'react-router-dom';
import { projectsQuery } from '#client/src/features/projects/api.ts';
import { candidatesQuery } from '#client/src/features/shortlist/api.ts';
import { sweepsQuery } from '#client/src/features/sweeps/api.ts';
import { paths } from '#client/src/lib/paths.ts';
import { Button } from '#client/src/ui/button.tsx';

/** Where the steps can be seen, as far as there is anything to see. */
interface Places {
  readonly project: string | undefined;
  readonly run: string | undefined;
  readonly candidate: string | undefined;
}

interface Step {
  readonly title: string;
  readonly words: string;
  readonly look: string;
  readonly at: (places: Places) => string | undefined;
}

const inProject = (tab: 'beams' | 'sweeps' | 'shortlist') => (places: Places) =>
  places.project === undefined ? undefined : paths.project(places.project, tab);

const STEPS: readonly Step[] = [
  {
    title: 'A beam says what is asked',
    words:
      'Each beam of a project has its moment Mu, the curvature ductility μφ it must reach, and how deep it may get. Everything else follows from that.',
    look: 'See the beams',
    at: inProject('beams'),
  },
  {
    title: 'A sweep tries every section',
    words:
      'Give ranges for width, depth and f′c, and the bars your office uses. Every combination is computed, with real bars in real layers, and none is guessed.',
    look: 'See the sweeps',
    at: inProject('sweeps'),
  },
  {
    title: 'The front is what is left to choose from',
    words:
      'Nothing is both lighter and more ductile than a section on the line. Walk it with the arrow keys; what fell out, and why, stands below the chart.',
    look: 'See a run',
    at: ({ project, run }) =>
      project === undefined || run === undefined ? undefined : paths.run(project, run),
  },
  {
    title: 'Pin what you would build',
    words:
      'A pinned section is frozen with its inputs and prices. Two to six of them can be set side by side, in steel, money and carbon.',
    look: 'See the shortlist',
    at: inProject('shortlist'),
  },
  {
    title: 'Someone else checks it',
    words:
      'The calculation sheet has every line with its formula and clause, and room for the checker’s own value. A section meets the listed checks, no more; what is not checked is named.',
    look: 'See a sheet',
    at: ({ project, candidate }) =>
      project === undefined || candidate === undefined ? undefined : paths.sheet(project, candidate),
  },
];

/** The project that is open, or the first one, and in it a run with something feasible and a candidate. */
function usePlaces(): Places {
  const { projectId } = useParams();
  const projects = useQuery(projectsQuery());
  const project = projectId ?? projects.data?.[0]?.id;
  const options = { enabled: project !== undefined };
  const sweeps = useQuery({ ...sweepsQuery(project ?? ''), ...options });
  const candidates = useQuery({ ...candidatesQuery(project ?? ''), ...options });
  const runs = sweeps.data?.flatMap((sweep) => sweep.runs) ?? [];
  return {
    project,
    run: runs.find(({ state, feasible }) => state === 'finished' && (feasible ?? 0) > 0)?.id,
    candidate: candidates.data?.[0]?.id,
  };
}

/** Five steps from a load to a signed section, beside the page and never over what is being done: it takes no focus. */
export function FirstSteps({ onClose }: { readonly onClose: () => void }) {
  const [place, setPlace] = useState(0);
  const places = usePlaces();
  const { title, words, look, at } = STEPS[place]!;
  const address = at(places);
  const isLast = place === STEPS.length - 1;
  return (
    <aside
      aria-label="First steps"
      className="fixed bottom-3 left-3 z-30 grid w-[calc(100vw-1.5rem)] max-w-sm gap-2 border border-ink bg-sheet p-4 print:hidden"
    >
      <div className="flex items-baseline justify-between gap-4">
        <p className="num text-xs text-muted">
          Step {place + 1} of {STEPS.length}
        </p>
        <Button look="text" onClick={onClose}>
          {isLast ? 'Close' : 'Skip'}
        </Button>
      </div>
      <div aria-live="polite" className="grid gap-1">
        <h2 className="font-semibold">{title}</h2>
        <p className="min-h-20 text-sm text-muted">{words}</p>
      </div>
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
        {address !== undefined && <Link to={address}>{look}</Link>}
        <span className="ml-auto flex gap-2">
          {place > 0 && <Button onClick={() => setPlace(place - 1)}>Back</Button>}
          <Button look="solid" onClick={() => (isLast ? onClose() : setPlace(place + 1))}>
            {isLast ? 'Done' : 'Next'}
          </Button>
        </span>
      </div>
    </aside>
  );
}
