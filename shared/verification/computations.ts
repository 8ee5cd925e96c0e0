import { BAR_CASES } from './bar-cases.ts';
import { CURVE_CASES } from './curve-cases.ts';
import { DETAILING_CASES } from './detailing-cases.ts';
import { ELASTIC_CASES } from './elastic-cases.ts';
import { EUROCODE_CASES } from './eurocode-cases.ts';
import { FLANGE_CASES } from './flange-cases.ts';
import { FLEXURE_CASES } from './flexure-cases.ts';
import { HAND_WORKED_CASES } from './hand-worked-case.ts';
import { OPTIMUM_CASES } from './optimum-cases.ts';
import type { ComputeCase } from './published-case.ts';
import { SEISMIC_CASES } from './seismic-cases.ts';

/** How each case is computed, by its id. */
export const COMPUTATIONS: Readonly<Record<string, ComputeCase>> = {
  ...FLEXURE_CASES,
  ...FLANGE_CASES,
  ...ELASTIC_CASES,
  ...BAR_CASES,
  ...CURVE_CASES,
  ...DETAILING_CASES,
  ...SEISMIC_CASES,
  ...EUROCODE_CASES,
  ...HAND_WORKED_CASES,
  ...OPTIMUM_CASES,
};
