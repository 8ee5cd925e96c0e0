import { CustomChart, LineChart, ScatterChart } from 'echarts/charts';
import { GridComponent } from 'echarts/components';
import * as echarts from 'echarts/core';
import { CanvasRenderer, SVGRenderer } from 'echarts/renderers';
import { PAPER_COLOURS } from '#client/src/lib/paper-colours.ts';
import { PICTURE_FACE, svgText } from '#client/src/lib/svg-text.ts';
import { cloudBoxes, type CloudBox } from './cloud-boxes.ts';
import type { FrontPicture, PlotFrame } from './front-chart-input.ts';
import { frontChartOption } from './front-chart-option.ts';

echarts.use([CustomChart, LineChart, ScatterChart, GridComponent, CanvasRenderer, SVGRenderer]);

/** Fits across a page of A4 or Letter with its caption below. */
const WIDTH_PX = 1000;
const CHART_HEIGHT_PX = 620;
const CAPTION_PITCH_PX = 17;
const CAPTION_SIZE_PX = 12;
const MARGIN_PX = 16;
/** Pixels of the picture for one of the drawing: sharp in print at half the page's width. */
const PNG_SCALE = 2;

const FRAME: PlotFrame = {
  width: WIDTH_PX,
  height: CHART_HEIGHT_PX,
  left: 64,
  right: 24,
  top: 36,
  bottom: 50,
};

const heightWith = (caption: readonly string[]) =>
  CHART_HEIGHT_PX + caption.length * CAPTION_PITCH_PX + MARGIN_PX;
const captionAt = (line: number) => CHART_HEIGHT_PX + (line + 1) * CAPTION_PITCH_PX - 4;

const boxesOf = ({ x, y, xExtent, yExtent, cells }: FrontPicture): readonly CloudBox[] =>
  cloudBoxes({ x, y, xExtent, yExtent, cells, frame: FRAME });

const optionOf = (picture: FrontPicture) => ({
  ...frontChartOption({ ...picture, frame: FRAME, colours: PAPER_COLOURS }),
  tooltip: { show: false },
});

/** A chart of the option in a form nobody sees; `take` takes what it needs and the chart is ended. */
function withChart<T>(
  renderer: 'svg' | 'canvas',
  picture: FrontPicture,
  take: (chart: ReturnType<typeof echarts.init>) => T,
): T {
  const size = { width: WIDTH_PX, height: CHART_HEIGHT_PX };
  const chart =
    renderer === 'svg'
      ? echarts.init(null, null, { renderer, ssr: true, ...size })
      : echarts.init(document.createElement('div'), null, { renderer, devicePixelRatio: PNG_SCALE, ...size });
  try {
    chart.setOption(optionOf(picture));
    return take(chart);
  } finally {
    chart.dispose();
  }
}

/** The chart as it stands, on white paper, with what it is of in words below. */
export function frontPictureSvg(picture: FrontPicture, caption: readonly string[]): string {
  const height = heightWith(caption);
  const cloud = boxesOf(picture).map(
    ({ x, y, width, height: tall, opacity }) =>
      `<rect x="${x.toFixed(1)}" y="${y.toFixed(1)}" width="${width.toFixed(1)}" height="${tall.toFixed(1)}" opacity="${opacity.toFixed(3)}"/>`,
  );
  const words = caption.map((text, line) =>
    svgText(text, {
      x: MARGIN_PX,
      y: captionAt(line),
      sizePx: CAPTION_SIZE_PX,
      fill: line === 0 ? PAPER_COLOURS.ink : PAPER_COLOURS.muted,
      face: 'words',
    }),
  );
  const chart = withChart('svg', picture, (drawn) => drawn.renderToSVGString());
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${WIDTH_PX} ${height}" width="${WIDTH_PX}" height="${height}">`,
    `<rect width="${WIDTH_PX}" height="${height}" fill="${PAPER_COLOURS.paper}"/>`,
    `<g fill="${PAPER_COLOURS.meets}">${cloud.join('')}</g>`,
    chart,
    ...words,
    '</svg>',
  ].join('');
}

/** The same as pixels. The page's own faces are drawn with, which a picture of an SVG would not have. */
export async function frontPicturePng(picture: FrontPicture, caption: readonly string[]): Promise<Blob> {
  const canvas = document.createElement('canvas');
  canvas.width = WIDTH_PX * PNG_SCALE;
  canvas.height = heightWith(caption) * PNG_SCALE;
  const pen = canvas.getContext('2d');
  if (pen === null) throw new Error('This browser gives no canvas to draw on');
  pen.fillStyle = PAPER_COLOURS.paper;
  pen.fillRect(0, 0, canvas.width, canvas.height);
  pen.scale(PNG_SCALE, PNG_SCALE);
  pen.fillStyle = PAPER_COLOURS.meets;
  for (const { x, y, width, height, opacity } of boxesOf(picture)) {
    pen.globalAlpha = opacity;
    pen.fillRect(x, y, width, height);
  }
  pen.globalAlpha = 1;
  withChart('canvas', picture, (chart) =>
    pen.drawImage(chart.renderToCanvas({ pixelRatio: PNG_SCALE }), 0, 0, WIDTH_PX, CHART_HEIGHT_PX),
  );
  pen.font = `${CAPTION_SIZE_PX}px ${PICTURE_FACE.words}`;
  caption.forEach((text, line) => {
    pen.fillStyle = line === 0 ? PAPER_COLOURS.ink : PAPER_COLOURS.muted;
    pen.fillText(text, MARGIN_PX, captionAt(line));
  });
  return new Promise((resolve, reject) =>
    canvas.toBlob(
      (blob) => (blob === null ? reject(new Error('The picture could not be made')) : resolve(blob)),
      'image/png',
    ),
  );
}
