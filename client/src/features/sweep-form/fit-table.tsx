import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { barsText } from '#shared/print/section-text.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { FaceStrip } from './face-strip.tsx';
import type { FitPreview, FitRow, WidthFit } from './fit-preview.ts';
import { fitWords } from './fit-words.ts';

interface FitTableProps {
  readonly preview: FitPreview;
  /** `Bottom bars`. */
  readonly name: string;
  readonly isAtTop: boolean;
  readonly units: UnitSystem;
}

/** The widest width is drawn this wide; the others to the same scale. */
const WIDEST_PX = 116;

function Cell({
  fit,
  props,
  pxPerMm,
}: {
  readonly fit: WidthFit;
  readonly props: FitTableProps;
  readonly pxPerMm: number;
}) {
  const { most } = fit;
  return (
    <td>
      <span className="grid grid-cols-[7.5rem_minmax(0,1fr)] items-center gap-x-3">
        <FaceStrip
          preview={props.preview}
          widthMm={fit.widthMm}
          bars={most?.bars ?? []}
          isAtTop={props.isAtTop}
          pxPerMm={pxPerMm}
        />
        <span className="text-xs">
          <span className={`num ${most === null ? 'text-fails' : ''}`}>{fitWords(fit)}</span>
          {most !== null && <span className="block text-muted">drawn: {barsText(most.group)}</span>}
        </span>
      </span>
    </td>
  );
}

const isNowhere = ({ at }: FitRow) => at.every(({ most }) => most === null);

/** Which bars stand in one layer, in two, or not at all, at both ends of the widths. */
export function FitTable(props: FitTableProps) {
  const { preview, name, units } = props;
  const { rows, moreGroups } = preview;
  const widths = rows[0]!.at.map(({ widthMm }) => widthMm);
  const pxPerMm = WIDEST_PX / Math.max(...widths);
  const ends = widths.length === 1 ? ['b'] : ['narrowest b', 'widest b'];
  return (
    <div>
      <TableFrame
        label={`${name}: what stands in one layer`}
        columnShares={widths.length === 1 ? [14, 86] : [11, 44, 45]}
        minWidth={widths.length === 1 ? '24rem' : '37rem'}
      >
        <thead>
          <tr>
            <th scope="col">Size</th>
            {widths.map((widthMm, k) => (
              <th key={widthMm} scope="col">
                At the {ends[k]}, <span className="num">{formatQuantity(widthMm, 'length', units)}</span>
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.name} className="middle">
              <th scope="row" className="num font-medium text-steel">
                {row.name}
                {(row.isExcluded || isNowhere(row)) && (
                  <span className="block font-sans text-xs font-normal text-near">
                    {row.isExcluded ? 'never used' : 'fits nowhere'}
                  </span>
                )}
              </th>
              {row.at.map((fit) => (
                <Cell key={fit.widthMm} fit={fit} props={props} pxPerMm={pxPerMm} />
              ))}
            </tr>
          ))}
        </tbody>
      </TableFrame>
      {moreGroups > 0 && <p className="pt-1 text-xs text-muted">and {moreGroups} more groups of two sizes</p>}
    </div>
  );
}
