import { beams } from '#server/db/schema/beams.ts';
import { projectMembers } from '#server/db/schema/project-members.ts';
import { projects } from '#server/db/schema/projects.ts';
import { sweeps } from '#server/db/schema/sweeps.ts';
import type { Deps } from '#server/deps.ts';
import type { PriceBook, ProjectDesignBasis } from '#shared/contract/design-basis.ts';
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import { NMM_PER_KNM } from '#shared/engine/units.ts';
import type { Account, TestOffice } from './office.ts';

/** Rates with digits that stand out in any text. */
export const PRICE_BOOK: PriceBook = {
  source: 'Invented for the tests',
  currency: 'XTS',
  steelPerKg: 1.234517,
  stirrupPerKg: 1.876529,
  formworkPerM2: 43.210987,
  concrete: [
    { fcMPa: 28, costPerM3: 123.456781, co2eKgPerM3: 301.2347 },
    { fcMPa: 35, costPerM3: 134.567892, co2eKgPerM3: 342.3458 },
  ],
  steelCo2ePerKg: 0.876543,
  lapShare: 0.08,
  wasteShare: 0.03,
};

export const DESIGN_BASIS: ProjectDesignBasis = {
  units: 'si',
  ruleSet: 'aci318m-19',
  barStandard: 'iso',
  esMPa: 200_000,
  maxAggregateMm: 20,
  bendAllowance: 'corner-in-bend',
  displacedConcrete: 'deduct',
  yieldCurvatureAt: 'outermost-layer',
  slabMm: 0,
  fyMPa: 420,
  fytMPa: 420,
  coverMm: 40,
};

/** 3 widths × 10 depths × 2 strengths × 12 tension sets × 4 compression sets = 2880 sections. */
export const SMALL_SWEEP: SweepDefinition = {
  space: {
    width: { kind: 'range', from: 300, to: 400, step: 50 },
    depth: { kind: 'range', from: 400, to: 850, step: 50 },
    fc: { kind: 'list', values: [28, 35] },
    fy: { kind: 'list', values: [420] },
    cover: { kind: 'list', values: [40] },
    stirrups: [{ bar: '10', legs: 2, spacingMm: 200 }],
    tension: { kind: 'bars', sizes: ['20', '25', '28'], counts: [2, 3, 4, 5], none: false },
    compression: { kind: 'bars', sizes: ['20'], counts: [2, 3, 4], none: true },
  },
  demand: { muNmm: 300 * NMM_PER_KNM, ductilityTarget: 6, depthCapMm: null },
  rules: {
    minDepthToWidth: null,
    maxDepthToWidth: null,
    maxLayers: 2,
    oneSizePerFace: false,
    excludedBars: [],
    columnWidthMm: null,
    minCompressionShare: null,
    requireHangers: false,
  },
  view: { x: 'steelKgPerM', y: 'depthMm' },
};

/** `SMALL_SWEEP` over the same ranges with finer steps: widths × depths × 96 sections. */
export function scaledSweep(widths: number, depths: number): SweepDefinition {
  const { space } = SMALL_SWEEP;
  return {
    ...SMALL_SWEEP,
    space: {
      ...space,
      width: { kind: 'range', from: 300, to: 400, step: 100 / (widths - 1) },
      depth: { kind: 'range', from: 400, to: 850, step: 450 / (depths - 1) },
    },
  };
}

export interface OfficeProject {
  readonly projectId: string;
  readonly beamId: string;
  readonly addSweep: (definition: SweepDefinition) => Promise<string>;
}

const MEMBERS: readonly Account[] = ['engineer', 'checker', 'estimator', 'viewer'];
let projectCount = 0;

/** A project of everyone but the outsider, with rates and one beam. */
export async function addProject(
  { deps: { db }, idOf }: { deps: Pick<Deps, 'db'>; idOf: TestOffice['idOf'] },
  priceBook: PriceBook | null = PRICE_BOOK,
): Promise<OfficeProject> {
  const number = `P-${++projectCount}`;
  const createdBy = idOf('engineer');
  const [project] = await db
    .insert(projects)
    .values({ name: `Project ${number}`, number, designBasis: DESIGN_BASIS, priceBook, createdBy })
    .returning({ id: projects.id });
  const projectId = project!.id;
  await db.insert(projectMembers).values(MEMBERS.map((account) => ({ projectId, personId: idOf(account) })));
  const [beam] = await db
    .insert(beams)
    .values({
      projectId,
      mark: 'B1',
      location: 'Level 2, grid C',
      spanMm: 7500,
      count: 6,
      muNmm: 300 * NMM_PER_KNM,
      ductilityTarget: 6,
    })
    .returning({ id: beams.id });
  const beamId = beam!.id;
  return {
    projectId,
    beamId,
    addSweep: async (definition) => {
      const [sweep] = await db
        .insert(sweeps)
        .values({ beamId, name: 'A sweep', definition, createdBy })
        .returning({ id: sweeps.id });
      return sweep!.id;
    },
  };
}
