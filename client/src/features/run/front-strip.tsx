import { useVirtualizer } from '@tanstack/react-virtual';
import { useEffect, useMemo, useRef, type KeyboardEvent } from 'react';
import type { BarStandard, SectionInput } from '#shared/engine/section.ts';
import type { View } from '#shared/sweep/problem.ts';
import type { FrontPoint } from '#shared/sweep/result.ts';
import { SectionDrawing } from '#client/src/drawing/section-drawing.tsx';
import { sectionGeometry } from '#shared/drawing/section-geometry.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { barsText, sizeText } from '#shared/print/section-text.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import { measureText } from './measure-text.ts';
import type { SectionSource } from './section-source.ts';
import { stripScale } from './strip-scale.ts';

interface FrontStripProps {
  readonly front: readonly FrontPoint[];
  readonly view: View;
  readonly source: SectionSource;
  readonly standard: BarStandard;
  readonly reader: MeasureReader;
  readonly selectedIndex: number | null;
  /** Labels of the sections that are on the shortlist, by index. */
  readonly pinLabels: ReadonlyMap<number, string>;
  readonly onSelect: (index: number) => void;
  /** Puts a section on the shortlist; null for who may not. */
  readonly onPin: ((index: number) => void) | null;
}

const DRAWING_PX = 132;
/** Room above the deepest section for a pin's flag. */
const HEAD_PX = 22;
/** Three lines of words and the way to pin. */
const WORDS_PX = 80;

const STEP_OF_KEY: Readonly<Record<string, number>> = {
  ArrowRight: 1,
  ArrowLeft: -1,
  PageDown: 5,
  PageUp: -5,
  Home: -Infinity,
  End: Infinity,
};

/** The mark of a pinned section, as on the chart. */
function Flag({ label }: { readonly label: string }) {
  return (
    <span
      className="absolute top-0.5 left-1/2 -translate-x-full text-xs font-semibold"
      title={`Candidate ${label}`}
    >
      <span
        className="num block bg-ink py-px pr-1 pl-2.5 leading-3.5 text-paper"
        style={{ clipPath: 'polygon(0 0, 100% 0, 100% 100%, 0 100%, 5px 50%)' }}
      >
        {label}
      </span>
    </span>
  );
}

interface CellProps extends FrontStripProps {
  readonly point: FrontPoint;
  readonly isChosen: boolean;
  /** The one stop of the strip on the way of the Tab key. */
  readonly isStop: boolean;
  readonly pxPerMm: number;
}

function StripCell(props: CellProps) {
  const { point, view, source, standard, reader, isChosen, onSelect, onPin } = props;
  const { section, evaluation } = source.evaluatedAt(point.index);
  const bareSize = [section.widthMm, section.depthMm]
    .map((mm) => formatQuantity(mm, 'length', reader.units, { hideUnit: true }))
    .join(' × ');
  const { reinforcement } = section;
  const isBars = reinforcement.kind === 'bars';
  const top =
    isBars && reinforcement.compression.length > 0 ? ` + ${barsText(reinforcement.compression)}` : '';
  const label = props.pinLabels.get(point.index);
  return (
    <div
      className={`group relative flex h-full flex-col items-center border ${isChosen ? 'border-steel' : 'border-transparent hover:bg-concrete/40'}`}
    >
      <button
        type="button"
        data-place={point.index}
        aria-pressed={isChosen}
        tabIndex={props.isStop ? 0 : -1}
        onClick={() => onSelect(point.index)}
        className="on-paper flex w-full flex-col items-center -outline-offset-2"
        style={{ paddingTop: HEAD_PX }}
      >
        <SectionDrawing
          variant="strip"
          section={section}
          evaluation={evaluation}
          standard={standard}
          units={reader.units}
          pxPerMm={props.pxPerMm}
          heightPx={DRAWING_PX}
        />
        <span className="num mt-1.5 text-xs leading-4 whitespace-nowrap">{bareSize}</span>
        <span className="num text-xs leading-4 whitespace-nowrap text-steel">
          {isBars ? `${barsText(reinforcement.tension)}${top}` : 'plain layers'}
        </span>
        <span className="num text-xs leading-4 whitespace-nowrap text-muted">
          {measureText(view.x, point.x, reader, true)} · {measureText(view.y, point.y, reader, true)}
        </span>
      </button>
      {label !== undefined && <Flag label={label} />}
      {onPin !== null && label === undefined && (
        <button
          type="button"
          tabIndex={isChosen ? 0 : -1}
          aria-label={`Pin ${sizeText(section, reader.units)} to the shortlist`}
          onClick={() => onPin(point.index)}
          className={`mt-0.5 min-h-6 px-2 text-xs underline decoration-concrete-edge hover:decoration-current print:hidden ${isChosen ? '' : 'opacity-0 group-hover:opacity-100 focus-visible:opacity-100'}`}
        >
          Pin
        </button>
      )}
    </div>
  );
}

/** What the slab of these sections adds to the width of their webs; all of a run share it. */
function overhangMm(front: readonly FrontPoint[], source: SectionSource, standard: BarStandard): number {
  const [first] = front;
  if (first === undefined) return 0;
  const { section, evaluation } = source.evaluatedAt(first.index);
  const { leftMm, rightMm } = sectionGeometry(section, evaluation, standard);
  return rightMm - leftMm - section.widthMm;
}

const isCalm = (): boolean => matchMedia('(prefers-reduced-motion: reduce)').matches;

/** The sections along the front, side by side on one ground line at one scale. Only those in sight are drawn. */
export function FrontStrip(props: FrontStripProps) {
  const { front, source, standard, selectedIndex, onSelect } = props;
  const frame = useRef<HTMLDivElement>(null);
  const scale = useMemo(
    () =>
      stripScale(
        front.map((point): SectionInput => source.sectionAt(point.index)),
        DRAWING_PX,
        overhangMm(front, source, standard),
      ),
    [front, source, standard],
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

  const place = front.findIndex((point) => point.ties.includes(selectedIndex ?? -1));
  const isFirst = useRef(true);
  useEffect(() => {
    if (place < 0) return;
    // The page opens where it stands; later one sees the strip move along.
    strip.scrollToIndex(place, {
      align: 'center',
      behavior: isFirst.current || isCalm() ? 'auto' : 'smooth',
    });
    isFirst.current = false;
  }, [strip, place]);

  const move = (event: KeyboardEvent) => {
    const step = STEP_OF_KEY[event.key];
    if (step === undefined || event.ctrlKey || event.metaKey || event.altKey || front.length === 0) return;
    event.preventDefault();
    const to = Math.min(Math.max((place < 0 ? 0 : place) + step, 0), front.length - 1);
    const { index } = front[to]!;
    onSelect(index);
    // It may not be drawn yet; the frame holds the focus until it is.
    strip.scrollToIndex(to, { align: 'center' });
    requestAnimationFrame(() =>
      (frame.current?.querySelector<HTMLElement>(`[data-place="${index}"]`) ?? frame.current)?.focus({
        preventScroll: true,
      }),
    );
  };
  const items = strip.getVirtualItems();
  const isStopDrawn = items.some((item) => item.index === place);

  return (
    <div
      ref={frame}
      className="overflow-x-auto pb-1"
      role="group"
      tabIndex={-1}
      aria-label="Sections along the front, to one scale"
      onKeyDown={move}
    >
      <div
        className="relative"
        style={{ width: strip.getTotalSize(), height: HEAD_PX + DRAWING_PX + WORDS_PX }}
      >
        <div className="absolute inset-x-0 border-t border-ink" style={{ top: HEAD_PX + DRAWING_PX }} />
        {items.map((item) => {
          const point = front[item.index];
          if (point === undefined) return null;
          return (
            <div
              key={point.index}
              className="absolute top-0 h-full"
              style={{ left: item.start, width: item.size }}
            >
              <StripCell
                {...props}
                point={point}
                isChosen={item.index === place}
                isStop={isStopDrawn ? item.index === place : item.index === items[0]?.index}
                pxPerMm={scale.pxPerMm}
              />
            </div>
          );
        })}
      </div>
    </div>
  );
}
