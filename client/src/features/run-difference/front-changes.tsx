import { useMemo, useState } from 'react';
import { Link } from 'react-router-dom';
import type { FrontPoint } from '#shared/sweep/result.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { measureLabel } from '#shared/print/measure-labels.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import { sizeText, steelText } from '#shared/print/section-text.ts';
import { paths } from '#client/src/lib/paths.ts';
import { Button } from '#client/src/ui/button.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { absenceWords } from './absence-words.ts';
import type { ComparedRun, ComparedRuns } from './compared-run.ts';
import { absenceOf, frontDifferences } from './front-differences.ts';

interface FrontChangesProps extends ComparedRuns {
  readonly reader: MeasureReader;
}

/** So many are told with their reasons at first; each reason is worked out when it is shown. */
const FIRST_SHOWN = 12;

interface PointRowProps {
  readonly point: FrontPoint;
  readonly of: ComparedRun;
  /** The run whose front it is not on. */
  readonly notOn: ComparedRun;
  readonly reader: MeasureReader;
}

function PointRow({ point, of, notOn, reader }: PointRowProps) {
  const { run, sections, result } = of;
  const section = sections.sectionAt(point.index);
  const why = useMemo(() => absenceWords(absenceOf(section, notOn.sections)), [section, notOn.sections]);
  const value = (side: 'x' | 'y') =>
    formatQuantity(point[side], measureLabel(result.view[side], reader.units).kind, reader.units, {
      hideUnit: true,
    });
  return (
    <tr>
      <th scope="row" className="font-normal">
        <Link
          className="num underline decoration-concrete-edge hover:decoration-current"
          to={`${paths.run(run.projectId, run.id)}?x=${result.view.x}&y=${result.view.y}&i=${point.index}`}
        >
          {sizeText(section, reader.units)}
        </Link>
        <span className="num block text-steel">{steelText(section, reader.units)}</span>
      </th>
      <td className="num">{formatQuantity(section.fcMPa, 'stress', reader.units)}</td>
      <td className="figure">{value('x')}</td>
      <td className="figure">{value('y')}</td>
      <td>{why}</td>
    </tr>
  );
}

interface PointListProps extends Omit<PointRowProps, 'point'> {
  readonly title: string;
  readonly points: readonly FrontPoint[];
}

function PointList({ title, points, ...rest }: PointListProps) {
  const [isWhole, setWhole] = useState(false);
  const { result } = rest.of;
  const head = (side: 'x' | 'y') => {
    const { name, unit } = measureLabel(result.view[side], rest.reader.units, rest.reader.code);
    return `${name}${unit === '' ? '' : `, ${unit}`}`;
  };
  if (points.length === 0) return null;
  const shown = isWhole ? points : points.slice(0, FIRST_SHOWN);
  return (
    <div>
      <h3 className="pb-1 text-sm font-semibold">{title}</h3>
      <TableFrame label={title} minWidth="44rem" columnShares={[34, 12, 13, 13, 28]}>
        <thead>
          <tr>
            <th scope="col">Section</th>
            <th scope="col">Concrete</th>
            <th scope="col" className="figure">
              {head('x')}
            </th>
            <th scope="col" className="figure">
              {head('y')}
            </th>
            <th scope="col">In run {rest.notOn.run.number}</th>
          </tr>
        </thead>
        <tbody>
          {shown.map((point) => (
            <PointRow key={point.index} point={point} {...rest} />
          ))}
        </tbody>
      </TableFrame>
      {shown.length < points.length && (
        <Button look="text" className="mt-1 text-sm" onClick={() => setWhole(true)}>
          Show the other {points.length - shown.length}
        </Button>
      )}
    </div>
  );
}

/** Which sections the front gained and lost, and why each is not on the other one. */
export function FrontChanges({ baseline, other, reader }: FrontChangesProps) {
  const { kept, gained, lost } = useMemo(
    () =>
      frontDifferences(
        { front: baseline.result.front, sections: baseline.sections },
        { front: other.result.front, sections: other.sections },
      ),
    [baseline, other],
  );
  const moved = kept.filter(({ before, after }) => before.x !== after.x || before.y !== after.y).length;
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-5">
      <p>
        <span className="num">{kept.length}</span> kept
        {moved > 0 && (
          <span className="text-muted">
            {' '}
            (<span className="num">{moved}</span> with other values)
          </span>
        )}
        , <span className="num">{gained.length}</span> gained, <span className="num">{lost.length}</span>{' '}
        lost.
      </p>
      <PointList title="Gained" points={gained} of={other} notOn={baseline} reader={reader} />
      <PointList title="Lost" points={lost} of={baseline} notOn={other} reader={reader} />
    </div>
  );
}
