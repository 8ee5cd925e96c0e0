import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { OfficeStandard } from '#shared/contract/office-standard.ts';
import { barStandardLabel, unitSystemLabel } from '#shared/print/basis-labels.ts';
import { formatDate, formatQuantity } from '#shared/print/format-quantity.ts';
import { unitLabel } from '#shared/print/units.ts';
import { countsText } from '#client/src/lib/counts-text.ts';
import { paths } from '#client/src/lib/paths.ts';
import { valueListText } from '#client/src/lib/value-list.ts';
import { Button, ButtonLink } from '#client/src/ui/button.tsx';
import { ConfirmDialog } from '#client/src/ui/confirm-dialog.tsx';
import { KeyValue } from '#client/src/ui/key-value.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { useDeleteOfficeStandard } from './api.ts';

function Ranges({ standard }: { readonly standard: OfficeStandard }) {
  const { units, ranges, name } = standard;
  const length = (mm: number) => formatQuantity(mm, 'length', units, { hideUnit: true });
  const unit = unitLabel('length', units);
  return (
    <TableFrame label={`Usual ranges of ${name}`} minWidth="30rem">
      <thead>
        <tr>
          <th scope="col">Kind of beam</th>
          <th scope="col">b, {unit}</th>
          <th scope="col">h, {unit}</th>
          <th scope="col">Tension bars</th>
          <th scope="col">Compression bars</th>
        </tr>
      </thead>
      <tbody>
        {ranges.map((kind) => (
          <tr key={kind.name}>
            <th scope="row">{kind.name}</th>
            <td className="num">
              {length(kind.leastWidthMm)}–{length(kind.mostWidthMm)}
            </td>
            <td className="num">
              {length(kind.leastDepthMm)}–{length(kind.mostDepthMm)}
            </td>
            <td className="num">{countsText(kind.tensionCounts)}</td>
            <td className="num">
              {kind.compressionCounts.length === 0 ? 'none' : `none, ${countsText(kind.compressionCounts)}`}
            </td>
          </tr>
        ))}
      </tbody>
    </TableFrame>
  );
}

function Entry({
  standard,
  mayEdit,
  onDelete,
}: {
  readonly standard: OfficeStandard;
  readonly mayEdit: boolean;
  readonly onDelete: () => void;
}) {
  const { id, name, units, barStandard, bars, mixesMPa, increments, updatedBy, updatedAt } = standard;
  return (
    <section aria-label={name} className="border-t border-ink pt-3">
      <div className="mb-2 flex flex-wrap items-baseline gap-x-4 gap-y-1">
        <h2 className="text-lg font-semibold">
          <Link to={paths.officeStandard(id)} className="hover:underline">
            {name}
          </Link>
        </h2>
        <p className="text-muted">
          {barStandardLabel(barStandard)}, {unitSystemLabel(units)}
        </p>
        {mayEdit && (
          <div className="ml-auto flex items-baseline gap-3">
            <Button look="text" onClick={onDelete} aria-label={`Delete ${name}`}>
              Delete
            </Button>
            <ButtonLink to={paths.officeStandard(id)} aria-label={`Change ${name}`}>
              Change
            </ButtonLink>
          </div>
        )}
      </div>
      <div className="grid grid-cols-[minmax(0,1fr)] gap-x-12 gap-y-4 lg:grid-cols-[minmax(0,22rem)_minmax(0,1fr)]">
        <KeyValue
          items={[
            { label: 'Tension face', value: bars.tension.join(', ') },
            { label: 'Compression face', value: bars.compression.join(', ') },
            { label: 'Stirrups', value: [...new Set(bars.stirrups.map(({ bar }) => bar))].join(', ') },
            {
              label: 'Mixes',
              value: `${valueListText(mixesMPa, 'stress', units)} ${unitLabel('stress', units)}`,
            },
            {
              label: 'Steps of b and h',
              value: `${formatQuantity(increments.widthMm, 'length', units)}, ${formatQuantity(increments.depthMm, 'length', units)}`,
            },
          ]}
        />
        <Ranges standard={standard} />
      </div>
      <p className="pt-2 text-xs text-muted">
        Set by {updatedBy.name}, {formatDate(updatedAt)}
      </p>
    </section>
  );
}

/** Every standard of the office, in full enough to choose by. */
export function StandardList({
  standards,
  mayEdit,
}: {
  readonly standards: readonly OfficeStandard[];
  readonly mayEdit: boolean;
}) {
  const [doomed, setDoomed] = useState<OfficeStandard | null>(null);
  const remove = useDeleteOfficeStandard();
  const close = () => {
    remove.reset();
    setDoomed(null);
  };
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-8">
      {standards.map((standard) => (
        <Entry key={standard.id} standard={standard} mayEdit={mayEdit} onDelete={() => setDoomed(standard)} />
      ))}
      {doomed !== null && (
        <ConfirmDialog
          isOpen
          onClose={close}
          onConfirm={() => remove.mutate(doomed.id, { onSuccess: close })}
          title={`Delete the standard ${doomed.name}?`}
          description="Sweeps filled from it keep their ranges. New sweeps are no longer offered it."
          confirmLabel="Delete standard"
          isBusy={remove.isPending}
          error={remove.error}
        />
      )}
    </div>
  );
}
