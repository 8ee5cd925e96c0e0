import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { savedViewsQuery } from './api.ts';
import { viewPath } from './view-search.ts';

/** The saved views of a sweep in a line, each to the run it was saved on; nothing where there are none. */
export function ViewLinks({ projectId, sweepId }: { readonly projectId: string; readonly sweepId: string }) {
  const views = useQuery(savedViewsQuery(projectId));
  const own = views.data?.filter((view) => view.sweepId === sweepId) ?? [];
  if (own.length === 0) return null;
  return (
    <p className="flex flex-wrap items-baseline gap-x-4 gap-y-1 py-1 text-sm">
      <span className="text-muted">Saved views</span>
      {own.map((view) => (
        <Link
          key={view.id}
          to={viewPath(projectId, view)}
          title={`Run ${view.runNumber}, saved by ${view.createdBy.name}`}
          className="underline decoration-concrete-edge hover:decoration-current"
        >
          {view.name}
        </Link>
      ))}
    </p>
  );
}
