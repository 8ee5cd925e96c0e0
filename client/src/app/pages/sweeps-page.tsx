import { ViewLinks } from '#client/src/features/saved-views/view-links.tsx';
import { SweepsPanel } from '#client/src/features/sweeps/sweeps-panel.tsx';

export function SweepsPage() {
  return <SweepsPanel below={({ projectId, id }) => <ViewLinks projectId={projectId} sweepId={id} />} />;
}
