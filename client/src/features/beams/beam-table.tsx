import { useLocation } from 'react-router-dom';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Beam } from '#shared/contract/records.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { paths } from '#client/src/lib/paths.ts';
import type { CodeSymbols } from '#shared/engine/rules/code-symbols.ts';
import { unitLabel, type DisplayKind } from '#shared/print/units.ts';
import { Button, ButtonLink } from '#client/src/ui/button.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';

interface BeamTableProps {
  readonly beams: readonly Beam[];
  readonly units: UnitSystem;
  readonly symbols: CodeSymbols;
  readonly onEdit: (beam: Beam) => void;
  readonly onDelete: (beam: Beam) => void;
  readonly mayEdit: boolean;
  readonly maySweep: boolean;
}

interface Figure {
  readonly head: string;
  readonly kind: DisplayKind;
  readonly of: (beam: Beam) => number | null;
}

const figuresOf = ({ moment, shear }: CodeSymbols): readonly Figure[] => [
  { head: 'Span', kind: 'span', of: (beam) => beam.spanMm },
  { head: 'Count', kind: 'count', of: (beam) => beam.count },
  { head: moment, kind: 'moment', of: (beam) => beam.muNmm },
  { head: shear, kind: 'force', of: (beam) => beam.vuN },
  { head: 'μφ ≥', kind: 'count', of: (beam) => beam.ductilityTarget },
  { head: 'h ≤', kind: 'length', of: (beam) => beam.depthCapMm },
  { head: 'Sweeps', kind: 'count', of: (beam) => beam.sweepCount },
  { head: 'Candidates', kind: 'count', of: (beam) => beam.candidateCount },
];

/** A beam that was gone to by name. */
const showRow = (row: HTMLTableRowElement | null) => row?.scrollIntoView({ block: 'center' });

export function BeamTable({ beams, units, symbols, onEdit, onDelete, mayEdit, maySweep }: BeamTableProps) {
  const figures = figuresOf(symbols);
  const { hash } = useLocation();
  return (
    <TableFrame label="Beams">
      <thead>
        <tr>
          <th scope="col">Mark</th>
          <th scope="col">Location</th>
          {figures.map(({ head, kind }) => (
            <th key={head} scope="col" className="figure">
              {head} <span className="block text-2xs font-normal">{unitLabel(kind, units) || ' '}</span>
            </th>
          ))}
          {(mayEdit || maySweep) && (
            <th scope="col">
              <span className="sr-only">Actions</span>
            </th>
          )}
        </tr>
      </thead>
      <tbody>
        {beams.map((beam) => (
          <tr
            key={beam.id}
            ref={hash === `#beam-${beam.id}` ? showRow : undefined}
            className="hover:bg-sheet aria-[current]:bg-sheet"
            aria-current={hash === `#beam-${beam.id}` || undefined}
          >
            <th scope="row" className="font-semibold whitespace-nowrap">
              {beam.mark}
            </th>
            <td className="min-w-36 text-muted">{beam.location}</td>
            {figures.map(({ head, kind, of }) => (
              <td key={head} className="figure">
                {formatQuantity(of(beam), kind, units, { hideUnit: true })}
              </td>
            ))}
            {(mayEdit || maySweep) && (
              <td className="text-right whitespace-nowrap">
                {maySweep && (
                  <ButtonLink
                    look="text"
                    className="font-semibold text-steel"
                    to={paths.newSweep(beam.projectId, beam.id)}
                    aria-label={`New sweep for ${beam.mark}`}
                  >
                    New sweep
                  </ButtonLink>
                )}
                {mayEdit && (
                  <>
                    <Button
                      look="text"
                      className="ml-2"
                      onClick={() => onEdit(beam)}
                      aria-label={`Edit ${beam.mark}`}
                    >
                      Edit
                    </Button>
                    <Button
                      look="text"
                      className="ml-2"
                      onClick={() => onDelete(beam)}
                      aria-label={`Delete ${beam.mark}`}
                    >
                      Delete
                    </Button>
                  </>
                )}
              </td>
            )}
          </tr>
        ))}
      </tbody>
    </TableFrame>
  );
}
