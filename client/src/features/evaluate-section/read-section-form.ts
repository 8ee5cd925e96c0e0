import type { Issue } from '#shared/contract/errors.ts';
import { evaluateInputSchema, type EvaluateInput } from '#shared/contract/records.ts';
import type { Face } from '#shared/engine/section.ts';
import { errorsByField, type FieldErrors } from '#client/src/lib/field-errors.ts';
import { parseGroups } from '#client/src/lib/parse-bar-groups.ts';
import { typedFlange } from '#client/src/section-fields/flange-values.ts';
import type { SectionFormValues } from './section-form-values.ts';

export type SectionFormReading =
  | { readonly kind: 'complete'; readonly input: EvaluateInput }
  | { readonly kind: 'incomplete'; readonly errors: FieldErrors };

/** One face's bars from its line of text; `none` and an empty line mean no bars. */
function readFace(text: string, face: Face, problems: Issue[]) {
  if (text.trim().toLowerCase() === 'none') return [];
  const reading = parseGroups(text);
  const path = ['section', 'reinforcement', face];
  if (reading.kind === 'unreadable') problems.push({ path, message: reading.problem });
  else if (reading.groups.length > 1)
    problems.push({ path, message: 'Join the sizes of one face with a plus: 2-#8 + 2-#6' });
  else return reading.groups[0] ?? [];
  return [];
}

function readSteel(form: SectionFormValues, problems: Issue[]) {
  if (form.steel === 'layers') {
    const layers = form.layers.filter(({ depthMm, areaMm2 }) => depthMm !== null || areaMm2 !== null);
    return { kind: 'layers', layers };
  }
  const tension = readFace(form.tensionText, 'tension', problems);
  if (tension.length === 0 && problems.length === 0)
    problems.push({
      path: ['section', 'reinforcement', 'tension'],
      message: `Enter the ${form.flange.shape !== 'none' && form.flange.face === 'tension' ? 'top' : 'bottom'} bars, as 3-#8`,
    });
  return { kind: 'bars', tension, compression: readFace(form.compressionText, 'compression', problems) };
}

function readStirrup({ stirrupBar, legs, spacingMm, isSpacingDesigned }: SectionFormValues) {
  if (stirrupBar === '') return null;
  return { bar: stirrupBar, legs, spacingMm, ...(isSpacingDesigned ? { isDesigned: true } : {}) };
}

/** Turns the typed section into the input of the contract, or into messages by the contract's paths. */
export function readSectionForm(form: SectionFormValues): SectionFormReading {
  const problems: Issue[] = [];
  const { displacedConcrete, yieldCurvatureAt, bendAllowance } = form;
  const input = evaluateInputSchema.safeParse({
    section: {
      widthMm: form.widthMm,
      depthMm: form.depthMm,
      fcMPa: form.fcMPa,
      fyMPa: form.fyMPa,
      coverMm: form.coverMm,
      stirrup: readStirrup(form),
      reinforcement: readSteel(form, problems),
      flange: typedFlange(form.flange, form),
    },
    demand: {
      muNmm: form.muNmm,
      ductilityTarget: form.ductilityTarget,
      depthCapMm: form.depthCapMm,
      vuN: form.vuN,
      spanMm: form.spanMm,
      support: form.support,
    },
    rules: {
      minDepthToWidth: null,
      maxDepthToWidth: null,
      maxLayers: form.maxLayers,
      oneSizePerFace: false,
      excludedBars: [],
      columnWidthMm: null,
      minCompressionShare: null,
      requireHangers: false,
    },
    basis: { displacedConcrete, yieldCurvatureAt, bendAllowance },
  });
  if (input.success && problems.length === 0) return { kind: 'complete', input: input.data };
  return { kind: 'incomplete', errors: errorsByField([...problems, ...(input.error?.issues ?? [])]) };
}
