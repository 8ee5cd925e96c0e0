import { CustomChart, LineChart, ScatterChart } from 'echarts/charts';
import { GridComponent, TooltipComponent } from 'echarts/components';
import * as echarts from 'echarts/core';
import type { EChartsCoreOption, EChartsType } from 'echarts/core';
import { CanvasRenderer } from 'echarts/renderers';
import ReactECharts from 'echarts-for-react/esm/core';
import { useEffect, useRef } from 'react';

echarts.use([CustomChart, LineChart, ScatterChart, GridComponent, TooltipComponent, CanvasRenderer]);

interface EChartsCanvasProps {
  readonly option: EChartsCoreOption;
  readonly onPoint: (xPx: number, yPx: number) => void;
}

const FILL = { width: '100%', height: '100%' };
const REPLACED = ['series'];

/**
 * The component takes its first change of size for its own beginning and passes over it, also when it is a real one: a
 * window narrowed while the chart is being fetched.
 */
function fillFrame(chart: EChartsType): void {
  if (chart.isDisposed()) return;
  if (chart.getWidth() !== chart.getDom().clientWidth) chart.resize({ width: 'auto', height: 'auto' });
}

/** The only place that knows the chart library's component; loaded lazily, being the largest script we ship. */
export default function EChartsCanvas({ option, onPoint }: EChartsCanvasProps) {
  const latest = useRef(onPoint);
  useEffect(() => {
    latest.current = onPoint;
  }, [onPoint]);
  const drawn = useRef<EChartsType | null>(null);
  useEffect(() => {
    if (drawn.current !== null) fillFrame(drawn.current);
  }, [option]);
  const listen = (chart: EChartsType) => {
    drawn.current = chart;
    fillFrame(chart);
    chart.getZr().on('click', (event) => latest.current(event.offsetX, event.offsetY));
  };
  return (
    <ReactECharts
      echarts={echarts}
      option={option}
      replaceMerge={REPLACED}
      onChartReady={listen}
      style={FILL}
    />
  );
}
