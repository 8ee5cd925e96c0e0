import type { Run } from '#shared/contract/records.ts';
import { unitLabel } from '#shared/print/units.ts';
import { EdgeOffers } from '#client/src/features/run/edge-offers.tsx';
import { FrontStrip } from '#client/src/features/run/front-strip.tsx';
import { RangesPanel } from '#client/src/features/run/ranges-panel.tsx';
import { viewPart, type Panel } from '#client/src/features/run/run-address.ts';
import { SectionTable } from '#client/src/features/run/section-table.tsx';
import type { useRunView } from '#client/src/features/run/use-run-view.ts';
import { WhyPanel } from '#client/src/features/run/why-panel.tsx';
import { unavailableReason } from '#client/src/lib/measure-availability.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { Button } from '#client/src/ui/button.tsx';
import { EmptyState } from '#client/src/ui/empty-state.tsx';
import { SegmentedControl } from '#client/src/ui/segmented-control.tsx';
import { useVarySweep } from './use-vary-sweep.ts';

interface RunBelowChartProps {
  readonly run: Run;
  readonly state: ReturnType<typeof useRunView>;
  readonly pinLabels: ReadonlyMap<number, string>;
  readonly onPin: ((index: number) => void) | null;
  readonly isFinished: boolean;
}

const PANEL_NAMES: readonly { readonly value: Panel; readonly label: string }[] = [
  { value: 'table', label: 'Table' },
  { value: 'ranges', label: 'Ranges' },
  { value: 'why', label: 'Why the rest fell out' },
];

function Strip({ run, state, pinLabels, onPin }: RunBelowChartProps) {
  const { address, view, source, reader, selected, explore } = state;
  const { listed: front } = explore.shown;
  const place = front.findIndex((point) => point.ties.includes(selected?.index ?? -1));
  return (
    <section aria-label="Along the front" className="min-w-0 border-t border-rule pt-2">
      <h2 className="flex flex-wrap justify-between gap-x-3 text-xs font-semibold text-muted">
        Along the front, to one scale (b × h, {unitLabel('length', reader.units)})
        <span className="num font-normal">
          {place >= 0 ? `${place + 1} of ${front.length}` : front.length}
        </span>
      </h2>
      <FrontStrip
        front={front}
        view={view}
        source={source}
        standard={run.basis.barStandard}
        reader={reader}
        selectedIndex={selected?.index ?? null}
        pinLabels={pinLabels}
        onSelect={address.select}
        onPin={onPin}
      />
    </section>
  );
}

function Panels({ run, state }: RunBelowChartProps) {
  const { address, source, reader, selected, explore, keys, axes, result } = state;
  if (result === null) return null;
  return (
    <div className="grid min-w-0 grid-cols-[minmax(0,1fr)] gap-3 border-t border-rule pt-3">
      <SegmentedControl
        legend="Shown below the strip"
        options={PANEL_NAMES}
        value={address.panel}
        onChange={(panel) => address.write({ show: panel === 'table' ? null : panel })}
      />
      {address.panel === 'table' && (
        <SectionTable
          shown={explore.shown}
          bounds={result.bounds}
          keys={keys}
          source={source}
          reader={reader}
          address={address}
          selectedIndex={selected?.index ?? null}
        />
      )}
      {address.panel === 'ranges' && (
        <RangesPanel
          run={run}
          explore={explore}
          keys={keys}
          axes={axes}
          source={source}
          reader={reader}
          address={address}
          selected={selected}
        />
      )}
      {address.panel === 'why' && (
        <WhyPanel
          result={state.recorded ?? result}
          definition={run.definition}
          source={source}
          reader={reader}
          selectedIndex={selected?.index ?? null}
          onSelect={address.select}
        />
      )}
    </div>
  );
}

/** What lies below the chart: the strip, the end of a range where the best lies there, and one of three ways to read on. */
export function RunBelowChart(props: RunBelowChartProps) {
  const { run, state, isFinished } = props;
  const { address, view, source, reader, result, explore } = state;
  const mayRun = useMay('run-sweeps');
  const vary = useVarySweep(run);
  const { space, demand } = run.definition;
  const isCostAvailable =
    unavailableReason('costPerM', { space, demand, basis: run.basis, units: reader.units }) === null;
  // As tall as the strip and its heading, so that nothing moves when the first part arrives.
  if (result === null) return <div className="h-72 animate-pulse border-t border-rule" aria-hidden="true" />;
  if (result.front.length === 0) return <Panels {...props} />;
  return (
    <>
      {explore.shown.front.length === 0 ? (
        <EmptyState
          title="No section that meets every check lies within these ranges"
          action={<Button onClick={() => explore.setFilters({}, true)}>Clear the ranges</Button>}
        >
          The dashed line is the front without them.
        </EmptyState>
      ) : (
        <Strip {...props} />
      )}
      {isFinished && (
        <EdgeOffers
          run={run}
          view={view}
          result={result}
          source={source}
          reader={reader}
          isCostAvailable={isCostAvailable}
          onView={(next) => address.write(viewPart(next))}
          onVary={mayRun ? vary.mutate : null}
          isBusy={vary.isPending}
        />
      )}
      <Panels {...props} />
    </>
  );
}
