import { useId, useMemo } from 'react';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Evaluation } from '#shared/engine/evaluation.ts';
import type { BarStandard, SectionInput } from '#shared/engine/section.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { sizeText, steelText, stirrupText } from '#shared/print/section-text.ts';
import { LARGE_VIEW_BOX, LargeDrawing } from './large-drawing.tsx';
import { SectionBody } from './section-body.tsx';
import { sectionGeometry } from '#shared/drawing/section-geometry.ts';

interface DrawnSection {
  readonly section: SectionInput;
  readonly evaluation: Evaluation;
  readonly standard: BarStandard;
  readonly units: UnitSystem;
}

/** `strip`: bare, at a scale shared with its neighbours, standing on a common ground line. `large`: with dimensions. */
export type SectionDrawingProps = DrawnSection &
  (
    | { readonly variant: 'large' }
    | { readonly variant: 'strip'; readonly pxPerMm: number; readonly heightPx: number }
  );

const EDGE_PX = 1;

/** The section as the engine placed it, to scale: the one drawing used in the strip, the inspector and on the sheet. */
export function SectionDrawing(props: SectionDrawingProps) {
  const { section, evaluation, standard, units } = props;
  const id = useId();
  const geometry = useMemo(
    () => sectionGeometry(section, evaluation, standard),
    [section, evaluation, standard],
  );
  const title = `Section ${sizeText(section, units)}, ${steelText(section, units)}`;
  const words = [
    `Stirrups ${stirrupText(evaluation.stirrups ?? section.stirrup, units)}`,
    `clear cover ${formatQuantity(section.coverMm, 'length', units)}`,
    geometry.effectiveDepthMm === null
      ? ''
      : `effective depth d ${formatQuantity(geometry.effectiveDepthMm, 'length', units)}`,
    geometry.neutralAxisMm === null
      ? ''
      : `neutral axis at ${formatQuantity(geometry.neutralAxisMm, 'length', units)} from the compression face`,
    geometry.fits ? '' : `the bars do not fit: ${geometry.reason}`,
  ];
  const label = (
    <>
      <title id={`${id}t`}>{title}</title>
      <desc id={`${id}d`}>{words.filter((word) => word !== '').join('; ')}.</desc>
    </>
  );
  const named = { role: 'img', 'aria-labelledby': `${id}t`, 'aria-describedby': `${id}d` };

  if (props.variant === 'large')
    return (
      <svg viewBox={LARGE_VIEW_BOX} className="h-auto w-full max-w-[26rem]" {...named}>
        {label}
        <LargeDrawing section={section} geometry={geometry} units={units} />
      </svg>
    );

  const widthPx = (geometry.rightMm - geometry.leftMm) * props.pxPerMm + 2 * EDGE_PX;
  const yPx = props.heightPx - section.depthMm * props.pxPerMm;
  return (
    <svg width={widthPx} height={props.heightPx} className="block overflow-visible" {...named}>
      {label}
      <SectionBody
        geometry={geometry}
        at={{ xPx: EDGE_PX - geometry.leftMm * props.pxPerMm, yPx, pxPerMm: props.pxPerMm }}
        hasHooks={false}
      />
      {!geometry.fits && (
        <text x={widthPx / 2} y={yPx - 4} textAnchor="middle" className="fill-fails font-sans text-[10px]">
          no fit
        </text>
      )}
    </svg>
  );
}
