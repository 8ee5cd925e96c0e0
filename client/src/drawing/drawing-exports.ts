import { sectionGeometry } from '#shared/drawing/section-geometry.ts';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Evaluation } from '#shared/engine/evaluation.ts';
import type { BarStandard, SectionInput } from '#shared/engine/section.ts';
import { fileName } from '#shared/print/file-name.ts';
import { sizeText, steelText } from '#shared/print/section-text.ts';
import { saveFile } from '#client/src/lib/save-file.ts';
import type { ExportGroup } from '#client/src/ui/export-menu.tsx';

interface DrawingToExport {
  readonly section: SectionInput;
  readonly evaluation: Evaluation;
  readonly standard: BarStandard;
  readonly units: UnitSystem;
  /** What the section is of: candidate A, run 3. */
  readonly source: readonly (string | number)[];
}

/** What a drawing that lies alone on somebody's disk has to say. */
function notesOf({ section, evaluation, units, source }: DrawingToExport): string[] {
  const { title } = evaluation.ruleSet;
  const verdict = evaluation.meetsListedChecks ? 'meets' : 'does not meet';
  return [
    `${sizeText(section, units)}, ${steelText(section, units)}`,
    source.join(' '),
    `The section ${verdict} the listed checks of ${title} (engine ${evaluation.engineVersion}).`,
    'A licensed engineer verifies the design under the codes that apply.',
  ].filter((note) => note !== '');
}

/** The drawing as files; the writers are fetched when asked for. */
export function drawingExports(drawing: DrawingToExport): ExportGroup {
  const { section, evaluation, standard, units, source } = drawing;
  const plan = () => ({ section, geometry: sectionGeometry(section, evaluation, standard), units });
  const name = (extension: string) => fileName([...source, sizeText(section, units)], extension);
  return {
    name: 'Drawing',
    items: [
      {
        label: 'Drawing as SVG',
        run: async () => {
          const { sectionSvg } = await import('./section-svg.ts');
          saveFile(sectionSvg(plan(), notesOf(drawing)), name('svg'), 'image/svg+xml');
        },
      },
      {
        label: 'Drawing as DXF',
        note: `to scale, in ${units === 'us' ? 'inches' : 'millimetres'}`,
        run: async () => {
          const { sectionDxf } = await import('./section-dxf.ts');
          saveFile(sectionDxf(plan(), notesOf(drawing)), name('dxf'), 'image/vnd.dxf');
        },
      },
    ],
  };
}
