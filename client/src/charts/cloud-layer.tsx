import { useEffect, useRef } from 'react';
import type { CloudBox } from './cloud-boxes.ts';
import type { PlotFrame } from './front-chart-input.ts';

interface CloudLayerProps {
  readonly boxes: readonly CloudBox[];
  readonly frame: PlotFrame;
  readonly colour: string;
}

/**
 * The cloud on a canvas of its own under the chart's: some thousand boxes are painted in a millisecond or two, where the
 * chart library makes an object of each. That is the difference between a smooth and a jerky enlargement.
 */
export function CloudLayer({ boxes, frame, colour }: CloudLayerProps) {
  const ref = useRef<HTMLCanvasElement>(null);
  useEffect(() => {
    const canvas = ref.current;
    const pen = canvas?.getContext('2d');
    if (!canvas || !pen) return;
    const scale = window.devicePixelRatio;
    canvas.width = Math.round(frame.width * scale);
    canvas.height = Math.round(frame.height * scale);
    pen.scale(scale, scale);
    pen.beginPath();
    pen.rect(
      frame.left,
      frame.top,
      frame.width - frame.left - frame.right,
      frame.height - frame.top - frame.bottom,
    );
    pen.clip();
    pen.fillStyle = colour;
    for (const { x, y, width, height, opacity } of boxes) {
      pen.globalAlpha = opacity;
      pen.fillRect(x, y, width, height);
    }
  }, [boxes, frame, colour]);
  return (
    <canvas ref={ref} data-layer="cloud" aria-hidden="true" className="absolute inset-0 h-full w-full" />
  );
}
