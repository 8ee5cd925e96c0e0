import type { EChartsCoreOption } from 'echarts/core';
import { lazy, Suspense } from 'react';

const loadCanvas = () => import('./echarts-canvas.tsx');
const EChartsCanvas = lazy(loadCanvas);

/** Fetches the chart script ahead of its first use, so that a finished run is not kept waiting for it. */
export const preloadChart = (): void => void loadCanvas();

export interface ChartProps {
  readonly option: EChartsCoreOption;
  readonly onPoint: (xPx: number, yPx: number) => void;
}

/** A drawing for the eyes; the table behind it is the page's to give. */
export function Chart({ option, onPoint }: ChartProps) {
  return (
    <Suspense fallback={null}>
      <EChartsCanvas option={option} onPoint={onPoint} />
    </Suspense>
  );
}
