import { CURVE_SHEET, curvePlan, type CurvePlanInput } from '#shared/drawing/curve-plan.ts';
import { classNames } from '#client/src/lib/class-names.ts';
import { CURVE_STROKES } from './curve-strokes.ts';

interface CurvePlotProps extends CurvePlanInput {
  /** What a screen reader says of the plot; the table with its numbers stands beside it. */
  readonly title: string;
  readonly className?: string;
}

const RIGHT = CURVE_SHEET.width - CURVE_SHEET.right;
const BOTTOM = CURVE_SHEET.height - CURVE_SHEET.bottom;
const TICK_PX = 5;

/** Moment over curvature on two scale rulers. Its numbers are in a table beside it: this is the picture of them. */
export function CurvePlot({ title, className, ...input }: CurvePlotProps) {
  const plan = curvePlan(input);
  const isOne = plan.curves.length === 1;
  return (
    <svg
      viewBox={`0 0 ${CURVE_SHEET.width} ${CURVE_SHEET.height}`}
      role="img"
      aria-label={title}
      className={classNames('h-auto w-full max-w-[36rem] font-mono text-[11px]', className)}
    >
      <g className="fill-none stroke-ink" strokeWidth={1}>
        <path d={`M ${CURVE_SHEET.left} ${CURVE_SHEET.top - 8} V ${BOTTOM} H ${RIGHT}`} />
        {plan.xTicks.map(({ atPx }) => (
          <path key={atPx} d={`M ${atPx} ${BOTTOM} v ${TICK_PX}`} />
        ))}
        {plan.yTicks.map(({ atPx }) => (
          <path key={atPx} d={`M ${CURVE_SHEET.left} ${atPx} h ${-TICK_PX}`} />
        ))}
      </g>
      <g className="fill-muted">
        {plan.xTicks.map(({ atPx, text }) => (
          <text key={atPx} x={atPx} y={BOTTOM + TICK_PX + 11} textAnchor="middle">
            {text}
          </text>
        ))}
        {plan.yTicks.map(({ atPx, text }) => (
          <text key={atPx} x={CURVE_SHEET.left - TICK_PX - 4} y={atPx} dy="0.35em" textAnchor="end">
            {text}
          </text>
        ))}
      </g>
      <g className="fill-muted font-sans">
        <text x={RIGHT} y={CURVE_SHEET.height - 6} textAnchor="end">
          {plan.xTitle}
        </text>
        <text x={8} y={12}>
          {plan.yTitle}
        </text>
      </g>
      {plan.levels.map(({ yPx, text }) => (
        <g key={text}>
          <path
            d={`M ${CURVE_SHEET.left} ${yPx} H ${RIGHT}`}
            className="stroke-muted"
            strokeDasharray="1 3"
          />
          <text x={RIGHT} y={yPx + 12} textAnchor="end" className="fill-muted">
            {text}
          </text>
        </g>
      ))}
      {plan.curves.map((curve, i) => {
        const stroke = CURVE_STROKES[i % CURVE_STROKES.length]!;
        return (
          <g key={`${i} ${curve.end.text}`}>
            {curve.twoLines !== null && (
              <path
                d={curve.twoLines}
                className="fill-none stroke-steel"
                strokeWidth={1}
                strokeDasharray="5 3"
              />
            )}
            <path
              d={curve.path}
              className={`fill-none ${stroke.className}`}
              strokeWidth={1.6}
              strokeDasharray={stroke.dash}
            />
            {curve.dots.map(({ xPx, yPx }, k) => (
              <circle
                key={k}
                cx={xPx}
                cy={yPx}
                r={isOne ? 3.2 : 2.4}
                className={`fill-paper ${stroke.className}`}
                strokeWidth={1.4}
              />
            ))}
            {isOne &&
              curve.numbers.map(({ xPx, yPx, text }) => (
                <text key={text} x={xPx} y={yPx} textAnchor="middle" className="fill-ink font-semibold">
                  {text}
                </text>
              ))}
            {curve.end.text !== '' && (
              <text x={curve.end.xPx + 6} y={curve.end.yPx} dy="0.35em" className="fill-ink font-semibold">
                {curve.end.text}
              </text>
            )}
          </g>
        );
      })}
    </svg>
  );
}
