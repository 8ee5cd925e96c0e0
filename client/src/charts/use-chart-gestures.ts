import { useEffect, useState, type PointerEvent, type RefObject } from 'react';
import {
  boxedExtents,
  isInPlot,
  movedExtents,
  shareAt,
  zoomedExtents,
  type Extents,
  type Spot,
} from './chart-window.ts';
import type { PlotFrame } from './front-chart-input.ts';

/** A hand that clicks moves a little. */
const CLICK_PX = 5;
/** One notch of a wheel is 100 to 120 px and enlarges by about a sixth. */
const WHEEL_PER_PX = 0.0016;

type Change = (by: (now: Extents) => Extents) => void;

interface Drag {
  readonly kind: 'box' | 'shift';
  readonly from: Spot;
  readonly to: Spot;
}

const spotOf = (event: { clientX: number; clientY: number }, element: Element): Spot => {
  const box = element.getBoundingClientRect();
  return { xPx: event.clientX - box.left, yPx: event.clientY - box.top };
};

/** Turning the wheel alone scrolls the page; with Ctrl, or by pinching a touchpad, it enlarges. */
function useWheel(ref: RefObject<HTMLElement | null>, frame: PlotFrame | null, change: Change): void {
  useEffect(() => {
    const element = ref.current;
    if (element === null || frame === null) return;
    const turn = (event: WheelEvent) => {
      if (!event.ctrlKey && !event.metaKey) return;
      event.preventDefault();
      const about = shareAt(spotOf(event, element), frame);
      change((now) => zoomedExtents(now, Math.exp(event.deltaY * WHEEL_PER_PX), about));
    };
    element.addEventListener('wheel', turn, { passive: false });
    return () => element.removeEventListener('wheel', turn);
  }, [ref, frame, change]);
}

/** Dragging a box enlarges what is in it; with Shift it moves what is shown. A finger scrolls the page as always. */
export function useChartGestures(
  ref: RefObject<HTMLElement | null>,
  frame: PlotFrame | null,
  change: Change,
) {
  const [drag, setDrag] = useState<Drag | null>(null);
  useWheel(ref, frame, change);

  const begin = (event: PointerEvent<HTMLElement>) => {
    if (frame === null || event.button !== 0 || event.pointerType === 'touch') return;
    const from = spotOf(event, event.currentTarget);
    if (isInPlot(from, frame)) setDrag({ kind: event.shiftKey ? 'shift' : 'box', from, to: from });
  };
  const move = (event: PointerEvent<HTMLElement>) => {
    if (drag === null || frame === null) return;
    const to = spotOf(event, event.currentTarget);
    if (!event.currentTarget.hasPointerCapture(event.pointerId)) {
      if (Math.hypot(to.xPx - drag.from.xPx, to.yPx - drag.from.yPx) < CLICK_PX) return;
      event.currentTarget.setPointerCapture(event.pointerId);
    }
    if (drag.kind === 'shift') {
      const [a, b] = [shareAt(drag.to, frame), shareAt(to, frame)];
      change((now) => movedExtents(now, { x: a.x - b.x, y: a.y - b.y }));
    }
    setDrag({ ...drag, to });
  };
  const end = () => {
    if (drag?.kind === 'box' && frame !== null) {
      const { from, to } = drag;
      const isBox = Math.abs(to.xPx - from.xPx) > CLICK_PX && Math.abs(to.yPx - from.yPx) > CLICK_PX;
      if (isBox) change((now) => boxedExtents(now, frame, [from, to]));
    }
    setDrag(null);
  };
  const handlers = {
    onPointerDown: begin,
    onPointerMove: move,
    onPointerUp: end,
    onPointerCancel: () => setDrag(null),
  };
  const box = drag?.kind === 'box' && drag.to !== drag.from ? drag : null;
  return { handlers, box };
}
