import { useVirtualizer } from '@tanstack/react-virtual';
import { useEffect, useMemo, useRef } from 'react';
import type { BarStandard, SectionInput } from '#shared/engine/section.ts';
import type { View } from '#shared/sweep/problem.ts';
import type { FrontPoint } from '#shared/sweep/result.ts';
import { SectionDrawing } from '#client/src/drawing/section-drawing.tsx';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { barsText } from '#shared/print/section-text.ts';
import { measureText, type MeasureReader } from './measure-text.ts';
import type { SectionSource } from './section-source.ts';
import { stripScale } from './strip-scale.ts';

interface FrontStripProps {
  readonly front: readonly FrontPoint[];
  readonly view: View;
  readonly source: SectionSource;
  readonly standard: BarStandard;
  readonly reader: MeasureReader;
  readonly selectedIndex: number | null;
  readonly onSelect: (index: number) => void;
}

const DRAWING_PX = 132;

/** The sections along the front, side by side on one ground line at one scale. Only those in sight are drawn. */
export function FrontStrip(props: FrontStripProps) {
  const { front, view, source, standard, reader, selectedIndex, onSelect } = props;
  const frame = useRef<HTMLDivElement>(null);
  const scale = useMemo(
    () =>
      stripScale(
        front.map((point) => source.sectionAt(point.index)),
        DRAWING_PX,
      ),
    [front, source],
  );
  // eslint-disable-next-line react-hooks/incompatible-library -- its functions are called here and passed nowhere
  const strip = useVirtualizer({
    count: front.length,
    horizontal: true,
    getScrollElement: () => frame.current,
    estimateSize: () => scale.cellPx,
    overscan: 4,
  });
  useEffect(() => strip.measure(), [strip, scale.cellPx]);

  const bareSize = ({ widthMm, depthMm }: SectionInput) =>
    [widthMm, depthMm]
      .map((mm) => formatQuantity(mm, 'length', reader.units, { hideUnit: true }))
      .join(' × ');
  const place = front.findIndex((point) => point.ties.includes(selectedIndex ?? -1));
  useEffect(() => {
    if (place >= 0) strip.scrollToIndex(place, { align: 'auto' });
  }, [strip, place]);

  return (
    <div
      ref={frame}
      className="overflow-x-auto pb-1"
      role="group"
      aria-label="Sections along the front, to one scale"
    >
      <div className="relative" style={{ width: strip.getTotalSize(), height: DRAWING_PX + 74 }}>
        <div className="absolute inset-x-0 border-t border-ink" style={{ top: DRAWING_PX + 10 }} />
        {strip.getVirtualItems().map((item) => {
          const point = front[item.index];
          if (point === undefined) return null;
          const { section, evaluation } = source.evaluatedAt(point.index);
          const isChosen = item.index === place;
          const steel =
            section.reinforcement.kind === 'bars' ? barsText(section.reinforcement.tension) : 'plain layers';
          return (
            <button
              key={point.index}
              type="button"
              aria-pressed={isChosen}
              onClick={() => onSelect(point.index)}
              className={`absolute top-0 flex h-full flex-col items-center pt-2.5 -outline-offset-2 hover:bg-concrete/40 ${isChosen ? 'border border-steel' : 'border border-transparent'}`}
              style={{ left: item.start, width: item.size }}
            >
              <SectionDrawing
                variant="strip"
                section={section}
                evaluation={evaluation}
                standard={standard}
                units={reader.units}
                pxPerMm={scale.pxPerMm}
                heightPx={DRAWING_PX}
              />
              <span className="num mt-1.5 text-xs leading-4 whitespace-nowrap">{bareSize(section)}</span>
              <span className="num text-xs leading-4 whitespace-nowrap text-steel">{steel}</span>
              <span className="num text-xs leading-4 whitespace-nowrap text-muted">
                {measureText(view.x, point.x, reader, true)} · {measureText(view.y, point.y, reader, true)}
              </span>
            </button>
          );
        })}
      </div>
    </div>
  );
}
