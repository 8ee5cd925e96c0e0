import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Scatter, ScatterVariant } from '#shared/engine/scatter.ts';
import type { CodeSymbols } from '#shared/engine/rules/code-symbols.ts';
import { checkLabel } from '#shared/print/check-labels.ts';
import { formatNumber, formatQuantity } from '#shared/print/format-quantity.ts';
import { unitLabel } from '#shared/print/units.ts';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { VerdictMark } from '#client/src/ui/verdict-mark.tsx';

interface ScatterTableProps {
  readonly scatter: Scatter;
  readonly units: UnitSystem;
  readonly symbols: CodeSymbols;
}

function departureText({ id, from, to }: ScatterVariant, units: UnitSystem, fcSymbol: string): string {
  if (id === 'bar-oversize') return `bars ${formatNumber((to - 1) * 100, 3, true)} % larger than their name`;
  const isCover = id === 'cover-less' || id === 'cover-more';
  const kind = isCover ? 'length' : 'stress';
  const name = isCover ? 'cover' : fcSymbol;
  const ends = [from, to].map((value) => formatQuantity(value, kind, units, { hideUnit: true, digits: 3 }));
  return `${name} ${ends[0]} → ${ends[1]} ${unitLabel(kind, units)}`;
}

function verdictOf({ outcome, newlyFailing }: ScatterVariant) {
  if (outcome === null) return { verdict: 'near', word: 'not judged' } as const;
  if (outcome.meetsListedChecks) return { verdict: 'meets', word: 'still meets' } as const;
  const names = (newlyFailing.length > 0 ? newlyFailing : outcome.failing).map(
    (check) => checkLabel(check).name,
  );
  return { verdict: 'fails', word: names.join(', ').toLowerCase() } as const;
}

function headline({ asDrawn, holds, variants }: Scatter): string {
  if (!asDrawn.meetsListedChecks)
    return 'As drawn it does not meet its listed checks; what follows is beside that.';
  if (holds) return 'It still meets its listed checks where execution strays by this much.';
  const failing = variants.filter((one) => one.outcome?.meetsListedChecks === false).length;
  return `It no longer meets its listed checks in ${failing} of these ${variants.length} departures.`;
}

/** Whether the section still meets its checks where cover, concrete and bars stray from the drawing. */
export function ScatterTable({ scatter, units, symbols }: ScatterTableProps) {
  return (
    <div className="grid gap-2">
      <p className="text-sm">{headline(scatter)}</p>
      <TableFrame label="Where execution strays from the drawing">
        <thead>
          <tr>
            <th scope="col">Departure</th>
            <th scope="col" className="figure">
              {symbols.designMoment}, {unitLabel('moment', units)}
            </th>
            <th scope="col" className="figure">
              μφ
            </th>
            <th scope="col">Listed checks</th>
          </tr>
        </thead>
        <tbody>
          {scatter.variants.map((variant) => (
            <tr key={`${variant.id} ${variant.to}`}>
              <th scope="row" className="font-normal">
                {departureText(variant, units, symbols.fc)}
                <span className="block text-2xs text-muted">{variant.note}</span>
              </th>
              <td className="figure">
                {formatQuantity(variant.outcome?.designMomentNmm, 'moment', units, { hideUnit: true })}
              </td>
              <td className="figure">
                {formatQuantity(variant.outcome?.curvatureDuctility, 'ratio', units)}
              </td>
              <td>
                <VerdictMark {...verdictOf(variant)} />
              </td>
            </tr>
          ))}
        </tbody>
      </TableFrame>
      <p className="text-xs text-muted">
        Departures of common practice; what your execution class allows is for you to set against them.
      </p>
    </div>
  );
}
