import { useState } from 'react';
import { Outlet, useLocation } from 'react-router-dom';
import { RenameProjectDialog } from '#client/src/features/projects/rename-project-dialog.tsx';
import { ruleSetLabel } from '#shared/print/basis-labels.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { usePageActions } from '#client/src/lib/page-actions.ts';
import { paths, PROJECT_TABS, type ProjectTab } from '#client/src/lib/paths.ts';
import { useProject } from '#client/src/lib/project-context.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { Button, ButtonLink } from '#client/src/ui/button.tsx';
import { PageBody } from '#client/src/ui/page-body.tsx';
import { PageCrumbs } from '#client/src/ui/page-crumbs.tsx';
import { PageHeader } from '#client/src/ui/page-header.tsx';
import { TabLinks } from '#client/src/ui/tab-links.tsx';

const TAB_NAME: Readonly<Record<ProjectTab, string>> = {
  beams: 'Beams',
  sweeps: 'Sweeps',
  shortlist: 'Shortlist',
  basis: 'Design basis',
  prices: 'Price book',
  people: 'People',
};

/** Head of a project and the sections it is kept in. */
export function ProjectLayout() {
  const project = useProject();
  const { pathname } = useLocation();
  const [isRenaming, setRenaming] = useState(false);
  const mayEdit = useMay('edit-basis');
  usePageActions(mayEdit ? [{ name: 'Name and number of the project', act: () => setRenaming(true) }] : []);
  const { designBasis: basis } = project;
  const tab = PROJECT_TABS.find((name) => pathname.endsWith(`/${name}`)) ?? 'beams';
  const counts: Partial<Record<ProjectTab, number>> = {
    beams: project.beamCount,
    shortlist: project.candidateCount,
    people: project.members.length,
  };
  return (
    <PageBody>
      <PageCrumbs
        crumbs={[
          { label: 'Projects', to: paths.projects() },
          { label: project.name, to: paths.project(project.id) },
          { label: TAB_NAME[tab] },
        ]}
      />
      <PageHeader
        title={project.name}
        lead={
          <p className="flex flex-wrap gap-x-4 gap-y-1">
            <span className="num">{project.number}</span>
            <span>{ruleSetLabel(basis.ruleSet)}</span>
            <span>
              fy <span className="num">{formatQuantity(basis.fyMPa, 'stress', basis.units)}</span>
            </span>
            <span>
              cover <span className="num">{formatQuantity(basis.coverMm, 'length', basis.units)}</span>
            </span>
            <span>
              approved{' '}
              <span className="num">
                {project.approvedCount} of {project.candidateCount}
              </span>
            </span>
          </p>
        }
        actions={
          <>
            {mayEdit && (
              <Button look="text" onClick={() => setRenaming(true)}>
                Name and number
              </Button>
            )}
            <ButtonLink to={paths.section(project.id)}>Look at one section</ButtonLink>
          </>
        }
      />
      <TabLinks
        label="Parts of the project"
        tabs={PROJECT_TABS.map((name) => ({
          to: paths.project(project.id, name),
          label: TAB_NAME[name],
          ...(counts[name] === undefined ? {} : { count: counts[name] }),
        }))}
      />
      <div className="pt-5">
        <Outlet />
      </div>
      {isRenaming && <RenameProjectDialog onClose={() => setRenaming(false)} />}
    </PageBody>
  );
}
