import type { Beam, Project } from '#shared/contract/records.ts';
import { MPA_PER_KSI, MM_PER_IN, NMM_PER_KIPFT } from '#shared/engine/units.ts';

const person = { id: 'e', name: 'An engineer', email: 'engineer@office.example', role: 'engineer' } as const;

/** A project in US units, without rates. */
export const PROJECT: Project = {
  id: '11111111-1111-4111-8111-111111111111',
  name: 'A library',
  number: '1',
  createdAt: '2026-01-01T00:00:00.000Z',
  beamCount: 1,
  candidateCount: 0,
  approvedCount: 0,
  members: [person],
  priceBook: null,
  designBasis: {
    units: 'us',
    ruleSet: 'aci318-19',
    barStandard: 'astm',
    esMPa: 29_000 * MPA_PER_KSI,
    maxAggregateMm: 0.75 * MM_PER_IN,
    bendAllowance: 'corner-in-bend',
    displacedConcrete: 'deduct',
    yieldCurvatureAt: 'outermost-layer',
    slabMm: 0,
    fyMPa: 60 * MPA_PER_KSI,
    fytMPa: 60 * MPA_PER_KSI,
    coverMm: 1.5 * MM_PER_IN,
  },
};

export const BEAM: Beam = {
  id: '22222222-2222-4222-8222-222222222222',
  projectId: PROJECT.id,
  mark: 'B-1',
  location: 'midspan',
  spanMm: 9000,
  count: 4,
  muNmm: 350 * NMM_PER_KIPFT,
  vuN: null,
  ductilityTarget: 6,
  depthCapMm: 30 * MM_PER_IN,
  sweepCount: 0,
  candidateCount: 0,
};
