import { Link } from 'react-router-dom';
import type { Project } from '#shared/contract/records.ts';
import { ruleSetLabel } from '#shared/print/basis-labels.ts';
import { paths } from '#client/src/lib/paths.ts';
import { TableFrame } from '#client/src/ui/table-frame.tsx';

/** The office's projects as an index on paper. */
export function ProjectIndex({ projects }: { readonly projects: readonly Project[] }) {
  return (
    <TableFrame label="Projects">
      <thead>
        <tr>
          <th scope="col">Number</th>
          <th scope="col">Project</th>
          <th scope="col">Code</th>
          <th scope="col">Units</th>
          <th scope="col" className="figure">
            Beams
          </th>
          <th scope="col" className="figure">
            Candidates
          </th>
          <th scope="col" className="figure">
            Approved
          </th>
        </tr>
      </thead>
      <tbody>
        {projects.map((project) => (
          <tr key={project.id} className="relative hover:bg-sheet">
            <td className="num whitespace-nowrap text-muted">{project.number}</td>
            <th scope="row" className="w-[45%] min-w-48 text-lg font-semibold">
              <Link to={paths.project(project.id)} className="hover:underline before:absolute before:inset-0">
                {project.name}
              </Link>
            </th>
            <td className="whitespace-nowrap">{ruleSetLabel(project.designBasis.ruleSet)}</td>
            <td>{project.designBasis.units === 'us' ? 'US' : 'SI'}</td>
            <td className="figure">{project.beamCount}</td>
            <td className="figure">{project.candidateCount}</td>
            <td className="figure">{project.approvedCount}</td>
          </tr>
        ))}
      </tbody>
    </TableFrame>
  );
}
