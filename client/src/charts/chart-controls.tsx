import { zoomedExtents, type Extents } from './chart-window.ts';

/** One press of a button, or of + and −, shows this share of what was shown. */
export const ZOOM_STEP = 0.6;

interface ChartControlsProps {
  readonly isXLog: boolean;
  readonly isYLog: boolean;
  readonly isWhole: boolean;
  readonly onLog: (isXLog: boolean, isYLog: boolean) => void;
  readonly onZoom: (by: (now: Extents) => Extents) => void;
  readonly onWhole: () => void;
}

const BUTTON =
  'min-h-6 min-w-6 border border-rule px-1.5 leading-none hover:enabled:border-ink hover:enabled:text-ink disabled:opacity-45';

/** How the axes are divided and how much of the plane is shown. */
export function ChartControls({ isXLog, isYLog, isWhole, onLog, onZoom, onWhole }: ChartControlsProps) {
  const box = (words: string, isOn: boolean, onChange: () => void) => (
    <label className="inline-flex min-h-6 items-center gap-1 has-checked:text-ink">
      <input type="checkbox" className="size-3.5 accent-steel-solid" checked={isOn} onChange={onChange} />
      {words}
    </label>
  );
  return (
    <div
      className="ml-auto flex flex-wrap items-center gap-x-3 gap-y-1 text-xs text-muted print:hidden"
      role="group"
      aria-label="Axes of the chart"
    >
      {box('log up', isYLog, () => onLog(isXLog, !isYLog))}
      {box('log across', isXLog, () => onLog(!isXLog, isYLog))}
      <span className="inline-flex gap-1">
        <button
          type="button"
          className={BUTTON}
          aria-label="Enlarge"
          title="Enlarge (+); drag a box over the chart to choose what"
          onClick={() => onZoom((now) => zoomedExtents(now, ZOOM_STEP))}
        >
          +
        </button>
        <button
          type="button"
          className={BUTTON}
          aria-label="Reduce"
          title="Reduce (−)"
          disabled={isWhole}
          onClick={() => onZoom((now) => zoomedExtents(now, 1 / ZOOM_STEP))}
        >
          −
        </button>
        <button
          type="button"
          className={BUTTON}
          title="Show the whole front (0)"
          disabled={isWhole}
          onClick={onWhole}
        >
          Whole
        </button>
      </span>
    </div>
  );
}
