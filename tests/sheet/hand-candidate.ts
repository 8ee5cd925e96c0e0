import type { Candidate } from '#shared/contract/records.ts';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import type { DesignBasis, SectionInput } from '#shared/engine/section.ts';
import { studiesOf } from '#shared/engine/studies.ts';
import { takeoff } from '#shared/engine/takeoff.ts';
import { MPA_PER_KSI, MM_PER_IN, NMM_PER_KIPFT } from '#shared/engine/units.ts';
import { METRIC_BASIS, NO_RULES } from '#shared/verification/layered-section.ts';

/** HAND-01 of the optimum cases (worked by hand and by an independent script for this project; no outside source). */
export const HAND_SECTION: SectionInput = {
  widthMm: 300,
  depthMm: 500,
  fcMPa: 30,
  fyMPa: 420,
  coverMm: 40,
  stirrup: { bar: '10', legs: 2, spacingMm: 150 },
  reinforcement: { kind: 'bars', tension: [{ bar: '25', count: 3 }], compression: [{ bar: '16', count: 2 }] },
};

/** Invented rates. */
const RATES: NonNullable<DesignBasis['rates']> = {
  currency: 'XTS',
  steelPerKg: 1.4,
  stirrupPerKg: 1.7,
  formworkPerM2: 48,
  concrete: [{ fcMPa: 30, costPerM3: 135, co2eKgPerM3: 290 }],
  steelCo2ePerKg: 0.85,
  lapShare: 0.08,
  wasteShare: 0.03,
};

const DEMAND = {
  muNmm: 200e6,
  ductilityTarget: 4,
  depthCapMm: 600,
  vuN: 120e3,
  spanMm: 6000,
  support: 'simple',
} as const;

/** A section of US units with two layers of tension bars, doubly reinforced. */
export const US_SECTION: SectionInput = {
  widthMm: 14 * MM_PER_IN,
  depthMm: 26 * MM_PER_IN,
  fcMPa: 4 * MPA_PER_KSI,
  fyMPa: 60 * MPA_PER_KSI,
  coverMm: 1.5 * MM_PER_IN,
  stirrup: { bar: '#3', legs: 2, spacingMm: 6 * MM_PER_IN },
  reinforcement: { kind: 'bars', tension: [{ bar: '#8', count: 6 }], compression: [{ bar: '#6', count: 3 }] },
};

export const US_BASIS: DesignBasis = {
  ...METRIC_BASIS,
  ruleSet: 'aci318-19',
  barStandard: 'astm',
  esMPa: 29000 * MPA_PER_KSI,
  fytMPa: 60 * MPA_PER_KSI,
  bendAllowance: 'corner-in-bend',
  rates: RATES,
};

export const US_DEMAND = { ...DEMAND, muNmm: 300 * NMM_PER_KIPFT, depthCapMm: null };

interface Parts {
  readonly section?: SectionInput;
  readonly basis?: DesignBasis;
  readonly demand?: Candidate['snapshot']['demand'];
}

export function candidateOf(parts: Parts = {}): Candidate {
  const { section = HAND_SECTION, basis = { ...METRIC_BASIS, rates: RATES }, demand = DEMAND } = parts;
  const evaluation = evaluateSection(section, { basis, demand, rules: NO_RULES });
  const person = { id: '0', name: 'A. Engineer', role: 'engineer' } as const;
  const beam = { id: '1', mark: 'B1', location: 'Level 2', spanMm: 6000, count: 4 };
  const { lines, ...amounts } = takeoff(evaluation.quantities, beam.spanMm, beam.count);
  const createdAt = '2026-05-14T10:00:00.000Z';
  return {
    id: '2',
    projectId: '3',
    beam,
    label: 'A',
    state: 'proposed',
    note: '',
    author: person,
    runId: null,
    sectionIndex: null,
    snapshot: JSON.parse(
      JSON.stringify({
        section,
        demand,
        rules: NO_RULES,
        basis,
        engineVersion: evaluation.engineVersion,
        evaluation,
        studies: studiesOf(section, { basis, demand, rules: NO_RULES }),
      }),
    ) as Candidate['snapshot'],
    hash: 'ab'.repeat(32),
    isReproducedByCurrentEngine: true,
    takeoff: { ...amounts, lines: [...lines] },
    comments: [],
    transitions: [
      { id: '4', from: null, to: 'proposed', by: person, note: '', sheetValues: null, createdAt },
    ],
    createdAt,
    allowedTransitions: [],
  };
}
